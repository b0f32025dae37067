#include "core/drawing.hpp"

#include <catch2/catch.hpp>

#include "tests/core/drawn.hpp"
#include "tests/support/files.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

const std::string kHeader = "x1 [mm],z1 [mm],x2 [mm],z2 [mm],group\n";

}  // namespace

TEST_CASE("end points within the tolerance are one node where the first is drawn") {
  const Tower tower = bare_drawn(kHeader +
                                 "0,0,1000,0,g\n1000.4,0,2000,0,g\n2000,900,1000,0.3,g\n"
                                 "1000,500,0,0,g\n");
  REQUIRE(tower.nodes.size() == 5);
  CHECK_THAT(tower.nodes[1].position.x(), is_near(1.0, kRoundoff));
  CHECK(tower.nodes[1].position.z() == 0.0);
  CHECK(tower.segments->nodes == 5);
  CHECK(tower.segments->moved == 2);
  CHECK_THAT(tower.segments->largest_move, is_near(0.4e-3, 1e-9));
  CHECK(tower.segments->largest_move_node == 1);
}

TEST_CASE("a distance of just the tolerance is within it") {
  CHECK(bare_drawn(kHeader + "0,0,1000,0,g\n1001,0,2000,0,g\n").nodes.size() == 3);
  CHECK(bare_drawn(kHeader + "0,0,1000,0,g\n1001.01,0,2000,0,g\n").nodes.size() == 4);
}

TEST_CASE("a chain of end points longer than the tolerance is refused in whatever order it comes") {
  const std::string a = "0,0,1000,0,g\n";
  const std::string b = "1000.8,0,1000,700,g\n";
  const std::string c = "1001.6,0,2000,0,g\n";
  CHECK(bare_refusal(kHeader + a + b + c) ==
        "lines.csv:4:1 end points follow each other here in steps within 'merge_within' (1 mm), but together "
        "they extend over 1.6 mm: which of them are one node is not clear");
  CHECK_THAT(bare_refusal(kHeader + b + c + a), Catch::Contains("they extend over 1.6 mm"));
  CHECK_THAT(bare_refusal(kHeader + c + b + a), Catch::Contains("they extend over 1.6 mm"));
  CHECK(bare_drawn(kHeader + a + b + c, "merge_within: 1.61 mm\n").nodes.size() == 4);
}

TEST_CASE("no end point moves farther than the tolerance") {
  std::string lines = kHeader;
  for (int i = 0; i < 10; ++i) lines += fmt::format("{},{},{},5000,g\n", 0.07 * i, 0.07 * (i % 3), 500 * i);
  const Tower tower = bare_drawn(lines);
  CHECK(tower.nodes.size() == 11);
  CHECK(tower.segments->largest_move > 0.5e-3);
  CHECK(tower.segments->largest_move <= 1e-3);
}

TEST_CASE("a node written by hand within the tolerance of an end point gives it name and place") {
  const Tower tower = drawn_tower(kHeader + "0.6,0,1000,1000,g\n1999.5,0.2,1000,1000,g\n");
  REQUIRE(tower.nodes.size() == 3);
  CHECK(tower.nodes[tower.bars[0].from].name == "a");
  CHECK(tower.nodes[tower.bars[1].from].name == "b");
  CHECK(tower.nodes[0].position.x() == 0.0);
  CHECK(tower.segments->named == 2);
  CHECK(tower.segments->moved == 2);
}

TEST_CASE("an end point near two nodes is refused at the second") {
  CHECK(refusal_beside(
            "swaymark: 1\ndimensions: 1\nmaterials: {s: {E: 1, density: 1}}\nsections: {b: {area: 1}}\n"
            "nodes: {a: [0], b: [0.0015]}\nmembers: [{group: g, section: b, material: s}]\n"
            "segments_from: lines.csv\n",
            {{"lines.csv", "x1,x2,group\n0.0008,3,g\n"}}) ==
        "tower.yaml:5:17 an end point here lies within 'merge_within' (1 mm) of the node 'b' and of 'a'");
}

TEST_CASE("a name that the drawing gives is refused elsewhere") {
  CHECK(refusal_beside(
            "swaymark: 1\ndimensions: 1\nmaterials: {s: {E: 1, density: 1}}\nsections: {b: {area: 1}}\n"
            "nodes: {a: [0], n2: [7]}\nmembers: [{group: g, section: b, material: s, bars: [[a, n2]]}]\n"
            "segments_from: lines.csv\n",
            {{"lines.csv", "x1,x2,group\n0,-3,g\n"}}) ==
        "tower.yaml:5:17 the node 'n2' is made from the segments of lines.csv already");
  // The node of that very place may have it.
  const Tower tower = tower_beside(
      "swaymark: 1\ndimensions: 1\nmaterials: {s: {E: 1, density: 1}}\nsections: {b: {area: 1}}\n"
      "nodes: {n2: [-3]}\nmembers: [{group: g, section: b, material: s}]\nsegments_from: lines.csv\n",
      {{"lines.csv", "x1,x2,group\n0,-3,g\n"}});
  CHECK(tower.nodes.size() == 2);
}

TEST_CASE("more end points together than a joint has are refused with the unit in mind") {
  std::string lines = "x1 [um],z1,x2 [um],z2,group\n";
  for (int i = 0; i < 3000; ++i) lines += fmt::format("{},0,{},0,g\n", i, i + 0.5);
  CHECK_THAT(bare_refusal(lines), Catch::Contains("more end points lie close together"));
}

}  // namespace swaymark::test
