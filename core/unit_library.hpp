#pragma once

#include <optional>
#include <string>
#include <string_view>

/// The one door to UDUNITS-2. Its database takes some milliseconds to load, so it is opened on first need.
namespace swaymark::unit_library {

enum class Outcome { converted, unknown_unit, other_dimension, not_proportional, no_database };

struct Factor {
  Outcome outcome = Outcome::unknown_unit;
  double to_si = 0.0;  ///< SI value of one unit, where converted
};

/// The factor from `unit` to `si_unit`. Reciprocal and offset conversions count as another dimension or as
/// not proportional: `s` is no frequency, and degrees Celsius have no factor.
[[nodiscard]] Factor factor_to(std::string_view unit, std::string_view si_unit);

}  // namespace swaymark::unit_library
