#include "core/tower_file_requests.hpp"

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

const std::string kQuay = "spectra: {quay: {points: [[0, 0.1 g], [1 s, 0.25 g]]}}";

// The small tower with a spectrum of these keys.
std::string spectrum(const std::string& keys) { return "spectra: {quay: {" + keys + "}}"; }

Refusals seismic_refusals(const std::string& keys) {
  return refusals_of(tower_with({kQuay, "damping: 2 %", "seismic: {" + keys + "}"}));
}

SeismicStatement seismic_of(const std::string& keys) {
  return tower_of(tower_with({kQuay, "damping: 2 %", "seismic: {" + keys + "}"})).seismic.value();
}

ModeRequest modes_of(const std::string& value) { return tower_of(tower_with({"modes: " + value})).modes; }

}  // namespace

TEST_CASE("without a word on modes nine tenths of the mass are wanted") {
  for (const ModeRequest& modes : {tower_of(tower_with({})).modes, modes_of("{}")}) {
    CHECK(modes.mass_share == 0.9);
    CHECK_FALSE(modes.count);
    CHECK_FALSE(modes.up_to);
  }
}

TEST_CASE("each condition on modes stands alone or with others") {
  const ModeRequest count = modes_of("{count: 20}");
  CHECK(count.count == 20);
  CHECK_FALSE(count.mass_share);
  CHECK(modes_of("{up_to: 30 Hz}").up_to == 30.0);
  const ModeRequest all = modes_of("{count: 3, up_to: 600 rpm, mass_share: 95 %}");
  CHECK(all.count == 3);
  CHECK_THAT(all.up_to.value(), is_near(10.0, kRoundoff));
  CHECK_THAT(all.mass_share.value(), is_near(0.95, kRoundoff));
  CHECK(modes_of("{mass_share: 100 %}").mass_share == 1.0);
}

TEST_CASE("modes that cannot be counted are refused") {
  CHECK(refusals_with("modes: {count: 0}") ==
        Refusals{"8:16 'count' wants a whole number from 1 to 100000, got '0'"});
  CHECK(refusals_with("modes: {count: 2.5}").size() == 1);
  CHECK(refusals_with("modes: {up_to: 0 Hz, mass_share: 101 %}") ==
        Refusals{"8:16 'up_to' must be above zero, got '0 Hz'",
                 "8:34 'mass_share' is a fraction, and '101 %' is 101 %"});
  CHECK(refusals_with("modes: {up_to: 2 s}") ==
        Refusals{"8:16 'up_to': a frequency was wanted, got '2 s', which is a time"});
  CHECK(refusals_with("modes: 20") == Refusals{"8:8 'modes' wants a map of keys, got '20'"});
  CHECK(refusals_with("modes: {number: 20}") == Refusals{"8:9 unknown key 'number' in 'modes'"});
}

TEST_CASE("a band is given by its ends or by a running speed") {
  const Tower tower = tower_of(
      tower_with({"bands: [{label: rotor, from: 0.8 Hz, to: 1.4 Hz, margin: 10 %}, {label: pump, speed: 1500 "
                  "rpm, spread: 2 %, harmonics: [1, 2], direction: x}, {label: fan, speed: 10 Hz}]"}));
  REQUIRE(tower.bands.size() == 4);
  CHECK(tower.bands[0].label == "rotor");
  CHECK(tower.bands[0].harmonic == 0);
  CHECK(tower.bands[0].from == 0.8);
  CHECK(tower.bands[0].to == 1.4);
  CHECK_THAT(tower.bands[0].margin, is_near(0.1, kRoundoff));
  CHECK(tower.bands[0].direction == BandDirection::any);
  CHECK(tower.bands[1].harmonic == 1);
  CHECK_THAT(tower.bands[1].from, is_near(24.5, kRoundoff));
  CHECK_THAT(tower.bands[1].to, is_near(25.5, kRoundoff));
  CHECK(tower.bands[1].direction == BandDirection::x);
  CHECK(tower.bands[2].harmonic == 2);
  CHECK_THAT(tower.bands[2].from, is_near(49.0, kRoundoff));
  CHECK_THAT(tower.bands[2].to, is_near(51.0, kRoundoff));
  CHECK(tower.bands[3].from == 10.0);
  CHECK(tower.bands[3].to == 10.0);
  CHECK(tower.bands[3].margin == 0.0);
}

TEST_CASE("a band may begin at zero") {
  CHECK(tower_of(tower_with({"bands: [{label: low, from: 0, to: 1}]"})).bands[0].from == 0.0);
}

TEST_CASE("a band must rise") {
  CHECK(refusals_with("bands: [{label: b, from: 2 Hz, to: 1 Hz}]") ==
        Refusals{"8:9 the band ends at 1 Hz, not above its begin at 2 Hz"});
  CHECK(refusals_with("bands: [{label: b, from: 1 Hz, to: 1 Hz}]") ==
        Refusals{"8:9 a band without width is never hit"});
  CHECK(
      refusals_with("bands: [{label: b, from: -1 Hz, to: 0 Hz}]") ==
      Refusals{"8:26 'from' must not be negative, got '-1 Hz'", "8:37 'to' must be above zero, got '0 Hz'"});
}

TEST_CASE("a band says its range in one way and whole") {
  CHECK(refusals_with("bands: [{label: b}]") ==
        Refusals{"8:9 a band needs exactly one of 'from' and 'to', or 'speed'"});
  CHECK(refusals_with("bands: [{label: b, from: 1}]") == Refusals{"8:9 'to' is missing in a band"});
  CHECK(refusals_with("bands: [{label: b, to: 1}]") == Refusals{"8:9 'from' is missing in a band"});
  CHECK(refusals_with("bands: [{label: b, from: 1, to: 2, speed: 3}]") ==
        Refusals{"8:9 'speed' and 'from/to' exclude each other in a band"});
  CHECK(refusals_with("bands: [{label: b, from: 1, to: 2, spread: 3 %}]") ==
        Refusals{"8:9 'spread' and 'from/to' exclude each other in a band"});
  CHECK(refusals_with("bands: [{label: b, from: 1, to: 2, harmonics: [1]}]") ==
        Refusals{"8:9 'harmonics' and 'from/to' exclude each other in a band"});
  CHECK(refusals_with("bands: [{from: 1, to: 2}]") == Refusals{"8:9 'label' is missing in a band"});
}

TEST_CASE("a direction is one the tower has") {
  CHECK(refusals_with("bands: [{label: b, from: 1, to: 2, direction: y}]") ==
        Refusals{"8:47 'direction' cannot be 'y'"});
  for (const std::string name : {"x", "z", "horizontal", "any"}) {
    const Tower tower =
        tower_of(tower_with({"bands: [{label: b, from: 1, to: 2, direction: " + name + "}]"}));
    CHECK(name_of(tower.bands[0].direction) == name);
  }
}

TEST_CASE("labels of bands and harmonics are named once") {
  CHECK(refusals_with("bands: [{label: b, from: 1, to: 2}, {label: b, from: 3, to: 4}]") ==
        Refusals{"8:45 the band 'b' is named twice, first in line 8"});
  CHECK(refusals_with("bands: [{label: b, speed: 3, harmonics: [1, 2, 1]}]") ==
        Refusals{"8:48 the harmonic '1' is named twice, first in line 8"});
  CHECK(refusals_with("bands: [{label: b, speed: 3, harmonics: [0, 1.5]}]").size() == 2);
  CHECK(refusals_with("bands: [{label: b, speed: 3, harmonics: []}]") ==
        Refusals{"8:41 'harmonics' lists nothing"});
  CHECK(refusals_with("bands: [{label: b, speed: 0 rpm, spread: 100 %}]") ==
        Refusals{"8:27 'speed' must be above zero, got '0 rpm'",
                 "8:42 'spread' is a fraction, and '100 %' is 100 %"});
}

TEST_CASE("a spectrum by points is read in SI") {
  const Tower tower =
      tower_of(tower_with({spectrum("damping: 5 %, damping_correction: true, interpolation: log-log, points: "
                                    "[[50 ms, 0.1 g], [1, 2.5]]")}));
  REQUIRE(tower.spectra.size() == 1);
  const SpectrumStatement& quay = tower.spectra[0];
  CHECK(quay.name == "quay");
  CHECK_THAT(quay.damping.value(), is_near(0.05, kRoundoff));
  CHECK(quay.damping_correction);
  CHECK(quay.interpolation == Interpolation::log_log);
  REQUIRE(quay.points.size() == 2);
  CHECK_THAT(quay.points[0].first, is_near(0.05, kRoundoff));
  CHECK_THAT(quay.points[0].second, is_near(0.980665, kRoundoff));
  CHECK(quay.points[1] == std::pair(1.0, 2.5));
}

TEST_CASE("a spectrum is linear and not corrected unless it says so") {
  const Tower tower = tower_of(tower_with({kQuay}));
  CHECK(tower.spectra[0].interpolation == Interpolation::linear);
  CHECK_FALSE(tower.spectra[0].damping_correction);
  CHECK_FALSE(tower.spectra[0].damping.has_value());
  CHECK(tower_of(tower_with({spectrum("interpolation: linear, points: [[0, 1], [1, 2]]")}))
            .spectra[0]
            .interpolation == Interpolation::linear);
}

TEST_CASE("the points of a spectrum rise in period") {
  CHECK(refusals_with(spectrum("points: [[0, 1], [2, 1], [1, 1]]")) ==
        Refusals{"8:43 the periods of a spectrum must rise, but 1 s follows 2 s"});
  CHECK(refusals_with(spectrum("points: [[0, 1], [2, 1], [2, 3]]")) ==
        Refusals{"8:43 the periods of a spectrum must rise, but 2 s follows 2 s"});
  CHECK(refusals_with(spectrum("points: [[-1, 1], [2, -1 g]]")) ==
        Refusals{"8:28 'period' must not be negative, got '-1'",
                 "8:40 'acceleration' must not be negative, got '-1 g'"});
  CHECK(refusals_with(spectrum("points: [[0, 1]]")) == Refusals{"8:26 a spectrum needs two points or more"});
  CHECK(refusals_with(spectrum("points: []")) == Refusals{"8:26 'points' lists nothing"});
  CHECK(refusals_with(spectrum("points: [[0, 1], [1], 2]")) ==
        Refusals{"8:35 a point of a spectrum is a pair", "8:40 a point of a spectrum is a pair"});
  CHECK(refusals_with(spectrum("points: [[0, 0.1 kg], [1 Hz, 1]]")) ==
        Refusals{"8:31 'acceleration': an acceleration was wanted, got '0.1 kg', which is a mass",
                 "8:41 'period': a time was wanted, got '1 Hz', which is a frequency"});
}

TEST_CASE("log-log interpolation takes no zero") {
  CHECK(refusals_with(spectrum("interpolation: log-log, points: [[0, 1], [1, 0], [2, 1]]")) ==
        Refusals{"8:51 log-log interpolation has no logarithm of zero",
                 "8:59 log-log interpolation has no logarithm of zero"});
  CHECK(refusals_with(spectrum("interpolation: cubic, points: [[0, 1], [1, 2]]")) ==
        Refusals{"8:33 'interpolation' cannot be 'cubic'"});
}

TEST_CASE("a correction needs the damping the spectrum was drawn for") {
  CHECK(refusals_with(spectrum("damping_correction: true, points: [[0, 1], [1, 2]]")) ==
        Refusals{"8:38 'damping_correction' needs to know the damping the spectrum was drawn for"});
  CHECK(refusals_with(spectrum("damping_correction: false, points: [[0, 1], [1, 2]]")).empty());
  CHECK(refusals_with(spectrum("damping: 5, points: [[0, 1], [1, 2]]")) ==
        Refusals{"8:27 'damping' is a fraction, and '5' is 500 %"});
}

TEST_CASE("spectra of a later version are refused key by key and draw no other fault") {
  CHECK(refusals_with(spectrum("rule: EN 1998-1 elastic, type: 1, ground: C, ag: 0.2 g, q: 1.5")) ==
        Refusals{"8:18 'rule': spectra by the formulas of a code are not yet supported",
                 "8:43 'type': spectra by the formulas of a code are not yet supported",
                 "8:52 'ground': spectra by the formulas of a code are not yet supported",
                 "8:63 'ag': spectra by the formulas of a code are not yet supported",
                 "8:74 'q': spectra by the formulas of a code are not yet supported"});
}

TEST_CASE("no spectrum may be called none") {
  CHECK(refusals_with("spectra: {none: {points: [[0, 1], [1, 2]]}}") ==
        Refusals{"8:11 no spectrum may be called 'none'"});
}

TEST_CASE("a seismic check has the defaults of the format") {
  const SeismicStatement seismic = seismic_of("spectrum: {x: quay, z: none}");
  CHECK(seismic.spectrum[0] == std::size_t{0});
  CHECK_FALSE(seismic.spectrum[1]);
  CHECK_FALSE(seismic.spectrum[2]);
  CHECK(seismic.modes == ModalRule::cqc);
  CHECK(seismic.directions == DirectionalRule::srss);
  CHECK(seismic.missing_mass);
  CHECK(seismic.factor == 1.0);
}

TEST_CASE("a seismic check takes every rule of this version") {
  for (const ModalRule rule : {ModalRule::cqc, ModalRule::srss, ModalRule::absolute_sum}) {
    CHECK(seismic_of(fmt::format("spectrum: {{x: quay}}, modes: {}", name_of(rule))).modes == rule);
  }
  for (const DirectionalRule rule :
       {DirectionalRule::srss, DirectionalRule::percent_30, DirectionalRule::percent_40}) {
    CHECK(seismic_of(fmt::format("spectrum: {{x: quay}}, directions: {}", name_of(rule))).directions == rule);
  }
  const SeismicStatement seismic =
      seismic_of("spectrum: {x: quay, z: quay}, missing_mass: false, factor: 1.4, resistance: none");
  CHECK(seismic.spectrum[2] == std::size_t{0});
  CHECK_FALSE(seismic.missing_mass);
  CHECK(seismic.factor == 1.4);
}

TEST_CASE("a seismic check excites axes of the tower by spectra that exist") {
  CHECK(seismic_refusals("spectrum: {x: quai}") == Refusals{"10:25 there is no spectrum 'quai'"});
  CHECK(seismic_refusals("spectrum: {y: quay}") ==
        Refusals{"10:21 'seismic' excites no direction", "10:22 unknown key 'y' in 'spectrum' of seismic"});
  CHECK(seismic_refusals("spectrum: {x: none, z: none}") == Refusals{"10:21 'seismic' excites no direction"});
  CHECK(seismic_refusals("modes: CQC") == Refusals{"10:10 'spectrum' is missing in 'seismic'"});
  CHECK(seismic_refusals("spectrum: quay") ==
        Refusals{"10:21 'spectrum' of seismic wants a map of keys, got 'quay'"});
}

TEST_CASE("rules of a later version are told from slips of the pen") {
  CHECK(seismic_refusals(
            "spectrum: {x: quay}, modes: ten-percent, directions: worst angle, resistance: EN 1993-1-1") ==
        Refusals{"10:39 'modes: ten-percent' is not yet supported",
                 "10:64 'directions: worst angle' is not yet supported",
                 "10:89 'resistance: EN 1993-1-1' is not yet supported"});
  CHECK(seismic_refusals("spectrum: {x: quay}, minor_ratio: 0.85") ==
        Refusals{"10:32 'minor_ratio': the worst angle of excitation is not yet supported"});
  CHECK(seismic_refusals("spectrum: {x: quay}, modes: cqc, directions: 100-50, resistance: some") ==
        Refusals{"10:39 'modes' cannot be 'cqc'", "10:56 'directions' cannot be '100-50'",
                 "10:76 'resistance' cannot be 'some'"});
}

TEST_CASE("the factor of a seismic check is a number above zero") {
  CHECK(seismic_refusals("spectrum: {x: quay}, factor: 0") ==
        Refusals{"10:40 'factor' must be above zero, got '0'"});
  CHECK(seismic_refusals("spectrum: {x: quay}, missing_mass: yes") ==
        Refusals{"10:46 'missing_mass' cannot be 'yes'"});
}

TEST_CASE("a seismic check needs the damping of the tower") {
  CHECK(refusals_of(tower_with({kQuay, "seismic: {spectrum: {x: quay}}"})) ==
        Refusals{"9:10 a seismic check needs the tower's damping"});
}

}  // namespace swaymark::test
