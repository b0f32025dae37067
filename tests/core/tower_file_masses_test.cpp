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
  const std::string one = "needs exactly one of 'mass', 'per_length' and 'allowance'";
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

TEST_CASE("masses of a later version are the only fault of their entry") {
  CHECK(refusals_with("masses: [{group: all, ice: 20 mm, density: 900 kg/m3}]") ==
        Refusals{"8:23 'ice': ice on the bars is not yet supported"});
  CHECK(refusals_with("masses: [{group: all, liquid: water}]") ==
        Refusals{"8:23 'liquid': liquids are not yet supported"});
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
