#include "core/bar.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

TEST_CASE("the coefficients of one direction of an element's mass add up to its mass in every scheme") {
  // Common practice, no source.
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    const MassShares shares = mass_shares(scheme);
    CHECK_THAT(2.0 * (shares.own_end + shares.other_end), is_near(1.0, kRoundoff));
  }
}

TEST_CASE("the averaged mass is half consistent and half lumped") {
  const MassShares consistent = mass_shares(MassScheme::consistent);
  const MassShares lumped = mass_shares(MassScheme::lumped);
  const MassShares averaged = mass_shares(MassScheme::averaged);
  CHECK_THAT(averaged.own_end, is_near(0.5 * (consistent.own_end + lumped.own_end), kRoundoff));
  CHECK_THAT(averaged.other_end, is_near(0.5 * (consistent.other_end + lumped.other_end), kRoundoff));
}

TEST_CASE("a bar's stiffness, mass and direction follow from its ends, section and material") {
  Tower tower = bare_tower(3, 2e-3);
  add_node(tower, {1.0, 1.0, 1.0});
  add_node(tower, {4.0, 1.0, 5.0});
  add_bar(tower, 0, 1);
  tower.line_masses.push_back({std::nullopt, 3.0, "", {}});
  tower.allowances.push_back({std::size_t{0}, 0.1, "", {}});
  const BarElement bar = bar_elements(tower).front();
  CHECK(bar.length == 5.0);
  CHECK_THAT(bar.axial_stiffness, is_near(210e9 * 2e-3 / 5.0, kRoundoff));
  CHECK_THAT(bar.own_mass, is_near(7850.0 * 2e-3 * 5.0, kRoundoff));
  CHECK_THAT(bar.carried_mass, is_near(0.1 * bar.own_mass + 15.0, kRoundoff));
  CHECK((bar.direction - Eigen::Vector3d(0.6, 0.0, 0.8)).norm() < kRoundoff);
}

TEST_CASE("a factor on area acts on stiffness and mass and one on stiffness on stiffness alone") {
  Tower tower = bare_tower(3, 2e-3);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {0.0, 0.0, 5.0});
  add_bar(tower, 0, 1);
  tower.line_masses.push_back({std::nullopt, 3.0, "", {}});
  tower.allowances.push_back({std::size_t{0}, 0.1, "", {}});
  tower.groups[0].area_factor = 0.9;
  tower.groups[0].stiffness_factor = 0.5;
  const BarElement bar = bar_elements(tower).front();
  CHECK_THAT(bar.axial_stiffness, is_near(0.5 * 210e9 * 0.9 * 2e-3 / 5.0, kRoundoff));
  CHECK_THAT(bar.own_mass, is_near(7850.0 * 0.9 * 2e-3 * 5.0, kRoundoff));
  CHECK_THAT(bar.carried_mass, is_near(0.1 * bar.own_mass + 15.0, kRoundoff));  // cables do not corrode
}

}  // namespace swaymark::test
