#include "core/liquid.hpp"

#include <cmath>
#include <numbers>

#include "core/assembly.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

Liquid water(double radius, double depth) {
  Liquid liquid;
  liquid.nodes = {0};
  liquid.radius = radius;
  liquid.depth = depth;
  liquid.density = 1000.0;
  return liquid;
}

}  // namespace

TEST_CASE("a tank as deep as wide has the masses of Housner's formulas") {
  // gamma = 1: tanh(1.841) = 0.95090, m_c/m = 2 * 0.95090 / (1.841 (1.841^2 - 1)) = 0.4324; derived by hand.
  const LiquidSplit split = split_liquid(water(2.0, 2.0));
  CHECK_THAT(split.mass, is_near(1000.0 * std::numbers::pi * 8.0, kRoundoff));
  CHECK_THAT(split.convective / split.mass, is_near(0.4324, 0.0, 0.00005));
  CHECK_THAT(split.impulsive + split.convective, is_near(split.mass, kRoundoff));
  // omega^2 = 1.841 * 9.80665 / 2 * 0.95090 = 8.584 1/s2.
  CHECK_THAT(split.omega * split.omega, is_near(8.584, 0.0, 0.0005));
  CHECK_THAT(split.spring, is_near(split.convective * split.omega * split.omega, kRoundoff));
}

TEST_CASE("the convective share agrees with the table of EN 1998-4") {
  // EN 1998-4:2006, Table A.2, m_c/m by H/R (from memory), three digits.
  const std::vector<std::pair<double, double>> published{{0.3, 0.824}, {0.5, 0.700}, {0.7, 0.586},
                                                         {1.0, 0.452}, {1.5, 0.314}, {2.0, 0.237},
                                                         {2.5, 0.190}, {3.0, 0.158}};
  // The table holds all that is not impulsive, the higher sloshing modes among it; the first alone is some
  // percent less: the sum over all roots x of J1' of 2 tanh(x H/R) / (x H/R (x^2 - 1)) tells 8 % at H/R =
  // 0.3. Derived.
  for (const auto& [ratio, share] : published) {
    INFO(ratio);
    const LiquidSplit split = split_liquid(water(1.0, ratio));
    CHECK(split.convective / split.mass < share);
    CHECK(split.convective / split.mass > 0.92 * share);
  }
}

TEST_CASE("a shallow liquid sloshes nearly whole and a deep one mostly stays") {
  // The limits of the formula: 2 / (1.841^2 - 1) = 0.8371 for H/R to 0; m_c of a depth of about R / 1.841 x
  // 0.837 for H/R without end. Derived.
  const double limit = 2.0 / (1.841 * 1.841 - 1.0);
  const LiquidSplit shallow = split_liquid(water(10.0, 1e-6));
  CHECK_THAT(shallow.convective / shallow.mass, is_near(limit, 1e-9));
  const LiquidSplit deep = split_liquid(water(1.0, 1e4));
  CHECK_THAT(deep.convective, is_near(1000.0 * std::numbers::pi * limit / 1.841, 1e-9));
}

TEST_CASE("a rigid liquid has no part that sloshes") {
  Liquid liquid = water(2.0, 2.0);
  liquid.rigid = true;
  const LiquidSplit split = split_liquid(liquid);
  CHECK(split.impulsive == split.mass);
  CHECK(split.convective == 0.0);
  CHECK(split.spring == 0.0);
}

TEST_CASE("the links of a liquid pull on the mean of its nodes in every horizontal axis") {
  Tower tower = bare_tower(3);
  for (int i = 0; i < 3; ++i) add_node(tower, {1.0 * i, 0.0, 2.0});
  Liquid liquid = water(1.0, 1.0);
  liquid.nodes = {0, 1};
  liquid.node = 2;
  tower.liquids.push_back(liquid);
  const DofMap dofs(tower);
  const auto links = liquid_links(tower, dofs);
  REQUIRE(links.size() == 2);
  CHECK(links[0].dof == dofs.dof(2, 0));
  CHECK(links[1].dof == dofs.dof(2, 1));
  CHECK(links[1].others == std::vector<Index>{dofs.dof(0, 1), dofs.dof(1, 1)});
  CHECK(links[0].stiffness == split_liquid(liquid).spring);
  // Upright its node is held, and holds nothing.
  CHECK(dofs.fixed_count() == 1);
  const Assembly assembly = assemble(tower);
  CHECK(assembly.support_mass.norm() == 0.0);
  CHECK(assembly.support_stiffness.norm() == 0.0);
  const Eigen::MatrixXd k(assembly.stiffness);
  const double s = links[0].stiffness;
  const auto free = [&](std::size_t node) { return dofs.free(dofs.dof(node, 0)); };
  CHECK_THAT(k(free(2), free(2)), is_near(s, kRoundoff));
  CHECK_THAT(k(free(2), free(0)), is_near(-0.5 * s, kRoundoff));
  CHECK_THAT(k(free(0), free(1)), is_near(0.25 * s, kRoundoff));
}

TEST_CASE("nodes carry the impulsive part sideways and the whole upright") {
  Liquid liquid = water(2.0, 2.0);
  liquid.nodes = {0, 1};
  liquid.node = 2;
  const LiquidSplit split = split_liquid(liquid);
  CHECK(liquid_on_node(liquid, split, Axis::x) == 0.5 * split.impulsive);
  CHECK(liquid_on_node(liquid, split, Axis::y) == 0.5 * split.impulsive);
  CHECK(liquid_on_node(liquid, split, Axis::z) == 0.5 * split.mass);
  liquid.node.reset();
  CHECK(liquid_on_node(liquid, split, Axis::x) == 0.5 * split.mass);
}

}  // namespace swaymark::test
