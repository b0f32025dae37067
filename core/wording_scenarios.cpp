#include "core/wording_scenarios.hpp"

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark::wording {

Message too_many_scenarios(std::size_t came, std::size_t limit) {
  return {fmt::format("{} scenarios are more than the {} that one file may have", came, limit),
          "write several tower files"};
}
Message scenario_changes_nothing(std::string_view label) {
  return {
      fmt::format("scenario '{}' states nothing that differs from the tower", excerpt(label)),
      "add a key that it replaces, for example 'mass_matrix: lumped', or remove it: the tower as stated is "
      "reported beside the scenarios"};
}
Message key_same_in_all_scenarios(std::string_view key, const std::vector<std::string>& keys) {
  return {fmt::format("'{}' is the same in all scenarios", excerpt(key)),
          fmt::format("write it once, outside; a scenario may state {}", alternatives(keys))};
}
Message key_of_a_scenario(std::string_view key) {
  return {
      fmt::format("'{}' belongs in a scenario", excerpt(key)),
      "write it under 'scenarios', beside a label; the tower itself is stated by its sections and masses"};
}
Message section_not_in_group(std::string_view group, std::string_view section,
                             const std::vector<std::string>& used) {
  constexpr std::size_t most = 8;
  std::vector<std::string> names;
  for (std::size_t i = 0; i < used.size() && i < most; ++i) names.push_back(excerpt(used[i]));
  return {fmt::format("no bar of group '{}' has section '{}'", excerpt(group), excerpt(section)),
          names.empty() ? "remove it: the group has no bars"
                        : fmt::format("name a section of its bars ({})", alternatives(names))};
}

}  // namespace swaymark::wording
