#pragma once

#include <string>
#include <vector>

namespace swaymark {

struct Analysis;

/// One check and its outcome.
struct Verdict {
  std::string check;
  bool met = false;
  std::string detail;
};

/// The outcome of every check the tower file asks for, and of the checks on the modes themselves.
[[nodiscard]] std::vector<Verdict> verdicts_of(const Analysis& analysis);

}  // namespace swaymark
