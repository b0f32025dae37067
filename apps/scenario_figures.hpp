#pragma once

#include <optional>
#include <string>
#include <vector>

#include "apps/study.hpp"

/// The figures by which the states of a tower are compared, for every report format.
namespace swaymark {

/// One figure in every state, in the order of Study::states; nothing where a state does not have it.
struct FigureRow {
  std::string name;
  std::string unit;  ///< of the values, SI; empty for a plain number
  std::vector<std::optional<double>> values;
  bool compared = false;  ///< whether its change against the tower as stated is worth a line

  /// (value - value as stated) / value as stated; nothing without both, or as stated itself.
  [[nodiscard]] std::optional<double> change(std::size_t state) const;
};

/// Masses, lowest frequencies, the first torsion, base shear and overturning moment.
[[nodiscard]] std::vector<FigureRow> figure_rows(const Study& study);

/// The outcome of one check in every state: "clear", "close", "inside" for a band, "met" or "NOT MET" for any
/// other; empty where a state does not have the check.
struct OutcomeRow {
  std::string check;
  std::vector<std::string> outcomes;
};
[[nodiscard]] std::vector<OutcomeRow> outcome_rows(const Study& study);

/// Checks of one state that are not met.
[[nodiscard]] std::size_t unmet(const Analysis& analysis);

}  // namespace swaymark
