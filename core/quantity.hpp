#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <variant>

#include "core/error.hpp"

namespace swaymark {

/// What a value measures. Inside the program every value is in the SI unit of its quantity.
enum class Quantity {
  length,           ///< m
  area,             ///< m2
  mass,             ///< kg
  mass_per_length,  ///< kg/m
  density,          ///< kg/m3
  stress,           ///< Pa
  stiffness,        ///< N/m
  time,             ///< s
  frequency,        ///< Hz: cycles or turns per second
  acceleration,     ///< m/s2
  fraction,         ///< 1
  force,            ///< N; known so that it can be told from a mass, wanted by no key yet
  velocity,         ///< m/s; likewise
};

/// Standard acceleration of gravity [m/s2] (ISO 80000-3, exact by definition of the CGPM, 1901).
inline constexpr double kStandardGravity = 9.80665;

/// "a mass"
[[nodiscard]] std::string_view name_of(Quantity quantity);
/// "kg"
[[nodiscard]] std::string_view si_unit_of(Quantity quantity);

/// Reads `12`, `12 kg`, `0.25 g`, `12 kip/in` as the quantity wanted, in SI.
///
/// A bare number is SI. Common units are known here; any other is looked up in the UDUNITS-2 database, which
/// is loaded on first need only. `g` is standard gravity where an acceleration is wanted and a gram where a
/// mass is; `rpm` is turns per minute. \return the value, finite; or what is wrong with the text and what
/// would cure it.
[[nodiscard]] std::variant<double, Message> read_quantity(std::string_view text, Quantity wanted);

/// A plain finite number over the whole text, '.' as decimal sign; nothing else.
[[nodiscard]] std::optional<double> read_number(std::string_view text);

}  // namespace swaymark
