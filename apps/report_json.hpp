#pragma once

#include <string>

#include "apps/study.hpp"

namespace swaymark {

/// The results as JSON, SI throughout, numbers in the shortest form that reads back the same.
/// A tower that can move has its mechanisms instead of modes.
/// \param shapes whether the mode shapes are written.
[[nodiscard]] std::string json_report(const Analysis& analysis, bool shapes);

/// The same of the tower as stated, with the whole result of each scenario under `scenarios`.
[[nodiscard]] std::string json_report(const Study& study, bool shapes);

}  // namespace swaymark
