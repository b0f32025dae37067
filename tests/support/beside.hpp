#pragma once

#include <map>
#include <string>
#include <string_view>

#include "core/tower.hpp"

/// Towers with tables beside them, all in the memory of a test.
namespace swaymark::test {

using Files = std::map<std::string, std::string>;

/// The tower of `text`, called tower.yaml, with the files beside it. \throws InputError
[[nodiscard]] Tower tower_beside(std::string_view text, const Files& files);

/// What the tower is refused with, a line for each fault without its cure; empty if it is read.
[[nodiscard]] std::string refusal_beside(std::string_view text, const Files& files);

/// Whether both towers have the same nodes and the same bars by the names of their nodes, in any order; names
/// of bars count where `bar_names` is set. The answer is empty, or the first difference.
[[nodiscard]] std::string difference(const Tower& a, const Tower& b, bool bar_names);

}  // namespace swaymark::test
