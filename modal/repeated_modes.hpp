#pragma once

#include "modal/eigenproblem.hpp"

namespace swaymark {

/// Modes whose frequencies agree to this relative difference count as one repeated mode. Rounding splits a
/// true pair by 1e-12 or so; a tower drawn to the millimetre splits its sway pair by more than 1e-7.
inline constexpr double kRepeated = 1e-8;

/// Turns the shapes of every repeated mode to the directions of excitation.
///
/// The shapes of a repeated mode are unique only up to a rotation among themselves, which the solver picks by
/// chance. Here the first shape takes the whole participation along the first direction that has any, the
/// next the whole of the next, and what is left is told apart by the displacement at single degrees of
/// freedom, so that equal input gives equal shapes. The subspace, the sum of effective masses and every CQC
/// result stay what they were. \param modes  M-orthonormal shapes.    \param drive  b, n_free x n_directions
/// [kg].
[[nodiscard]] Modes turn_repeated(const SparseMatrix& stiffness, const SparseMatrix& mass, Modes modes,
                                  const Eigen::MatrixXd& drive);

}  // namespace swaymark
