#pragma once

#include "modal/dense.hpp"

namespace swaymark {

/// The `count` pairs of A = L^-1 M L^-T with the largest mu, orthogonal to the columns of `known`, by
/// Spectra's restarted Lanczos method: shift-and-invert at zero, in the symmetric form that needs no inner
/// product with M and so allows degrees of freedom without mass.
///
/// A Lanczos method started from one vector can pass over copies of a repeated mode and report success.
/// `known` lets the caller look again for what is missing among the modes square to those found. \param count
/// 1 <= count < n / 2. \param known  n x m, orthonormal columns; may have no column.
[[nodiscard]] ReciprocalPairs solve_shift_invert(const Factorisation& factor, const SparseMatrix& mass,
                                                 Index count, const Eigen::MatrixXd& known);

}  // namespace swaymark
