#include <numbers>

#include "core/mechanism.hpp"
#include "tests/laws/whole.hpp"

/// A liquid is mass on a spring of its own, and nothing else.
namespace swaymark::test {

namespace {

constexpr double kTurn = 2.0 * std::numbers::pi;

struct Tank {
  double shell = 800.0;  // [kg]
  double radius = 1.9;
  double depth = 3.5;
  double sideways = 4e6;  // [N/m]
  double upright = 9e7;
};

// One node on springs to the ground that carries a shell and water.
Tower on_springs(const Tank& tank, int dimensions) {
  Tower tower = bare_tower(dimensions);
  const std::size_t node = add_node(tower, {0.0, 0.0, 5.0});
  Support support;
  support.node = node;
  support.spring = {tank.sideways, dimensions == 3 ? tank.sideways : 0.0, tank.upright};
  tower.supports.push_back(support);
  carry(tower, node, tank.shell);
  stand_tank(tower, {node}, tank.radius, tank.depth);
  ask_for_all_modes(tower);
  return tower;
}

// Frequencies [Hz] of a mass on a spring to the ground that carries another on a spring.
std::pair<double, double> two_masses(double m1, double k1, double m2, double k2) {
  const double a = m1 * m2;
  const double b = m1 * k2 + m2 * (k1 + k2);
  const double root = std::sqrt(b * b - 4.0 * a * k1 * k2);
  return {std::sqrt((b - root) / (2.0 * a)) / kTurn, std::sqrt((b + root) / (2.0 * a)) / kTurn};
}

Tower mast_with_tank(bool rigid) {
  Tower tower = lopsided_mast();
  const std::size_t last = tower.nodes.size() - 1;
  stand_tank(tower, {last - 1, last - 2, last - 3, last - 4}, 0.9, 1.2, rigid);
  return tower;
}

}  // namespace

TEST_CASE("a tank on springs has the frequencies of two masses in series sideways and of one upright") {
  const Tank tank;
  // Housner's figures by hand: published formulas with gamma = H/R.
  const double gamma = tank.depth / tank.radius;
  const double mass = 1000.0 * std::numbers::pi * tank.radius * tank.radius * tank.depth;
  const double convective = mass * 2.0 * std::tanh(1.841 * gamma) / (1.841 * gamma * (1.841 * 1.841 - 1.0));
  const double spring = convective * 1.841 * 9.80665 / tank.radius * std::tanh(1.841 * gamma);
  const auto [low, high] = two_masses(tank.shell + mass - convective, tank.sideways, convective, spring);
  const double lift = std::sqrt(tank.upright / (tank.shell + mass)) / kTurn;
  for (const int dimensions : {2, 3}) {
    const Analysis analysis = analysed(on_springs(tank, dimensions));
    const Index sideways = dimensions - 1;
    REQUIRE(analysis.mode_count() == 2 * sideways + 1);
    for (Index k = 0; k < sideways; ++k) {
      CHECK_THAT(analysis.frequency(k), is_near(low, kSolved));
      CHECK_THAT(analysis.frequency(sideways + k), is_near(high, kSolved));
      CHECK(analysis.character[static_cast<std::size_t>(k)] == "liquid");
      CHECK(analysis.character[static_cast<std::size_t>(sideways + k)] != "liquid");
    }
    CHECK_THAT(analysis.frequency(2 * sideways), is_near(lift, kSolved));
    for (const double moving : analysis.set.moving) CHECK_THAT(moving, is_near(tank.shell + mass, kSolved));
  }
}

TEST_CASE("on a base without give the liquid sloshes at its own frequency") {
  Tank tank;
  tank.sideways = 1e15;
  const Tower tower = on_springs(tank, 3);
  const double own = split_liquid(tower.liquids.front()).omega / kTurn;
  CHECK_THAT(analysed(tower).frequency(0), is_near(own, kSolved));
}

TEST_CASE("a rigid liquid is a carried mass of the same weight") {
  Tower carried = lopsided_mast();
  const std::size_t last = carried.nodes.size() - 1;
  const double mass = 1000.0 * std::numbers::pi * 0.81 * 1.2;
  carried.node_masses.push_back({{last - 1, last - 2, last - 3, last - 4}, mass, "", {}});
  const Analysis one = analysed(mast_with_tank(true));
  const Analysis other = analysed(carried);
  REQUIRE(one.mode_count() == other.mode_count());
  for (Index j = 0; j < one.mode_count(); ++j)
    CHECK_THAT(one.frequency(j), is_near(other.frequency(j), kSolved));
  CHECK_THAT(one.ledger.total(), is_near(other.ledger.total(), kRoundoff));
}

TEST_CASE("a liquid that sloshes weighs as much as one that does not") {
  Tower rigid = mast_with_tank(true);
  Tower sloshing = mast_with_tank(false);
  for (Tower* tower : {&rigid, &sloshing}) shake(*tower, {Axis::x});
  const Analysis one = analysed(rigid);
  const Analysis other = analysed(sloshing);
  CHECK_THAT(other.ledger.total(), is_near(one.ledger.total(), kRoundoff));
  CHECK_THAT(other.seismic->bar_gravity, matrix_near(one.seismic->bar_gravity, kSolved));
  CHECK_THAT(other.seismic->reaction_gravity, matrix_near(one.seismic->reaction_gravity, kSolved));
}

TEST_CASE("two lowest modes of a mast with a tank are those of its liquid") {
  const Analysis analysis = analysed(mast_with_tank(false));
  REQUIRE(analysis.mode_count() >= 3);
  CHECK(analysis.character[0] == "liquid");
  CHECK(analysis.character[1] == "liquid");
  CHECK(analysis.character[2] != "liquid");
  // The mast gives way a little, and no more: Rayleigh's quotient of the sloshing mass alone is an upper
  // bound.
  const double own = split_liquid(analysis.tower.liquids.front()).omega / kTurn;
  CHECK(analysis.frequency(1) < own);
  CHECK(analysis.frequency(0) > 0.9 * own);
}

TEST_CASE("a tank holds no node that nothing else holds") {
  CHECK_FALSE(analysed(mast_with_tank(false)).mechanisms.any());
  Tower loose = lopsided_mast();
  const std::size_t node = add_node(loose, {0.0, 0.0, 9.0});
  stand_tank(loose, {node}, 0.9, 1.2);
  const Analysis analysis = analysed(loose);
  REQUIRE(analysis.mechanisms.any());
  bool named = false;
  for (const Mechanism& mechanism : analysis.mechanisms.mechanisms) {
    for (const FreeMotion& motion : mechanism.motions)
      named = named || motion.of(node) != Eigen::Vector3d::Zero();
  }
  CHECK(named);
  CHECK(analysis.mechanisms.count() == 3);  // what sloshes goes with the node and is no motion of its own
}

TEST_CASE("ice on every bar is a mass per length on every bar") {
  Tower iced = lopsided_mast();
  iced.sections.front().perimeter = 0.25;
  iced.ice.push_back({std::nullopt, 0.02, 900.0, std::nullopt, std::nullopt, "", {}});
  Tower lined = lopsided_mast();
  LineMass line;
  line.per_length = 900.0 * (0.25 * 0.02 + std::numbers::pi * 0.02 * 0.02);
  lined.line_masses.push_back(line);
  CHECK_THAT(Eigen::MatrixXd(assemble(iced).mass_all),
             matrix_near(Eigen::MatrixXd(assemble(lined).mass_all), kRoundoff));
}

}  // namespace swaymark::test
