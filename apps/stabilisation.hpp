#pragma once

#include <array>
#include <string>
#include <vector>

#include "apps/analysis.hpp"

namespace swaymark {

/// How the first modes follow the springs that stabilise loose nodes, over three decades of their stiffness.
struct Stabilisation {
  static constexpr std::array kFactors{0.0316227766016838, 1.0, 31.6227766016838};  ///< 10^-1.5, 1, 10^1.5

  struct Row {
    Index mode = 0;                               ///< from 0
    bool found = true;                            ///< again with the softer and the stiffer springs
    std::array<double, 3> frequency{};            ///< by factor [Hz]
    [[nodiscard]] double largest_change() const;  ///< relative to the stiffness as stated
  };
  std::vector<Row> rows;  ///< the first modes that move the tower as a whole, three at most
  double softest = 0.0;   ///< stiffness as stated, of the softest spring [N/m]
  double stiffest = 0.0;  ///< likewise [N/m]
  std::size_t springs = 0;
  double share_of_weight =
      0.0;  ///< what the springs carry of the dead load, the sum of their forces over the weight

  /// Whether no frequency changes by more than a thousandth.
  [[nodiscard]] bool independent() const;
};

/// Solves the tower of an analysis with all of its stabilising springs softer and stiffer. A mode is followed
/// by its shape: of the modes found there, the one that has most of it. \throws ComputationError where no
/// modes are found.
[[nodiscard]] Stabilisation study_stabilisation(const Analysis& analysis, const Eigenproblem& problem);

/// The study in a sentence, a warning where the frequencies depend on the springs.
[[nodiscard]] std::string stabilisation_note(const Stabilisation& study);

}  // namespace swaymark
