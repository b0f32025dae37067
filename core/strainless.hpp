#pragma once

#include <vector>

#include "core/matrix.hpp"

namespace swaymark {

/// A basis of the displacements that elongate nothing: the null space of E, n_rows x n.
struct StrainlessMotions {
  std::vector<Eigen::VectorXd> motions;  ///< n each, independent, each with a component of its own
  bool complete = true;                  ///< false where there are more, which could not be told apart
};

/// The pivots of the factorised ET E point at degrees of freedom that may be free; what they do not show is
/// found by inverse iteration. Unit springs are put there until nothing is free, and the displacements under
/// a unit force at each are the motions looked for, each 1 at its own and 0 at the others. What decides is
/// the elongations themselves, which are accurate to rounding where uT ET E u is not. \param elongation  E,
/// rows of about unit length. Cost: one sparse factorisation where there is no such motion, three or more
/// where there is.
[[nodiscard]] StrainlessMotions strainless_motions(const SparseMatrix& elongation);

}  // namespace swaymark
