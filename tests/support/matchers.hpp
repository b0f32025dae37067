#pragma once

#include <string>

#include <catch2/catch.hpp>

#include "core/matrix.hpp"

/// Matchers that speak of invariants; a failure says which entry and how far.
namespace swaymark::test {

// Tolerances, each with its reason.
/// Sums and products of a few hundred terms of double precision.
inline constexpr double kRoundoff = 1e-12;
/// A quantity that went through an eigensolution or a solve: rounding times the condition of a small tower.
inline constexpr double kSolved = 1e-8;

/// |value - expected| <= relative * |expected|
class IsNear : public Catch::MatcherBase<double> {
 public:
  IsNear(double expected, double relative, double absolute)
      : expected_(expected), relative_(relative), absolute_(absolute) {}
  [[nodiscard]] bool match(const double& value) const override;
  [[nodiscard]] std::string describe() const override;

 private:
  double expected_;
  double relative_;
  double absolute_;
};
[[nodiscard]] IsNear is_near(double expected, double relative, double absolute = 0.0);

/// max |A - B| <= relative * max |B|, sizes equal
class MatrixNear : public Catch::MatcherBase<Eigen::MatrixXd> {
 public:
  MatrixNear(Eigen::MatrixXd expected, double relative)
      : expected_(std::move(expected)), relative_(relative) {}
  [[nodiscard]] bool match(const Eigen::MatrixXd& value) const override;
  [[nodiscard]] std::string describe() const override;

 private:
  Eigen::MatrixXd expected_;
  double relative_;
};
[[nodiscard]] MatrixNear matrix_near(const Eigen::MatrixXd& expected, double relative);

/// PhiT M Phi = I to the tolerance.
class Orthonormal : public Catch::MatcherBase<Eigen::MatrixXd> {
 public:
  Orthonormal(SparseMatrix mass, double tolerance) : mass_(std::move(mass)), tolerance_(tolerance) {}
  [[nodiscard]] bool match(const Eigen::MatrixXd& shapes) const override;
  [[nodiscard]] std::string describe() const override;

 private:
  SparseMatrix mass_;
  double tolerance_;
};
[[nodiscard]] Orthonormal m_orthonormal(const SparseMatrix& mass, double tolerance = kSolved);

/// The columns span the same subspace: the projector onto one leaves the other as it is, in the inner product
/// of M.
class SameSubspace : public Catch::MatcherBase<Eigen::MatrixXd> {
 public:
  SameSubspace(Eigen::MatrixXd expected, SparseMatrix mass, double tolerance)
      : expected_(std::move(expected)), mass_(std::move(mass)), tolerance_(tolerance) {}
  [[nodiscard]] bool match(const Eigen::MatrixXd& shapes) const override;
  [[nodiscard]] std::string describe() const override;

 private:
  Eigen::MatrixXd expected_;
  SparseMatrix mass_;
  double tolerance_;
};
/// \param expected  M-orthonormal columns.
[[nodiscard]] SameSubspace same_subspace(const Eigen::MatrixXd& expected, const SparseMatrix& mass,
                                         double tolerance = 1e-6);

}  // namespace swaymark::test
