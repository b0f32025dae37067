#pragma once

#include <string>
#include <vector>

#include "apps/analysis.hpp"

namespace swaymark {

/// What a reader of the results must know besides the figures; warnings begin with "WARNING:".
[[nodiscard]] std::vector<std::string> notes_of(const Analysis& analysis);

}  // namespace swaymark
