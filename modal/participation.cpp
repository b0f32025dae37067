#include "modal/participation.hpp"

#include <vector>

#include <Eigen/SparseCholesky>

namespace swaymark {

Eigen::MatrixXd participation(const Eigen::MatrixXd& shapes, const Eigen::MatrixXd& drive) {
  return shapes.transpose() * drive;
}

Eigen::MatrixXd solve_mass(const SparseMatrix& mass, const Eigen::MatrixXd& right) {
  // A unit on the diagonal stands in for the inertia that massless rows lack; their right-hand side is zero.
  SparseMatrix regular = mass;
  const Eigen::VectorXd diagonal = mass.diagonal();
  std::vector<Index> massless;
  for (Index i = 0; i < diagonal.size(); ++i) {
    if (diagonal(i) > 0.0) continue;
    regular.coeffRef(i, i) = 1.0;
    massless.push_back(i);
  }
  const Eigen::SimplicialLDLT<SparseMatrix> factor(regular);
  Eigen::MatrixXd result = factor.solve(right);
  for (const Index i : massless) result.row(i).setZero();
  return result;
}

Eigen::VectorXd moving_mass(const SparseMatrix& mass, const Eigen::MatrixXd& drive) {
  return (drive.array() * solve_mass(mass, drive).array()).colwise().sum().transpose();
}

}  // namespace swaymark
