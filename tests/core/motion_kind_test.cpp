#include "core/motion_kind.hpp"

#include <catch2/catch.hpp>

#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// A square of held corners in the plane y = 0, and a node joined to some of the eight points around it: the
// four corners, and the middles of the four sides, which are held as well.
MotionKind kind_of_middle(const std::vector<std::size_t>& joined) {
  Tower tower = bare_tower(3);
  for (const auto& [x, z] : {std::pair{-1.0, -1.0},
                             {1.0, -1.0},
                             {1.0, 1.0},
                             {-1.0, 1.0},
                             {0.0, -1.0},
                             {1.0, 0.0},
                             {0.0, 1.0},
                             {-1.0, 0.0}})
    fix(tower, add_node(tower, {x, 0.0, z}));
  const std::size_t middle = add_node(tower, {0.0, 0.0, 0.0});
  for (const std::size_t node : joined) add_bar(tower, node, middle);
  return MotionKinds(tower).of({MotionClass::node, {{middle, Eigen::Vector3d::UnitY()}}});
}

}  // namespace

TEST_CASE("a node is told by the bars that meet in it") {
  CHECK(kind_of_middle({0, 1, 5, 7}) == MotionKind::mid_node);       // two diagonals on a horizontal
  CHECK(kind_of_middle({0, 1, 2, 3}) == MotionKind::crossing_node);  // two diagonals
  CHECK(kind_of_middle({0, 1, 6}) == MotionKind::face_node);         // a fork
  CHECK(kind_of_middle({5, 7}) == MotionKind::line_node);
  CHECK(kind_of_middle({5}) == MotionKind::line_node);
}

TEST_CASE("a motion of several nodes is told by where they are and whether they keep their distances") {
  // A cube: nodes 0 to 3 below and 4 to 7 above, and a bar from each to the one above it.
  Tower tower = bare_tower(3);
  for (const double z : {0.0, 1.0}) {
    for (const auto& [x, y] : {std::pair{0.0, 0.0}, {1.0, 0.0}, {1.0, 1.0}, {0.0, 1.0}})
      add_node(tower, {x, y, z});
  }
  for (std::size_t i = 0; i < 4; ++i) add_bar(tower, i, i + 4);
  const MotionKinds kinds(tower);
  const auto kind = [&](std::vector<FreeMotion::Part> parts) {
    return kinds.of({MotionClass::shape, std::move(parts)});
  };
  const Eigen::Vector3d x = Eigen::Vector3d::UnitX();
  const Eigen::Vector3d y = Eigen::Vector3d::UnitY();
  const Eigen::Vector3d z = Eigen::Vector3d::UnitZ();
  CHECK(kind({{4, x}, {5, x}, {6, x}, {7, x}}) == MotionKind::sway);
  CHECK(kind({{4, -y}, {5, x}, {6, y}, {7, -x}}) == MotionKind::plan_distortion);
  CHECK(kind({{4, x}, {5, x}}) == MotionKind::plan_distortion);
  CHECK(kind({{1, y}, {5, y}}) == MotionKind::part_as_body);
  CHECK(kind({{1, y}, {5, x + z}, {6, y}}) == MotionKind::changes_shape);
}

TEST_CASE("what the search found as a body or loose stays that") {
  Tower tower = bare_tower(3);
  add_node(tower, {0.0, 0.0, 0.0});
  const MotionKinds kinds(tower);
  CHECK(kinds.of({MotionClass::loose_node, {{0, Eigen::Vector3d::UnitX()}}}) == MotionKind::loose_node);
  CHECK(kinds.of({MotionClass::body, {{0, Eigen::Vector3d::UnitX()}}}) == MotionKind::on_too_few_supports);
  CHECK_FALSE(kinds.has_bars(0));
}

}  // namespace swaymark::test
