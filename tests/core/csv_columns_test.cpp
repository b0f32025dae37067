#include "core/csv_columns.hpp"

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

const TableForm kForm{"a table of weights",
                      "name,mass [kg],length [m]",
                      {{"name", {}}, {"mass", Quantity::mass}, {"length", Quantity::length, false}}};

std::vector<std::string> words_of(FaultList faults) {
  std::vector<std::string> result;
  try {
    faults.throw_if_any();
  } catch (const InputError& error) {
    for (const Fault& fault : error.faults())
      result.push_back(fmt::format("{}:{} {}", fault.place.line, fault.place.column, fault.message.what));
  }
  return result;
}

std::vector<std::string> refusals_of_header(const std::string& text) {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv(text, faults);
  const bool usable = check_columns(table, kForm, faults);
  CHECK(usable == faults.empty());
  return words_of(faults);
}

using Lines = std::vector<std::string>;

}  // namespace

TEST_CASE("a header with all that a form needs is accepted in any order") {
  CHECK(refusals_of_header("mass [t],name\n1,a\n").empty());
  CHECK(refusals_of_header("length [mm],mass,name\n1,2,a\n").empty());
}

TEST_CASE("each fault of a header is told once at its column") {
  CHECK(refusals_of_header("name,mass [kg],colour\n") ==
        Lines{"1:16 unknown key 'colour' in a table of weights"});
  CHECK(refusals_of_header("# weights\nname,length [m]\n") ==
        Lines{"2:1 'mass' is missing in a table of weights"});
  CHECK(refusals_of_header("name [kg],mass [kg]\n") ==
        Lines{"1:1 the column 'name' holds words, which have no unit"});
  const Lines wrong = refusals_of_header("name,mass [kN],length [h]\n");
  REQUIRE(wrong.size() == 2);
  CHECK_THAT(wrong[0], Catch::StartsWith("1:6 ") && Catch::Contains("a force"));
  CHECK_THAT(wrong[1], Catch::StartsWith("1:16 "));
}

TEST_CASE("a value takes the unit of its column whatever way it is read") {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv("name,mass [t],length\na,-2.5,3\nb,1e2,4 ft\nc,,\n", faults);
  REQUIRE(check_columns(table, kForm, faults));
  const ValueColumn any(table, "mass", Quantity::mass, Range::any);
  const ValueColumn positive(table, "mass", Quantity::mass, Range::positive);
  const ValueColumn length(table, "length", Quantity::length, Range::any);
  CHECK_THAT(any.in(table.rows[0], faults).value(), is_near(-2500.0, kRoundoff));
  CHECK_THAT(any.in(table.rows[1], faults).value(), is_near(1e5, kRoundoff));
  CHECK_THAT(positive.in(table.rows[1], faults).value(), is_near(1e5, kRoundoff));
  CHECK_THAT(length.in(table.rows[0], faults).value(), is_near(3.0, kRoundoff));
  CHECK_THAT(length.in(table.rows[1], faults).value(),
             is_near(4.0 * 0.3048, kRoundoff));  // ft: by definition
  CHECK_FALSE(any.in_or_empty(table.rows[2], faults));
  CHECK(faults.empty());
  CHECK_FALSE(any.in(table.rows[2], faults));
  CHECK_FALSE(positive.in(table.rows[0], faults));
  CHECK(words_of(faults) ==
        Lines{"2:3 'mass' must be above zero, got '-2.5 t'", "4:3 'mass' wants a plain number, got ''"});
}

TEST_CASE("a value beyond the range of numbers is refused") {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv("name,mass [t]\na,1e308\n", faults);
  CHECK_FALSE(ValueColumn(table, "mass", Quantity::mass, Range::any).in(table.rows[0], faults));
  CHECK(faults.size() == 1);
}

TEST_CASE("a column that the table lacks has no values") {
  FaultList faults("table.csv");
  const CsvTable table = parse_csv("name,mass\na,1\n", faults);
  const ValueColumn length(table, "length", Quantity::length, Range::any);
  CHECK_FALSE(length.in(table.rows[0], faults));
  CHECK_FALSE(length.place_in(table.rows[0]).known());
  CHECK(faults.empty());
  CHECK(WordColumn(table, "name").in(table.rows[0]).text == "a");
}

}  // namespace swaymark::test
