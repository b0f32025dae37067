#pragma once

#include <string>
#include <vector>

#include "core/tower.hpp"

namespace swaymark {

/// What was made of a drawing by line segments: which ends became one, how far they moved, and where bars
/// cross. Nothing for a tower written otherwise.
[[nodiscard]] std::vector<std::string> segment_notes(const Tower& tower);

}  // namespace swaymark
