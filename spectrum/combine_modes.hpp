#pragma once

#include "core/matrix.hpp"
#include "core/request.hpp"

namespace swaymark {

/// CQC correlation of two modes, with r = omega_j / omega_i:
///
///   rho = 8 sqrt(zi zj) (zi + r zj) r^1.5 / [(1 - r^2)^2 + 4 zi zj r (1 + r^2) + 4 (zi^2 + zj^2) r^2]
///
/// Source: E. L. Wilson, A. Der Kiureghian, E. P. Bayo, Earthquake Engineering & Structural Dynamics 9 (1981)
/// (from memory); equal to the covariance of two oscillators under white noise. Swapping the modes changes
/// nothing. Where both dampings are zero it is 1 for equal frequencies and 0 otherwise, the limit.
/// \param omega_i [rad/s] > 0; omega_j likewise.    \param damping_i fraction of critical in [0, 1);
/// damping_j likewise.
[[nodiscard]] double cqc_correlation(double omega_i, double omega_j, double damping_i, double damping_j);

/// P = [rho_ij], the CQC correlation of every pair of modes, n_modes x n_modes.
[[nodiscard]] Eigen::MatrixXd correlation_matrix(const Eigen::VectorXd& omega,
                                                 const Eigen::VectorXd& damping);

/// Peak of every response from its modal peaks.
///
///   CQC           R^2 = sum_ij rho_ij R_i R_j + R_0^2
///   SRSS          R^2 = sum_i R_i^2 + R_0^2
///   absolute sum  R   = sum_i |R_i| + |R_0|
///
/// R_0 is the response to the missing mass: one more term, correlated with none.
/// \param peaks        n_responses x n_modes, signed.
/// \param residual     n_responses, R_0.
/// \param correlation  n_modes x n_modes; used by CQC.
/// \return n_responses, >= 0.
[[nodiscard]] Eigen::VectorXd combine_modes(const Eigen::MatrixXd& peaks, const Eigen::VectorXd& residual,
                                            ModalRule rule, const Eigen::MatrixXd& correlation);

/// Whether two neighbouring modes are closer than ten percent: (f_j - f_i) / f_i <= 0.1 (US NRC RG 1.92 rev.
/// 1, from memory), so that SRSS may not be used.    \param omega ascending.
[[nodiscard]] bool has_close_modes(const Eigen::VectorXd& omega);

}  // namespace swaymark
