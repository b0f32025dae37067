#include "core/open_direction.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// Two held nodes and one between them that is joined to both.
Tower straight(int dimensions) {
  Tower tower = bare_tower(dimensions);
  for (const double x : {0.0, 2.0, 1.0}) add_node(tower, {x, 0.0, 0.0});
  fix(tower, 0);
  fix(tower, 1);
  add_bar(tower, 0, 2);
  add_bar(tower, 1, 2);
  return tower;
}

}  // namespace

TEST_CASE("a node between two bars in line is open square to them") {
  CHECK(open_directions(straight(1))[2].empty());
  const auto plane = open_directions(straight(2));
  REQUIRE(plane[2].size() == 1);
  CHECK_THAT(std::abs(plane[2][0].z()), is_near(1.0, kRoundoff));
  const auto space = open_directions(straight(3));
  REQUIRE(space[2].size() == 2);
  for (const Eigen::Vector3d& direction : space[2]) {
    CHECK(std::abs(direction.x()) <= kRoundoff);
    CHECK_THAT(direction.norm(), is_near(1.0, kRoundoff));
  }
  CHECK_THAT(std::abs(space[2][0].dot(space[2][1])), is_near(0.0, 0.0, kRoundoff));
}

TEST_CASE("what a support or a spring holds is not open") {
  Tower tower = straight(3);
  Support support;
  support.node = 2;
  support.fixed[1] = true;
  support.spring[2] = 5.0;
  tower.supports.push_back(support);
  for (const auto& open : open_directions(tower)) CHECK(open.empty());
}

TEST_CASE("a node without a bar is open in every direction it has") {
  for (const int dimensions : {1, 2, 3}) {
    Tower tower = bare_tower(dimensions);
    add_node(tower, {0.0, 0.0, 0.0});
    CHECK(open_directions(tower)[0].size() == static_cast<std::size_t>(dimensions));
  }
}

TEST_CASE("nodes of a tower that stands are not open") {
  for (const auto& open : open_directions(regular_mast({}))) CHECK(open.empty());
}

}  // namespace swaymark::test
