#include "modal/dense.hpp"

#include <Eigen/Eigenvalues>

namespace swaymark {

ReciprocalPairs solve_dense(const Factorisation& factor, const SparseMatrix& mass, Index count) {
  const Index n = mass.rows();
  Eigen::MatrixXd a(n, n);
  for (Index j = 0; j < n; ++j)
    a.col(j) = factor.forward(mass * factor.backward(Eigen::VectorXd::Unit(n, j)));
  const Eigen::MatrixXd symmetric = 0.5 * (a + a.transpose());
  const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(symmetric);
  ReciprocalPairs pairs;
  pairs.converged = solver.info() == Eigen::Success;
  pairs.mu = solver.eigenvalues().reverse().head(count);
  pairs.v = solver.eigenvectors().rowwise().reverse().leftCols(count);
  return pairs;
}

}  // namespace swaymark
