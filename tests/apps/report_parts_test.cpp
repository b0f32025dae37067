#include "apps/report_parts.hpp"

#include <catch2/catch.hpp>

#include "core/quantity.hpp"
#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("modes are listed in words and counted from one") {
  CHECK(mode_list({}).empty());
  CHECK(mode_list({0}) == "1");
  CHECK(mode_list({0, 1}) == "1 and 2");
  CHECK(mode_list({0, 1, 6}) == "1, 2 and 7");
}

TEST_CASE("a band is named by its label and its harmonic from the second on") {
  BandStatement band;
  band.label = "pump set";
  CHECK(band_name(band) == "pump set");
  band.harmonic = 1;
  CHECK(band_name(band) == "pump set");
  band.harmonic = 2;
  CHECK(band_name(band) == "pump set, harmonic 2");
}

TEST_CASE("a bar is found again by the nodes it joins") {
  const Tower tower = tower_of(tower_with({}));
  CHECK(bar_ends(tower, 0) == "a to c");
  CHECK(bar_ends(tower, 1) == "b to c");
}

TEST_CASE("the extremes of a bar are the largest pull and the largest push of gravity and shaking") {
  const auto check = [](double gravity, double seismic, double tension, double compression) {
    const Extremes extremes = bar_extremes(gravity, seismic);
    CHECK(extremes.tension == tension);
    CHECK(extremes.compression == compression);
  };
  check(-3.0, 5.0, 2.0, 8.0);
  check(-5.0, 3.0, 0.0, 8.0);
  check(5.0, 3.0, 8.0, 0.0);
  check(0.0, 0.0, 0.0, 0.0);
}

TEST_CASE("each foot of two bars carries half the weight and half the overturning") {
  const Analysis analysis = checked(lone_mass({kFlatSpectrum, kAlongX}));
  const auto reactions = node_reactions(analysis);
  const double weight = 150'000.0 * kStandardGravity;
  const double sway = 0.2 * weight;  // m Sa, at 1 m above feet 2 m apart
  REQUIRE(reactions.size() == 2);
  for (const NodeReaction& foot : reactions) {
    REQUIRE(foot.gravity[2]);
    CHECK_THAT(*foot.gravity[2], is_near(weight / 2.0, kSolved));
    CHECK_THAT(*foot.seismic[2], is_near(sway / 2.0, kSolved));
    CHECK_THAT(*foot.seismic[0], is_near(sway / 2.0, kSolved));
    CHECK_THAT(*foot.push, is_near((weight + sway) / 2.0, kSolved));
    CHECK(*foot.uplift == 0.0);
    CHECK(!foot.gravity[1]);
    CHECK(!foot.seismic[1]);
  }
  CHECK(reactions[0].node == 0);
  CHECK(reactions[1].node == 1);
}

TEST_CASE("a foot on springs has one row of reactions with its fixed axes") {
  const Analysis analysis =
      checked(lone_mass({"supports: [{nodes: [a], fixed: [x, z]}, {nodes: [b], fixed: [z]}, "
                         "{nodes: [c], springs: {x: 50 MN/m}}]",
                         kFlatSpectrum, kAlongX}));
  const auto reactions = node_reactions(analysis);
  REQUIRE(reactions.size() == 3);
  CHECK(!reactions[1].seismic[0]);
  CHECK(reactions[2].seismic[0]);
  CHECK(!reactions[2].uplift);
}

TEST_CASE("without a vertical axis there is neither gravity nor uplift") {
  const auto reactions = node_reactions(checked(shaken_rod(2)));
  REQUIRE(reactions.size() == 1);
  CHECK(!reactions[0].gravity[0]);
  CHECK(!reactions[0].uplift);
  CHECK(!reactions[0].push);
  CHECK(*reactions[0].seismic[0] > 0.0);
}

TEST_CASE("displacements are those of the free nodes and zero where a node is held") {
  const Analysis analysis = checked(lone_mass({kFlatSpectrum, kAlongX}));
  const Eigen::MatrixXd displacements = node_displacements(analysis);
  REQUIRE(displacements.rows() == 3);
  // Sa / omega^2 of one mass on one spring
  const double omega = 2.0 * std::numbers::pi * lone_frequency();
  CHECK_THAT(displacements(2, 0), is_near(0.2 * kStandardGravity / (omega * omega), kSolved));
  CHECK(displacements.topRows(2).isZero());
}

}  // namespace swaymark::test
