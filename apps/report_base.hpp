#pragma once

#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

/// How the first frequencies move with the stiffness of the supports. \pre the analysis has a base study.
[[nodiscard]] std::string base_study_section(const Analysis& analysis);

/// "a pad of 2 x 2 m, G = 60 MPa, nu = 0.3"
[[nodiscard]] std::string pad_words(const Pad& pad);

/// What each liquid was split into, a line each; empty where there is none.
[[nodiscard]] std::string liquids_text(const Tower& tower);

}  // namespace swaymark
