#pragma once

#include <vector>

#include "core/tower.hpp"

/// Towers whose supports give way upright: what a study of the base compares.
namespace swaymark {

/// The axis that gives way: z; x where the tower has no other.
[[nodiscard]] Axis studied_axis(const Tower& tower);

/// Whether any support is fixed along that axis.
[[nodiscard]] bool has_studied_support(const Tower& tower);

/// The range in equal steps of its logarithm, both ends among them [N/m], ascending.
[[nodiscard]] std::vector<double> studied_stiffnesses(const BaseStudyStatement& study);

/// The tower with a spring [N/m] in place of every support that is fixed along the axis; what is on springs
/// already stays as it is.
[[nodiscard]] Tower on_leg_springs(Tower tower, double stiffness);

}  // namespace swaymark
