#include "core/tower_file_tables.hpp"

#include <catch2/catch.hpp>

#include "tests/core/tower_text.hpp"
#include "tests/core/written.hpp"
#include "tests/support/beside.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// The small tower with its nodes and bars in tables.
const std::string kTabled =
    "swaymark: 1\n"
    "dimensions: 2\n"
    "materials: {steel: {E: 210 GPa, density: 7850 kg/m3}}\n"
    "sections: {bar: {area: 10 cm2}}\n"
    "nodes_from: nodes.csv\n"
    "members: [{group: g, section: bar, material: steel}]\n"
    "bars_from: bars.csv\n"
    "supports: [{nodes: [a, b], fixed: [x, z]}]\n";
const std::string kNodes = "node,x [m],z [mm]\na,0,0\nb,2,0\nc,1,1000\n";
const std::string kBars = "bar,from,to,group\ng-1,a,c,g\ng-2,b,c,g\n";

std::string refusal_of_nodes(const std::string& nodes) {
  return refusal_beside(kTabled, {{"nodes.csv", nodes}, {"bars.csv", kBars}});
}

std::string refusal_of_bars(const std::string& bars) {
  return refusal_beside(kTabled, {{"nodes.csv", kNodes}, {"bars.csv", bars}});
}

}  // namespace

TEST_CASE("a tower from tables equals the tower written out") {
  const Tower written = tower_of(tower_with({}));
  const Tower tabled = tower_beside(kTabled, {{"nodes.csv", kNodes}, {"bars.csv", kBars}});
  CHECK(difference(tabled, written, true).empty());
  REQUIRE(tabled.supports.size() == 2);
  CHECK(tabled.nodes[tabled.supports[1].node].name == "b");
  CHECK(tabled.files == std::vector<std::string>{"tower.yaml", "nodes.csv", "bars.csv"});
  CHECK(tabled.nodes[2].place.line == 4);
  CHECK(tabled.nodes[2].place.file == 1);
  CHECK(tabled.bars[1].place.file == 2);
}

TEST_CASE("the demo tower with its nodes and bars in tables is the same tower") {
  const Tower written = tower_in("harbour_light.yaml");
  std::string nodes = "node,x,y,z\n";
  for (const Node& node : written.nodes)
    nodes += fmt::format("{},{},{},{}\n", node.name, node.position.x(), node.position.y(), node.position.z());
  std::string bars = "group,to,from,bar\n";
  for (std::size_t b = 0; b < written.bars.size(); ++b) {
    const Bar& bar = written.bars[b];
    bars += fmt::format("{},{},{},{}\n", written.groups[bar.group].name, written.nodes[bar.to].name,
                        written.nodes[bar.from].name, written.bar_name(b));
  }
  const std::string text = "swaymark: 1\nnodes_from: nodes.csv\nbars_from: bars.csv\n" + parts_of(written);
  const Tower tabled = tower_beside(text, {{"nodes.csv", nodes}, {"bars.csv", bars}});
  CHECK(difference(tabled, written, true).empty());
}

TEST_CASE("nodes and bars of tables stand beside those of the tower file") {
  const std::string text = tower_with({"nodes_from: more.csv", "bars_from: bars.csv"});
  const Tower tower = tower_beside(
      text, {{"more.csv", "node,x,z\nd,1,-1\n"}, {"bars.csv", "bar,from,to,group\ntie,d,a,g\nrod,d,b,g\n"}});
  REQUIRE(tower.nodes.size() == 4);
  REQUIRE(tower.bars.size() == 4);
  CHECK(tower.bar_name(0) == "g-1");
  CHECK(tower.bar_name(2) == "tie");
  CHECK(tower.bar_name(3) == "rod");
  CHECK(tower.bars[3].number == 4);
}

TEST_CASE("tables of a tower in one dimension have one coordinate") {
  const std::string text =
      "swaymark: 1\ndimensions: 1\nmaterials: {s: {E: 1, density: 1}}\nsections: {b: {area: 1}}\n"
      "nodes_from: n.csv\nmembers: [{group: g, section: b, material: s, bars: [[a, b]]}]\n";
  CHECK_THAT(tower_beside(text, {{"n.csv", "x [ft],node\n0,a\n10,b\n"}}).nodes[1].position.x(),
             is_near(3.048, kRoundoff));
  CHECK(refusal_beside(text, {{"n.csv", "node,x,y\na,0,0\nb,1,0\n"}}) ==
        "n.csv:1:8 unknown key 'y' in a table of nodes in 1 dimension");
}

TEST_CASE("faults of a table of nodes are told at their place in the table") {
  CHECK(refusal_of_nodes("node,x,z,y\na,0,0,0\n") ==
        "nodes.csv:1:10 unknown key 'y' in a table of nodes in 2 dimensions");
  CHECK(refusal_of_nodes("node,x\na,0\n") ==
        "nodes.csv:1:1 'z' is missing in a table of nodes in 2 dimensions");
  CHECK_THAT(refusal_of_nodes("node,x [kg],z\na,0,0\n"), Catch::StartsWith("nodes.csv:1:6 "));
  CHECK(refusal_of_nodes(kNodes + "a,5,0\n") == "nodes.csv:5:1 the node 'a' is named twice, first in line 2");
  CHECK(refusal_of_nodes(kNodes + ",5,0\n") == "nodes.csv:5:1 nothing stands behind 'node'");
  CHECK_THAT(refusal_of_nodes(kNodes + "d,5e6,0\n"), Catch::StartsWith("nodes.csv:5:3 "));
  CHECK_THAT(refusal_of_nodes(kNodes + "d,5,here\n"), Catch::StartsWith("nodes.csv:5:5 "));
  CHECK(refusal_of_nodes("node,x,z\n") ==
        "nodes.csv:1:1 a table of nodes in 2 dimensions has no row below its first line");
  CHECK(refusal_of_nodes(kNodes + "d,1,1000\n") == "nodes.csv:5:1 nodes 'c' and 'd' stand at the same place");
}

TEST_CASE("a node named in the tower file and in the table is told with both places") {
  CHECK(refusal_beside(tower_with({"nodes_from: nodes.csv"}), {{"nodes.csv", "node,x,z\nc,5,5\n"}}) ==
        "nodes.csv:2:1 the node 'c' is named in tower.yaml:5:31 already");
}

TEST_CASE("faults of a table of bars are told at their place in the table") {
  CHECK(refusal_of_bars("bar,from,to\nr,a,c\n") == "bars.csv:1:1 'group' is missing in a table of bars");
  CHECK(refusal_of_bars("bar [m],from,to,group\nr,a,c,g\n") ==
        "bars.csv:1:1 the column 'bar' holds words, which have no unit");
  CHECK(refusal_of_bars(kBars + "r,a,d,g\n") == "bars.csv:4:5 there is no node 'd'");
  CHECK(refusal_of_bars(kBars + "r,a,b,legs\n") == "bars.csv:4:7 there is no group 'legs'");
  CHECK(refusal_of_bars(kBars + ",a,b,g\n") == "bars.csv:4:1 nothing stands behind 'bar'");
  CHECK(refusal_of_bars(kBars + "r,,b,\n") ==
        "bars.csv:4:3 nothing stands behind 'from'\nbars.csv:4:6 nothing stands behind 'group'");
  CHECK(refusal_of_bars(kBars + "r,b,b,g\n") == "bars.csv:4:1 bar r joins node 'b' to itself");
  CHECK_THAT(refusal_of_bars(kBars + "r,c,a,g\n"), Catch::StartsWith("bars.csv:4:1 bar r joins"));
}

TEST_CASE("every bar has a name of its own") {
  CHECK(refusal_of_bars(kBars + "g-1,a,b,g\n") ==
        "bars.csv:4:1 the bar 'g-1' is named twice, first in line 2");
  CHECK(
      refusal_beside(tower_with({"bars_from: bars.csv"}), {{"bars.csv", "bar,from,to,group\ng-2,a,b,g\n"}}) ==
      "bars.csv:2:1 the bar 'g-2' is named in tower.yaml:6:68 already");
}

TEST_CASE("a group that no row names is refused where it is stated") {
  std::string more = kTabled;
  more.replace(more.find("steel}]"), 7, "steel}, {group: h, section: bar, material: steel}]");
  CHECK(refusal_beside(more, {{"nodes.csv", kNodes}, {"bars.csv", kBars}}) ==
        "tower.yaml:6:54 no bar is in the group 'h'");
}

TEST_CASE("a faulty table of nodes draws no faults after it") {
  CHECK(refusal_of_nodes("node,x,z\na,0,0\nb,2\nc,1,1\n") ==
        "nodes.csv:3:1 the row has 2 cells, the first line names 3 columns");
}

TEST_CASE("bars are counted by their group") {
  const Tower tower = tower_of(tower_with({}));
  CHECK(bars_by_group(tower) == std::vector<std::size_t>{2});
}

}  // namespace swaymark::test
