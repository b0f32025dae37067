#pragma once

#include <vector>

#include "core/matrix.hpp"
#include "core/request.hpp"

namespace swaymark {

/// Peak of every response from its peaks under each direction of excitation.
///
///   SRSS     R = sqrt(E1^2 + E2^2 + E3^2)
///   100-30   R = the largest of E1 + 0.3 E2 + 0.3 E3 over which direction counts whole
///   100-40   the same with 0.4
///
/// Source: EN 1998-1:2004, 4.3.3.5 and US NRC RG 1.92 (from memory).
/// \param by_direction one vector of n_responses, >= 0, for each direction excited; at least one.
[[nodiscard]] Eigen::VectorXd combine_directions(const std::vector<Eigen::VectorXd>& by_direction,
                                                 DirectionalRule rule);

}  // namespace swaymark
