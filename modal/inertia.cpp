#include "modal/inertia.hpp"

#include <cmath>

#include <Eigen/SparseCholesky>

namespace swaymark {

namespace {

// Measured on lattice towers: growth stays below 5e4 where the count is right and exceeds 1e15 where it is
// wrong.
constexpr double kMostGrowth = 1e8;
constexpr int kMostTries = 8;

double largest_entry(const SparseMatrix& matrix) {
  double largest = 0.0;
  for (Index k = 0; k < matrix.nonZeros(); ++k) largest = std::max(largest, std::abs(matrix.valuePtr()[k]));
  return largest;
}

}  // namespace

std::optional<InertiaCount> count_modes_below(const SparseMatrix& stiffness, const SparseMatrix& mass,
                                              double omega_squared) {
  for (int attempt = 0; attempt < kMostTries; ++attempt) {
    const double shift = omega_squared * std::pow(1.0 + 1e-6, attempt);
    SparseMatrix shifted = stiffness - shift * mass;
    shifted.makeCompressed();
    const Eigen::SimplicialLDLT<SparseMatrix> factor(shifted);
    if (factor.info() != Eigen::Success) continue;
    const Eigen::VectorXd pivots = factor.vectorD();
    const double growth = pivots.cwiseAbs().maxCoeff() / largest_entry(shifted);
    if (!std::isfinite(growth) || growth > kMostGrowth) continue;
    return InertiaCount{(pivots.array() < 0.0).count(), shift};
  }
  return std::nullopt;
}

}  // namespace swaymark
