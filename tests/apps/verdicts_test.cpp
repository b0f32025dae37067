#include "apps/verdicts.hpp"

#include <algorithm>

#include <catch2/catch.hpp>

#include "apps/figure.hpp"
#include "tests/apps/cases.hpp"

namespace swaymark::test {

namespace {

Verdict verdict_on(const Analysis& analysis, const std::string& check) {
  const auto found = std::find_if(analysis.verdicts.begin(), analysis.verdicts.end(),
                                  [&](const Verdict& verdict) { return verdict.check == check; });
  INFO(check);
  REQUIRE(found != analysis.verdicts.end());
  return *found;
}

std::string frequency_in_words() { return figure(lone_frequency(), 3) + " Hz"; }

// The verdict on a band for the lone mass, whose only frequency is 5.008 Hz.
Verdict band_verdict(const std::string& band) {
  return verdict_on(checked(lone_mass({"bands: [{label: rotor, " + band + "}]"})), "band rotor");
}

}  // namespace

TEST_CASE("a mode inside a band fails its check and is named with frequency and character") {
  const Verdict verdict = band_verdict("from: 4.5 Hz, to: 5.5 Hz");
  CHECK(!verdict.met);
  CHECK_THAT(verdict.detail, Catch::Contains("inside") && Catch::Contains(frequency_in_words()) &&
                                 Catch::Contains("mode 1") && Catch::Contains("sway x"));
}

TEST_CASE("a mode within the margin of a band fails its check") {
  const Verdict verdict = band_verdict("from: 5.2 Hz, to: 6 Hz, margin: 10 %");
  CHECK(!verdict.met);
  CHECK_THAT(verdict.detail, Catch::Contains("margin of 10 %") && Catch::Contains(frequency_in_words()));
}

TEST_CASE("a band with no mode in it or its margin is met") {
  CHECK(band_verdict("from: 5.2 Hz, to: 6 Hz, margin: 3 %").met);
  CHECK(band_verdict("from: 20 Hz, to: 30 Hz").met);
  CHECK(band_verdict("from: 0 Hz, to: 1 Hz").met);
}

TEST_CASE("each harmonic of a band has a verdict of its own") {
  const Analysis analysis =
      checked(lone_mass({"bands: [{label: fan, speed: 150 rpm, spread: 2 %, harmonics: [1, 2]}]"}));
  CHECK(verdict_on(analysis, "band fan").met);               // 2.5 Hz
  CHECK(!verdict_on(analysis, "band fan, harmonic 2").met);  // 5.0 Hz
}

TEST_CASE("too little effective mass fails whether the missing mass is added or not") {
  // The first mode of a fixed-free rod takes 8/pi2 = 81 % of its mass (derived), and a little more of what
  // moves, as the foot of the rod holds a part of it.
  Tower tower = shaken_rod(1);
  const Analysis analysis = checked(tower);
  const double share = analysis.mass_ratio(0, 0);
  REQUIRE(share > 0.81);
  REQUIRE(share < 0.9);
  const Verdict added = verdict_on(analysis, "effective mass x");
  CHECK(!added.met);
  CHECK_THAT(added.detail, Catch::Contains(percent(share) + " %") && Catch::Contains("the rest was added"));
  tower.seismic->missing_mass = false;
  const Verdict left_out = verdict_on(checked(tower), "effective mass x");
  CHECK(!left_out.met);
  CHECK_THAT(left_out.detail, Catch::Contains("90 %") && !Catch::Contains("the rest was added"));
}

TEST_CASE("ninety percent of effective mass are enough without the missing mass") {
  // The first three modes take 81.06 + 9.01 + 3.24 % (derived).
  Tower tower = shaken_rod(3);
  tower.seismic->missing_mass = false;
  CHECK(verdict_on(checked(tower), "effective mass x").met);
}

TEST_CASE("every direction that is shaken has its check of effective mass and no other has") {
  const Analysis analysis = checked(lone_mass({kFlatSpectrum, kAlongX}));
  CHECK(verdict_on(analysis, "effective mass x").met);
  for (const Verdict& verdict : analysis.verdicts) CHECK(verdict.check != "effective mass z");
}

TEST_CASE("modes that were counted and accurate meet their checks") {
  const Analysis analysis = checked(lone_mass());
  CHECK(analysis.verdicts.size() == 2);
  const Verdict complete = verdict_on(analysis, "no mode missing");
  CHECK(complete.met);
  CHECK_THAT(complete.detail, Catch::Contains("exactly 2 modes"));
  CHECK(verdict_on(analysis, "residual of the modes").met);
}

TEST_CASE("modes that could not be counted or are inaccurate fail their checks") {
  Analysis analysis = checked(lone_mass());
  analysis.set.modes.status = ModesStatus::uncounted;
  analysis.set.modes.certificate.reset();
  analysis.set.modes.residual(1) = 1e-3;
  const auto verdicts = verdicts_of(analysis);
  REQUIRE(verdicts.size() == 2);
  CHECK(!verdicts[0].met);
  CHECK_THAT(verdicts[0].detail, Catch::Contains("could not be counted"));
  CHECK(!verdicts[1].met);
  CHECK_THAT(verdicts[1].detail, Catch::Contains("1.0e-03"));
}

}  // namespace swaymark::test
