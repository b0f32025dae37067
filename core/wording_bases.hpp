#pragma once

#include <string_view>

#include "core/error.hpp"

/// What is wrong with pads, with springs that stabilise and with the study of the base.
namespace swaymark::wording {

[[nodiscard]] Message pad_in_one_dimension();
[[nodiscard]] Message pad_beside(std::string_view key);
[[nodiscard]] Message pad_too_slender(double ratio, double limit);
[[nodiscard]] Message pad_without_stiffness();
[[nodiscard]] Message poisson_out_of_range(double value);
[[nodiscard]] Message stabilised_twice(std::string_view node, Place first);
[[nodiscard]] Message stabilise_without_bars(std::string_view node);
[[nodiscard]] Message nothing_to_stabilise(std::string_view node);
[[nodiscard]] Message study_is_a_range(std::string_view came);
[[nodiscard]] Message study_reversed(double from, double to);
[[nodiscard]] Message study_of_nothing(std::string_view axis);

}  // namespace swaymark::wording
