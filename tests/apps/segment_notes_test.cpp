#include "apps/segment_notes.hpp"

#include <catch2/catch.hpp>

#include "apps/report_json.hpp"
#include "apps/report_mechanism.hpp"
#include "apps/report_text.hpp"
#include "tests/apps/cases.hpp"
#include "tests/core/drawn.hpp"

namespace swaymark::test {

namespace {

using Texts = std::vector<std::string>;
const std::string kHeader = "x1,z1,x2,z2,group\n";

}  // namespace

TEST_CASE("a tower that was not drawn has no notes about segments") {
  CHECK(segment_notes(tower_of(kSmallWritten)).empty());
}

TEST_CASE("what became of the ends of segments is noted with number tolerance and distance") {
  CHECK(
      segment_notes(drawn_tower(kHeader + "0,0,1,1,g\n2,0,1,1,g\n")) ==
      Texts{"lines.csv: the ends of 2 segments are 3 nodes; ends within merge_within (1 mm, the default) of "
            "each other are one, where the first of them is drawn, or where a node was written there (2 of "
            "them). No end moved."});
  CHECK(
      segment_notes(bare_drawn(kHeader + "0,0,1,1,g\n2,0,1,1.0025,g\n", "merge_within: 3 mm\n")) ==
      Texts{
          "lines.csv: the ends of 2 segments are 3 nodes; ends within merge_within (3 mm) of each other are "
          "one, where the first of them is drawn. 1 end moved, by 2.5 mm at most (node n2)."});
}

TEST_CASE("crossings are noted with the bars and their place") {
  const std::string lines = kHeader + "0,0,2,2,g\n2,0,0,2,g\n";
  const Texts open = segment_notes(bare_drawn(lines));
  REQUIRE(open.size() == 2);
  CHECK(
      open[1] ==
      "lines.csv: 1 crossing of segments that share no node is not joined, as 'split_crossings: true' would "
      "do: g-1 and g-2 at (1.000, 1.000) m.");
  const Texts split = segment_notes(bare_drawn(lines, "split_crossings: true\n"));
  REQUIRE(split.size() == 2);
  CHECK(split[1] ==
        "lines.csv: 1 crossing of segments that share no node became a node, and the segments were split "
        "there: "
        "g-1 and g-2 at (1.000, 1.000) m, node c1.");
}

TEST_CASE("an end that is left loose on another segment is a warning") {
  const Texts notes = segment_notes(bare_drawn(kHeader + "0,0,4,0,g\n1,0,1,3,g\n"));
  REQUIRE(notes.size() == 2);
  CHECK_THAT(notes[1], Catch::StartsWith("WARNING: ") &&
                           Catch::Contains("the end of g-2 on g-1 at (1.000, 0.000) m, node n3"));
}

TEST_CASE("a long list of crossings is cut and counted") {
  std::string lines = kHeader + "-1,0,40,0,g\n";
  for (int i = 0; i < 30; ++i) lines += fmt::format("{},-1,{},1,g\n", i, i);
  const Texts notes = segment_notes(bare_drawn(lines));
  REQUIRE(notes.size() == 2);
  CHECK_THAT(notes[1], Catch::Contains(": 30 crossings") && Catch::EndsWith("; and 18 more."));
}

TEST_CASE("notes about segments stand in every report") {
  const std::string held = "damping: 2 %\n";
  std::string text = drawing_text(held);
  text.replace(text.find("nodes: [a]"), 10, "nodes: [a, b]");
  const Analysis analysis = checked(tower_beside(text, {{"lines.csv", kHeader + "0,0,1,1,g\n2,0,1,1,g\n"}}));
  CHECK(has_line(text_report(analysis, {}), {"lines.csv: the ends of 2 segments are 3 nodes"}));
  CHECK_THAT(json_report(analysis, false), Catch::Contains("lines.csv: the ends of 2 segments are 3 nodes"));
}

TEST_CASE("a drawing that can move is told with its notes") {
  const Analysis loose = checked(drawn_tower(kHeader + "0,0,1,1,g\n2,0,1,1,g\n"));
  REQUIRE(loose.mechanisms.any());
  CHECK(has_line(mechanism_text(loose), {"the drawing: lines.csv: the ends of 2 segments"}));
  CHECK_THAT(json_report(loose, false), Catch::Contains("lines.csv: the ends of 2 segments"));
}

}  // namespace swaymark::test
