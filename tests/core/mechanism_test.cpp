#include "core/mechanism.hpp"

#include <Eigen/LU>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// Elongations of a unit motion: the search itself calls 1e-11 no strain; motions below 1e-6 are not listed.
constexpr double kNoElongation = 1e-6;

MechanismReport report_of(const Tower& tower) { return find_mechanisms(tower, assemble(tower)); }

Eigen::Vector3d motion_of(const Mechanism& mechanism, std::size_t node) {
  for (const Mechanism::Motion& motion : mechanism.motion) {
    if (motion.node == node) return motion.direction;
  }
  return Eigen::Vector3d::Zero();
}

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

// What holds for every report: as many mechanisms as there are, none strains a bar or moves a support, the
// largest component is 1, and each has a name and a cure.
void check_sound(const Tower& tower, const MechanismReport& report) {
  CHECK(report.complete);
  CHECK(report.mechanisms.size() == strainless_count(tower));
  for (const Mechanism& mechanism : report.mechanisms) {
    INFO(mechanism.kind);
    CHECK(!mechanism.kind.empty());
    CHECK(!mechanism.cures.empty());
    REQUIRE(!mechanism.motion.empty());
    double largest = 0.0;
    for (const auto& motion : mechanism.motion)
      largest = std::max(largest, motion.direction.cwiseAbs().maxCoeff());
    CHECK_THAT(largest, is_near(1.0, kRoundoff));
    for (const Bar& bar : tower.bars) {
      const Eigen::Vector3d along =
          (tower.nodes[bar.to].position - tower.nodes[bar.from].position).normalized();
      const double elongation = along.dot(motion_of(mechanism, bar.to) - motion_of(mechanism, bar.from));
      CHECK(std::abs(elongation) <= kNoElongation);
    }
    for (const Support& support : tower.supports) {
      for (const Axis axis : tower.axes()) {
        const auto a = static_cast<std::size_t>(axis);
        if (support.fixed[a] || support.spring[a] > 0.0) {
          CHECK(motion_of(mechanism, support.node)[index_of(axis)] == 0.0);
        }
      }
    }
  }
}

// Follows the first cure of the list: a bar from the node that moves most, along its motion, to firm ground.
Tower cured(Tower tower, const Mechanism& mechanism) {
  const Mechanism::Motion& lead = mechanism.motion.front();
  const Eigen::Vector3d away = tower.nodes[lead.node].position + lead.direction.normalized();
  const std::size_t anchor = add_node(tower, away);
  fix(tower, anchor);
  add_bar(tower, lead.node, anchor);
  return tower;
}

// The cures one after the other, each followed to the letter, leave a tower that stands.
void check_curable(Tower tower) {
  std::size_t left = report_of(tower).mechanisms.size();
  REQUIRE(left > 0);
  while (left > 0) {
    tower = cured(tower, report_of(tower).mechanisms.front());
    const std::size_t now = report_of(tower).mechanisms.size();
    REQUIRE(now < left);
    left = now;
  }
  CHECK(strainless_count(tower) == 0);
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

// Two posts and a beam without a diagonal.
Tower portal() {
  Tower tower = bare_tower(2);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  fix(tower, add_node(tower, {2.0, 0.0, 0.0}));
  add_node(tower, {0.0, 0.0, 2.0});
  add_node(tower, {2.0, 0.0, 2.0});
  add_bar(tower, 0, 2);
  add_bar(tower, 1, 3);
  add_bar(tower, 2, 3);
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

TEST_CASE("a sound tower has no mechanism") {
  CHECK_FALSE(report_of(regular_mast({})).any());
  CHECK_FALSE(report_of(rod(5, 5.0, MassScheme::lumped)).any());
}

TEST_CASE("a truss of any shape has as many mechanisms as its bars leave motions open") {
  std::mt19937 random(3);
  for (const int dimensions : {1, 2, 3}) {
    for (int repeat = 0; repeat < 4; ++repeat) {
      Tower tower = random_truss(dimensions, 15, random);
      check_sound(tower, report_of(tower));
      tower.bars.erase(tower.bars.begin() + 3 * repeat);
      check_sound(tower, report_of(tower));
    }
  }
}

TEST_CASE("a node in a flat panel is free square to it") {
  const Tower tower = flat_panel();
  const MechanismReport report = report_of(tower);
  check_sound(tower, report);
  REQUIRE(report.mechanisms.size() == 1);
  REQUIRE(report.mechanisms[0].motion.size() == 1);
  CHECK(report.mechanisms[0].motion[0].node == 4);
  CHECK((report.mechanisms[0].motion[0].direction - Eigen::Vector3d::UnitY()).norm() <= kSolved);
  CHECK_THAT(report.mechanisms[0].cures[0], Catch::Contains("node '5'") && Catch::Contains("along y"));
  check_curable(tower);
}

TEST_CASE("a panel without a diagonal sways") {
  const Tower tower = portal();
  const MechanismReport report = report_of(tower);
  check_sound(tower, report);
  REQUIRE(report.mechanisms.size() == 1);
  CHECK(report.mechanisms[0].kind == "part of the tower moves");
  CHECK(report.mechanisms[0].motion.size() == 2);
  CHECK((motion_of(report.mechanisms[0], 2) - Eigen::Vector3d::UnitX()).norm() <= kSolved);
  CHECK((motion_of(report.mechanisms[0], 3) - Eigen::Vector3d::UnitX()).norm() <= kSolved);
  check_curable(tower);
}

TEST_CASE("a diagonal in the panel holds it") {
  Tower tower = portal();
  add_bar(tower, 0, 3);
  CHECK_FALSE(report_of(tower).any());
}

TEST_CASE("a body without supports moves in as many ways as its space has") {
  Tower line_body = rod(2, 2.0, MassScheme::lumped);
  line_body.supports.clear();
  const std::vector<std::pair<Tower, std::size_t>> bodies{
      {line_body, 1}, {triangle(), 3}, {tetrahedron(), 6}};
  for (const auto& [tower, ways] : bodies) {
    const MechanismReport report = report_of(tower);
    check_sound(tower, report);
    CHECK(report.mechanisms.size() == ways);
    check_curable(tower);
  }
}

TEST_CASE("a body pinned at one point turns about it") {
  Tower tower = triangle();
  fix(tower, 0);
  const MechanismReport report = report_of(tower);
  check_sound(tower, report);
  CHECK(report.mechanisms.size() == 1);
  check_curable(tower);
}

TEST_CASE("a node without a bar is loose in every direction") {
  Tower tower = regular_mast({});
  add_node(tower, {9.0, 9.0, 9.0});
  const MechanismReport report = report_of(tower);
  check_sound(tower, report);
  REQUIRE(report.mechanisms.size() == 3);
  for (const Mechanism& mechanism : report.mechanisms) {
    CHECK(mechanism.kind == "loose node");
    CHECK(mechanism.motion[0].node == tower.nodes.size() - 1);
    CHECK_THAT(mechanism.cures[0], Catch::Contains("or remove it"));
  }
  check_curable(tower);
}

TEST_CASE("a node without a bar that is held does not move") {
  Tower tower = regular_mast({});
  fix(tower, add_node(tower, {9.0, 9.0, 9.0}));
  CHECK_FALSE(report_of(tower).any());
}

TEST_CASE("the middle node of a K-brace is free square to the face") {
  // Derived: its bars all lie in the face.
  Tower tower = regular_mast({});
  const std::size_t top =
      tower.nodes.size() - 2;  // two neighbours of the top ring, whose hub is the last node
  const std::size_t next = top - 1;
  const std::size_t middle = add_node(tower, 0.5 * (tower.nodes[top].position + tower.nodes[next].position));
  add_bar(tower, top, middle);
  add_bar(tower, middle, next);
  const std::size_t below = 3;  // a foot on the same side
  add_bar(tower, middle, below);
  const MechanismReport report = report_of(tower);
  check_sound(tower, report);
  REQUIRE(report.mechanisms.size() == 1);
  CHECK(report.mechanisms[0].motion[0].node == middle);
  const Eigen::Vector3d along = tower.nodes[top].position - tower.nodes[next].position;
  CHECK(std::abs(report.mechanisms[0].motion[0].direction.dot(along.normalized())) <= kSolved);
  check_curable(tower);
}

TEST_CASE("every node of a straight line of bars is free sideways") {
  for (const int dimensions : {2, 3}) {
    const Tower tower = line(dimensions, 4);
    const MechanismReport report = report_of(tower);
    check_sound(tower, report);
    CHECK(report.mechanisms.size() == 3 * static_cast<std::size_t>(dimensions - 1));
    check_curable(tower);
  }
}

TEST_CASE("a shallow apex stands and a straight one does not") {
  CHECK_FALSE(report_of(line(2, 2, 1e-3)).any());
  CHECK(report_of(line(2, 2, 0.0)).mechanisms.size() == 1);
}

TEST_CASE("a very soft bar is not taken for a missing one") {
  Tower tower = portal();
  tower.sections.push_back({"thread", 1e-12, {}, {}, {}});  // 1e-9 of the others
  tower.groups.push_back({"threads", 1, 0, {}});
  add_bar(tower, 0, 3);
  CHECK_FALSE(report_of(tower).any());
}

TEST_CASE("a spring holds what nothing else does") {
  Tower tower = portal();
  Support spring;
  spring.node = 2;
  spring.spring[0] = 1.0;  // N/m: soft, but a spring
  tower.supports.push_back(spring);
  CHECK_FALSE(report_of(tower).any());
}

TEST_CASE("mechanisms of several kinds are all told at once") {
  Tower tower = portal();
  add_node(tower, {7.0, 0.0, 7.0});
  const std::size_t hung = add_node(tower, {0.0, 0.0, 3.0});
  add_bar(tower, 2, hung);
  const MechanismReport report = report_of(tower);
  check_sound(tower, report);
  CHECK(report.mechanisms.size() == 4);  // sway, a loose node both ways, a post on top that tips
  check_curable(tower);
}

TEST_CASE("a tower that is held everywhere cannot move") {
  Tower tower = bare_tower(2);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  CHECK_FALSE(report_of(tower).any());
}

TEST_CASE("very many motions are counted as far as the list goes and the cut is told") {
  Tower tower = bare_tower(3);
  for (int i = 0; i < 1000; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  const MechanismReport report = report_of(tower);
  CHECK(report.mechanisms.size() == 2000);
  CHECK_FALSE(report.complete);
}

}  // namespace swaymark::test
