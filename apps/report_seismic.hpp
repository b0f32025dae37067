#pragma once

#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

/// The part of the text report on the seismic response: ordinates and base shear by mode, base, bars,
/// displacements, reactions. \param analysis with a seismic result.
[[nodiscard]] std::string seismic_section(const Analysis& analysis);

}  // namespace swaymark
