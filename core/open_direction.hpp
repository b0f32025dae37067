#pragma once

#include <vector>

#include "core/matrix.hpp"
#include "core/tower.hpp"

namespace swaymark {

/// By node: orthonormal directions in which it can move, its neighbours held, without straining a bar and
/// without moving an axis that is fixed or on a spring; to first order, and up to slopes of 1e-5. Bars count
/// by their directions alone. What sloshes is held by its tank. Springs that stabilise are left out.
[[nodiscard]] std::vector<std::vector<Eigen::Vector3d>> open_directions(const Tower& tower);

}  // namespace swaymark
