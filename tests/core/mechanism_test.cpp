#include "core/mechanism.hpp"

#include "tests/support/files.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

MechanismReport report_of(const Tower& tower) { return find_mechanisms(tower, assemble(tower)); }

// A square tower by panels of 3 m, 2 m wide, on held corners.
Tower panels(const std::string& panel, int repeat, const std::string& rest = "") {
  return tower_of(
      "swaymark: 1\nmaterials: {steel: {E: 210 GPa, density: 7850}}\n"
      "sections: {leg: {area: 20 cm2}}\n"
      "lattice: {plan: square, width: 2, material: steel, panels: [{height: 3, width: 2, legs: leg, "
      "diagonals: leg, " +
      panel + ", repeat: " + std::to_string(repeat) + "}]}\nsupports: [{nodes: base, fixed: [x, y, z]}]\n" +
      rest);
}

// The kinds, in their order.
std::vector<std::string> kinds_of(const MechanismReport& report) {
  std::vector<std::string> kinds;
  for (const Mechanism& mechanism : report.mechanisms) kinds.push_back(mechanism.kind);
  return kinds;
}

using Kinds = std::vector<std::string>;

}  // namespace

TEST_CASE("a tower that stands has no mechanism and its count of bars covers its degrees of freedom") {
  const MechanismReport report = report_of(panels("bracing: X, horizontals: leg, plan_bracing: leg", 2));
  CHECK_FALSE(report.any());
  CHECK(report.count() == 0);
  CHECK(report.maxwell.bars == 2 * (4 + 8 + 4 + 1));
  CHECK(report.maxwell.restraints == 12);
  CHECK(report.maxwell.dofs == 36);
  CHECK(report.maxwell.surplus() == 10);
}

TEST_CASE("mid nodes of K-bracing are one mechanism each and one entry together") {
  // Derived: nothing at a mid node has a part square to the face.
  const MechanismReport report = report_of(panels("bracing: K, horizontals: leg, plan_bracing: leg", 6));
  REQUIRE(kinds_of(report) == Kinds{"node square to a face"});
  CHECK(report.mechanisms[0].count() == 24);
  CHECK(report.mechanisms[0].what ==
        "24 mid nodes of K-bracing, square to their faces: L1.m1, L1.m2 ... L6.m4");
}

TEST_CASE("the bar named first for mid nodes holds each of them") {
  // L1.m1 lies between L1.1 and L1.2, so that a bar to any other corner leaves its face.
  const MechanismReport report = report_of(panels("bracing: K, horizontals: leg, plan_bracing: leg", 1));
  REQUIRE(report.count() == 4);
  CHECK_THAT(report.mechanisms[0].cures[0],
             Catch::Contains("a bar from L1.m1 to L1.3") || Catch::Contains("a bar from L1.m1 to L1.4"));
  const std::string hips =
      "members: [{group: hips, section: leg, material: steel, bars: "
      "[[L1.m1, L1.3], [L1.m2, L1.4], [L1.m3, L1.1], [L1.m4, L1.2]]}]\n";
  CHECK_FALSE(report_of(panels("bracing: K, horizontals: leg, plan_bracing: leg", 1, hips)).any());
}

TEST_CASE("a diamond in plan leaves one distortion a level") {
  // Derived: with d out of the face, each bar of the diamond asks for d(i) = -d(i+1).
  const MechanismReport report =
      report_of(panels("bracing: K, horizontals: leg, plan_bracing: {section: leg, pattern: diamond}", 3));
  REQUIRE(kinds_of(report) == Kinds{"plan distortion of a level"});
  CHECK(report.mechanisms[0].count() == 3);
  for (const FreeMotion& motion : report.mechanisms[0].motions) CHECK(motion.parts.size() == 4);
  CHECK_THAT(report.mechanisms[0].what, Catch::StartsWith("3 levels distort in plan"));
}

TEST_CASE("the bar named first for a diamond holds its level") {
  const std::string diamond = "bracing: K, horizontals: leg, plan_bracing: {section: leg, pattern: diamond}";
  const MechanismReport report = report_of(panels(diamond, 1));
  REQUIRE(report.count() == 1);
  const std::string cure = report.mechanisms[0].cures[0];
  REQUIRE_THAT(cure, Catch::StartsWith("a bar from L1.m"));
  const std::string from = cure.substr(11, 5);
  const std::string to = cure.substr(20);
  CHECK_FALSE(report_of(panels(diamond, 1,
                               "members: [{group: ties, section: leg, material: steel, bars: [[" + from +
                                   ", " + to + "]]}]\n"))
                  .any());
}

TEST_CASE("a tower that its supports do not hold sideways is on too few supports") {
  Tower tower = regular_mast({});
  for (Support& support : tower.supports) support.fixed = {false, false, true};
  const MechanismReport report = report_of(tower);
  REQUIRE(kinds_of(report) == Kinds{"tower on too few supports"});
  CHECK(report.count() == 3);
  CHECK_THAT(report.mechanisms[0].what, Catch::Contains("the whole tower moves as a body, in 3 ways"));
  REQUIRE(report.mechanisms[0].cures.size() == 3);
}

TEST_CASE("the supports named for a tower on too few hold it together") {
  Tower tower = regular_mast({});
  for (Support& support : tower.supports) support.fixed = {false, false, true};
  const MechanismReport report = report_of(tower);
  for (const std::string& cure : report.mechanisms.front().cures) {
    // "hold node 3 along x by a support"
    const std::size_t node = std::stoul(cure.substr(10)) - 1;
    const char axis = cure[cure.find("along ") + 6];
    const auto support = std::find_if(tower.supports.begin(), tower.supports.end(),
                                      [&](const Support& known) { return known.node == node; });
    REQUIRE(support != tower.supports.end());  // at a node that has one, as the smaller change
    support->fixed[static_cast<std::size_t>(axis - 'x')] = true;
  }
  CHECK_FALSE(report_of(tower).any());
}

TEST_CASE("a tower whose feet may lift is held at its feet and not aloft") {
  Tower tower = regular_mast({});
  for (Support& support : tower.supports) support.fixed = {true, true, false};
  const MechanismReport report = report_of(tower);
  REQUIRE(kinds_of(report) == Kinds{"tower on too few supports"});
  REQUIRE(report.mechanisms[0].cures.size() == 3);
  for (const std::string& cure : report.mechanisms[0].cures) {
    INFO(cure);
    CHECK_THAT(cure, Catch::Contains("along z"));
    const std::size_t node = std::stoul(cure.substr(10)) - 1;
    CHECK(tower.nodes[node].position.z() == 0.0);
  }
}

TEST_CASE("a part that no bar joins to the tower is told as such") {
  Tower tower = regular_mast({});
  const std::size_t first = tower.nodes.size();
  for (const Eigen::Vector3d& at : {Eigen::Vector3d(9, 0, 0), Eigen::Vector3d(10, 0, 0),
                                    Eigen::Vector3d(9, 1, 0), Eigen::Vector3d(9, 0, 1)}) {
    const std::size_t node = add_node(tower, at);
    for (std::size_t other = first; other < node; ++other) add_bar(tower, other, node);
  }
  const MechanismReport report = report_of(tower);
  REQUIRE(kinds_of(report) == Kinds{"part on too few supports"});
  CHECK(report.count() == 6);
  CHECK_THAT(report.mechanisms[0].what, Catch::StartsWith("4 nodes that no bar joins to the rest"));
}

TEST_CASE("a level without bracing below it takes along all that stands on it") {
  Tower tower = bare_tower(2);
  for (int level = 0; level <= 2; ++level) {
    for (const double x : {0.0, 2.0}) {
      const std::size_t node = add_node(tower, {x, 0.0, 2.0 * level});
      if (level == 0) fix(tower, node);
      if (level > 0) add_bar(tower, node - 2, node);
    }
    if (level > 0) add_bar(tower, tower.nodes.size() - 2, tower.nodes.size() - 1);
  }
  add_bar(tower, 2, 5);
  const MechanismReport report = report_of(tower);
  REQUIRE(kinds_of(report) == Kinds{"sway of a panel"});
  CHECK(report.mechanisms[0].motions[0].parts.size() == 4);
}

TEST_CASE("an arm on two pins moves as a body") {
  // A triangle hung on two nodes of the mast turns about the line through them.
  Tower tower = regular_mast({});
  const std::size_t tip = add_node(tower, {6.0, 0.0, 5.0});
  const std::size_t other = add_node(tower, {6.0, 1.0, 5.0});
  add_bar(tower, 5, tip);
  add_bar(tower, 9, tip);
  add_bar(tower, 5, other);
  add_bar(tower, 9, other);
  add_bar(tower, tip, other);
  const MechanismReport report = report_of(tower);
  CHECK(report.count() == 1);
  CHECK(kinds_of(report) == Kinds{"part of the tower moves as a body"});
}

TEST_CASE("nodes without a bar are told together") {
  Tower tower = regular_mast({});
  add_node(tower, {9.0, 9.0, 9.0});
  add_node(tower, {9.0, 9.0, 8.0});
  const MechanismReport report = report_of(tower);
  REQUIRE(kinds_of(report) == Kinds{"loose node"});
  CHECK(report.count() == 6);
  CHECK_THAT(report.mechanisms[0].what, Catch::StartsWith("2 nodes without a bar: "));
  CHECK_THAT(report.mechanisms[0].cures[0], Catch::Contains("remove"));
}

TEST_CASE("ends of a line of bars are told apart from nodes of a face") {
  Tower tower = bare_tower(3);
  for (int i = 0; i <= 3; ++i) {
    add_node(tower, {1.0 * i, 0.0, 0.0});
    if (i > 0) add_bar(tower, tower.nodes.size() - 2, tower.nodes.size() - 1);
  }
  fix(tower, 0);
  fix(tower, 3);
  const MechanismReport report = report_of(tower);
  REQUIRE(kinds_of(report) == Kinds{"node square to a line"});
  CHECK(report.count() == 4);
  CHECK_THAT(report.mechanisms[0].what,
             Catch::StartsWith("2 nodes, square to their bars, which are in one line"));
}

TEST_CASE("kinds are told in the order of what they move") {
  Tower tower = regular_mast({});
  for (Support& support : tower.supports) support.fixed[0] = false;
  add_node(tower, {9.0, 9.0, 9.0});
  const std::size_t pole = add_node(tower, {0.0, 0.0, 20.0});
  add_bar(tower, 5, pole);
  CHECK(kinds_of(report_of(tower)) ==
        Kinds{"tower on too few supports", "node square to a line", "loose node"});
}

}  // namespace swaymark::test
