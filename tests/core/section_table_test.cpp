#include "core/section_table.hpp"

#include <algorithm>

#include <catch2/catch.hpp>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

std::string found(const SectionTable& table, std::string_view size) {
  const SectionSize* known = table.find(size);
  return known != nullptr ? known->name : "none";
}

std::size_t sizes_of_family(const SectionTable& table, std::string_view family) {
  const auto& sizes = table.sizes();
  return static_cast<std::size_t>(std::count_if(sizes.begin(), sizes.end(), [&](const SectionSize& size) {
    return designation_of(size.name).value().family == family;
  }));
}

}  // namespace

TEST_CASE("the tables hold angles from 40x40x4 to 250x250x28 and hollow sections of both kinds") {
  const SectionTable table = SectionTable::built_in();
  CHECK(sizes_of_family(table, "L") >= 30);
  CHECK(sizes_of_family(table, "CHS") + sizes_of_family(table, "SHS") >= 60);
  for (const char* size : {"L 40x40x4", "L 45x45x4.5", "L 50x50x5", "L 60x60x6", "L 70x70x7", "L 80x80x8",
                           "L 90x90x8", "L 100x100x10", "L 120x120x10", "L 150x150x12", "L 150x150x15",
                           "L 250x250x28", "CHS 88.9x5", "CHS 168.3x6.3", "SHS 100x100x5"}) {
    CHECK(found(table, size) == size);
  }
}

TEST_CASE("every size of the tables can be made and is named by its dimensions") {
  const SectionTable table = SectionTable::built_in();
  for (const SectionSize& size : table.sizes()) {
    INFO(size.name);
    const Designation designation = designation_of(size.name).value();
    const double width = designation.numbers.front() * 1e-3;
    const double wall = designation.numbers.back() * 1e-3;
    CHECK(wall <= 0.25 * width);
    REQUIRE(size.radius.has_value());
    REQUIRE(size.perimeter.has_value());
    CHECK(size.area > 0.0);
    CHECK(*size.radius > 0.1 * width);
    CHECK(*size.radius < 0.5 * width);
    CHECK(*size.perimeter <= 4.0 * width);
    CHECK(size.angle.has_value() == (designation.family == "L"));
    if (!size.angle) continue;
    // The rounded toe must fit the leg, and so must the root.
    CHECK(size.angle->toe <= size.angle->thickness);
    CHECK(size.angle->root + size.angle->toe <= size.angle->leg - size.angle->thickness);
    CHECK_THAT(size.angle->toe, is_near(0.5 * size.angle->root, kRoundoff));
  }
}

TEST_CASE("among walls of one width the area rises and the radius of gyration falls") {
  const SectionTable table = SectionTable::built_in();
  const auto& sizes = table.sizes();
  for (std::size_t i = 1; i < sizes.size(); ++i) {
    const Designation before = designation_of(sizes[i - 1].name).value();
    const Designation here = designation_of(sizes[i].name).value();
    if (before.family != here.family || before.numbers.front() != here.numbers.front()) continue;
    INFO(sizes[i - 1].name << " and " << sizes[i].name);
    CHECK(sizes[i].area > sizes[i - 1].area);
    CHECK(sizes[i].radius.value() < sizes[i - 1].radius.value());
  }
}

TEST_CASE("a size of the table has the properties of its dimensions") {
  const SectionTable table = SectionTable::built_in();
  const SectionSize& angle = *table.find("L 80x80x8");
  const SectionProperties expected = single_angle({0.08, 0.008, 0.010, 0.005});  // r1 10 mm, from memory
  CHECK_THAT(angle.area, is_near(expected.area, kRoundoff));
  CHECK_THAT(angle.radius.value(), is_near(expected.radius, kRoundoff));
  CHECK_THAT(angle.perimeter.value(), is_near(expected.perimeter, kRoundoff));
  CHECK_THAT(table.find("CHS 168.3x6.3")->area, is_near(circular_hollow(0.1683, 0.0063).area, kRoundoff));
  CHECK_THAT(table.find("SHS 100x100x5")->area, is_near(square_hollow(0.1, 0.005).area, kRoundoff));
}

TEST_CASE("a size is found however it is written") {
  const SectionTable table = SectionTable::built_in();
  for (const char* written : {"L 80x80x8", "L80x80x8", "l 80 x 80 x 8", "L 80X80X8",
                              "L 80\xC3\x97"
                              "80\xC3\x97"
                              "8",
                              "L 80x8", "L80x8.0", "\tL 080x80x8 "}) {
    INFO(written);
    CHECK(found(table, written) == "L 80x80x8");
  }
  CHECK(found(table, "chs168.30x6.3") == "CHS 168.3x6.3");
  CHECK(found(table, "SHS 100x5") == "SHS 100x100x5");
}

TEST_CASE("what is no size of the table is not found") {
  const SectionTable table = SectionTable::built_in();
  for (const char* written : {"", "L", "80x80x8", "L 80", "L 80x80x8 mm", "L 80x80x8x8", "L 80,8", "L -80x8",
                              "L 80xx8", "L 80x8x", "L 1e2x10", "CHS infxnan", "CHS 168.3x0", "L 100x80x8"}) {
    INFO(written);
    CHECK(found(table, written) == "none");
  }
}

TEST_CASE("a size is letters and then numbers") {
  const Designation tube = designation_of("chs 168.3x6.3").value();
  CHECK(tube.family == "CHS");
  CHECK(tube.numbers == std::vector<double>{168.3, 6.3});
  CHECK(designation_of("L80x8").value().numbers == std::vector<double>{80.0, 80.0, 8.0});
  CHECK(designation_of("CHS 80x8").value().numbers == std::vector<double>{80.0, 8.0});
  CHECK_FALSE(designation_of("80x8"));
  CHECK_FALSE(designation_of("leg"));
  CHECK_FALSE(designation_of("L 8..0x8"));
  CHECK_FALSE(designation_of("L " + std::string(1000, '8')));  // longer than any name of a size
}

TEST_CASE("an unknown size is answered by the nearest of its family") {
  const SectionTable table = SectionTable::built_in();
  const auto cure = [&](std::string_view size) { return table.unknown(size).cure; };
  // By ratio: 90/85 is less than 85/80.
  CHECK_THAT(cure("L 85x85x8"), Catch::StartsWith("nearest: L 90x90x8, L 80x80x8 or L 90x90x9;"));
  CHECK_THAT(cure("L 250x250x30"), Catch::StartsWith("nearest: L 250x250x28, L 250x250x35 or "));
  CHECK_THAT(cure("CHS 168x6.3"), Catch::StartsWith("nearest: CHS 168.3x6.3, "));
  CHECK_THAT(cure("CHS 168.3"), Catch::StartsWith("nearest: CHS 168.3x4, CHS 168.3x5 or CHS 168.3x6;"));
  CHECK_THAT(cure("shs 99x99x5"), Catch::StartsWith("nearest: SHS 100x100x5, "));
  CHECK(table.unknown("L 85x85x8").what == "there is no size 'L 85x85x8' in the tables");
}

TEST_CASE("an unknown family is answered by the families") {
  const Message message = SectionTable::built_in().unknown("HEB 200");
  CHECK(message.what == "there is no family 'HEB' of sections in the tables");
  CHECK_THAT(message.cure, Catch::StartsWith("known: L, CHS or SHS;"));
}

TEST_CASE("what is written like no size is answered by how sizes are written") {
  const Message message = SectionTable::built_in().unknown("big angle");
  CHECK(message.what == "'big angle' is no size of a section");
  CHECK_THAT(message.cure, Catch::Contains("L 80x80x8"));
}

TEST_CASE("an added size is found beside the others and one name never means two") {
  SectionTable table = SectionTable::built_in();
  const std::size_t count = table.sizes().size();
  CHECK(table.add({"HEA 100", 21.2e-4, 2.51e-2, std::nullopt, std::nullopt}));
  CHECK(table.add({"old leg", 10e-4, std::nullopt, std::nullopt, std::nullopt}));
  CHECK_FALSE(table.add({"l80 x 8", 1e-4, std::nullopt, std::nullopt, std::nullopt}));
  CHECK_FALSE(table.add({"OLD LEG", 1e-4, std::nullopt, std::nullopt, std::nullopt}));
  CHECK(table.sizes().size() == count + 2);
  CHECK(found(table, "hea100") == "HEA 100");
  CHECK(found(table, "Old  Leg") == "old leg");
  CHECK(table.find("L 80x80x8")->area > 1e-3);
  CHECK_THAT(table.unknown("HEA 120").cure, Catch::StartsWith("nearest: HEA 100;"));
  CHECK_THAT(table.unknown("old legg").cure, Catch::StartsWith("nearest: old leg;"));
  CHECK_THAT(table.unknown("HEB 200").cure, Catch::StartsWith("known: L, CHS, SHS or HEA;"));
}

}  // namespace swaymark::test
