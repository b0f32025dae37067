#include "core/drawing_bars.hpp"

#include <catch2/catch.hpp>

#include "tests/core/drawn.hpp"
#include "tests/support/files.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

const std::string kHeader = "x1,z1,x2,z2,group\n";
const std::string kSplit = "split_crossings: true\n";
// A square with both diagonals.
const std::string kCrossed = kHeader + "0,0,2,0,g\n0,0,0,2,g\n2,0,2,2,g\n0,2,2,2,g\n0,0,2,2,g\n2,0,0,2,g\n";

Tower written(const std::string& nodes, const std::string& bars) {
  return tower_of(
      "swaymark: 1\ndimensions: 2\nmaterials: {steel: {E: 210 GPa, density: 7850 kg/m3}}\n"
      "sections: {bar: {area: 10 cm2}}\nnodes: {" +
      nodes + "}\nmembers: [{group: g, section: bar, material: steel, bars: [" + bars + "]}]\n");
}

}  // namespace

TEST_CASE("diagonals that cross are told and left as they are") {
  const Tower tower = bare_drawn(kCrossed);
  CHECK(tower.nodes.size() == 4);
  CHECK(tower.bars.size() == 6);
  REQUIRE(tower.segments->crossings.size() == 1);
  const SegmentCrossing& crossing = tower.segments->crossings[0];
  CHECK(crossing.first == "g-5");
  CHECK(crossing.second == "g-6");
  CHECK((crossing.position - Eigen::Vector3d(1, 0, 1)).norm() < 1e-12);  // rounding of metres
  CHECK_FALSE(crossing.node);
  CHECK_FALSE(crossing.at_end);
}

TEST_CASE("split crossings give the same tower as written with the node") {
  const Tower tower = bare_drawn(kCrossed, kSplit);
  const Tower by_hand = written("1: [0, 0], 2: [2, 0], 3: [2, 2], 4: [0, 2], m: [1, 1]",
                                "[1, 2], [1, 4], [2, 3], [4, 3], [1, m], [m, 3], [2, m], [m, 4]");
  CHECK(difference(tower, by_hand, false).empty());
  CHECK(tower.nodes.back().name == "c1");
  CHECK(tower.bar_name(4) == "g-5.1");
  CHECK(tower.bar_name(5) == "g-5.2");
  CHECK(tower.bar_name(7) == "g-6.2");
  CHECK(tower.bars[7].place.line == 7);
  REQUIRE(tower.segments->crossings.size() == 1);
  CHECK(tower.segments->crossings[0].node == 4);
  CHECK(tower.segments->split);
}

TEST_CASE("an end within another bar is told and split likewise") {
  const std::string lines = kHeader + "0,0,4,0,g\n1,0,1,3,g\n0,0,1,3,g\n4,0,1,3,g\n";
  const Tower open = bare_drawn(lines);
  REQUIRE(open.segments->crossings.size() == 1);
  CHECK(open.segments->crossings[0].first == "g-2");
  CHECK(open.segments->crossings[0].second == "g-1");
  CHECK(open.segments->crossings[0].at_end);
  CHECK(open.bars.size() == 4);
  const Tower split = bare_drawn(lines, kSplit);
  const Tower by_hand =
      written("a: [0, 0], b: [1, 0], c: [4, 0], t: [1, 3]", "[a, b], [b, c], [b, t], [a, t], [c, t]");
  CHECK(difference(split, by_hand, false).empty());
}

TEST_CASE("three bars through one point get one node") {
  const Tower tower = bare_drawn(kHeader + "-1,0,1,0,g\n0,-1,0,1,g\n-1,-1,1,1,g\n", kSplit);
  CHECK(tower.nodes.size() == 7);
  CHECK(tower.bars.size() == 6);
  CHECK(tower.segments->crossings.size() == 3);
  for (const SegmentCrossing& crossing : tower.segments->crossings) CHECK(crossing.node == 6);
}

TEST_CASE("a bar that is crossed several times is split in order from its first end") {
  const Tower tower = bare_drawn(kHeader + "4,0,0,0,g\n1,-1,1,1,g\n3,-1,3,1,g\n", kSplit);
  REQUIRE(tower.bars.size() == 7);
  CHECK(tower.nodes[tower.bars[0].from].position.x() == 4.0);
  CHECK_THAT(tower.nodes[tower.bars[0].to].position.x(), is_near(3.0, kRoundoff));
  CHECK_THAT(tower.nodes[tower.bars[1].to].position.x(), is_near(1.0, kRoundoff));
  CHECK(tower.nodes[tower.bars[2].to].position.x() == 0.0);
  CHECK(tower.bar_name(2) == "g-1.3");
}

TEST_CASE("a node written by hand at a crossing gives it its name") {
  const Tower tower =
      tower_beside(bare_drawing(kSplit + "nodes: {hub: [1, 1.0005]}\n"), {{"lines.csv", kCrossed}});
  CHECK(tower.nodes.size() == 5);
  CHECK(tower.bars.size() == 8);
  CHECK(tower.nodes[tower.bars[4].to].name == "hub");
  CHECK(tower.nodes[tower.bars[7].from].name == "hub");
}

TEST_CASE("segments on each other are refused at the later one") {
  CHECK(bare_refusal(kHeader + "0,0,4,0,g\n1,0,3,0,g\n") ==
        "lines.csv:3:1 the bar 'g-2' lies on 'g-1' for 2 m");
  CHECK(bare_refusal(kHeader + "0,0,1,0,g\n0,0,4,0,g\n", kSplit) ==
        "lines.csv:3:1 the bar 'g-2' lies on 'g-1' for 1 m");
  // The same segment again joins the same nodes, which is a fault of every tower.
  CHECK_THAT(bare_refusal(kHeader + "0,0,1,0,g\n1,0,0,0,g\n"),
             Catch::StartsWith("lines.csv:3:1 bar g-2 joins"));
}

TEST_CASE("a segment within the tolerance is refused with its length") {
  CHECK(bare_refusal(kHeader + "0,0,4,0,g\n1,1,1,1.0005,g\n") ==
        "lines.csv:3:1 the segment is 0.5 mm long, and 'merge_within' (1 mm) makes its two ends one node");
  CHECK_THAT(bare_refusal(kHeader + "1,1,1,1,g\n"), Catch::Contains("the segment is 0 mm long"));
}

TEST_CASE("ends that touch beyond the tolerance are refused") {
  const std::string refusal = refusal_beside(
      "swaymark: 1\nmaterials: {s: {E: 1, density: 1}}\nsections: {b: {area: 1}}\n"
      "members: [{group: g, section: b, material: s}]\nsegments_from: lines.csv\n",
      {{"lines.csv", "x1,y1,z1,x2,y2,z2,group\n0,0,0,1,0,0,g\n1,0.0008,-0.0008,1,0.0008,2,g\n"}});
  CHECK(refusal ==
        "lines.csv:3:1 the bars 'g-2' and 'g-1' touch, but their end points are 1.131 mm apart, farther than "
        "'merge_within' (1 mm)");
}

TEST_CASE("a split tower has the mass of the whole one") {
  const auto length = [](const Tower& tower) {
    double sum = 0.0;
    for (const Bar& bar : tower.bars)
      sum += (tower.nodes[bar.to].position - tower.nodes[bar.from].position).norm();
    return sum;
  };
  CHECK_THAT(length(bare_drawn(kCrossed, kSplit)), is_near(8.0 + 4.0 * std::sqrt(2.0), 1e-12));
}

}  // namespace swaymark::test
