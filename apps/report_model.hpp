#pragma once

#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

/// The part of the text report that repeats what was stated, so that a reader sees what was understood:
/// extent, groups with their sections and materials, supports, spectra.
[[nodiscard]] std::string model_section(const Analysis& analysis);

}  // namespace swaymark
