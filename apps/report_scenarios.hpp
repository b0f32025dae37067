#pragma once

#include <string>

#include "apps/study.hpp"

namespace swaymark {

/// The states of the tower side by side, in blocks of as many columns as fit; then every check that a
/// scenario does not meet, every warning, and every scenario that could not be computed.
[[nodiscard]] std::string scenario_section(const Study& study);

/// One line for the head of the report.
[[nodiscard]] std::string scenario_line(const Study& study);

/// Whatever standard error says of scenarios that could not be computed; empty where all were.
[[nodiscard]] std::string scenario_failures(const Study& study);

}  // namespace swaymark
