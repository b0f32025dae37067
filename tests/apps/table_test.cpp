#include "apps/table.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

using Align = Table::Align;

TEST_CASE("words stand to the left and figures to the right of a column as wide as its widest cell") {
  Table table({{{"bar"}, Align::left}, {{"force", "[kN]"}, Align::right}});
  table.add({"legs-1", "1.25"});
  table.add({"k", "-1200.00"});
  CHECK(table.text() ==
        "             force\n"
        "  bar         [kN]\n"
        "  legs-1      1.25\n"
        "  k       -1200.00\n");
}

TEST_CASE("labels of many alphabets keep the columns of a table in line") {
  Table table({{{"label"}, Align::left}, {{"mass"}, Align::right}});
  table.add({"gallery", "1.0"});
  table.add({"gal\u00e9rie \u03a6", "22.0"});
  const auto lines = lines_of(table.text());
  REQUIRE(lines.size() == 3);
  CHECK(columns_of(lines[1]) == columns_of(lines[2]));
  CHECK(columns_of(lines[0]) == columns_of(lines[1]));
}

TEST_CASE("no line of a table ends with a blank") {
  Table table({{{"a"}, Align::left}, {{"b"}, Align::left}});
  table.add({"x", ""});
  for (const std::string& line : lines_of(table.text())) CHECK(line.back() != ' ');
}

TEST_CASE("a table without rows says that it is empty") {
  Table table({{{"a"}, Align::left}});
  CHECK(table.empty());
  table.add({"x"});
  CHECK(!table.empty());
}

TEST_CASE("running text is broken at blanks and keeps to its width") {
  const std::string words = "the quick brown fox jumps over the lazy dog again and again";
  const std::string text = wrapped(words, "  - ", 24);
  for (const std::string& line : lines_of(text)) CHECK(columns_of(line) <= 24);
  CHECK(lines_of(text).front().starts_with("  - the"));
  CHECK(lines_of(text).back().starts_with("    "));
  CHECK(on_one_line(text) == "- " + words + " ");
}

TEST_CASE("a word longer than the line stands on a line of its own whole") {
  const std::string name(60, 'n');
  const std::string text = wrapped("node " + name + " moves", "  ", 30);
  CHECK_THAT(text, Catch::Contains("  " + name + "\n"));
}

TEST_CASE("no line begins with the unit of a figure") {
  for (std::size_t width = 10; width < 40; ++width) {
    for (const std::string& line : lines_of(wrapped("from 4.46 to 6.04 Hz, 27.3 kN, 20 %", "  ", width))) {
      INFO(width << ": " << line);
      CHECK(!line.starts_with("  Hz"));
      CHECK(!line.starts_with("  kN"));
      CHECK(!line.starts_with("  %"));
    }
  }
}

TEST_CASE("a text takes one column for each character and not for each byte") {
  CHECK(columns_of("") == 0);
  CHECK(columns_of("abc") == 3);
  CHECK(columns_of("\u00e9\u03a6\u6a4b") == 3);
}

TEST_CASE("a heading follows an empty line") { CHECK(section_head("MODES") == "\nMODES\n"); }

}  // namespace swaymark::test
