#include "core/tower_file_scenarios.hpp"

#include <catch2/catch.hpp>

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// Two groups of one bar each, with masses of every kind.
const std::vector<std::string> kTwoGroups{
    "sections: {bar: {area: 10 cm2}, thick: {area: 20 cm2}, slim: {area: 5 cm2}}",
    "members: [{group: g, section: bar, material: steel, bars: [[a, c]]},"
    " {group: h, section: slim, material: steel, bars: [[b, c]]}]",
    "masses: [{nodes: [c], mass: 7 kg}, {group: g, per_length: 2 kg/m}, {group: all, allowance: 5 %}]",
    "spectra: {quay: {points: [[0 s, 1], [1 s, 1]]}}",
    "damping: 2 %",
    "modes: {count: 2}",
    "bands: [{label: fan, from: 1 Hz, to: 2 Hz}]",
    "seismic: {spectrum: {x: quay}}"};

TowerFile file_of(const std::string& scenarios, std::vector<std::string> lines = kTwoGroups) {
  lines.push_back("scenarios: " + scenarios);
  return read_tower_file(tower_with(lines), "tower.yaml");
}

// The tower of the only scenario, which states these keys.
Tower in_scenario(const std::string& keys) {
  const TowerFile file = file_of("[{label: other, " + keys + "}]");
  REQUIRE(file.scenarios.size() == 1);
  return file.scenarios[0].tower;
}

double area_of(const Tower& tower, std::size_t bar) { return tower.area_of(tower.bars[bar]); }

}  // namespace

TEST_CASE("a tower without scenarios has none") {
  CHECK(read_tower_file(tower_with({}), "t").scenarios.empty());
}

TEST_CASE("scenarios keep their order their labels and the keys they state") {
  const TowerFile file =
      file_of("[{label: lighter, masses: none}, {mass_matrix: lumped, damping: 1 %, label: lumped}]");
  REQUIRE(file.scenarios.size() == 2);
  CHECK(file.scenarios[0].label == "lighter");
  CHECK(file.scenarios[0].keys == std::vector<std::string>{"masses"});
  CHECK(file.scenarios[1].label == "lumped");
  CHECK(file.scenarios[1].keys == std::vector<std::string>{"mass_matrix", "damping"});
  CHECK(file.scenarios[1].place.line > 7);
}

TEST_CASE("a scenario leaves the tower as stated as it was") {
  const TowerFile file = file_of(
      "[{label: all, masses: none, area_factor: 0.5, stiffness_factor: 0.5, group_sections: {g: thick},"
      " supports: [{nodes: [a], fixed: [x]}], damping: 1 %, bands: none, seismic: none, mass_matrix: "
      "lumped}]");
  const Tower plain = tower_of(tower_with(kTwoGroups));
  CHECK(file.tower.node_masses.size() == plain.node_masses.size());
  CHECK(file.tower.supports.size() == plain.supports.size());
  CHECK(file.tower.damping == plain.damping);
  CHECK(file.tower.bands.size() == 1);
  CHECK(file.tower.seismic.has_value());
  CHECK(file.tower.mass_scheme == MassScheme::consistent);
  CHECK(area_of(file.tower, 0) == area_of(plain, 0));
  CHECK(file.tower.groups[0].stiffness_factor == 1.0);
}

TEST_CASE("masses of a scenario replace all masses and none leaves the bars alone") {
  const Tower replaced = in_scenario("masses: [{nodes: [c], mass: 3 kg}]");
  REQUIRE(replaced.node_masses.size() == 1);
  CHECK(replaced.node_masses[0].total == 3.0);
  CHECK(replaced.line_masses.empty());
  CHECK(replaced.allowances.empty());
  const Tower bare = in_scenario("masses: none");
  CHECK(bare.node_masses.empty());
  CHECK(bare.line_masses.empty());
  CHECK(bare.allowances.empty());
}

TEST_CASE("more masses come after those of the tower") {
  const Tower tower = in_scenario("more_masses: [{nodes: [c], mass: 3 kg}, {group: h, per_length: 1 kg/m}]");
  REQUIRE(tower.node_masses.size() == 2);
  CHECK(tower.node_masses[0].total == 7.0);
  CHECK(tower.node_masses[1].total == 3.0);
  CHECK(tower.line_masses.size() == 2);
  CHECK(tower.allowances.size() == 1);
}

TEST_CASE("supports of a scenario replace all supports") {
  const Tower tower =
      in_scenario("supports: [{nodes: [a], fixed: [x, z]}, {nodes: [b], springs: {z: 1 MN/m}, fixed: [x]}]");
  REQUIRE(tower.supports.size() == 2);
  CHECK(tower.supports[1].spring[2] == 1e6);
  CHECK_FALSE(tower.supports[1].fixed[2]);
}

TEST_CASE("the section of a whole group is replaced and of the others is not") {
  const Tower tower = in_scenario("group_sections: {g: thick}");
  CHECK_THAT(area_of(tower, 0), is_near(20e-4, kRoundoff));
  CHECK_THAT(area_of(tower, 1), is_near(5e-4, kRoundoff));
}

TEST_CASE("sections of a group can be exchanged for one another where bars have their own") {
  const std::vector<std::string> lattice{
      "dimensions: 3",
      "nodes: {lamp: [0, 0, 9]}",
      "sections: {low: {area: 10 cm2}, high: {area: 8 cm2}, brace: {area: 5 cm2}, big: {area: 20 cm2}}",
      "lattice: {plan: triangle, width: 2, material: steel, panels: ["
      "{height: 2, width: 2, bracing: X, legs: low, diagonals: brace, horizontals: brace},"
      "{height: 2, width: 2, bracing: X, legs: high, diagonals: brace, horizontals: brace}]}",
      "members: [{group: head, section: low, material: steel, bars: [[L2.1, lamp], [L2.2, lamp], [L2.3, "
      "lamp]]}]",
      "supports: [{nodes: base, fixed: [x, y, z]}]"};
  const TowerFile file = file_of(
      "[{label: swapped, group_sections: {legs: {low: high, high: low}}}, {label: all, group_sections: "
      "{legs: big}}]",
      lattice);
  const auto legs = [](const Tower& tower) {
    std::vector<std::string> names;
    for (const Bar& bar : tower.bars) {
      if (tower.groups[bar.group].name == "legs") names.push_back(tower.section_of(bar).name);
    }
    return names;
  };
  CHECK(legs(file.tower) == std::vector<std::string>{"low", "low", "low", "high", "high", "high"});
  CHECK(legs(file.scenarios[0].tower) ==
        std::vector<std::string>{"high", "high", "high", "low", "low", "low"});
  CHECK(legs(file.scenarios[1].tower) == std::vector<std::string>(6, "big"));
  CHECK(file.scenarios[1].tower.section_of(file.tower.bars.back()).name == "low");  // the head has its own
}

TEST_CASE("a factor holds for all groups or for those that are named") {
  const Tower all = in_scenario("area_factor: 90 %, stiffness_factor: 0.8");
  for (const Group& group : all.groups) {
    CHECK_THAT(group.area_factor, is_near(0.9, kRoundoff));
    CHECK_THAT(group.stiffness_factor, is_near(0.8, kRoundoff));
  }
  const Tower one = in_scenario("area_factor: {h: 0.7}, stiffness_factor: {g: 0.5}");
  CHECK(one.groups[0].area_factor == 1.0);
  CHECK_THAT(one.groups[1].area_factor, is_near(0.7, kRoundoff));
  CHECK_THAT(one.groups[0].stiffness_factor, is_near(0.5, kRoundoff));
  CHECK(one.groups[1].stiffness_factor == 1.0);
}

TEST_CASE("what is asked for is replaced and not added to") {
  const Tower tower = in_scenario(
      "mass_matrix: lumped, damping: [1 %, 3 %], modes: {up_to: 5 Hz}, bands: [{label: a, from: 3 Hz, to: 4 "
      "Hz}],"
      " seismic: {spectrum: {z: quay}, modes: SRSS}");
  CHECK(tower.mass_scheme == MassScheme::lumped);
  CHECK(tower.damping == std::vector<double>{0.01, 0.03});
  CHECK_FALSE(tower.modes.count.has_value());
  CHECK(tower.modes.up_to == 5.0);
  REQUIRE(tower.bands.size() == 1);
  CHECK(tower.bands[0].label == "a");
  REQUIRE(tower.seismic.has_value());
  CHECK_FALSE(tower.seismic->spectrum[0].has_value());
  CHECK(tower.seismic->modes == ModalRule::srss);
}

TEST_CASE("bands and seismic of a scenario may be none") {
  const Tower tower = in_scenario("bands: none, seismic: none");
  CHECK(tower.bands.empty());
  CHECK_FALSE(tower.seismic.has_value());
}

TEST_CASE("what a scenario does not state is that of the tower") {
  const Tower tower = in_scenario("damping: 1 %");
  CHECK(tower.node_masses.size() == 1);
  CHECK(tower.supports.size() == 2);
  CHECK(tower.modes.count == 2);
  CHECK(tower.bands.size() == 1);
  CHECK(tower.seismic.has_value());
  CHECK(tower.nodes.size() == 3);
  CHECK(tower.bars.size() == 2);
}

TEST_CASE("a scenario may be shaken by the damping it states itself") {
  std::vector<std::string> undamped{"spectra: {quay: {points: [[0 s, 1], [1 s, 1]]}}"};
  const TowerFile file =
      file_of("[{label: shaken, damping: 3 %, seismic: {spectrum: {x: quay}}}]", std::move(undamped));
  CHECK(file.scenarios[0].tower.seismic.has_value());
}

}  // namespace swaymark::test
