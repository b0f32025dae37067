#include "spectrum/combine_modes.hpp"

#include <algorithm>
#include <cmath>

namespace swaymark {

double cqc_correlation(double omega_i, double omega_j, double damping_i, double damping_j) {
  const double r = omega_j / omega_i;
  const double product = damping_i * damping_j;
  const double denominator = std::pow(1.0 - r * r, 2) + 4.0 * product * r * (1.0 + r * r) +
                             4.0 * (damping_i * damping_i + damping_j * damping_j) * r * r;
  if (denominator == 0.0) return 1.0;
  return 8.0 * std::sqrt(product) * (damping_i + r * damping_j) * std::pow(r, 1.5) / denominator;
}

Eigen::MatrixXd correlation_matrix(const Eigen::VectorXd& omega, const Eigen::VectorXd& damping) {
  Eigen::MatrixXd correlation = Eigen::MatrixXd::Identity(omega.size(), omega.size());
  for (Index i = 0; i < omega.size(); ++i) {
    for (Index j = 0; j < i; ++j) {
      correlation(i, j) = cqc_correlation(omega(i), omega(j), damping(i), damping(j));
      correlation(j, i) = correlation(i, j);
    }
  }
  return correlation;
}

Eigen::VectorXd combine_modes(const Eigen::MatrixXd& peaks, const Eigen::VectorXd& residual, ModalRule rule,
                              const Eigen::MatrixXd& correlation) {
  Eigen::VectorXd squares = residual.array().square();
  switch (rule) {
    case ModalRule::absolute_sum:
      return peaks.rowwise().lpNorm<1>() + residual.cwiseAbs();
    case ModalRule::srss:
      squares += peaks.rowwise().squaredNorm();
      break;
    case ModalRule::cqc:
      squares += (peaks * correlation).cwiseProduct(peaks).rowwise().sum();
      break;
  }
  // Rounding may leave a hair below zero where terms cancel.
  return squares.cwiseMax(0.0).cwiseSqrt();
}

bool has_close_modes(const Eigen::VectorXd& omega) {
  for (Index j = 1; j < omega.size(); ++j) {
    if (omega(j) - omega(j - 1) <= 0.1 * omega(j - 1)) return true;
  }
  return false;
}

}  // namespace swaymark
