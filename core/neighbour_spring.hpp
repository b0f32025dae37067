#pragma once

#include <utility>
#include <vector>

#include "core/dof_map.hpp"

namespace swaymark {

/// A spring that stabilises: between a node and its neighbours, in a direction in which the node is free by
/// itself. Where the node stands among its neighbours its forces add up to nothing, nor do they turn the
/// tower.
struct NeighbourSpring {
  std::size_t node = 0;
  std::vector<std::pair<Index, double>> elongation;  ///< degree of freedom of all, elongation per unit of it
  double stiffness = 0.0;                            ///< [N/m]
};

/// The springs of all stabilised nodes, one for each direction of open_directions().
///
/// The elongation along a direction d is d (u - sum w_i u_i) over the neighbours i. The weights w are the
/// smallest with sum w_i = 1 and sum w_i x_i = x, so that no motion as a body strains the spring; where the
/// node does not lie in the line, plane or space of its neighbours, they are equal.
[[nodiscard]] std::vector<NeighbourSpring> neighbour_springs(const Tower& tower, const DofMap& dofs);

}  // namespace swaymark
