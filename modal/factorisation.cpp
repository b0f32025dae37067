#include "modal/factorisation.hpp"

namespace swaymark {

Factorisation::Factorisation(const SparseMatrix& matrix) : llt_(matrix) {}

Eigen::MatrixXd Factorisation::solve(const Eigen::MatrixXd& right) const { return llt_.solve(right); }

Eigen::VectorXd Factorisation::forward(const Eigen::VectorXd& x) const {
  Eigen::VectorXd y = llt_.permutationP() * x;
  llt_.matrixL().solveInPlace(y);
  return y;
}

Eigen::VectorXd Factorisation::backward(const Eigen::VectorXd& x) const {
  Eigen::VectorXd y = x;
  llt_.matrixU().solveInPlace(y);
  return llt_.permutationPinv() * y;
}

}  // namespace swaymark
