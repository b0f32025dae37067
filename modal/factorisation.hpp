#pragma once

#include <Eigen/SparseCholesky>

#include "core/matrix.hpp"

namespace swaymark {

/// The Cholesky factorisation P K PT = L LT of a symmetric positive definite sparse matrix.
///
/// Order: approximate minimum degree. Enough up to some ten thousand unknowns of a slender tower.
class Factorisation {
 public:
  explicit Factorisation(const SparseMatrix& matrix);

  /// False where the matrix is not positive definite to working precision.
  [[nodiscard]] bool usable() const { return llt_.info() == Eigen::Success; }
  [[nodiscard]] Index size() const { return llt_.rows(); }

  /// K^-1 B, n x m
  [[nodiscard]] Eigen::MatrixXd solve(const Eigen::MatrixXd& right) const;
  /// L^-1 P x
  [[nodiscard]] Eigen::VectorXd forward(const Eigen::VectorXd& x) const;
  /// PT L^-T x
  [[nodiscard]] Eigen::VectorXd backward(const Eigen::VectorXd& x) const;

 private:
  Eigen::SimplicialLLT<SparseMatrix> llt_;
};

}  // namespace swaymark
