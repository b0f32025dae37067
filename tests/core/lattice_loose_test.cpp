#include "core/lattice_loose.hpp"

#include "tests/support/matchers.hpp"

// Whether the motions counted here are the ones a tower has is a law of its own: tests/laws/lattice_test.cpp.
namespace swaymark::test {

namespace {

LatticePanel panel(double width, std::size_t repeat, Bracing bracing, bool horizontals) {
  LatticePanel result;
  result.height = 3.0;
  result.width = width;
  result.repeat = repeat;
  result.bracing = bracing;
  if (horizontals) result.horizontals = 0;
  return result;
}

struct Loose {
  LatticeStatement statement;
  Lattice lattice;
  std::vector<LooseNodes> found;
};

Loose loose_in(LatticePlan plan, const std::vector<LatticePanel>& panels) {
  Loose result;
  result.statement.plan = plan;
  result.statement.width = 4.0;
  result.statement.panels = panels;
  result.statement.base_horizontals = 0;
  result.lattice = build_lattice(result.statement);
  result.found = loose_nodes(result.statement, result.lattice);
  return result;
}

LatticePanel with_plan(LatticePanel panel, PlanPattern pattern) {
  panel.plan_bracing = PlanBracing{0, pattern, {}};
  return panel;
}

}  // namespace

TEST_CASE("X-bracing and diagonals with horizontals leave nothing loose") {
  for (const LatticePlan plan : {LatticePlan::square, LatticePlan::triangle}) {
    CHECK(loose_in(plan, {panel(2.0, 3, Bracing::x, false)}).found.empty());
    CHECK(loose_in(plan, {panel(2.0, 3, Bracing::x, true)}).found.empty());
    CHECK(loose_in(plan, {panel(2.0, 3, Bracing::single, true)}).found.empty());
    CHECK(loose_in(plan, {panel(2.0, 3, Bracing::alternating, true)}).found.empty());
  }
}

TEST_CASE("every mid node of K-bracing is named as free square to its face") {
  const Loose loose = loose_in(LatticePlan::square, {panel(2.0, 6, Bracing::k, true)});
  REQUIRE(loose.found.size() == 1);
  CHECK(loose.found[0].what == "24 mid nodes of K-bracing, L1.m1 ... L6.m4, are free square to their faces");
  CHECK(loose.found[0].motions == 24);
  CHECK(loose.found[0].nodes.size() == 24);
  for (const std::size_t node : loose.found[0].nodes) {
    CHECK(loose.lattice.nodes[node].name.find('m') != std::string::npos);
  }
  REQUIRE(loose.found[0].cures.size() == 3);
  CHECK(
      loose.found[0].cures[0] ==
      "'plan_bracing: {section: ..., pattern: diamond}' at these levels, and a bar between two opposite mid "
      "nodes of each level, such as L1.m1 to L1.m3, under 'members'");
  CHECK(loose.found[0].cures[1] ==
        "or a bar from each of them to a corner out of its face under 'members', such as L1.m1 to L1.3");
}

TEST_CASE("diagonals in plan do not hold mid nodes") {
  const Loose loose =
      loose_in(LatticePlan::square, {with_plan(panel(2.0, 2, Bracing::k, true), PlanPattern::crossed)});
  REQUIRE(loose.found.size() == 1);
  CHECK(loose.found[0].motions == 8);
}

TEST_CASE("a diamond leaves one motion a level of a square and none of a triangle") {
  const LatticePanel braced = with_plan(panel(2.0, 5, Bracing::k, true), PlanPattern::diamond);
  const Loose square = loose_in(LatticePlan::square, {braced});
  REQUIRE(square.found.size() == 1);
  CHECK(square.found[0].what ==
        "plan bracing in a diamond at 5 levels leaves one motion a level, L1.m1 ... L5.m4: two opposite mid "
        "nodes "
        "move out while the others move in");
  CHECK(square.found[0].motions == 5);
  CHECK(square.found[0].nodes.size() == 20);
  CHECK(square.found[0].cures.size() == 1);
  CHECK(loose_in(LatticePlan::triangle, {braced}).found.empty());
  const Loose triangle = loose_in(LatticePlan::triangle, {panel(2.0, 1, Bracing::k, true)});
  REQUIRE(triangle.found.size() == 1);
  CHECK(triangle.found[0].cures[0] == "'plan_bracing: {section: ..., pattern: diamond}' at these levels");
}

TEST_CASE("a change of slope holds mid nodes that diagonals reach from both sides") {
  const auto above = panel(3.0, 1, Bracing::k_down, true);
  CHECK(loose_in(LatticePlan::square, {panel(3.0, 1, Bracing::k, true), above}).found.empty());
  const Loose straight =
      loose_in(LatticePlan::square, {panel(3.5, 1, Bracing::k, true), panel(3.0, 1, Bracing::k_down, true)});
  REQUIRE(straight.found.size() == 1);
  CHECK(straight.found[0].motions == 4);
}

TEST_CASE("mid nodes at the base ask for supports") {
  const Loose loose = loose_in(LatticePlan::square, {panel(2.0, 2, Bracing::k_down, true)});
  REQUIRE(loose.found.size() == 2);
  CHECK(loose.found[0].what == "the mid nodes at the base, L0.m1 ... L0.m4, are free square to their faces");
  CHECK(loose.found[0].motions == 4);
  CHECK(loose.found[0].cures[0] == "hold each of them square to its face by a support");
  CHECK(loose.found[1].motions == 4);
}

TEST_CASE("one diagonal without horizontals leaves one motion a face") {
  const Loose loose = loose_in(LatticePlan::triangle, {panel(2.0, 4, Bracing::alternating, false)});
  REQUIRE(loose.found.size() == 1);
  CHECK(
      loose.found[0].what ==
      "bracing 'alternating' without horizontals leaves the corners of 4 levels, L1.1 ... L4.3, free to move "
      "within the faces, in up to 12 ways");
  CHECK(loose.found[0].motions == 12);
  CHECK(loose.found[0].cures[0] == "'horizontals' in these panels");
}

TEST_CASE("X-bracing with horizontals above makes up for horizontals that are missing below") {
  const auto bare = panel(3.0, 1, Bracing::single, false);
  CHECK(loose_in(LatticePlan::square, {bare, panel(2.0, 1, Bracing::x, true)}).found.empty());
  CHECK(
      loose_in(LatticePlan::square, {bare, panel(2.5, 1, Bracing::x, false), panel(2.0, 1, Bracing::x, true)})
          .found.empty());
  CHECK(loose_in(LatticePlan::square, {bare, panel(2.0, 1, Bracing::x, false)}).found.at(0).motions == 4);
}

}  // namespace swaymark::test
