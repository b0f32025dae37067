#include "core/tower_file_sections.hpp"

#include <catch2/catch.hpp>

#include "core/tower_file.hpp"
#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

Section section_of(const std::string& map) {
  return tower_of(tower_with({"sections: {bar: " + map + "}"})).sections.at(0);
}

Refusals refusals_of_section(const std::string& map) { return refusals_with("sections: {bar: " + map + "}"); }

// The small tower with one section by a size of a table of its own, read from a folder.
Tower tower_beside(const std::string& size, const std::string& table) {
  const std::string text =
      tower_with({"sections: {bar: {size: " + size + "}}", "sections_from: my_sections.csv"});
  return read_tower(text, "site/tower.yaml", [&](const std::string& path) {
    CHECK(path == "site/my_sections.csv");
    return table;
  });
}

std::string refusal_beside(const std::string& size, const std::string& table) {
  try {
    static_cast<void>(tower_beside(size, table));
  } catch (const InputError& error) {
    return error.what();
  }
  return {};
}

}  // namespace

TEST_CASE("a section by size has area and radius and perimeter from the tables") {
  const Section section = section_of("{size: L 80x80x8, curve: b}");
  CHECK(section.size == "L 80x80x8");
  // EN 10056-1 / producers' tables, from memory; within half of the last digit.
  CHECK_THAT(section.area, is_near(12.3e-4, 0.0, 0.05e-4));
  CHECK_THAT(section.radius.value(), is_near(1.56e-2, 0.0, 0.005e-2));
  CHECK_THAT(section.perimeter.value(), is_near(0.311, 0.0, 0.0005));
  CHECK(section.curve == "b");
  CHECK(section_of("{size: chs 168.3 x 6.3}").size == "CHS 168.3x6.3");
  CHECK(section_of("{size: SHS 100x5}").size == "SHS 100x100x5");
}

TEST_CASE("a tube by its dimensions is the tube by its size") {
  const Section by_tube = section_of("{tube: [168.3 mm, 6.3 mm]}");
  const Section by_size = section_of("{size: CHS 168.3x6.3}");
  CHECK_THAT(by_tube.area, is_near(by_size.area, kRoundoff));
  CHECK_THAT(by_tube.radius.value(), is_near(by_size.radius.value(), kRoundoff));
  CHECK_THAT(by_tube.perimeter.value(), is_near(by_size.perimeter.value(), kRoundoff));
  CHECK(by_tube.size.empty());
  CHECK_FALSE(section_of("{area: 10 cm2}").perimeter.has_value());
}

TEST_CASE("a pair of angles is twice the angle") {
  const Section single = section_of("{size: L 80x80x8, double: false}");
  const Section pair = section_of("{size: L 80x80x8, double: true, gap: 10 mm}");
  CHECK(pair.size == "2L 80x80x8");
  CHECK_THAT(pair.area, is_near(2.0 * single.area, kRoundoff));
  CHECK_THAT(pair.perimeter.value(), is_near(2.0 * single.perimeter.value(), kRoundoff));
  CHECK_THAT(pair.radius.value(), is_near(2.43e-2, 0.0, 0.005e-2));  // i_y of L 80x80x8; from memory
  CHECK(single.size == "L 80x80x8");
  CHECK_NOTHROW(section_of("{size: L 80x80x8, double: true, gap: 0}"));
}

TEST_CASE("an unknown size is refused where it stands") {
  CHECK(refusals_of_section("{size: L 85x85x8}") ==
        Refusals{"4:24 there is no size 'L 85x85x8' in the tables"});
  CHECK(refusals_of_section("{size: HEB 200}") ==
        Refusals{"4:24 there is no family 'HEB' of sections in the tables"});
  CHECK(refusals_of_section("{size: heavy}") == Refusals{"4:24 'heavy' is no size of a section"});
  CHECK(refusals_of_section("{size: [L, 80, 8]}") == Refusals{"4:24 'size' wants a word, got a list"});
}

TEST_CASE("a size excludes every other way to say what a section is") {
  CHECK(refusals_of_section("{size: L 80x80x8, area: 1 cm2}") ==
        Refusals{"4:12 'area' and 'size' exclude each other in section 'bar'"});
  CHECK(refusals_of_section("{size: L 80x80x8, tube: [80 mm, 5 mm]}") ==
        Refusals{"4:12 'tube' and 'size' exclude each other in section 'bar'"});
  CHECK(refusals_of_section("{area: 1 cm2, tube: [80 mm, 5 mm], size: L 80x80x8}") ==
        Refusals{"4:12 'area' and 'tube' exclude each other in section 'bar'",
                 "4:12 'area' and 'size' exclude each other in section 'bar'"});
  CHECK(refusals_of_section("{size: L 80x80x8, radius: 2 cm}") ==
        Refusals{"4:12 'radius' stands beside 'size' in section 'bar', which brings its own"});
}

TEST_CASE("only angles by size can be doubled and a pair says its gap") {
  const std::string angles_only = " 'double' is known for equal angles by size only";
  CHECK(refusals_of_section("{size: CHS 168.3x6.3, double: true, gap: 10 mm}") ==
        Refusals{"4:24" + angles_only});
  CHECK(refusals_of_section("{area: 1 cm2, double: true, gap: 10 mm}") == Refusals{"4:12" + angles_only});
  CHECK(refusals_of_section("{size: L 80x80x8, double: true}") ==
        Refusals{"4:17 'gap' is missing in section 'bar'"});
  CHECK(refusals_of_section("{size: L 80x80x8, double: true, gap: -1 mm}") ==
        Refusals{"4:54 'gap' must not be negative, got '-1 mm'"});
  CHECK(refusals_of_section("{size: L 80x80x8, double: both}") == Refusals{"4:43 'double' cannot be 'both'"});
  for (const char* single : {"{size: L 80x80x8, gap: 10 mm}", "{area: 1 cm2, gap: 10 mm}"}) {
    const Refusals refusals = refusals_of_section(single);
    REQUIRE(refusals.size() == 1);
    CHECK_THAT(refusals[0], Catch::Contains("'gap' is the gap of a pair, and this section is single"));
  }
}

TEST_CASE("sizes of a table beside the tower file are used as the built-in ones are") {
  const std::string table = "size,area [cm2],radius [cm],perimeter [m]\nU 100x50,13.5,1.47,0.372\n";
  const Tower tower = tower_beside("u100x50", table);
  CHECK(tower.sections[0].size == "U 100x50");
  CHECK_THAT(tower.sections[0].area, is_near(13.5e-4, kRoundoff));
  CHECK_THAT(tower.sections[0].radius.value(), is_near(1.47e-2, kRoundoff));
  CHECK_THAT(tower.sections[0].perimeter.value(), is_near(0.372, kRoundoff));
  CHECK(tower_beside("L 80x80x8", table).sections[0].size == "L 80x80x8");
}

TEST_CASE("an angle of a table of its own is not doubled as its dimensions are not known") {
  CHECK_THAT(refusal_beside("L 100x75x8, double: true, gap: 8 mm", "size,area [cm2]\nL 100x75x8,13.5\n"),
             Catch::Contains("'double' is known for equal angles by size only"));
}

TEST_CASE("faults of a table beside the tower file carry its own name and place and come last") {
  const std::string shown = refusal_beside("L 80x8, radius: 2 cm", "size,area [cm2]\nrod,0\n");
  CHECK_THAT(shown, Catch::StartsWith("site/tower.yaml:4:12: 'radius' stands beside 'size'") &&
                        Catch::Contains("\nsite/my_sections.csv:2:5: 'area' must be above zero"));
}

TEST_CASE("a size that a faulty table may have had is no second fault where it is used") {
  const std::vector<std::pair<std::string, std::string>> cases{
      {"rod", "size,area [cm2]\nrod,0\n"}, {"rod", "size,area [cm2]\nrod\n"}, {"rod", "size;area\nrod;1\n"}};
  for (const auto& [size, table] : cases) {
    const std::string shown = refusal_beside(size, table);
    CHECK_THAT(shown, Catch::StartsWith("site/my_sections.csv:") && !Catch::Contains("\n"));
  }
  CHECK_THAT(refusal_beside("rod", "size,area [cm2]\nbar,1\n"), Catch::StartsWith("site/tower.yaml:4:24: "));
}

TEST_CASE("a table is refused where no other file can be reached and where it is no name") {
  CHECK(
      refusals_with("sections_from: my_sections.csv") ==
      Refusals{"8:16 the file 'my_sections.csv' is out of reach here: only the tower file itself was given"});
  CHECK(refusals_with("sections_from: [a.csv, b.csv]") ==
        Refusals{"8:16 'sections_from' wants a word, got a list"});
}

TEST_CASE("a section by area may state its perimeter") {
  CHECK(section_of("{area: 10 cm2, perimeter: 400 mm}").perimeter == 0.4);
  CHECK(refusals_of_section("{area: 10 cm2, perimeter: 0}") ==
        Refusals{"4:43 'perimeter' must be above zero, got '0'"});
  CHECK(refusals_of_section("{tube: [60 mm, 5 mm], perimeter: 0.2 m}") ==
        Refusals{"4:50 'perimeter' and 'tube' exclude each other in section 'bar'"});
}

TEST_CASE("no perimeter is shorter than that of a circle of the same area") {
  // Isoperimetric inequality: p >= 2 sqrt(pi A); a circle of 112.1 mm encloses 10 cm2. Derived.
  CHECK(refusals_of_section("{area: 10 cm2, perimeter: 112.2 mm}").empty());
  CHECK(refusals_of_section("{area: 10 cm2, perimeter: 111.5 mm}") ==
        Refusals{"4:43 a perimeter of 0.1115 m cannot enclose the area: a circle of it has 0.1121 m"});
}

}  // namespace swaymark::test
