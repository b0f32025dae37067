#pragma once

#include <optional>

#include "core/matrix.hpp"

namespace swaymark {

/// How many modes of K phi = omega^2 M phi lie below a frequency: the negative pivots of K - omega^2 M = L D
/// LT (Sylvester's law of inertia). K positive definite, M positive semidefinite; degrees of freedom without
/// mass count no mode.
///
/// The factorisation does not pivot; where a pivot grows far beyond the matrix its sign means nothing, so the
/// shift moves up by a millionth and the count is repeated.
struct InertiaCount {
  Index below = 0;
  double omega_squared =
      0.0;  ///< the shift that was counted at [rad2/s2]; at or just above the one asked for
};

/// \return nothing if no shift near the one asked for could be counted at.
[[nodiscard]] std::optional<InertiaCount> count_modes_below(const SparseMatrix& stiffness,
                                                            const SparseMatrix& mass, double omega_squared);

}  // namespace swaymark
