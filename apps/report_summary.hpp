#pragma once

#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

/// The figures an engineer looks for first, for the head of the text report: lowest modes, base shear,
/// largest bar forces, uplift. Each stands again further down with what it comes from.
[[nodiscard]] std::string summary_section(const Analysis& analysis);

}  // namespace swaymark
