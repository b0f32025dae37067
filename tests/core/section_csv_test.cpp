#include "core/section_csv.hpp"

#include <catch2/catch.hpp>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

using Lines = std::vector<std::string>;

// Every fault of a table, as it is shown.
Lines refusals_of_sections(std::string_view text) {
  FaultList faults("my.csv");
  SectionTable table = SectionTable::built_in();
  read_section_csv(text, faults, table);
  Lines result;
  try {
    faults.throw_if_any();
  } catch (const InputError& error) {
    for (const Fault& fault : error.faults()) {
      result.push_back(fault.file + ":" + std::to_string(fault.place.line) + ":" +
                       std::to_string(fault.place.column) + " " + fault.message.what);
    }
  }
  return result;
}

}  // namespace

TEST_CASE("a table of sections gives area and what else is known") {
  FaultList faults("my.csv");
  SectionTable table;
  read_section_csv("size,perimeter [mm],area [cm2],radius [cm]\nU 100x50,372,13.5,1.47\nflat 60x8,,4.8,\n",
                   faults, table);
  CHECK(faults.empty());
  const SectionSize* channel = table.find("u 100x50");
  REQUIRE(channel != nullptr);
  CHECK_THAT(channel->area, is_near(13.5e-4, kRoundoff));
  CHECK_THAT(channel->radius.value(), is_near(14.7e-3, kRoundoff));
  CHECK_THAT(channel->perimeter.value(), is_near(0.372, kRoundoff));
  const SectionSize* flat = table.find("flat 60x8");
  REQUIRE(flat != nullptr);
  CHECK_THAT(flat->area, is_near(4.8e-4, kRoundoff));
  CHECK_FALSE(flat->radius.has_value());
  CHECK_FALSE(flat->perimeter.has_value());
}

TEST_CASE("radius and perimeter are optional columns") {
  CHECK(refusals_of_sections("size,area [mm2]\nbar,100\n").empty());
}

TEST_CASE("columns that are missing or unknown are named") {
  CHECK(refusals_of_sections("size,radius [cm]\nbar,1\n") ==
        Lines{"my.csv:1:1 'area' is missing in a table of sections"});
  CHECK(refusals_of_sections("area [cm2]\n1\n") ==
        Lines{"my.csv:1:1 'size' is missing in a table of sections"});
  CHECK(refusals_of_sections("size,area [cm2],colour\nbar,1,red\n") ==
        Lines{"my.csv:1:17 unknown key 'colour' in a table of sections"});
  CHECK(refusals_of_sections("size [mm],area [cm2]\n80x8,1\n") ==
        Lines{"my.csv:1:1 the column 'size' holds words, which have no unit"});
}

TEST_CASE("a unit of the wrong dimension is refused once at its column") {
  const Lines refusals = refusals_of_sections("size,area [cm]\nbar,1\nrod,2\n");
  REQUIRE(refusals.size() == 1);
  CHECK_THAT(refusals[0], Catch::StartsWith("my.csv:1:6 ") && Catch::Contains("a length"));
}

TEST_CASE("values and names of a table are refused in their cells") {
  CHECK(refusals_of_sections("size,area [cm2],radius [cm]\nbar,0,1\nrod,x,1\n,1,1\nbeam,1,-1\n") ==
        Lines{"my.csv:2:5 'area' must be above zero, got '0 cm2'",
              "my.csv:3:5 'area' wants a plain number, got 'x'", "my.csv:4:1 nothing stands behind 'size'",
              "my.csv:5:8 'radius' must be above zero, got '-1 cm'"});
}

TEST_CASE("a size that the tables have already is refused") {
  CHECK(refusals_of_sections("size,area [cm2]\nL 80x8,12.3\nbar,1\nBAR,2\n") ==
        Lines{"my.csv:2:1 the size 'L 80x8' is in the tables already",
              "my.csv:4:1 the size 'BAR' is in the tables already"});
}

TEST_CASE("a table without columns adds nothing") {
  CHECK(refusals_of_sections("") == Lines{"my.csv:0:0 the table is empty"});
}

}  // namespace swaymark::test
