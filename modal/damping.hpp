#pragma once

#include <vector>

#include "core/matrix.hpp"

namespace swaymark {

/// Damping ratio of each mode [-], n_modes: one value for all, or a list mode by mode whose last value is
/// held for the modes beyond it.    \param stated at least one value.
[[nodiscard]] Eigen::VectorXd modal_damping(const std::vector<double>& stated, Index modes);

}  // namespace swaymark
