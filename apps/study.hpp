#pragma once

#include <optional>
#include <string>
#include <vector>

#include "apps/analysis.hpp"
#include "core/tower_file.hpp"

namespace swaymark {

/// What became of one scenario.
struct ScenarioResult {
  std::string label;
  std::vector<std::string> keys;  ///< of the tower file that it states
  std::optional<Analysis>
      analysis;         ///< nothing where it could not be computed for a reason other than mechanisms
  std::string failure;  ///< that reason and its cure

  /// Whether it has modes.
  [[nodiscard]] bool computed() const { return analysis && !analysis->mechanisms.any(); }
};

/// The tower as stated and in each of its scenarios, in the file's order.
struct Study {
  Analysis stated;
  std::vector<ScenarioResult> scenarios;
  int different =
      1;  ///< states whose stiffness or supports differ; all others shared the work of one of them

  /// The states in the order of the reports, the tower as stated first; nullptr where one has no modes.
  [[nodiscard]] std::vector<const Analysis*> states() const;
  /// Their labels.
  [[nodiscard]] std::vector<std::string> labels() const;
};

/// Analyses the tower and its scenarios. A scenario that cannot be computed costs the others nothing.
/// \throws ComputationError where the tower as stated cannot be computed for a reason other than mechanisms.
[[nodiscard]] Study study_of(TowerFile file, const Provenance& provenance, Scope scope);

}  // namespace swaymark
