#include "modal/eigenproblem.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <utility>
#include <vector>

#include "modal/shift_invert.hpp"

namespace swaymark {

namespace {

constexpr Index kSmall = 80;        // below it the dense solver is the faster one
constexpr Index kMostDense = 4000;  // above it dense takes minutes
constexpr double kDistinct = 1e-5;  // relative gap of omega^2 at which a set of modes may end
constexpr int kMostContinuations = 12;

ReciprocalPairs sorted(const ReciprocalPairs& pairs) {
  std::vector<Index> order(static_cast<std::size_t>(pairs.mu.size()));
  std::iota(order.begin(), order.end(), Index{0});
  std::stable_sort(order.begin(), order.end(), [&](Index a, Index b) { return pairs.mu(a) > pairs.mu(b); });
  ReciprocalPairs result;
  result.converged = pairs.converged;
  result.mu.resize(pairs.mu.size());
  result.v.resize(pairs.v.rows(), pairs.mu.size());
  for (std::size_t i = 0; i < order.size(); ++i) {
    result.mu(static_cast<Index>(i)) = pairs.mu(order[i]);
    result.v.col(static_cast<Index>(i)) = pairs.v.col(order[i]);
  }
  return result;
}

ReciprocalPairs joined(const ReciprocalPairs& first, const ReciprocalPairs& second) {
  ReciprocalPairs all;
  all.converged = first.converged && second.converged;
  all.mu.resize(first.mu.size() + second.mu.size());
  all.mu << first.mu, second.mu;
  all.v.resize(first.v.rows(), all.mu.size());
  all.v << first.v, second.v;
  return sorted(all);
}

// Where the modes from `least` on may end: the first clear gap. The number of modes before it, or nothing.
std::optional<Index> clear_end(const Eigen::VectorXd& omega, Index least) {
  for (Index end = std::max<Index>(least, 1); end < omega.size(); ++end) {
    if (std::pow(omega(end) / omega(end - 1), 2) - 1.0 > kDistinct) return end;
  }
  return std::nullopt;
}

// A frequency just above mode `end`, clear of the next one.
double just_above(const Eigen::VectorXd& omega, Index end) {
  const double last = omega(end - 1);
  if (end >= omega.size()) return 1.01 * last;
  return last * (1.0 + std::min(0.01, 0.5 * (omega(end) / last - 1.0)));
}

}  // namespace

Eigenproblem::Eigenproblem(const SparseMatrix& stiffness, const SparseMatrix& mass)
    : Eigenproblem(stiffness, mass, std::make_shared<const Factorisation>(stiffness)) {}

Eigenproblem::Eigenproblem(const SparseMatrix& stiffness, const SparseMatrix& mass,
                           std::shared_ptr<const Factorisation> factor)
    : stiffness_(stiffness),
      mass_(mass),
      factor_(std::move(factor)),
      mode_count_((Eigen::VectorXd(mass.diagonal()).array() > 0.0).count()) {}

Index Eigenproblem::most_modes() const {
  if (mass_.rows() <= kMostDense) return mode_count_;
  return std::min(mode_count_, mass_.rows() / 3);
}

std::optional<InertiaCount> Eigenproblem::below(double omega_squared) const {
  return count_modes_below(stiffness_, mass_, omega_squared);
}

ReciprocalPairs Eigenproblem::pairs(Index count, EigenMethod method) const {
  const Index n = mass_.rows();
  const bool dense = method == EigenMethod::dense || n <= kSmall || 3 * count > n;
  if (dense && (method != EigenMethod::shift_invert || 2 * count + 1 >= n))
    return solve_dense(*factor_, mass_, count);
  ReciprocalPairs found = solve_shift_invert(*factor_, mass_, count, Eigen::MatrixXd(n, 0));
  return sorted(found);
}

Modes Eigenproblem::shapes_of(const ReciprocalPairs& pairs) const {
  Modes modes;
  const Index count = pairs.mu.size();
  modes.omega.resize(count);
  modes.residual.resize(count);
  modes.shapes.resize(mass_.rows(), count);
  for (Index j = 0; j < count; ++j) {
    Eigen::VectorXd shape = factor_->backward(pairs.v.col(j));
    // Rayleigh quotient of A: no differences of large numbers, unlike phiT K phi.
    const double mu = shape.dot(mass_ * shape) / pairs.v.col(j).squaredNorm();
    const double omega_squared = 1.0 / mu;
    shape /= std::sqrt(shape.dot(mass_ * shape));
    Index largest = 0;
    shape.cwiseAbs().maxCoeff(&largest);
    if (shape(largest) < 0.0) shape = -shape;
    const Eigen::VectorXd force = stiffness_ * shape;
    modes.omega(j) = std::sqrt(omega_squared);
    modes.residual(j) = (force - omega_squared * (mass_ * shape)).norm() / force.norm();
    modes.shapes.col(j) = shape;
  }
  return modes;
}

Modes Eigenproblem::lowest(Index count, EigenMethod method) const {
  Modes none;
  none.status = ModesStatus::not_positive_definite;
  if (!factor_->usable()) return none;
  const Index wanted = std::min(count, most_modes());
  ReciprocalPairs found = pairs(std::min(wanted + 4, most_modes()), method);
  for (int round = 0; round < kMostContinuations; ++round) {
    if (!found.converged) break;
    const Modes modes = shapes_of(found);
    const Index end = clear_end(modes.omega, wanted).value_or(modes.count());
    Modes kept = first(modes, end);
    if (kept.usable()) return kept;
    const Index counted = kept.certificate->below;
    if (counted < end || modes.count() >= mode_count_) break;
    const Index missing = counted - end + 1;
    const Index room = std::max<Index>(1, std::min(missing, (mass_.rows() - modes.count()) / 2 - 1));
    found = joined(found, solve_shift_invert(*factor_, mass_, room, found.v));
  }
  none = shapes_of(found);
  none.status = found.converged ? ModesStatus::incomplete : ModesStatus::not_converged;
  return none;
}

Modes Eigenproblem::first(const Modes& modes, Index count) const {
  Modes result;
  result.omega = modes.omega.head(count);
  result.shapes = modes.shapes.leftCols(count);
  result.residual = modes.residual.head(count);
  result.status = ModesStatus::uncounted;
  // A set that ends within a repeated mode is counted past all its copies.
  const Index end = clear_end(modes.omega, count).value_or(modes.count());
  if (end == modes.count() && modes.certificate) {
    // What lies beyond the last of the given modes is not known here, but was when they were counted.
    result.certificate = modes.certificate;
    result.status = modes.status;
    return result;
  }
  const double omega = just_above(modes.omega, end);
  const auto counted = below(omega * omega);
  if (!counted) return result;
  result.certificate = Certificate{counted->below, std::sqrt(counted->omega_squared)};
  result.status = counted->below == end ? ModesStatus::complete : ModesStatus::incomplete;
  return result;
}

}  // namespace swaymark
