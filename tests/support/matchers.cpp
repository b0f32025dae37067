#include "tests/support/matchers.hpp"

#include <cmath>

#include <fmt/format.h>

namespace swaymark::test {

bool IsNear::match(const double& value) const {
  return std::abs(value - expected_) <= relative_ * std::abs(expected_) + absolute_;
}

std::string IsNear::describe() const {
  return fmt::format("is within {:.1e} (relative) or {:.1e} of {:.17g}", relative_, absolute_, expected_);
}

IsNear is_near(double expected, double relative, double absolute) { return {expected, relative, absolute}; }

bool MatrixNear::match(const Eigen::MatrixXd& value) const {
  if (value.rows() != expected_.rows() || value.cols() != expected_.cols()) return false;
  if (value.size() == 0) return true;
  return (value - expected_).cwiseAbs().maxCoeff() <= relative_ * expected_.cwiseAbs().maxCoeff();
}

std::string MatrixNear::describe() const {
  std::ostringstream text;
  text << "is within " << relative_ << " of the largest entry of\n" << expected_;
  return text.str();
}

MatrixNear matrix_near(const Eigen::MatrixXd& expected, double relative) { return {expected, relative}; }

bool Orthonormal::match(const Eigen::MatrixXd& shapes) const {
  const Eigen::MatrixXd gram = shapes.transpose() * (mass_ * shapes);
  return (gram - Eigen::MatrixXd::Identity(gram.rows(), gram.cols())).cwiseAbs().maxCoeff() <= tolerance_;
}

std::string Orthonormal::describe() const {
  return fmt::format("has M-orthonormal columns to {:.1e}", tolerance_);
}

Orthonormal m_orthonormal(const SparseMatrix& mass, double tolerance) { return {mass, tolerance}; }

bool SameSubspace::match(const Eigen::MatrixXd& shapes) const {
  if (shapes.cols() != expected_.cols()) return false;
  const Eigen::MatrixXd left = shapes - expected_ * (expected_.transpose() * (mass_ * shapes));
  return left.cwiseAbs().maxCoeff() <= tolerance_ * shapes.cwiseAbs().maxCoeff();
}

std::string SameSubspace::describe() const {
  return fmt::format("spans the expected subspace to {:.1e}", tolerance_);
}

SameSubspace same_subspace(const Eigen::MatrixXd& expected, const SparseMatrix& mass, double tolerance) {
  return {expected, mass, tolerance};
}

}  // namespace swaymark::test
