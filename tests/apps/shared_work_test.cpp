#include "apps/shared_work.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("equal stiffness is factorised once and its mechanisms are sought once") {
  const Tower tower = tower_of(lone_mass());
  Tower heavier = tower;
  heavier.node_masses[0].total *= 2.0;
  SharedWork shared;
  const auto first = shared.factor(assemble(tower));
  const MechanismReport* const report = &shared.mechanisms(tower, assemble(tower));
  CHECK(shared.factor(assemble(heavier)) == first);
  CHECK(&shared.mechanisms(heavier, assemble(heavier)) == report);
  CHECK(shared.different() == 1);
}

TEST_CASE("other stiffness and other supports are not taken for the same") {
  const Tower tower = tower_of(lone_mass());
  Tower softer = tower;
  softer.groups[0].stiffness_factor = 0.5;
  SharedWork shared;
  const auto first = shared.factor(assemble(tower));
  CHECK(shared.factor(assemble(softer)) != first);
  CHECK(shared.different() == 2);
  CHECK(shared.factor(assemble(tower)) == first);  // the first state is kept
  CHECK(shared.different() == 2);
}

TEST_CASE("supports that give an equal matrix at other nodes are not taken for the same") {
  // One bar along x held at either end: K is EA/L both times.
  const auto held_at = [](const std::string& node) {
    return tower_of(tower_with({"dimensions: 1", "nodes: {a: [0], b: [2]}",
                                "members: [{group: g, section: bar, material: steel, bars: [[a, b]]}]",
                                "supports: [{nodes: [" + node + "], fixed: [x]}]"}));
  };
  const Assembly left = assemble(held_at("a"));
  const Assembly right = assemble(held_at("b"));
  REQUIRE(left.stiffness.coeff(0, 0) == right.stiffness.coeff(0, 0));
  SharedWork shared;
  const auto first = shared.factor(left);
  CHECK(shared.factor(right) != first);
}

}  // namespace swaymark::test
