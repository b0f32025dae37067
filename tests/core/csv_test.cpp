#include "core/csv.hpp"

#include <algorithm>

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

using Lines = std::vector<std::string>;

// "line:column what" of every fault, in the order of the file.
Lines words_of(FaultList faults) {
  Lines result;
  try {
    faults.throw_if_any();
  } catch (const InputError& error) {
    for (const Fault& fault : error.faults()) {
      result.push_back(fmt::format("{}:{} {}", fault.place.line, fault.place.column, fault.message.what));
    }
  }
  return result;
}

Lines refusals_of_csv(std::string_view text) {
  FaultList faults("table.csv");
  static_cast<void>(parse_csv(text, faults));
  return words_of(faults);
}

// The cells of a table without faults, with | between them.
Lines rows_of(std::string_view text) {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv(text, faults);
  CHECK(words_of(faults).empty());
  Lines result;
  for (const auto& row : table.rows) {
    Lines cells;
    for (const CsvCell& cell : row) cells.push_back(cell.text);
    result.push_back(fmt::format("{}", fmt::join(cells, "|")));
  }
  return result;
}

}  // namespace

TEST_CASE("the first line names the columns and their units") {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv("size, area [cm2] ,\"radius [ mm ]\",perimeter[m]\n", faults);
  REQUIRE(table.columns.size() == 4);
  CHECK(table.columns[0].name == "size");
  CHECK(table.columns[0].unit.empty());
  CHECK(table.columns[1].name == "area");
  CHECK(table.columns[1].unit == "cm2");
  CHECK(table.columns[1].place.column == 7);
  CHECK(table.columns[2].name == "radius");
  CHECK(table.columns[2].unit == "mm");
  CHECK(table.columns[3].name == "perimeter");
  CHECK(table.column("radius") == std::size_t{2});
  CHECK(table.column("colour") == std::nullopt);
}

TEST_CASE("cells are told apart by commas and lose the blanks around them") {
  CHECK(rows_of("a,b,c\n1, 2 ,\t3\n") == Lines{"1|2|3"});
  CHECK(rows_of("a,b,c\n,,\n") == Lines{"||"});
  CHECK(rows_of("a,b\n1,2") == Lines{"1|2"});  // no end of line at the end
}

TEST_CASE("a quoted cell may hold commas and quotes") {
  CHECK(rows_of("a,b\n\"one, two\",\"6\"\" pipe\" \n") == Lines{"one, two|6\" pipe"});
  CHECK(rows_of("a,b\n\"\",x\n") == Lines{"|x"});
}

TEST_CASE("tables of spreadsheets are read as they are saved") {
  CHECK(rows_of("\xEF\xBB\xBF"
                "a,b\r\n1,2\r\n\"3\",4\r\n") == Lines{"1|2", "3|4"});
}

TEST_CASE("empty lines and remarks are passed over and counted") {
  CHECK(rows_of("# my table\n\na,b\n  \n1,2\n # the end\n") == Lines{"1|2"});
  CHECK(refusals_of_csv("# my table\n\na,b\n1\n") ==
        Lines{"4:1 the row has 1 cell, the first line names 2 columns"});
}

TEST_CASE("a row of the wrong length is refused and the others are read") {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv("a,b\n1\n1,2,3\n1,2\n", faults);
  CHECK(table.rows.size() == 1);
  CHECK(words_of(faults) == Lines{"2:1 the row has 1 cell, the first line names 2 columns",
                                  "3:1 the row has 3 cells, the first line names 2 columns"});
}

TEST_CASE("a decimal comma shows as a cell too many") {
  CHECK(refusals_of_csv("size,area\nbar,12,3\n") ==
        Lines{"2:1 the row has 3 cells, the first line names 2 columns"});
}

TEST_CASE("a quoted cell that does not end in its line is refused where it begins") {
  CHECK(refusals_of_csv("a,b\n1,\"two\n") ==
        Lines{"2:3 a quoted cell does not end, or goes on after its closing quote"});
  CHECK(refusals_of_csv("a,b\n\"1\"2,3\n") ==
        Lines{"2:1 a quoted cell does not end, or goes on after its closing quote"});
  CHECK(refusals_of_csv("\"a,b\n1,2\n") ==
        Lines{"1:1 a quoted cell does not end, or goes on after its closing quote"});
}

TEST_CASE("a table that is none is refused once") {
  CHECK(refusals_of_csv("") == Lines{"0:0 the table is empty"});
  CHECK(refusals_of_csv("\n# nothing\n") == Lines{"0:0 the table is empty"});
  CHECK(refusals_of_csv("a;b\n1;2\n") == Lines{"1:1 the columns are not separated by commas"});
  CHECK(refusals_of_csv("a\tb\n1\t2\n") == Lines{"1:1 the columns are not separated by commas"});
  CHECK(refusals_of_csv("a,b\n1,\xFF\n") == Lines{"2:3 a character that is not UTF-8 text"});
}

TEST_CASE("a table longer than any tower needs is refused by its length") {
  const std::size_t limit = std::size_t{64} << 20U;
  const Lines refusals = refusals_of_csv(std::string(limit + 1, '\n'));
  REQUIRE(refusals.size() == 1);
  CHECK_THAT(refusals[0], Catch::Contains("bytes"));
}

TEST_CASE("a table of more cells than fit in memory is refused where they end") {
  std::string text = std::string(99, ',') + "\n";  // a hundred columns without a name
  for (int row = 0; row < 60'001; ++row) text += std::string(99, ',') + "\n";
  FaultList faults("table.csv");
  static_cast<void>(parse_csv(text, faults));
  const Lines refusals = words_of(faults);
  CHECK(std::find(refusals.begin(), refusals.end(),
                  "60002:1 the table has more than the 6000000 cells that it may have") != refusals.end());
}

TEST_CASE("a column named twice is refused") {
  CHECK(refusals_of_csv("a,b,a [mm]\n1,2,3\n") ==
        Lines{"1:5 the column 'a' is named twice, first in line 1"});
}

TEST_CASE("the place of a cell counts characters") {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv("a,b\n\xC3\xA4\xC3\xB6,2\n", faults);
  REQUIRE(table.rows.size() == 1);
  CHECK(table.rows[0][1].place.line == 2);
  CHECK(table.rows[0][1].place.column == 4);
}

TEST_CASE("a cell takes the unit of its column or carries its own") {
  FaultList faults("table.csv");
  const auto value = [&](const std::string& unit, const std::string& text) {
    return read_cell({"area", unit, {1, 1}}, {text, {2, 5}}, Quantity::area, Range::positive, faults);
  };
  CHECK_THAT(value("cm2", "12.3").value(), is_near(12.3e-4, kRoundoff));
  CHECK_THAT(value("", "12.3 cm2").value(), is_near(12.3e-4, kRoundoff));
  CHECK_THAT(value("", "0.5").value(), is_near(0.5, kRoundoff));
  CHECK(words_of(faults).empty());
  CHECK_FALSE(value("cm2", "12.3 cm2"));
  CHECK_FALSE(value("cm2", ""));
  CHECK_FALSE(value("cm2", "-1"));
  CHECK(words_of(faults) == Lines{"2:5 'area' wants a plain number, got '12.3 cm2'",
                                  "2:5 'area' wants a plain number, got ''",
                                  "2:5 'area' must be above zero, got '-1 cm2'"});
}

}  // namespace swaymark::test
