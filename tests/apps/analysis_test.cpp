#include "apps/analysis.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("one mass on two bars has the frequency and the damping that were stated") {
  const Analysis analysis = checked(lone_mass());
  REQUIRE(analysis.mode_count() == 2);
  for (Index j = 0; j < 2; ++j) {
    CHECK_THAT(analysis.frequency(j), is_near(lone_frequency(), kSolved));
    CHECK(analysis.damping(j) == 0.02);
  }
}

TEST_CASE("effective masses as shares of the moving mass add up to one in every axis the tower has") {
  const Analysis analysis = checked(lone_mass());
  CHECK_THAT(analysis.mass_ratio.col(0).sum(), is_near(1.0, kSolved));
  CHECK(analysis.mass_ratio.col(1).isZero());
  CHECK_THAT(analysis.mass_ratio.col(2).sum(), is_near(1.0, kSolved));
}

TEST_CASE("a tower without damping has no damping by mode") {
  const Analysis analysis = checked(tower_with({}));
  CHECK(analysis.damping.size() == 0);
  CHECK(analysis.mode_count() > 0);
}

TEST_CASE("a tower that can move comes back with its mechanisms and without modes or verdicts") {
  const Analysis analysis = checked(swinging_bar());
  REQUIRE(analysis.mechanisms.mechanisms.size() == 1);
  CHECK(analysis.mode_count() == 0);
  CHECK(analysis.verdicts.empty());
  CHECK(!analysis.seismic);
  CHECK(analysis.ledger.total() > 0.0);
}

TEST_CASE("a tower of which nothing is free cannot be computed") {
  const std::string held = tower_with({"supports: [{nodes: [a, b, c], fixed: [x, z]}]"});
  CHECK_THROWS_AS(checked(held), ComputationError);
  CHECK_THROWS_WITH(checked(held), Catch::Contains("nothing is free"));
}

TEST_CASE("a tower of which nothing that is free has mass cannot be computed") {
  const std::string weightless = tower_with({"materials: {steel: {E: 210 GPa, density: 0}}"});
  CHECK_THROWS_AS(checked(weightless), ComputationError);
  CHECK_THROWS_WITH(checked(weightless), Catch::Contains("has mass"));
}

TEST_CASE("the mass share is asked for in the directions with a spectrum and else in the horizontal ones") {
  CHECK(checked(lone_mass()).excited() == std::vector<Index>{0});
  CHECK(checked(lone_mass({kFlatSpectrum, "seismic: {spectrum: {z: flat}}"})).excited() ==
        std::vector<Index>{1});
  CHECK(checked(lone_mass({kFlatSpectrum, "seismic: {spectrum: {x: flat, z: flat}}"})).excited() ==
        std::vector<Index>{0, 1});
  CHECK(harbour_light().excited() == std::vector<Index>{0, 1});
}

TEST_CASE("modes leave bands and seismic response to a whole check") {
  const Analysis modes = harbour_light(Scope::modes);
  const Analysis whole = harbour_light();
  CHECK(modes.bands.empty());
  CHECK(!modes.seismic);
  CHECK(whole.bands.size() == whole.tower.bands.size());
  CHECK(whole.seismic);
  CHECK_THAT(modes.frequency(0), is_near(whole.frequency(0), kSolved));
}

TEST_CASE("a check takes as many modes as its highest band reaches and a count alone does not") {
  Tower tower = rod(8, 8.0, MassScheme::consistent);
  tower.modes = {};
  tower.modes.count = 1;
  BandStatement band;
  band.label = "machine";
  band.from = 400.0;
  band.to = 500.0;
  tower.bands = {band};
  // The first two axial modes of the rod lie near c/4L = 162 Hz and 3c/4L = 485 Hz, the third near 808 Hz.
  CHECK(checked(tower, Scope::modes).mode_count() == 1);
  CHECK(checked(tower).mode_count() == 2);
}

TEST_CASE("a mode that lives at one node of a larger tower is named by the node") {
  Tower tower = regular_mast({});
  const std::size_t top = tower.nodes.size() - 1;
  Section wire;
  wire.name = "wire";
  wire.area = 1e-9;
  tower.sections.push_back(wire);
  tower.groups.push_back({"wires", tower.sections.size() - 1, 0, {}});
  const std::size_t lamp = add_node(tower, {0.1, 0.2, 9.5});
  for (std::size_t k = 1; k <= 4; ++k) add_bar(tower, top - k, lamp);
  carry(tower, lamp, 50.0);
  const Analysis analysis = checked(tower);
  CHECK(analysis.character.front() == "local at " + tower.nodes[lamp].name);
  CHECK(analysis.character.back() != analysis.character.front());
}

TEST_CASE("every mode of a tower in one dimension is along x") {
  for (const std::string& character : checked(shaken_rod(3)).character) CHECK(character == "along x");
}

}  // namespace swaymark::test
