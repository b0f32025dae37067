#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"

/// What is wrong with masses that come by ice and by liquids.
namespace swaymark::wording {

[[nodiscard]] Message perimeter_too_short(double perimeter, double least);
[[nodiscard]] Message perimeter_missing(const std::vector<std::string>& sections);
[[nodiscard]] Message ice_on_nothing(std::string_view group);
[[nodiscard]] Message heights_reversed(double from, double to);
[[nodiscard]] Message heights_in_one_dimension();
[[nodiscard]] Message liquid_in_one_dimension();
[[nodiscard]] Message liquid_needs_label();
[[nodiscard]] Message liquid_label_taken(std::string_view label);
[[nodiscard]] Message liquid_without_mass();

}  // namespace swaymark::wording
