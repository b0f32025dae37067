#include "core/quantity.hpp"

#include <array>
#include <charconv>
#include <cmath>
#include <numbers>

#include "core/text.hpp"
#include "core/unit_library.hpp"
#include "core/wording.hpp"

namespace swaymark {

namespace {

struct QuantityRow {
  Quantity quantity;
  std::string_view name;
  std::string_view si_unit;
  std::string_view examples;
};

constexpr std::array<QuantityRow, 13> kQuantities{{
    {Quantity::length, "a length", "m", "m, cm or mm"},
    {Quantity::area, "an area", "m2", "m2, cm2 or mm2"},
    {Quantity::mass, "a mass", "kg", "kg or t"},
    {Quantity::mass_per_length, "a mass per length", "kg/m", "kg/m"},
    {Quantity::density, "a density", "kg/m3", "kg/m3 or t/m3"},
    {Quantity::stress, "a stress or modulus", "Pa", "Pa, MPa, GPa or N/mm2"},
    {Quantity::stiffness, "a stiffness", "N/m", "N/m, kN/m, MN/m or kN/mm"},
    {Quantity::time, "a time", "s", "s or ms"},
    {Quantity::frequency, "a frequency", "Hz", "Hz or rpm"},
    {Quantity::acceleration, "an acceleration", "m/s2", "m/s2 or g"},
    {Quantity::fraction, "a fraction", "1", "% or a bare number"},
    {Quantity::force, "a force", "N", "N or kN"},
    {Quantity::velocity, "a velocity", "m/s", "m/s"},
}};

const QuantityRow& row_of(Quantity quantity) {
  for (const QuantityRow& row : kQuantities) {
    if (row.quantity == quantity) return row;
  }
  return kQuantities.front();
}

struct UnitRow {
  std::string_view unit;
  Quantity quantity;
  double to_si;
};

// The units that towers are written in. Frequencies and fractions are complete here: in a general units
// database a turn is 2 pi, so that "rpm" and "rad/s" would not become cycles per second.
constexpr std::array<UnitRow, 44> kUnits{{
    {"m", Quantity::length, 1.0},
    {"cm", Quantity::length, 1e-2},
    {"mm", Quantity::length, 1e-3},
    {"m2", Quantity::area, 1.0},
    {"cm2", Quantity::area, 1e-4},
    {"mm2", Quantity::area, 1e-6},
    {"kg", Quantity::mass, 1.0},
    {"t", Quantity::mass, 1e3},
    {"g", Quantity::acceleration, kStandardGravity},
    {"g", Quantity::mass, 1e-3},
    {"kg/m", Quantity::mass_per_length, 1.0},
    {"kg/m3", Quantity::density, 1.0},
    {"t/m3", Quantity::density, 1e3},
    {"Pa", Quantity::stress, 1.0},
    {"kPa", Quantity::stress, 1e3},
    {"MPa", Quantity::stress, 1e6},
    {"GPa", Quantity::stress, 1e9},
    {"N/m2", Quantity::stress, 1.0},
    {"N/mm2", Quantity::stress, 1e6},
    {"kN/mm2", Quantity::stress, 1e9},
    {"N/m", Quantity::stiffness, 1.0},
    {"kN/m", Quantity::stiffness, 1e3},
    {"MN/m", Quantity::stiffness, 1e6},
    {"GN/m", Quantity::stiffness, 1e9},
    {"N/mm", Quantity::stiffness, 1e3},
    {"kN/mm", Quantity::stiffness, 1e6},
    {"s", Quantity::time, 1.0},
    {"ms", Quantity::time, 1e-3},
    {"Hz", Quantity::frequency, 1.0},
    {"mHz", Quantity::frequency, 1e-3},
    {"kHz", Quantity::frequency, 1e3},
    {"1/s", Quantity::frequency, 1.0},
    {"rpm", Quantity::frequency, 1.0 / 60.0},
    {"1/min", Quantity::frequency, 1.0 / 60.0},
    {"rad/s", Quantity::frequency, 0.5 / std::numbers::pi},
    {"m/s2", Quantity::acceleration, 1.0},
    {"cm/s2", Quantity::acceleration, 1e-2},
    {"mm/s2", Quantity::acceleration, 1e-3},
    {"%", Quantity::fraction, 1e-2},
    {"1", Quantity::fraction, 1.0},
    {"N", Quantity::force, 1.0},
    {"kN", Quantity::force, 1e3},
    {"MN", Quantity::force, 1e6},
    {"m/s", Quantity::velocity, 1.0},
}};

std::string_view trimmed(std::string_view text) {
  const std::string_view blanks = " \t";
  const std::size_t first = text.find_first_not_of(blanks);
  if (first == std::string_view::npos) return {};
  return text.substr(first, text.find_last_not_of(blanks) - first + 1);
}

struct Parts {
  double number = 0.0;
  std::string unit;
};

// Typed exponents as digits: cm² is cm2.
std::string plain_exponents(std::string_view unit) {
  std::string plain;
  for (std::size_t i = 0; i < unit.size(); ++i) {
    const std::string_view here = unit.substr(i, 2);
    if (here == "\u00b2" || here == "\u00b3") {
      plain += here == "\u00b2" ? '2' : '3';
      ++i;
    } else {
      plain += unit[i];
    }
  }
  return plain;
}

std::optional<Parts> split(std::string_view text) {
  std::string_view body = trimmed(text);
  const bool has_sign = body.starts_with('+') || body.starts_with('-');
  const std::string_view digits = has_sign ? body.substr(1) : body;
  if (body.starts_with('+')) body = digits;  // from_chars knows no plus sign
  // from_chars also reads "inf" and "nan", which no tower contains.
  const bool starts_like_number =
      !digits.empty() && (std::isdigit(static_cast<unsigned char>(digits[0])) != 0 || digits[0] == '.');
  if (!starts_like_number) return std::nullopt;
  Parts parts;
  const auto [end, error] = std::from_chars(body.data(), body.data() + body.size(), parts.number);
  if (error != std::errc{} || !std::isfinite(parts.number)) return std::nullopt;
  parts.unit = plain_exponents(trimmed(body.substr(static_cast<std::size_t>(end - body.data()))));
  return parts;
}

// A letter, then letters, digits as exponents, and the signs of products and quotients: numbers inside a unit
// ("12 5 kg") would otherwise scale the value in silence.
bool plausible_unit(std::string_view unit) {
  constexpr std::size_t longest = 40;
  if (unit.size() > longest) return false;
  const auto letter = [](char c) { return std::isalpha(static_cast<unsigned char>(c)) != 0 || c == '_'; };
  const auto digit = [](char c) { return std::isdigit(static_cast<unsigned char>(c)) != 0; };
  char before = ' ';
  for (const char c : unit) {
    const bool exponent = digit(c) && (letter(before) || digit(before) || before == '^' || before == '-');
    const bool sign = c == '-' && (letter(before) || before == '^');
    const bool joint = (c == '/' || c == '*' || c == '^' || c == '.' || c == ' ') && before != ' ';
    if (!letter(c) && !exponent && !sign && !joint) return false;
    before = c;
  }
  return !unit.empty() && letter(unit.front()) && (letter(before) || digit(before));
}

// The words of the database for the SI units, which it writes with plain exponents.
std::string_view came_as(std::string_view unit) {
  for (const QuantityRow& row : kQuantities) {
    if (row.quantity == Quantity::fraction) continue;
    const auto found = unit_library::factor_to(unit, row.si_unit);
    if (found.outcome == unit_library::Outcome::converted) return row.name;
  }
  return {};
}

std::variant<double, Message> in_si(double number, double to_si, std::string_view text) {
  const double value = number * to_si;
  if (!std::isfinite(value) || (value == 0.0 && number != 0.0)) return wording::number_out_of_range(text);
  return value;
}

std::variant<double, Message> from_library(const Parts& parts, std::string_view text, Quantity wanted) {
  const QuantityRow& row = row_of(wanted);
  if (!plausible_unit(parts.unit)) return wording::unknown_unit(parts.unit, row.name, row.examples);
  const bool own_units_only = wanted == Quantity::frequency || wanted == Quantity::fraction;
  const auto found = unit_library::factor_to(parts.unit, row.si_unit);
  switch (found.outcome) {
    case unit_library::Outcome::converted:
      if (own_units_only) return wording::unknown_unit(parts.unit, row.name, row.examples);
      return in_si(parts.number, found.to_si, text);
    case unit_library::Outcome::other_dimension:
      return wording::wrong_dimension(text, row.name, row.examples, came_as(parts.unit));
    case unit_library::Outcome::no_database:
      return wording::no_unit_database(parts.unit, row.examples);
    case unit_library::Outcome::not_proportional:
    case unit_library::Outcome::unknown_unit:
      break;
  }
  return wording::unknown_unit(parts.unit, row.name, row.examples);
}

}  // namespace

std::string_view name_of(Quantity quantity) { return row_of(quantity).name; }
std::string_view si_unit_of(Quantity quantity) { return row_of(quantity).si_unit; }

std::optional<double> read_number(std::string_view text) {
  const auto parts = split(text);
  if (!parts || !parts->unit.empty()) return std::nullopt;
  return parts->number;
}

std::variant<double, Message> read_quantity(std::string_view text, Quantity wanted) {
  const QuantityRow& row = row_of(wanted);
  const auto parts = split(text);
  if (!parts) return wording::not_a_number(text, row.name, row.examples);
  if (parts->unit.empty()) return parts->number;
  if (parts->unit.starts_with(',')) return wording::decimal_comma(text);
  if (parts->unit == "ton" || parts->unit == "tons")
    return wording::ambiguous_unit(parts->unit, "t (1000 kg), short_ton (907 kg) or long_ton (1016 kg)");
  const UnitRow* other = nullptr;
  for (const UnitRow& known : kUnits) {
    if (known.unit != parts->unit) continue;
    if (known.quantity == wanted) return in_si(parts->number, known.to_si, text);
    if (other == nullptr) other = &known;
  }
  if (other != nullptr) {
    return wording::wrong_dimension(text, row.name, row.examples, row_of(other->quantity).name);
  }
  return from_library(*parts, text, wanted);
}

}  // namespace swaymark
