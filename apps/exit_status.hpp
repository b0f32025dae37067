#pragma once

namespace swaymark {

/// What the program ends with; part of its contract.
enum ExitStatus : int {
  kAllMet = 0,
  kNotMet = 1,
  kUsage = 2,
  kRefused = 3,
  kNotComputable = 4,
  kFileTrouble = 5,
  kOurFault = 70,
};

}  // namespace swaymark
