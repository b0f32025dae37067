#include "apps/report_mechanism.hpp"

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("a mechanism is told with its file its node its direction and a cure") {
  const std::string text = mechanism_text(checked(swinging_bar()));
  CHECK_THAT(text, Catch::StartsWith("tower.yaml: ") && Catch::Contains("in 1 way;"));
  CHECK(has_line(text, {"node c: "}));
  // Square to its only bar, which rises at 45 degrees: x and z equal and opposite.
  CHECK((has_line(text, {"x 0.707", "z -0.707"}) || has_line(text, {"x -0.707", "z 0.707"}) ||
         has_line(text, {"x 1.000", "z -1.000"}) || has_line(text, {"x -1.000", "z 1.000"})));
  CHECK(has_line(text, {"cure: ", "node c", "support"}));
}

TEST_CASE("bars and restraints are counted against the degrees of freedom") {
  // Maxwell's count: 1 + 4 - 6.
  CHECK(has_line(
      mechanism_text(checked(swinging_bar())),
      {"bars 1 + restraints 4 - degrees of freedom 6 = -1 = states of self-stress 0 - free motions 1"}));
}

TEST_CASE("motions of one kind are told together and counted") {
  // A star of bars from one held node: every tip swings.
  Tower tower = bare_tower(2);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  for (int i = 0; i < 25; ++i)
    add_bar(tower, 0, add_node(tower, {std::cos(0.1 * i), 0.0, std::sin(0.1 * i)}));
  const Analysis analysis = checked(tower);
  REQUIRE(analysis.mechanisms.count() == 25);
  const std::string text = mechanism_text(analysis);
  CHECK_THAT(text, Catch::Contains("in 25 ways;") && Catch::Contains("25 nodes") &&
                       Catch::Contains("and 19 more motions"));
  CHECK(lines_of(text).size() < 20);
}

TEST_CASE("a mechanism of many nodes shows the first and counts the others") {
  // A mast on feet that hold nothing sideways moves as a whole.
  Tower tower = regular_mast({});
  for (Support& support : tower.supports) support.fixed = {false, false, true};
  const std::string text = mechanism_text(checked(tower));
  CHECK_THAT(text, Catch::Contains("the whole tower moves") && Catch::Contains("other nodes"));
}

TEST_CASE("no line on mechanisms is wider than a page or has a minus sign before zero") {
  for (const std::string& line : lines_of(mechanism_text(checked(swinging_bar())))) {
    CHECK(line.size() <= 100);
    CHECK(line.find("-0.000") == std::string::npos);
  }
}

TEST_CASE("the pattern of a lattice is told only while a node of it is free") {
  const auto text_of = [](const std::string& supports) {
    return mechanism_text(checked(
        "swaymark: 1\nmaterials: {steel: {E: 210 GPa, density: 7850}}\nsections: {leg: {area: 20 cm2}}\n"
        "lattice: {plan: square, width: 2, material: steel, panels: [{height: 3, width: 2, legs: leg, "
        "diagonals: leg, horizontals: leg, plan_bracing: leg, bracing: K}]}\n"
        "nodes: {alone: [9, 9, 9]}\nsupports:\n  - {nodes: base, fixed: [x, y, z]}\n" +
        supports));
  };
  CHECK_THAT(text_of(""), Catch::Contains("the pattern: "));
  CHECK_THAT(text_of("  - {nodes: [L1.m1, L1.m2, L1.m3, L1.m4], stabilise: 10 MN/m}\n"),
             !Catch::Contains("the pattern: ") && Catch::Contains("loose node"));
}

}  // namespace swaymark::test
