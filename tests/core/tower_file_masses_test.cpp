#include "core/tower_file_masses.hpp"

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("a mass at nodes is the total of all of them") {
  const Tower tower = tower_of(tower_with({"masses: [{nodes: [b, c], mass: 480 kg, label: platform}]"}));
  REQUIRE(tower.node_masses.size() == 1);
  CHECK(tower.node_masses[0].nodes == std::vector<std::size_t>{1, 2});
  CHECK(tower.node_masses[0].total == 480.0);
  CHECK(tower.node_masses[0].label == "platform");
}

TEST_CASE("masses along bars belong to a group or to all") {
  const Tower tower =
      tower_of(tower_with({"masses: [{group: g, per_length: 12 kg/m, label: ladder}, {group: all, "
                           "per_length: 1}, {group: all, allowance: 5 %}]"}));
  REQUIRE(tower.line_masses.size() == 2);
  CHECK(tower.line_masses[0].group == std::size_t{0});
  CHECK(tower.line_masses[0].per_length == 12.0);
  CHECK(tower.line_masses[0].label == "ladder");
  CHECK(tower.line_masses[1].group == std::nullopt);
  REQUIRE(tower.allowances.size() == 1);
  CHECK(tower.allowances[0].group == std::nullopt);
  CHECK_THAT(tower.allowances[0].share, is_near(0.05, kRoundoff));
}

TEST_CASE("an entry carries mass in exactly one way") {
  const std::string one = "needs exactly one of 'mass', 'per_length', 'allowance', 'ice' and 'liquid'";
  CHECK(refusals_with("masses: [{nodes: [c]}]") == Refusals{"8:10 a mass " + one});
  CHECK(refusals_with("masses: [{group: g, per_length: 1, allowance: 1 %}]") ==
        Refusals{"8:10 a mass " + one});
  CHECK(refusals_with("masses: [{nodes: [c], group: g, mass: 5}]") ==
        Refusals{"8:10 'nodes' and 'group' exclude each other in a mass"});
  CHECK(refusals_with("masses: [{group: g, mass: 5}]") ==
        Refusals{"8:10 'nodes' is missing in a mass at nodes"});
  CHECK(refusals_with("masses: [{nodes: [c], per_length: 5}]") ==
        Refusals{"8:10 'group' is missing in a mass on bars"});
  CHECK(refusals_with("masses: [{allowance: 5 %}]") == Refusals{"8:10 'group' is missing in a mass on bars"});
}

TEST_CASE("a mass is never a force and never negative") {
  const auto faults = faults_of(tower_with({"masses: [{nodes: [c], mass: 12 kip}]"}));
  REQUIRE(faults.size() == 1);
  CHECK(to_string(faults[0]) ==
        "tower.yaml:8:29: 'mass': a mass was wanted, got '12 kip', which is a force; "
        "a mass is never a weight: divide by 9.80665 m/s2 and write kg");
  CHECK(refusals_with("masses: [{nodes: [c], mass: -5 kg}]") ==
        Refusals{"8:29 'mass' must be above zero, got '-5 kg'"});
  CHECK(refusals_with("masses: [{group: g, per_length: 2 kN/m}]") ==
        Refusals{"8:33 'per_length': a mass per length was wanted, got '2 kN/m', which is a stiffness"});
  CHECK(refusals_with("masses: [{group: g, allowance: -5 %}]") ==
        Refusals{"8:32 'allowance' must be above zero, got '-5 %'"});
  CHECK(refusals_with("masses: [{group: g, allowance: 5}]") ==
        Refusals{"8:32 'allowance' is a fraction, and '5' is 500 %"});
}

TEST_CASE("masses at unknown places are refused where they name them") {
  CHECK(refusals_with("masses: [{nodes: [c, q], mass: 5}, {group: gg, per_length: 5}]") ==
        Refusals{"8:22 there is no node 'q'", "8:44 there is no group 'gg'"});
  CHECK(refusals_with("masses: [{nodes: [c, c], mass: 5}]") ==
        Refusals{"8:22 the node 'c' is named twice, first in line 8"});
  CHECK(refusals_with("masses: [{nodes: q, mass: 5}]") == Refusals{"8:18 there is no node 'q'"});
  CHECK(refusals_with("masses: 5 kg") == Refusals{"8:9 'masses' wants a list of masses, got '5 kg'"});
}

namespace {

const std::string kOutlined = "sections: {bar: {area: 10 cm2, perimeter: 0.4 m}}";
const std::string kWater = "liquid: {radius: 1.9 m, depth: 3.5 m, density: 1000 kg/m3}";

}  // namespace

TEST_CASE("ice lies on the bars of a group over a range of heights") {
  const Tower tower = tower_of(
      tower_with({kOutlined,
                  "masses: [{group: g, ice: 20 mm, density: 900 kg/m3, from: 0.2 m, to: 3 m, label: glaze}, "
                  "{group: all, ice: 0.01, density: 500}]"}));
  REQUIRE(tower.ice.size() == 2);
  CHECK(tower.ice[0].group == std::size_t{0});
  CHECK_THAT(tower.ice[0].thickness, is_near(0.02, kRoundoff));
  CHECK(tower.ice[0].density == 900.0);
  CHECK(tower.ice[0].from == 0.2);
  CHECK(tower.ice[0].to == 3.0);
  CHECK(tower.ice[0].label == "glaze");
  CHECK(tower.ice[1].group == std::nullopt);
  CHECK(tower.ice[1].from == std::nullopt);
}

TEST_CASE("ice names every section whose outline is not known") {
  CHECK(refusals_with("masses: [{group: all, ice: 20 mm, density: 900 kg/m3}]") ==
        Refusals{"8:10 ice needs the outline of its bars, and no perimeter is known of section 'bar'"});
  // A section with a fault of its own is not blamed again.
  CHECK(refusals_of(tower_with(
            {"sections: {bar: {area: 0}}", "masses: [{group: all, ice: 20 mm, density: 900 kg/m3}]"})) ==
        Refusals{"4:24 'area' must be above zero, got '0'"});
}

TEST_CASE("heights belong to ice alone") {
  CHECK(refusals_with("masses: [{group: g, per_length: 5, from: 0.2 m}]") ==
        Refusals{"8:36 unknown key 'from' in a mass"});
  CHECK(refusals_of(tower_with({kOutlined, "masses: [{group: g, ice: 5 mm, density: 900, to: -1 m}]"})) ==
        Refusals{"8:10 no bar of 'g' lies within these heights"});
}

TEST_CASE("a liquid adds a node for what sloshes in the middle of its own") {
  const Tower tower = tower_of(tower_with({"masses: [{nodes: [a, c], " + kWater + ", label: water}]"}));
  REQUIRE(tower.liquids.size() == 1);
  const Liquid& liquid = tower.liquids[0];
  CHECK(liquid.nodes == std::vector<std::size_t>{0, 2});
  CHECK(liquid.radius == 1.9);
  CHECK(liquid.depth == 3.5);
  CHECK(liquid.density == 1000.0);
  REQUIRE(liquid.node == std::size_t{3});
  CHECK(tower.nodes[3].name == "water");
  CHECK((tower.nodes[3].position - Eigen::Vector3d(0.5, 0.0, 0.5)).norm() <= kRoundoff);
  CHECK(tower.sloshes(3));
  CHECK_FALSE(tower.sloshes(2));
}

TEST_CASE("what sloshes may stand where a node stands and a rigid liquid adds none") {
  CHECK(tower_of(tower_with({"masses: [{nodes: [c], " + kWater + ", label: water}]"})).nodes.size() == 4);
  const Tower rigid = tower_of(
      tower_with({"masses: [{nodes: [c], liquid: {radius: 1.9, depth: 3.5, density: 1000, rigid: true}}]"}));
  CHECK(rigid.nodes.size() == 3);
  CHECK(rigid.liquids.at(0).rigid);
}

TEST_CASE("two liquids have different labels and no bar ends at one") {
  CHECK(refusals_with("masses: [{nodes: [c], " + kWater + ", label: w}, {nodes: [a], " + kWater +
                      ", label: w}]") ==
        Refusals{"8:94 the mass that sloshes takes its name from the label, and 'w' names something else "
                 "already"});
  CHECK(refusals_with("masses: [{nodes: [c], " + kWater + ", label: w}, {nodes: [w], mass: 5}]") ==
        Refusals{"8:103 there is no node 'w'"});
}

TEST_CASE("the mass matrix is consistent unless another scheme is named") {
  CHECK(tower_of(tower_with({})).mass_scheme == MassScheme::consistent);
  CHECK(tower_of(tower_with({"mass_matrix: consistent"})).mass_scheme == MassScheme::consistent);
  CHECK(tower_of(tower_with({"mass_matrix: lumped"})).mass_scheme == MassScheme::lumped);
  CHECK(tower_of(tower_with({"mass_matrix: averaged"})).mass_scheme == MassScheme::averaged);
  const auto faults = faults_of(tower_with({"mass_matrix: lumpd"}));
  REQUIRE(faults.size() == 1);
  CHECK(to_string(faults[0]) ==
        "tower.yaml:8:14: 'mass_matrix' cannot be 'lumpd'; "
        "did you mean 'lumped'? possible: consistent, lumped or averaged");
}

}  // namespace swaymark::test
