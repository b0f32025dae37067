#pragma once

#include <string>
#include <vector>

#include "apps/study.hpp"

namespace swaymark {

struct NamedText {
  std::string name;
  std::string text;
};

/// The results as CSV files (quoted as in RFC 4180, lines end with a line feed, comma, '.', SI, units in
/// brackets in the header): modes, ledger, and where they apply bands, ordinates, base, bars, nodes,
/// reactions, verdicts, and shapes where asked for.
[[nodiscard]] std::vector<NamedText> csv_report(const Analysis& analysis, bool shapes);

/// The same of the tower as stated, and two sheets that compare its scenarios with it. Of a tower that can
/// move as stated, those two alone.
[[nodiscard]] std::vector<NamedText> csv_report(const Study& study, bool shapes);

}  // namespace swaymark
