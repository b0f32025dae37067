#include "core/quantity.hpp"

#include <clocale>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// Exact by definition; conversions of NIST SP 811, appendix B (from memory).
constexpr double kInch = 0.0254;
constexpr double kPound = 0.45359237;
constexpr double kPoundForce = 4.4482216152605;

struct Reading {
  std::string_view text;
  Quantity quantity;
  double si;
};

double value_of(std::string_view text, Quantity quantity) {
  const auto reading = read_quantity(text, quantity);
  INFO(text << ": " << (reading.index() == 1 ? std::get<Message>(reading).what : ""));
  REQUIRE(std::holds_alternative<double>(reading));
  return std::get<double>(reading);
}

// What the text is refused with, cure included; empty if it is read.
std::string refusal_of(std::string_view text, Quantity quantity) {
  const auto reading = read_quantity(text, quantity);
  const auto* message = std::get_if<Message>(&reading);
  return message == nullptr ? "" : message->what + "; " + message->cure;
}

constexpr std::array kAllQuantities{Quantity::length,          Quantity::area,     Quantity::mass,
                                    Quantity::mass_per_length, Quantity::density,  Quantity::stress,
                                    Quantity::stiffness,       Quantity::time,     Quantity::frequency,
                                    Quantity::acceleration,    Quantity::fraction, Quantity::force,
                                    Quantity::velocity};

}  // namespace

TEST_CASE("every unit a tower is written in has its exact value") {
  constexpr double turn = 2.0 * 3.14159265358979323846;
  const std::vector<Reading> readings{
      {"4 m", Quantity::length, 4.0},
      {"19.5 mm", Quantity::length, 19.5e-3},
      {"5 cm", Quantity::length, 0.05},
      {"2 m2", Quantity::area, 2.0},
      {"19.2 cm2", Quantity::area, 19.2e-4},
      {"691 mm2", Quantity::area, 691e-6},
      {"120 kg", Quantity::mass, 120.0},
      {"1.5 t", Quantity::mass, 1500.0},
      {"250 g", Quantity::mass, 0.25},
      {"12 kg/m", Quantity::mass_per_length, 12.0},
      {"7850 kg/m3", Quantity::density, 7850.0},
      {"7.85 t/m3", Quantity::density, 7850.0},
      {"210 GPa", Quantity::stress, 210e9},
      {"355 MPa", Quantity::stress, 355e6},
      {"100 kPa", Quantity::stress, 1e5},
      {"3 Pa", Quantity::stress, 3.0},
      {"3 N/m2", Quantity::stress, 3.0},
      {"355 N/mm2", Quantity::stress, 355e6},
      {"210 kN/mm2", Quantity::stress, 210e9},
      {"50 MN/m", Quantity::stiffness, 50e6},
      {"50 kN/m", Quantity::stiffness, 50e3},
      {"2 GN/m", Quantity::stiffness, 2e9},
      {"7 N/m", Quantity::stiffness, 7.0},
      {"7 N/mm", Quantity::stiffness, 7e3},
      {"7 kN/mm", Quantity::stiffness, 7e6},
      {"0.15 s", Quantity::time, 0.15},
      {"150 ms", Quantity::time, 0.15},
      {"0.8 Hz", Quantity::frequency, 0.8},
      {"800 mHz", Quantity::frequency, 0.8},
      {"2 kHz", Quantity::frequency, 2e3},
      {"3 1/s", Quantity::frequency, 3.0},
      {"1450 rpm", Quantity::frequency, 1450.0 / 60.0},
      {"90 1/min", Quantity::frequency, 1.5},
      {"10 rad/s", Quantity::frequency, 10.0 / turn},
      {"0.25 g", Quantity::acceleration, 0.25 * 9.80665},
      {"2.5 m/s2", Quantity::acceleration, 2.5},
      {"250 cm/s2", Quantity::acceleration, 2.5},
      {"2500 mm/s2", Quantity::acceleration, 2.5},
      {"2 %", Quantity::fraction, 0.02},
      {"0.02 1", Quantity::fraction, 0.02},
      {"3 N", Quantity::force, 3.0},
      {"3 kN", Quantity::force, 3e3},
      {"3 MN", Quantity::force, 3e6},
      {"30 m/s", Quantity::velocity, 30.0},
  };
  for (const Reading& reading : readings) {
    INFO(reading.text);
    CHECK_THAT(value_of(reading.text, reading.quantity), is_near(reading.si, kRoundoff));
  }
}

TEST_CASE("units of the trade elsewhere have the values of their definitions") {
  const double foot = 12.0 * kInch;
  const std::vector<Reading> readings{
      {"12 in", Quantity::length, foot},
      {"10 ft", Quantity::length, 10.0 * foot},
      {"1 yd", Quantity::length, 3.0 * foot},
      {"3 in2", Quantity::area, 3.0 * kInch * kInch},
      {"3 in^2", Quantity::area, 3.0 * kInch * kInch},
      {"2 ft2", Quantity::area, 2.0 * foot * foot},
      {"150 lb", Quantity::mass, 150.0 * kPound},
      {"6 lb/ft", Quantity::mass_per_length, 6.0 * kPound / foot},
      {"490 lb/ft3", Quantity::density, 490.0 * kPound / (foot * foot * foot)},
      {"7.85 g/cm3", Quantity::density, 7850.0},
      {"36000 psi", Quantity::stress, 36000.0 * kPoundForce / (kInch * kInch)},
      {"12 kip/in", Quantity::stiffness, 12000.0 * kPoundForce / kInch},
      {"12 kip/ft", Quantity::stiffness, 12000.0 * kPoundForce / foot},
      {"5 lbf/in", Quantity::stiffness, 5.0 * kPoundForce / kInch},
      {"2 min", Quantity::time, 120.0},
      {"32 ft/s2", Quantity::acceleration, 32.0 * foot},
      {"12 kip", Quantity::force, 12000.0 * kPoundForce},
      {"36 km/h", Quantity::velocity, 10.0},
  };
  for (const Reading& reading : readings) {
    INFO(reading.text);
    CHECK_THAT(value_of(reading.text, reading.quantity), is_near(reading.si, kRoundoff));
  }
}

TEST_CASE("a bare number is SI for every quantity") {
  for (const Quantity quantity : kAllQuantities) {
    CHECK(value_of("12.5", quantity) == 12.5);
    CHECK(value_of("-1.25e-3", quantity) == -1.25e-3);
  }
}

TEST_CASE("blanks and signs around a number do not change it") {
  for (const std::string_view text :
       {"12kg", "12 kg", "12    kg", "  12\tkg ", "+12 kg", "12. kg", "1.2e1 kg", "1.2E+1 kg"}) {
    INFO(text);
    CHECK(value_of(text, Quantity::mass) == 12.0);
  }
  CHECK(value_of(".5 m", Quantity::length) == 0.5);
  CHECK(value_of("-.5 m", Quantity::length) == -0.5);
  CHECK(value_of("-0", Quantity::length) == 0.0);
}

TEST_CASE("g is gravity where an acceleration is wanted and a gram where a mass is") {
  CHECK(value_of("1 g", Quantity::acceleration) == 9.80665);
  CHECK_THAT(value_of("1 g", Quantity::mass), is_near(1e-3, kRoundoff));
  CHECK_THAT(refusal_of("1 g", Quantity::length), Catch::Contains("a length was wanted"));
}

TEST_CASE("a key that wants a mass never takes a force") {
  for (const std::string_view text : {"12 kip", "5 kN", "5 N", "9.81 lbf", "100 kgf"}) {
    const std::string refusal = refusal_of(text, Quantity::mass);
    INFO(text << ": " << refusal);
    CHECK_THAT(refusal, Catch::Contains("a mass was wanted"));
    CHECK_THAT(refusal, Catch::Contains("which is a force"));
    CHECK_THAT(refusal, Catch::Contains("divide by 9.80665 m/s2"));
  }
}

TEST_CASE("every quantity refuses the units of every other and names both") {
  const std::vector<std::pair<std::string_view, std::string_view>> units{
      {"1 m", "a length"},       {"1 m2", "an area"},
      {"1 kg", "a mass"},        {"1 kg/m", "a mass per length"},
      {"1 kg/m3", "a density"},  {"1 MPa", "a stress"},
      {"1 kN/m", "a stiffness"}, {"1 s", "a time"},
      {"1 Hz", "a frequency"},   {"1 m/s2", "an acceleration"},
      {"1 %", "a fraction"},     {"1 kN", "a force"},
      {"1 m/s", "a velocity"}};
  REQUIRE(units.size() == kAllQuantities.size());
  for (std::size_t wanted = 0; wanted < units.size(); ++wanted) {
    for (std::size_t came = 0; came < units.size(); ++came) {
      const std::string refusal = refusal_of(units[came].first, kAllQuantities[wanted]);
      INFO(units[came].first << " as " << name_of(kAllQuantities[wanted]) << ": " << refusal);
      if (wanted == came) {
        CHECK(refusal.empty());
      } else {
        CHECK_THAT(refusal, Catch::Contains(std::string(name_of(kAllQuantities[wanted])) + " was wanted"));
        CHECK_THAT(refusal, Catch::Contains("which is " + std::string(units[came].second)));
      }
    }
  }
}

TEST_CASE("a unit of the database with the wrong dimension is named by what it measures") {
  CHECK_THAT(refusal_of("3 ft", Quantity::mass), Catch::Contains("which is a length"));
  CHECK_THAT(refusal_of("12 kip/in", Quantity::stress), Catch::Contains("which is a stiffness"));
  CHECK_THAT(refusal_of("3 K", Quantity::mass), Catch::Contains("which is something else"));
}

TEST_CASE("a period is no frequency and a frequency no period") {
  CHECK_THAT(refusal_of("2 s", Quantity::frequency), Catch::Contains("which is a time"));
  CHECK_THAT(refusal_of("2 min", Quantity::frequency), Catch::Contains("which is a time"));
  CHECK_THAT(refusal_of("2 Hz", Quantity::time), Catch::Contains("which is a frequency"));
}

TEST_CASE("what is no finite number is refused") {
  for (const Quantity quantity : kAllQuantities) {
    for (const std::string_view text : {"",      "  ",     "nan",    "NaN", "inf",       "-inf",  "infinity",
                                        "1e999", "-1e999", "1e-999", "kg",  "twelve kg", "--5 m", "+-5 m",
                                        "-+5 m", "- 5 m",  ".",      "-",   "+",         "e5",    "%"}) {
      INFO("'" << text << "' as " << name_of(quantity));
      CHECK_THAT(refusal_of(text, quantity), Catch::Contains("no finite number"));
    }
  }
}

TEST_CASE("a number that its unit takes out of range is refused") {
  CHECK_THAT(refusal_of("1e300 GPa", Quantity::stress), Catch::Contains("too large or too small"));
  CHECK_THAT(refusal_of("1e-320 mm2", Quantity::area), Catch::Contains("too large or too small"));
  CHECK_THAT(refusal_of("1e308 ft", Quantity::length), !Catch::Contains("database"));
}

TEST_CASE("a decimal comma is pointed out") {
  for (const std::string_view text : {"3,5 m", "1,200 kg", "3,5", "1,5e3 mm"}) {
    CHECK_THAT(refusal_of(text, Quantity::length), Catch::Contains("comma"));
  }
}

TEST_CASE("numbers in other notations are refused and never read in part") {
  for (const std::string_view text :
       {"0x10", "0x10 m", "1_000 m", "1 000 m", "12 5 m", "1.2.3 m", "1/2 m", "5 (m)", "5 m + 2 m", "5 2*m",
        "3 m 2", "1e5.5 m", "1'000 m", "5 m;", "5 @", "5 m\n"}) {
    INFO(text);
    CHECK(!refusal_of(text, Quantity::length).empty());
  }
}

TEST_CASE("units that do not exist are refused with those that do") {
  CHECK_THAT(refusal_of("5 meterz", Quantity::length),
             Catch::Contains("'meterz' is no unit for a length; use m, cm or mm"));
  CHECK_THAT(refusal_of("5 RPM", Quantity::frequency), Catch::Contains("use Hz or rpm"));
  CHECK_THAT(refusal_of("5 " + std::string(500, 'm'), Quantity::length), Catch::Contains("is no unit"));
}

TEST_CASE("frequencies and fractions take their own units only") {
  // A general units database counts a turn as 2 pi, and degrees as fractions.
  CHECK_THAT(refusal_of("5 degree/s", Quantity::frequency), Catch::Contains("no unit for a frequency"));
  CHECK_THAT(refusal_of("5 degree", Quantity::fraction), Catch::Contains("no unit for a fraction"));
  CHECK_THAT(refusal_of("5 percent", Quantity::fraction), Catch::Contains("no unit for a fraction"));
}

TEST_CASE("a unit with an offset is refused wherever it stands") {
  for (const Quantity quantity : kAllQuantities) CHECK(!refusal_of("20 degC", quantity).empty());
}

TEST_CASE("reading does not depend on the locale") {
  const std::string before = std::setlocale(LC_ALL, nullptr);
  const char* comma = nullptr;
  for (const char* name :
       {"de_DE.UTF-8", "de_DE.utf8", "fr_FR.UTF-8", "fr_FR.utf8", "nl_NL.UTF-8", "it_IT.UTF-8"}) {
    if (comma == nullptr) comma = std::setlocale(LC_ALL, name);
  }
  if (comma == nullptr) {
    WARN("skipped: no locale with a decimal comma is installed");
    return;
  }
  const auto known = read_quantity("1.5 kg", Quantity::mass);
  const auto looked_up = read_quantity("2.5 lb", Quantity::mass);
  std::setlocale(LC_ALL, before.c_str());
  REQUIRE(std::holds_alternative<double>(known));
  REQUIRE(std::holds_alternative<double>(looked_up));
  CHECK(std::get<double>(known) == 1.5);
  CHECK_THAT(std::get<double>(looked_up), is_near(2.5 * kPound, kRoundoff));
}

TEST_CASE("a plain number stands alone") {
  CHECK(read_number("12") == 12.0);
  CHECK(read_number(" -1.5e3 ") == -1500.0);
  for (const std::string_view text : {"", "12 kg", "12,5", "0x1", "nan", "inf", "1e999", "twelve"}) {
    CHECK(read_number(text) == std::nullopt);
  }
}

TEST_CASE("every quantity has a name and an SI unit that is read as one") {
  for (const Quantity quantity : kAllQuantities) {
    CHECK_THAT(std::string(name_of(quantity)), Catch::StartsWith("a"));
    CHECK(value_of("3 " + std::string(si_unit_of(quantity)), quantity) == 3.0);
  }
}

TEST_CASE("typed exponents are read as digits") {
  CHECK_THAT(value_of("19.2 cm\u00b2", Quantity::area), is_near(19.2e-4, kRoundoff));
  CHECK_THAT(value_of("7850 kg/m\u00b3", Quantity::density), is_near(7850.0, kRoundoff));
}

TEST_CASE("a ton is refused because it means different masses") {
  CHECK_THAT(refusal_of("1.6 ton", Quantity::mass), Catch::Contains("t (1000 kg)"));
  CHECK_THAT(value_of("2 short_ton", Quantity::mass), is_near(4000.0 * kPound, kRoundoff));
}

TEST_CASE("a weight per length is told from a mass per length with its cure") {
  CHECK_THAT(refusal_of("0.35 kN/m", Quantity::mass_per_length), Catch::Contains("divide by 9.80665"));
}

}  // namespace swaymark::test
