#include "core/statics.hpp"

#include <Eigen/SparseCholesky>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

constexpr double kGravity = 9.80665;  // ISO 80000-3, exact

double total_mass(const Assembly& assembly) {
  const Eigen::VectorXd r = rigid_translation(assembly.dofs, Axis::x);
  return r.dot(assembly.mass_all * r);
}

// Reactions under dead load: a static solution, the weight of the held nodes included.
Eigen::VectorXd dead_reactions(const Tower& tower, const Assembly& assembly) {
  const Eigen::VectorXd load = weights(assembly);
  const Eigen::SimplicialLDLT<SparseMatrix> factor(assembly.stiffness);
  const Eigen::VectorXd displacement = factor.solve(assembly.dofs.free_part(load));
  Eigen::VectorXd held(assembly.dofs.fixed_count());
  for (Index i = 0; i < held.size(); ++i)
    held(i) = -load(assembly.dofs.fixed_dofs()[static_cast<std::size_t>(i)]);
  return reactions(support_dofs(tower, assembly), assembly, displacement, held);
}

Eigen::Vector3d sum_of(const std::vector<SupportDof>& supports, const Eigen::VectorXd& reactions) {
  Eigen::Vector3d sum = Eigen::Vector3d::Zero();
  for (std::size_t i = 0; i < supports.size(); ++i) {
    sum[index_of(supports[i].axis)] += reactions(static_cast<Index>(i));
  }
  return sum;
}

}  // namespace

TEST_CASE("the weights add up to the mass times standard gravity and are the same in every scheme") {
  Tower tower = regular_mast({});
  tower.mass_scheme = MassScheme::lumped;
  const Eigen::VectorXd lumped = weights(assemble(tower));
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    tower.mass_scheme = scheme;
    const Assembly assembly = assemble(tower);
    const Eigen::VectorXd load = weights(assembly);
    CHECK_THAT(load.sum(), is_near(-kGravity * total_mass(assembly), kRoundoff));
    CHECK_THAT(Eigen::MatrixXd(load), matrix_near(lumped, kRoundoff));
  }
}

TEST_CASE("gravity acts along z alone and needs that axis") {
  const Assembly assembly = assemble(regular_mast({}));
  CHECK(has_gravity(assembly));
  const Eigen::VectorXd load = weights(assembly);
  for (Index dof = 0; dof < load.size(); ++dof) {
    if (assembly.dofs.axis_of(dof) != Axis::z) CHECK(load(dof) == 0.0);
  }
  const Assembly line = assemble(rod(3, 3.0, MassScheme::lumped));
  CHECK_FALSE(has_gravity(line));
  CHECK(weights(line).norm() == 0.0);
}

TEST_CASE("the supports carry the weight of the tower and nothing sideways") {
  const Tower tower = regular_mast({});
  const Assembly assembly = assemble(tower);
  const Eigen::Vector3d sum = sum_of(support_dofs(tower, assembly), dead_reactions(tower, assembly));
  const double weight = kGravity * total_mass(assembly);
  CHECK_THAT(sum.z(), is_near(weight, kSolved));
  CHECK(std::abs(sum.x()) <= kSolved * weight);
  CHECK(std::abs(sum.y()) <= kSolved * weight);
}

TEST_CASE("springs carry the weight as rigid supports do") {
  Tower tower = regular_mast({});
  for (Support& support : tower.supports) {
    support.fixed = {true, true, false};
    support.spring = {0.0, 0.0, 80e6};
  }
  const Assembly assembly = assemble(tower);
  const Eigen::Vector3d sum = sum_of(support_dofs(tower, assembly), dead_reactions(tower, assembly));
  CHECK_THAT(sum.z(), is_near(kGravity * total_mass(assembly), kSolved));
}

TEST_CASE("a post under its own weight and a load pushes its support with both") {
  Tower tower = bare_tower(2);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  add_node(tower, {0.0, 0.0, 2.0});
  add_bar(tower, 0, 1);
  Support guide;
  guide.node = 1;
  guide.fixed[0] = true;
  tower.supports.push_back(guide);
  carry(tower, 1, 100.0);
  const Assembly assembly = assemble(tower);
  const Eigen::VectorXd force = dead_reactions(tower, assembly);
  REQUIRE(force.size() == 3);  // node 1 along x and z, node 2 along x
  CHECK_THAT(force(1), is_near(kGravity * (100.0 + 2.0 * 7.85), kRoundoff));
  CHECK(force(0) == 0.0);
  CHECK(force(2) == 0.0);
}

TEST_CASE("support degrees of freedom stand in the order of the supports with what holds them") {
  Tower tower = bare_tower(3);
  for (int i = 0; i < 2; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  add_bar(tower, 0, 1);
  Support mixed;
  mixed.node = 1;
  mixed.fixed[2] = true;
  mixed.spring[0] = 1e6;
  tower.supports.push_back(mixed);
  fix(tower, 0);
  const Assembly assembly = assemble(tower);
  const auto list = support_dofs(tower, assembly);
  REQUIRE(list.size() == 5);
  CHECK(list[0].node == 1);
  CHECK(list[0].axis == Axis::x);
  CHECK(list[0].free == 0);
  CHECK(list[0].fixed == -1);
  CHECK(list[1].axis == Axis::z);
  CHECK(list[1].fixed == 3);  // after the three of node 1
  CHECK(list[1].free == -1);
  CHECK(list[2].node == 0);
  CHECK(list[2].fixed == 0);
}

TEST_CASE("a spring pushes back against its own motion") {
  Tower tower = rod(1, 1.0, MassScheme::lumped);
  Support spring;
  spring.node = 1;
  spring.spring[0] = 3e6;
  tower.supports.push_back(spring);
  const Assembly assembly = assemble(tower);
  Eigen::MatrixXd displacement(1, 2);
  displacement << 1e-3, -2e-3;
  const Eigen::MatrixXd force =
      reactions(support_dofs(tower, assembly), assembly, displacement, Eigen::MatrixXd::Zero(1, 2));
  REQUIRE(force.rows() == 2);
  CHECK_THAT(force(1, 0), is_near(-3e3, kRoundoff));
  CHECK_THAT(force(1, 1), is_near(6e3, kRoundoff));
  CHECK_THAT(force(0, 0), is_near(-210e9 * 1e-3 * 1e-3, kRoundoff));  // the bar pulls its support along
}

TEST_CASE("the centroid is that of the lowest supports alone") {
  Tower tower = bare_tower(3);
  fix(tower, add_node(tower, {0.0, 0.0, 1.0}));
  fix(tower, add_node(tower, {4.0, 0.0, 1.0}));
  fix(tower, add_node(tower, {2.0, 6.0, 1.0}));
  fix(tower, add_node(tower, {9.0, 9.0, 8.0}));  // a tie higher up
  add_node(tower, {0.0, 0.0, 0.0});              // lower, but not held
  CHECK((support_centroid(tower) - Eigen::Vector3d(2.0, 2.0, 1.0)).norm() <= kRoundoff);
}

TEST_CASE("a tower without supports has its centroid at the origin") {
  Tower tower = bare_tower(3);
  add_node(tower, {5.0, 5.0, 5.0});
  CHECK(support_centroid(tower) == Eigen::Vector3d::Zero());
}

}  // namespace swaymark::test
