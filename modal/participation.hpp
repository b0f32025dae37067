#pragma once

#include "core/matrix.hpp"

/// How ground motion drives the modes. With b = M_ff r_f + M_fs r_s (r: unit translation of everything),
///
///   participation   Gamma_j = phi_jT b           [sqrt(kg)]   as phi_jT M phi_j = 1
///   effective mass  m_j = Gamma_j^2              [kg]
///   moving mass     bT M_ff^-1 b = sum of m_j over all modes    [kg]
///
/// The moving mass is less than the whole: what the supports hold never takes part. Derived; the sum is
/// Parseval's identity in the inner product of M.
namespace swaymark {

/// Gamma, n_modes x n_directions.
/// \param shapes  n_free x n_modes, M-orthonormal.    \param drive  b, n_free x n_directions [kg].
[[nodiscard]] Eigen::MatrixXd participation(const Eigen::MatrixXd& shapes, const Eigen::MatrixXd& drive);

/// M_ff^-1 B, n_free x m; zero at degrees of freedom without mass, which b cannot load either.
[[nodiscard]] Eigen::MatrixXd solve_mass(const SparseMatrix& mass, const Eigen::MatrixXd& right);

/// bT M_ff^-1 b for each direction [kg].
[[nodiscard]] Eigen::VectorXd moving_mass(const SparseMatrix& mass, const Eigen::MatrixXd& drive);

}  // namespace swaymark
