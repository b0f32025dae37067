#include "core/tower_file_segments.hpp"

#include <catch2/catch.hpp>

#include "tests/core/drawn.hpp"
#include "tests/core/written.hpp"
#include "tests/support/files.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("segments drawn to the end points equal the same tower by nodes and bars") {
  const Tower drawn = drawn_tower("x1,z1,x2,z2,group\n0,0,1,1,g\n2,0,1,1,g\n");
  CHECK(difference(drawn, tower_of(kSmallWritten), true).empty());
  REQUIRE(drawn.segments);
  CHECK(drawn.segments->file == "lines.csv");
  CHECK(drawn.segments->segments == 2);
  CHECK(drawn.segments->nodes == 3);
  CHECK(drawn.segments->named == 2);
  CHECK(drawn.segments->moved == 0);
  CHECK_FALSE(drawn.segments->merge_within_stated);
  CHECK_THAT(drawn.segments->merge_within, is_near(1e-3, kRoundoff));
}

TEST_CASE("the demo tower drawn by segments is the same tower") {
  const Tower written = tower_in("harbour_light.yaml");
  std::string lines = "x1 [mm],y1 [mm],z1 [mm],x2 [mm],y2 [mm],z2 [mm],group\n";
  for (std::size_t b = 0; b < written.bars.size(); ++b) {
    const Bar& bar = written.bars[b];
    // Each end a little off, by less than half of the tolerance to every side.
    const double off = 0.02 * static_cast<double>(b % 10);
    const Eigen::Vector3d from = 1e3 * written.nodes[bar.from].position;
    const Eigen::Vector3d to = 1e3 * written.nodes[bar.to].position;
    lines += fmt::format("{:.6f},{:.6f},{:.6f},{:.6f},{:.6f},{:.6f},{}\n", from.x() + off, from.y(), from.z(),
                         to.x(), to.y() - off, to.z(), written.groups[bar.group].name);
  }
  std::string text = "swaymark: 1\nsegments_from: lines.csv\n" + parts_of(written);
  text += "nodes:\n";  // named by hand, so that all stand where they are written
  for (const Node& node : written.nodes)
    text += fmt::format("  {}: [{}, {}, {}]\n", node.name, node.position.x(), node.position.y(),
                        node.position.z());
  const Tower drawn = tower_beside(text, {{"lines.csv", lines}});
  CHECK(difference(drawn, written, true).empty());
  CHECK(drawn.nodes.size() == written.nodes.size());
  CHECK(drawn.segments->named == written.nodes.size());
  CHECK_THAT(drawn.segments->largest_move, is_near(0.18e-3, 1e-9));
}

TEST_CASE("nodes of a drawing are named by their order and by hand") {
  const Tower tower = drawn_tower("x1,z1,x2,z2,group\n1,1,0,0,g\n1,1,2,0,g\n2,0,3,3,g\n3,3,1,1,g\n");
  REQUIRE(tower.nodes.size() == 4);
  CHECK(tower.nodes[0].name == "a");
  CHECK(tower.nodes[1].name == "b");
  CHECK(tower.nodes[2].name == "n1");  // the second and the third place have names of their own
  CHECK(tower.nodes[3].name == "n4");
  CHECK(tower.nodes[3].place.line == 4);
  CHECK(tower.nodes[3].place.column == 5);
  CHECK(tower.files.at(tower.nodes[3].place.file) == "lines.csv");
}

TEST_CASE("the tolerance is stated or a millimetre") {
  const std::string apart = "x1 [mm],z1 [mm],x2 [mm],z2 [mm],group\n0,0,1000,1000,g\n1003,1000,2000,0,g\n";
  CHECK(drawn_tower(apart).nodes.size() == 4);
  const Tower joined = drawn_tower(apart, "merge_within: 3 mm\n");
  CHECK(joined.nodes.size() == 3);
  CHECK(joined.segments->merge_within_stated);
  CHECK(joined.segments->moved == 1);
  CHECK_THAT(joined.segments->largest_move, is_near(3e-3, 1e-9));
  CHECK(joined.nodes.at(joined.segments->largest_move_node).name == "n2");
  CHECK(drawn_tower(apart, "merge_within: 2.9 mm\n").nodes.size() == 4);
}

TEST_CASE("keys of a drawing without a drawing are refused") {
  const std::string text = kSmallWritten;
  CHECK_THAT(refusal_beside(text + "merge_within: 1 mm\n", {}),
             Catch::Contains("'merge_within' says how line segments are read"));
  CHECK_THAT(refusal_beside(text + "split_crossings: true\n", {}),
             Catch::Contains("'split_crossings' says how line segments are read"));
}

TEST_CASE("a tolerance must be a length that tells nodes apart") {
  const std::string lines = "x1,z1,x2,z2,group\n0,0,1,1,g\n2,0,1,1,g\n";
  CHECK_THAT(drawing_refusal(lines, "merge_within: 0\n"), Catch::Contains("0.001 mm at least"));
  CHECK_THAT(drawing_refusal(lines, "merge_within: -1 mm\n"), Catch::Contains("0.001 mm at least"));
  CHECK_THAT(drawing_refusal(lines, "merge_within: 1 kg\n"), Catch::Contains("'merge_within'"));
  CHECK_THAT(drawing_refusal(lines, "split_crossings: maybe\n"),
             Catch::Contains("9:18 'split_crossings' cannot be 'maybe'"));
}

TEST_CASE("faults of a table of segments are told at their place in the table") {
  CHECK(drawing_refusal("x1,y1,z1,x2,z2,group\n0,0,0,1,1,g\n") ==
        "lines.csv:1:4 unknown key 'y1' in a table of segments in 2 dimensions");
  CHECK(drawing_refusal("x1,z1,x2,group\n0,0,1,g\n") ==
        "lines.csv:1:1 'z2' is missing in a table of segments in 2 dimensions");
  CHECK(drawing_refusal("x1,z1,x2,z2,group\n0,0,1,1,h\n2,0,1,1,\n") ==
        "lines.csv:2:9 there is no group 'h'\nlines.csv:3:9 nothing stands behind 'group'");
  CHECK_THAT(drawing_refusal("x1,z1,x2,z2,group\n0,0,1,2e6,g\n"), Catch::StartsWith("lines.csv:2:7 "));
  CHECK_THAT(drawing_refusal("x1,z1,x2,z2,group\n0,0,1,up,g\n"), Catch::StartsWith("lines.csv:2:7 "));
}

TEST_CASE("a node beside a drawing that no bar joins is refused with the distance") {
  CHECK(drawing_refusal("x1,z1,x2,z2,group\n0,0,1,1,g\n2.5,0,1,1,g\n") ==
        "tower.yaml:5:20 no bar ends at the node 'b': the nearest end point of a segment is 0.5 m away, "
        "farther than 'merge_within' (1 mm)");
  CHECK(drawing_refusal("x1,z1,x2,z2,group\n0,0,3,0,g\n3,0,1,1,g\n0,0,1,1,g\n") ==
        "tower.yaml:5:20 no bar ends at the node 'b': it stands on 'g-1', which passes it by");
  CHECK(drawing_refusal("x1,z1,x2,z2,group\n0,0,3,0,g\n3,0,1,1,g\n0,0,1,1,g\n", "split_crossings: true\n")
            .empty());
}

TEST_CASE("segments stand beside bars written by hand and number on from them") {
  const std::string text =
      drawing_text("", "members: [{group: g, section: bar, material: steel, bars: [[a, b]]}]\n");
  const Tower tower = tower_beside(text, {{"lines.csv", "x1,z1,x2,z2,group\n0,0,1,1,g\n2,0,1,1,g\n"}});
  REQUIRE(tower.bars.size() == 3);
  CHECK(tower.bar_name(0) == "g-1");
  CHECK(tower.bar_name(2) == "g-3");
}

}  // namespace swaymark::test
