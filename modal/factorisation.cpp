#include "modal/factorisation.hpp"

namespace swaymark {

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
