#pragma once

#include "modal/factorisation.hpp"

namespace swaymark {

/// Eigenpairs of A = L^-1 M L^-T, where K = L LT: A v = mu v with mu = 1 / omega^2. Largest mu first, which
/// is the lowest frequency first; the columns of v are orthonormal. Degrees of freedom without mass give mu =
/// 0.
struct ReciprocalPairs {
  Eigen::VectorXd mu;  ///< n_pairs [s2/rad2], descending
  Eigen::MatrixXd v;   ///< n_free x n_pairs
  bool converged = false;
};

/// The first `count` pairs from Eigen's dense symmetric solver. Taking reciprocals keeps the low modes
/// accurate to rounding however stiff the highest are.    Cost: n^3; for small problems, or where nearly all
/// modes are wanted.
[[nodiscard]] ReciprocalPairs solve_dense(const Factorisation& factor, const SparseMatrix& mass, Index count);

}  // namespace swaymark
