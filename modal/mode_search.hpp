#pragma once

#include <optional>
#include <vector>

#include "modal/eigenproblem.hpp"

namespace swaymark {

/// How many modes are wanted; every condition given must hold.
struct ModeTarget {
  std::optional<Index> count;
  std::optional<double> omega_up_to;    ///< [rad/s]: every mode at or below it
  std::optional<double> mass_share;     ///< fraction of the moving mass ...
  std::vector<Index> share_directions;  ///< ... in these columns of the drive
  std::optional<double> omega_covered;  ///< [rad/s]: bands are examined up to here; as omega_up_to
};

struct ModeSet {
  Modes modes;
  Eigen::MatrixXd participation;  ///< Gamma, n_modes x n_directions [sqrt(kg)]
  Eigen::VectorXd moving;         ///< moving mass of each direction [kg]
  Index available = 0;            ///< modes the model has
  bool reached = true;            ///< false where most_modes() ended the search before the target was met
  Index copies_added = 0;         ///< modes kept beyond the target because they repeat the last one
};

/// The fewest lowest modes that meet the target. A set never ends within a repeated mode: half of a pair
/// would depend on how the solver turned it. \param drive  b, n_free x n_directions [kg].
[[nodiscard]] ModeSet find_modes(const Eigenproblem& problem, const SparseMatrix& stiffness,
                                 const SparseMatrix& mass, const Eigen::MatrixXd& drive,
                                 const ModeTarget& target);

}  // namespace swaymark
