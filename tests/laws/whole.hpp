#pragma once

#include <map>
#include <string>
#include <vector>

#include "apps/analysis.hpp"
#include "tests/support/models.hpp"

/// Whole towers, analysed as the program does it.
namespace swaymark::test {

[[nodiscard]] Analysis analysed(Tower tower);

/// A spectrum with a rise, a plateau and a fall, along the given axes; 2 % damping; modes by CQC.
void shake(Tower& tower, const std::vector<Axis>& axes);

/// Every mode the tower has.
void ask_for_all_modes(Tower& tower);

/// A mast without any symmetry: one leg of it carries more.
[[nodiscard]] Tower lopsided_mast();

/// \throws std::logic_error if the axis is not excited.
[[nodiscard]] const DirectionResult& along(const Analysis& analysis, Axis axis);

/// Peaks by the names of the tower file: "bar bars-3", "displacement 5 x", "reaction 1 z", "base shear x".
[[nodiscard]] std::map<std::string, double> peaks_by_name(const Analysis& analysis);

/// Every peak agrees, to `kSolved` of itself or of the largest of its kind (its first word).
void check_same_peaks(const std::map<std::string, double>& actual,
                      const std::map<std::string, double>& expected);

}  // namespace swaymark::test
