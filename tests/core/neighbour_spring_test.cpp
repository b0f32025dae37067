#include "core/neighbour_spring.hpp"

#include <algorithm>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// A node in the middle of a leaning panel, on two diagonals and a horizontal: free square to it.
Tower leaning_panel() {
  Tower tower = bare_tower(3);
  for (const Eigen::Vector3d& at :
       {Eigen::Vector3d(-1, 0, 0), Eigen::Vector3d(1, 0, 0), Eigen::Vector3d(1, 0.5, 3),
        Eigen::Vector3d(-1, 0.5, 3), Eigen::Vector3d(0, 0.5, 3)})
    add_node(tower, at);
  for (const std::size_t corner : {0, 1, 2, 3}) add_bar(tower, corner, 4);
  tower.stabilisers.push_back({4, 7.0, {}});
  return tower;
}

double elongation_under(const NeighbourSpring& spring, const Eigen::VectorXd& displacement) {
  double sum = 0.0;
  for (const auto& [dof, value] : spring.elongation) sum += value * displacement(dof);
  return sum;
}

}  // namespace

TEST_CASE("no motion as a body strains a spring between a node and its neighbours") {
  const Tower tower = leaning_panel();
  const DofMap dofs(tower);
  const auto springs = neighbour_springs(tower, dofs);
  REQUIRE(springs.size() == 1);
  for (Index way = 0; way < 6; ++way) {
    Eigen::VectorXd motion(dofs.dof_count());
    for (std::size_t node = 0; node < tower.nodes.size(); ++node) {
      const Eigen::Vector3d r = tower.nodes[node].position;
      const Eigen::Vector3d turn[3] = {{0, -r.z(), r.y()}, {r.z(), 0, -r.x()}, {-r.y(), r.x(), 0}};
      motion.segment<3>(3 * static_cast<Index>(node)) = way < 3 ? Eigen::Vector3d::Unit(way) : turn[way - 3];
    }
    CHECK(std::abs(elongation_under(springs[0], motion)) <= kRoundoff);
  }
}

TEST_CASE("a spring between a node and its neighbours acts square to the panel") {
  const Tower tower = leaning_panel();
  const auto springs = neighbour_springs(tower, DofMap(tower));
  CHECK(springs[0].stiffness == 7.0);
  const Eigen::Vector3d square = Eigen::Vector3d(0.0, 3.0, -0.5).normalized();
  Eigen::VectorXd motion = Eigen::VectorXd::Zero(15);
  motion.tail(3) = square;
  CHECK_THAT(std::abs(elongation_under(springs[0], motion)), is_near(1.0, kRoundoff));
}

TEST_CASE("a node at the end of a single bar is held against the other end") {
  Tower tower = bare_tower(2);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {1.0, 0.0, 0.0});
  add_bar(tower, 0, 1);
  fix(tower, 0);
  tower.stabilisers.push_back({1, 5.0, {}});
  const auto springs = neighbour_springs(tower, DofMap(tower));
  REQUIRE(springs.size() == 1);
  Eigen::VectorXd lifted(4);
  lifted << 0.0, 0.0, 0.0, 1.0;
  CHECK_THAT(std::abs(elongation_under(springs[0], lifted)), is_near(1.0, kRoundoff));
  lifted(1) = 1.0;
  CHECK(std::abs(elongation_under(springs[0], lifted)) <= kRoundoff);
}

TEST_CASE("a tower that stabilises nothing has no such springs") {
  const Tower tower = regular_mast({});
  CHECK(neighbour_springs(tower, DofMap(tower)).empty());
}

}  // namespace swaymark::test
