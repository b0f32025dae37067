#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"

/// What scenarios can be refused with.
namespace swaymark::wording {

[[nodiscard]] Message too_many_scenarios(std::size_t came, std::size_t limit);
[[nodiscard]] Message scenario_changes_nothing(std::string_view label);
/// \param keys  that a scenario may state.
[[nodiscard]] Message key_same_in_all_scenarios(std::string_view key, const std::vector<std::string>& keys);
[[nodiscard]] Message key_of_a_scenario(std::string_view key);
[[nodiscard]] Message section_not_in_group(std::string_view group, std::string_view section,
                                           const std::vector<std::string>& used);

}  // namespace swaymark::wording
