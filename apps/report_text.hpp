#pragma once

#include <string>

#include "apps/study.hpp"

namespace swaymark {

struct TextStyle {
  bool colour = false;
};

/// The report for an engineer's file: plain text, at most 100 columns wide where names are of common length.
[[nodiscard]] std::string text_report(const Analysis& analysis, const TextStyle& style);

/// The same of the tower as stated, with its scenarios beside it. Of a tower that can move as stated, the
/// scenarios alone.
[[nodiscard]] std::string text_report(const Study& study, const TextStyle& style);

}  // namespace swaymark
