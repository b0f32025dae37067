#include "core/free_motion.hpp"

#include <Eigen/LU>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// Elongations of a unit motion: the search itself calls 1e-11 no strain; motions below 1e-6 are not listed.
constexpr double kNoElongation = 1e-6;

FreeMotions motions_of(const Tower& tower) { return find_free_motions(tower, assemble(tower)); }

// Ways to move without strain by counting: free degrees of freedom less the rank of the elongations.
std::size_t strainless_count(const Tower& tower) {
  const Assembly assembly = assemble(tower);
  Eigen::MatrixXd rows = Eigen::MatrixXd(assembly.axial);
  for (Index b = 0; b < rows.rows(); ++b)
    rows.row(b) /= assembly.bars[static_cast<std::size_t>(b)].axial_stiffness;
  const Index bars = rows.rows();
  rows.conservativeResize(bars + assembly.springs.size(), Eigen::NoChange);
  rows.bottomRows(assembly.springs.size()) =
      Eigen::MatrixXd((assembly.springs.array() > 0.0).cast<double>().matrix().asDiagonal());
  Eigen::FullPivLU<Eigen::MatrixXd> lu(rows);
  lu.setThreshold(1e-10);
  return static_cast<std::size_t>(rows.cols() - lu.rank());
}

// What holds for every list: as many motions as there are, none strains a bar or moves a support, the largest
// component is 1 and comes first.
void check_sound(const Tower& tower, const FreeMotions& motions) {
  CHECK(motions.complete);
  CHECK(motions.list.size() == strainless_count(tower));
  for (const FreeMotion& motion : motions.list) {
    REQUIRE(!motion.parts.empty());
    double largest = 0.0;
    for (const auto& part : motion.parts) largest = std::max(largest, part.direction.cwiseAbs().maxCoeff());
    CHECK_THAT(largest, is_near(1.0, kRoundoff));
    CHECK(motion.parts.front().direction.norm() >= motion.parts.back().direction.norm() - kNoElongation);
    for (const Bar& bar : tower.bars) {
      const Eigen::Vector3d along =
          (tower.nodes[bar.to].position - tower.nodes[bar.from].position).normalized();
      CHECK(std::abs(along.dot(motion.of(bar.to) - motion.of(bar.from))) <= kNoElongation);
    }
    for (const Support& support : tower.supports) {
      for (const Axis axis : tower.axes()) {
        const auto a = static_cast<std::size_t>(axis);
        if (support.fixed[a] || support.spring[a] > 0.0)
          CHECK(motion.of(support.node)[index_of(axis)] == 0.0);
      }
    }
  }
}

std::size_t count_of(const Tower& tower, MotionClass found_as) {
  std::size_t count = 0;
  for (const FreeMotion& motion : motions_of(tower).list) count += motion.found_as == found_as ? 1 : 0;
  return count;
}

// Four held corners of a square in the plane y = 0 and a node in its middle.
Tower flat_panel() {
  Tower tower = bare_tower(3);
  for (const double x : {-1.0, 1.0}) {
    for (const double z : {0.0, 2.0}) fix(tower, add_node(tower, {x, 0.0, z}));
  }
  const std::size_t middle = add_node(tower, {0.0, 0.0, 1.0});
  for (std::size_t corner = 0; corner < 4; ++corner) add_bar(tower, corner, middle);
  return tower;
}

// A line of bars between two held ends, straight or with a rise in the middle.
Tower line(int dimensions, int bars, double rise = 0.0) {
  Tower tower = bare_tower(dimensions);
  for (int i = 0; i <= bars; ++i) {
    add_node(tower, {1.0 * i, 0.0, 2 * i == bars ? rise : 0.0});
    if (i > 0) add_bar(tower, tower.nodes.size() - 2, tower.nodes.size() - 1);
  }
  fix(tower, 0);
  fix(tower, tower.nodes.size() - 1);
  return tower;
}

Tower tetrahedron() {
  Tower tower = bare_tower(3);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {2.0, 0.0, 0.0});
  add_node(tower, {1.0, 2.0, 0.0});
  add_node(tower, {1.0, 1.0, 2.0});
  for (std::size_t i = 0; i < 4; ++i) {
    for (std::size_t j = i + 1; j < 4; ++j) add_bar(tower, i, j);
  }
  return tower;
}

Tower triangle() {
  Tower tower = bare_tower(2);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {2.0, 0.0, 0.0});
  add_node(tower, {1.0, 0.0, 1.0});
  for (std::size_t i = 0; i < 3; ++i) add_bar(tower, i, (i + 1) % 3);
  return tower;
}

}  // namespace

TEST_CASE("a tower that stands has no free motion") {
  CHECK(motions_of(regular_mast({})).list.empty());
  CHECK(motions_of(rod(5, 5.0, MassScheme::lumped)).list.empty());
  CHECK(motions_of(line(2, 2, 1e-3)).list.empty());  // a shallow apex
}

TEST_CASE("a slender tower is not taken for one that can move") {
  Mast mast;
  mast.panels = 60;
  mast.radius = 0.5;
  CHECK(motions_of(regular_mast(mast)).list.empty());
}

TEST_CASE("a truss of any shape has as many free motions as its bars leave open") {
  std::mt19937 random(3);
  for (const int dimensions : {1, 2, 3}) {
    for (int repeat = 0; repeat < 4; ++repeat) {
      Tower tower = random_truss(dimensions, 15, random);
      check_sound(tower, motions_of(tower));
      for (int gone = 0; gone < repeat; ++gone) {
        tower.bars.erase(tower.bars.begin() + 3 * repeat);
        check_sound(tower, motions_of(tower));
      }
      tower.supports.pop_back();
      check_sound(tower, motions_of(tower));
    }
  }
}

TEST_CASE("a node in a flat panel is free square to it") {
  const Tower tower = flat_panel();
  const FreeMotions motions = motions_of(tower);
  check_sound(tower, motions);
  REQUIRE(motions.list.size() == 1);
  CHECK(motions.list[0].found_as == MotionClass::node);
  CHECK(motions.list[0].parts.front().node == 4);
  CHECK((motions.list[0].of(4) - Eigen::Vector3d::UnitY()).norm() <= kSolved);
}

TEST_CASE("a panel without a diagonal sways") {
  const Tower tower = portal();
  const FreeMotions motions = motions_of(tower);
  check_sound(tower, motions);
  REQUIRE(motions.list.size() == 1);
  CHECK(motions.list[0].found_as == MotionClass::shape);
  CHECK((motions.list[0].of(2) - Eigen::Vector3d::UnitX()).norm() <= kSolved);
  CHECK((motions.list[0].of(3) - Eigen::Vector3d::UnitX()).norm() <= kSolved);
}

TEST_CASE("a body without supports moves in as many ways as its space has") {
  Tower line_body = rod(2, 2.0, MassScheme::lumped);
  line_body.supports.clear();
  const std::vector<std::pair<Tower, std::size_t>> bodies{
      {line_body, 1}, {triangle(), 3}, {tetrahedron(), 6}};
  for (const auto& [tower, ways] : bodies) {
    check_sound(tower, motions_of(tower));
    CHECK(count_of(tower, MotionClass::body) == ways);
  }
}

TEST_CASE("a body pinned at one point turns about it") {
  Tower tower = triangle();
  fix(tower, 0);
  check_sound(tower, motions_of(tower));
  CHECK(count_of(tower, MotionClass::body) == 1);
}

TEST_CASE("each of several bodies on too few supports is found by itself") {
  Tower tower = triangle();
  for (const double shift : {10.0, 20.0}) {
    const std::size_t first = tower.nodes.size();
    for (std::size_t i = 0; i < 3; ++i) {
      add_node(tower, tower.nodes[i].position + Eigen::Vector3d(shift, 0.0, 0.0));
      add_bar(tower, first + i, first + (i + 1) % 3);
    }
  }
  check_sound(tower, motions_of(tower));
  CHECK(count_of(tower, MotionClass::body) == 9);
}

TEST_CASE("a bar adrift is free as a body only where its ends are not free by themselves") {
  Tower tower = bare_tower(3);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {1.0, 0.0, 0.0});
  add_bar(tower, 0, 1);
  check_sound(tower, motions_of(tower));
  CHECK(count_of(tower, MotionClass::node) == 4);
  CHECK(count_of(tower, MotionClass::body) == 1);
}

TEST_CASE("a node without a bar is loose in every direction") {
  Tower tower = regular_mast({});
  add_node(tower, {9.0, 9.0, 9.0});
  check_sound(tower, motions_of(tower));
  CHECK(count_of(tower, MotionClass::loose_node) == 3);
}

TEST_CASE("every node of a straight line of bars is free sideways") {
  for (const int dimensions : {2, 3}) {
    const Tower tower = line(dimensions, 4);
    check_sound(tower, motions_of(tower));
    CHECK(count_of(tower, MotionClass::node) == 3 * static_cast<std::size_t>(dimensions - 1));
  }
}

TEST_CASE("a very soft bar is not taken for a missing one") {
  Tower tower = portal();
  tower.sections.push_back({"thread", 1e-12, {}, {}, {}});  // 1e-9 of the others
  tower.groups.push_back({"threads", 1, 0, {}});
  add_bar(tower, 0, 3);
  CHECK(motions_of(tower).list.empty());
}

TEST_CASE("a spring however soft holds what nothing else does") {
  Tower tower = portal();
  Support spring;
  spring.node = 2;
  spring.spring[0] = 1.0;  // N/m
  tower.supports.push_back(spring);
  CHECK(motions_of(tower).list.empty());
}

TEST_CASE("free motions of several kinds are all found at once") {
  Tower tower = portal();
  add_node(tower, {7.0, 0.0, 7.0});
  const std::size_t hung = add_node(tower, {0.0, 0.0, 4.0});
  add_bar(tower, 2, hung);
  const FreeMotions motions = motions_of(tower);
  check_sound(tower, motions);
  CHECK(motions.list.size() == 4);  // sway, a loose node both ways, a post on top that tips
}

TEST_CASE("motions of the whole are as local as they can be") {
  // Five storeys without diagonals: each sways by itself against the ones beside it.
  Tower tower = bare_tower(2);
  for (int level = 0; level <= 5; ++level) {
    for (const double x : {0.0, 2.0}) {
      const std::size_t node = add_node(tower, {x, 0.0, 2.0 * level});
      if (level == 0) {
        fix(tower, node);
      } else {
        add_bar(tower, node - 2, node);
      }
    }
    if (level > 0) add_bar(tower, tower.nodes.size() - 2, tower.nodes.size() - 1);
  }
  const FreeMotions motions = motions_of(tower);
  check_sound(tower, motions);
  REQUIRE(motions.list.size() == 5);
  for (const FreeMotion& motion : motions.list) CHECK(motion.parts.size() == 2);
}

TEST_CASE("thousands of motions are all found") {
  Tower tower = bare_tower(3);
  for (int i = 0; i < 3000; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  CHECK(motions_of(tower).list.size() == 9000);
}

TEST_CASE("a node that a spring stabilises is free no longer") {
  Tower tower = flat_panel();
  tower.stabilisers.push_back({4, 1.0, {}});
  CHECK(motions_of(tower).list.empty());
}

TEST_CASE("a tank moves with a tower on too few supports") {
  Tower tower = regular_mast({});
  Liquid liquid;
  const std::size_t count = tower.nodes.size();
  liquid.nodes = {count - 2, count - 3};
  liquid.radius = 1.0;
  liquid.depth = 1.0;
  liquid.density = 1000.0;
  liquid.node = count;
  tower.nodes.push_back(
      {"water", 0.5 * (tower.nodes[count - 2].position + tower.nodes[count - 3].position), {}});
  tower.liquids.push_back(liquid);
  CHECK(motions_of(tower).list.empty());
  for (Support& support : tower.supports) support.fixed = {false, false, true};
  CHECK(count_of(tower, MotionClass::body) == 3);
  CHECK(motions_of(tower).list.size() == 3);
}

TEST_CASE("a panel without a diagonal sways however little its posts lean") {
  for (const double slope : {2.0, 5.0, 20.0, 71.0, 100.0, 200.0, 500.0, 1000.0, 3000.0}) {
    const Tower tower = portal(1.0 / slope);
    INFO("slope 1:" << slope);
    const FreeMotions motions = motions_of(tower);
    CHECK(motions.list.size() == 1);
    check_sound(tower, motions);
  }
}

TEST_CASE("a tapering tower without diagonals in one panel moves in three ways whatever its taper") {
  for (const double slope : {5.0, 50.0, 100.0, 200.0, 400.0, 800.0}) {
    Tower tower = bare_tower(3);
    for (int level = 0; level <= 3; ++level) {
      const double half = 1.0 - 2.0 * level / slope;
      const std::size_t first = tower.nodes.size();
      for (const auto& [x, y] : {std::pair{-half, -half}, {half, -half}, {half, half}, {-half, half}}) {
        const std::size_t node = add_node(tower, {x, y, 2.0 * level});
        if (level == 0) fix(tower, node);
        if (level > 0) add_bar(tower, node - 4, node);
      }
      if (level == 0) continue;
      for (std::size_t i = 0; i < 4; ++i) {
        add_bar(tower, first + i, first + (i + 1) % 4);
        if (level == 2) continue;
        add_bar(tower, first - 4 + i, first + (i + 1) % 4);
        add_bar(tower, first - 4 + (i + 1) % 4, first + i);
      }
      add_bar(tower, first, first + 2);
    }
    INFO("slope 1:" << slope);
    CHECK(motions_of(tower).list.size() == 3);
    CHECK(motions_of(tower).list.size() == strainless_count(tower));
  }
}

TEST_CASE("free motions that hardly move the last degree of freedom are found") {
  Tower tower = bare_tower(3);
  for (const Eigen::Vector3d& at :
       {Eigen::Vector3d(60, 0, 0), Eigen::Vector3d(20, 50, 0), Eigen::Vector3d(1, 1, 30),
        Eigen::Vector3d(59, 1, 30), Eigen::Vector3d(19, 49, 30)})
    add_node(tower, at);
  for (const auto& [from, to] : {std::pair<std::size_t, std::size_t>{0, 3}, {0, 4}, {1, 4}, {2, 3}, {3, 4}})
    add_bar(tower, from, to);
  fix(tower, 0);
  fix(tower, 1);
  check_sound(tower, motions_of(tower));
}

}  // namespace swaymark::test
