#pragma once

#include <string>
#include <vector>

#include "core/matrix.hpp"

namespace swaymark {

/// The nodes of a structure as the character of a mode needs them.
struct NodeCloud {
  Eigen::MatrixXd positions;  ///< n_nodes x 3 [m], z up
  Eigen::VectorXd masses;     ///< n_nodes [kg], the row sums of M
};

/// Shares of a mode's kinetic energy, weighed with the nodal masses; they add up to 1.
struct CharacterShares {
  double sway_x = 0.0;  ///< levels moving as rigid plates along x
  double sway_y = 0.0;
  double torsion = 0.0;    ///< levels turning about the vertical through their centre of mass
  double breathing = 0.0;  ///< the section changing its shape: what is left of the horizontal motion
  double vertical = 0.0;
};

/// \param motion  n_nodes x 3, the shape at every node.
[[nodiscard]] CharacterShares character_shares(const NodeCloud& cloud, const Eigen::MatrixXd& motion);

/// "sway x", "sway y", "sway" (in neither axis), "torsion", "vertical", "breathing" or "mixed"; "local at
/// ..." is left to the caller, who knows the names: see energy_nodes.
[[nodiscard]] std::string character_of(const CharacterShares& shares);

/// The fewest nodes that hold nine tenths of the kinetic energy, most first.
[[nodiscard]] std::vector<Index> energy_nodes(const NodeCloud& cloud, const Eigen::MatrixXd& motion);

}  // namespace swaymark
