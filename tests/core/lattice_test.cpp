#include "core/lattice.hpp"

#include <algorithm>
#include <set>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

LatticePanel panel(double height, double width, std::size_t repeat, Bracing bracing) {
  LatticePanel result;
  result.height = height;
  result.width = width;
  result.repeat = repeat;
  result.bracing = bracing;
  result.legs = 0;
  result.diagonals = 1;
  result.horizontals = 2;
  return result;
}

LatticeStatement lattice_of(LatticePlan plan, const std::vector<LatticePanel>& panels) {
  LatticeStatement statement;
  statement.plan = plan;
  statement.width = 4.0;
  statement.panels = panels;
  return statement;
}

std::size_t count(const Lattice& lattice, LatticeMember member) {
  return static_cast<std::size_t>(std::count_if(lattice.bars.begin(), lattice.bars.end(),
                                                [&](const LatticeBar& bar) { return bar.member == member; }));
}

using Joints = std::vector<std::string>;

// "L0.1-L1.2" of every bar of one kind.
Joints joints(const Lattice& lattice, LatticeMember member) {
  Joints result;
  for (const LatticeBar& bar : lattice.bars) {
    if (bar.member == member) {
      result.push_back(lattice.nodes[bar.from].name + "-" + lattice.nodes[bar.to].name);
    }
  }
  return result;
}

Joints face_1(const Joints& all) {
  // Face 1 stands between corners 1 and 2.
  Joints result;
  for (const std::string& joint : all) {
    const bool other = joint.find(".3") != std::string::npos || joint.find(".4") != std::string::npos ||
                       joint.find(".m2") != std::string::npos || joint.find(".m3") != std::string::npos ||
                       joint.find(".m4") != std::string::npos;
    if (!other) result.push_back(joint);
  }
  return result;
}

}  // namespace

TEST_CASE("a square stands with its corners anticlockwise from the one at least x and y") {
  const LatticeStatement statement = lattice_of(LatticePlan::square, {panel(3.0, 2.0, 1, Bracing::x)});
  const Lattice lattice = build_lattice(statement);
  REQUIRE(lattice.nodes.size() == 8);
  CHECK(lattice.nodes[0].name == "L0.1");
  CHECK(lattice.nodes[0].position == Eigen::Vector3d(-2.0, -2.0, 0.0));
  CHECK(lattice.nodes[1].position == Eigen::Vector3d(2.0, -2.0, 0.0));
  CHECK(lattice.nodes[2].position == Eigen::Vector3d(2.0, 2.0, 0.0));
  CHECK(lattice.nodes[3].position == Eigen::Vector3d(-2.0, 2.0, 0.0));
  CHECK(lattice.nodes[7].name == "L1.4");
  CHECK(lattice.nodes[7].position == Eigen::Vector3d(-1.0, 1.0, 3.0));
}

TEST_CASE("a triangle is equilateral about the axis of the tower with its width between legs") {
  const LatticeStatement statement = lattice_of(LatticePlan::triangle, {panel(3.0, 2.0, 1, Bracing::x)});
  const Lattice lattice = build_lattice(statement);
  REQUIRE(lattice.nodes.size() == 6);
  for (std::size_t level = 0; level < 2; ++level) {
    const double width = level == 0 ? 4.0 : 2.0;
    Eigen::Vector3d sum = Eigen::Vector3d::Zero();
    for (std::size_t k = 0; k < 3; ++k) {
      const Eigen::Vector3d here = lattice.nodes[3 * level + k].position;
      const Eigen::Vector3d next = lattice.nodes[3 * level + (k + 1) % 3].position;
      CHECK_THAT((next - here).norm(), is_near(width, kRoundoff));
      CHECK(here.x() * next.y() > here.y() * next.x());  // anticlockwise
      sum += here;
    }
    CHECK(sum.head<2>().norm() < kRoundoff);
  }
}

TEST_CASE("repeats have the height of one panel each and taper evenly to the stated width") {
  const LatticeStatement statement =
      lattice_of(LatticePlan::square, {panel(3.0, 2.5, 3, Bracing::x), panel(2.0, 2.5, 2, Bracing::single)});
  const auto levels = lattice_levels(statement);
  REQUIRE(levels.size() == 6);
  const std::vector<double> heights{0.0, 3.0, 6.0, 9.0, 11.0, 13.0};
  const std::vector<double> widths{4.0, 3.5, 3.0, 2.5, 2.5, 2.5};
  for (std::size_t i = 0; i < levels.size(); ++i) {
    INFO("level " << i);
    CHECK_THAT(levels[i].height, is_near(heights[i], kRoundoff, kRoundoff));
    CHECK_THAT(levels[i].width, is_near(widths[i], kRoundoff));
  }
  CHECK(levels[0].panel == nullptr);
  CHECK(levels[3].panel == &statement.panels[0]);
  CHECK(levels[4].panel == &statement.panels[1]);
}

TEST_CASE("legs between levels of one taper lie on a straight line") {
  const Lattice lattice = build_lattice(lattice_of(LatticePlan::square, {panel(3.0, 1.0, 7, Bracing::x)}));
  const Eigen::Vector3d foot = lattice.nodes[0].position;
  const Eigen::Vector3d leg = (lattice.nodes[28].position - foot).normalized();
  for (std::size_t level = 1; level <= 7; ++level) {
    const Eigen::Vector3d offset = lattice.nodes[4 * level].position - foot;
    CHECK((offset - offset.dot(leg) * leg).norm() < kRoundoff * 21.0);  // of 21 m height
  }
}

TEST_CASE("each bracing has the nodes and bars of its formula") {
  // With f faces and n panels: f legs a panel; diagonals 2f for X and K and f for one; horizontals f, or 2f
  // where mid nodes split them. Nodes f(n+1), and f more for each level with mid nodes. By counting, no
  // source.
  const auto plan = GENERATE(LatticePlan::square, LatticePlan::triangle);
  const std::size_t n = 5;
  const std::size_t f = plan == LatticePlan::square ? 4 : 3;
  const auto made = [&](Bracing bracing) {
    LatticeStatement statement = lattice_of(plan, {panel(3.0, 2.0, n, bracing)});
    statement.base_horizontals = 2;
    return build_lattice(statement);
  };
  struct Row {
    Bracing bracing;
    std::size_t mids, diagonals, horizontals;
  };
  for (const Row& row : {Row{Bracing::x, 0, 2 * f * n, f * (n + 1)},          //
                         Row{Bracing::single, 0, f * n, f * (n + 1)},         //
                         Row{Bracing::alternating, 0, f * n, f * (n + 1)},    //
                         Row{Bracing::k, f * n, 2 * f * n, f * (2 * n + 1)},  //
                         Row{Bracing::k_down, f * n, 2 * f * n, f * (2 * n + 1)}}) {
    INFO(name_of(row.bracing));
    const Lattice lattice = made(row.bracing);
    CHECK(lattice.nodes.size() == f * (n + 1) + row.mids);
    CHECK(count(lattice, LatticeMember::legs) == f * n);
    CHECK(count(lattice, LatticeMember::diagonals) == row.diagonals);
    CHECK(count(lattice, LatticeMember::horizontals) == row.horizontals);
    CHECK(count(lattice, LatticeMember::plan_bracing) == 0);
  }
}

TEST_CASE("no bar of a lattice is there twice and none joins a node to itself") {
  for (const Bracing bracing :
       {Bracing::x, Bracing::single, Bracing::alternating, Bracing::k, Bracing::k_down}) {
    LatticeStatement statement = lattice_of(LatticePlan::square, {panel(3.0, 2.0, 3, bracing)});
    statement.base_horizontals = 2;
    statement.panels[0].plan_bracing = PlanBracing{2, PlanPattern::crossed, {}};
    std::set<std::pair<std::size_t, std::size_t>> joined;
    for (const LatticeBar& bar : build_lattice(statement).bars) {
      CHECK(bar.from != bar.to);
      CHECK(joined.insert(std::minmax(bar.from, bar.to)).second);
    }
  }
}

TEST_CASE("diagonals run as their bracing says") {
  const auto diagonals = [](Bracing bracing) {
    LatticeStatement statement = lattice_of(LatticePlan::square, {panel(3.0, 2.0, 2, bracing)});
    statement.base_horizontals = 2;
    return face_1(joints(build_lattice(statement), LatticeMember::diagonals));
  };
  CHECK(diagonals(Bracing::x) == Joints{"L0.1-L1.2", "L0.2-L1.1", "L1.1-L2.2", "L1.2-L2.1"});
  CHECK(diagonals(Bracing::single) == Joints{"L0.1-L1.2", "L1.1-L2.2"});
  CHECK(diagonals(Bracing::alternating) == Joints{"L0.1-L1.2", "L1.2-L2.1"});
  CHECK(diagonals(Bracing::k) == Joints{"L0.1-L1.m1", "L0.2-L1.m1", "L1.1-L2.m1", "L1.2-L2.m1"});
  CHECK(diagonals(Bracing::k_down) == Joints{"L0.m1-L1.1", "L0.m1-L1.2", "L1.m1-L2.1", "L1.m1-L2.2"});
}

TEST_CASE("alternating diagonals go on alternating from one entry of panels to the next") {
  const Lattice lattice =
      build_lattice(lattice_of(LatticePlan::square, {panel(3.0, 2.0, 1, Bracing::alternating),
                                                     panel(3.0, 2.0, 1, Bracing::alternating)}));
  CHECK(face_1(joints(lattice, LatticeMember::diagonals)) == Joints{"L0.1-L1.2", "L1.2-L2.1"});
}

TEST_CASE("mid nodes stand in the middle of horizontals that they split") {
  const Lattice lattice = build_lattice(lattice_of(LatticePlan::square, {panel(3.0, 2.0, 1, Bracing::k)}));
  REQUIRE(lattice.nodes.size() == 12);
  CHECK(lattice.nodes[8].name == "L1.m1");
  CHECK(lattice.nodes[8].position == Eigen::Vector3d(0.0, -1.0, 3.0));
  CHECK(lattice.nodes[9].position == Eigen::Vector3d(1.0, 0.0, 3.0));
  CHECK(joints(lattice, LatticeMember::horizontals) == Joints{"L1.1-L1.m1", "L1.m1-L1.2", "L1.2-L1.m2",
                                                              "L1.m2-L1.3", "L1.3-L1.m3", "L1.m3-L1.4",
                                                              "L1.4-L1.m4", "L1.m4-L1.1"});
}

TEST_CASE("K below and K down above share the mid nodes between them") {
  const LatticeStatement statement =
      lattice_of(LatticePlan::square, {panel(3.0, 3.0, 1, Bracing::k), panel(3.0, 2.0, 1, Bracing::k_down)});
  const Lattice lattice = build_lattice(statement);
  CHECK(lattice.nodes.size() == 12 + 4);
  CHECK(face_1(joints(lattice, LatticeMember::diagonals)) ==
        Joints{"L0.1-L1.m1", "L0.2-L1.m1", "L1.m1-L2.1", "L1.m1-L2.2"});
}

TEST_CASE("plan bracing lies at the top of its panel in the pattern it names") {
  const auto plan = [](Bracing bracing, PlanPattern pattern, LatticePlan shape) {
    LatticeStatement statement = lattice_of(shape, {panel(3.0, 2.0, 1, bracing)});
    statement.panels[0].plan_bracing = PlanBracing{3, pattern, {}};
    return joints(build_lattice(statement), LatticeMember::plan_bracing);
  };
  CHECK(plan(Bracing::x, PlanPattern::diagonal, LatticePlan::square) == Joints{"L1.1-L1.3"});
  CHECK(plan(Bracing::x, PlanPattern::crossed, LatticePlan::square) == Joints{"L1.1-L1.3", "L1.2-L1.4"});
  CHECK(plan(Bracing::k, PlanPattern::diamond, LatticePlan::square) ==
        Joints{"L1.m1-L1.m2", "L1.m2-L1.m3", "L1.m3-L1.m4", "L1.m4-L1.m1"});
  CHECK(plan(Bracing::k, PlanPattern::diamond, LatticePlan::triangle) ==
        Joints{"L1.m1-L1.m2", "L1.m2-L1.m3", "L1.m3-L1.m1"});
}

TEST_CASE("each panel gives its bars its own sections and material") {
  LatticePanel upper = panel(3.0, 2.0, 1, Bracing::single);
  upper.legs = 10;
  upper.diagonals = 11;
  upper.horizontals.reset();
  upper.plan_bracing = PlanBracing{13, PlanPattern::diagonal, {}};
  upper.material = 1;
  const Lattice lattice =
      build_lattice(lattice_of(LatticePlan::square, {panel(3.0, 3.0, 2, Bracing::x), upper}));
  const std::vector<std::size_t> lower_sections{0, 1, 2};
  const std::vector<std::size_t> upper_sections{10, 11, 99, 13};
  std::size_t from_upper = 0;
  for (const LatticeBar& bar : lattice.bars) {
    const auto kind = static_cast<std::size_t>(bar.member);
    if (lattice.nodes[bar.to].name.starts_with("L3")) {
      ++from_upper;
      CHECK(bar.section == upper_sections[kind]);
      CHECK(bar.material == 1);
    } else {
      CHECK(bar.section == lower_sections[kind]);
      CHECK(bar.material == 0);
    }
  }
  CHECK(from_upper == 4 + 4 + 1);
}

TEST_CASE("bars are listed by kind and within a kind from the base up") {
  const Lattice lattice = build_lattice(lattice_of(LatticePlan::square, {panel(3.0, 2.0, 4, Bracing::x)}));
  for (std::size_t i = 1; i < lattice.bars.size(); ++i) {
    const LatticeBar& before = lattice.bars[i - 1];
    const LatticeBar& bar = lattice.bars[i];
    CHECK(before.member <= bar.member);
    if (before.member == bar.member) {
      CHECK(lattice.nodes[before.from].position.z() <= lattice.nodes[bar.from].position.z());
    }
  }
}

TEST_CASE("the groups of a lattice have the names of the trade") {
  Joints names;
  for (const LatticeMember member : kLatticeMembers) names.emplace_back(name_of(member));
  CHECK(names == Joints{"legs", "diagonals", "horizontals", "plan bracing"});
}

}  // namespace swaymark::test
