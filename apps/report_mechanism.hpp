#pragma once

#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

/// What standard error says of a tower that can move: each mechanism with its nodes, directions and cures.
[[nodiscard]] std::string mechanism_text(const Analysis& analysis);

}  // namespace swaymark
