#pragma once

#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

struct TextStyle {
  bool colour = false;
};

/// The report for an engineer's file: plain text, at most 100 columns wide where names are of common length.
[[nodiscard]] std::string text_report(const Analysis& analysis, const TextStyle& style);

}  // namespace swaymark
