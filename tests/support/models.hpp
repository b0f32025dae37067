#pragma once

#include "core/assembly.hpp"
#include "modal/eigenproblem.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

/// Matrices of towers, and a second eigensolver to hold the project's against.
namespace swaymark::test {

struct Model {
  Assembly assembly;
  Eigen::MatrixXd drive;  ///< b of every axis, n_free x n_axes

  [[nodiscard]] const SparseMatrix& stiffness() const { return assembly.stiffness; }
  [[nodiscard]] const SparseMatrix& mass() const { return assembly.mass; }
  [[nodiscard]] Eigenproblem problem() const { return {assembly.stiffness, assembly.mass}; }
};

[[nodiscard]] Model model_of(const Tower& tower);

/// All modes from Eigen's generalized symmetric solver on the full matrices: a general-purpose reference
/// library that goes another way (Cholesky of M, not of K). M positive definite.
struct Oracle {
  Eigen::VectorXd omega;   ///< ascending [rad/s]
  Eigen::MatrixXd shapes;  ///< M-orthonormal
};

[[nodiscard]] Oracle oracle_of(const Eigen::MatrixXd& stiffness, const Eigen::MatrixXd& mass);

[[nodiscard]] Oracle oracle_of(const Model& model);

/// Frequencies of two solvers: each is good to rounding times the spread of the eigenvalues of a small tower.
inline constexpr double kTwoSolvers = 1e-8;

/// Frequencies agree, and so do the subspaces of all modes that a clear gap separates from the others.
void check_same_modes(const Modes& modes, const Oracle& oracle, const SparseMatrix& mass);

/// A mast without a mass of its own: only the top nodes have inertia.
[[nodiscard]] Tower massless_mast(int legs, int panels);

}  // namespace swaymark::test
