#pragma once

#include "core/assembly.hpp"
#include "core/statics.hpp"
#include "modal/eigenproblem.hpp"

namespace swaymark {

/// Every response quantity of a set of displacement states, one column a state, signed.
struct Responses {
  Eigen::MatrixXd displacement;    ///< n_free x m [m], relative to the ground
  Eigen::MatrixXd bar_force;       ///< n_bars x m [N], tension positive
  Eigen::MatrixXd reaction;        ///< n_support_dofs x m [N], on the tower
  Eigen::RowVectorXd base_shear;   ///< m [N], along the excitation
  Eigen::RowVectorXd overturning;  ///< m [N m]; empty for vertical excitation
};

/// What one direction of excitation needs of the tower.
struct Excitation {
  Axis axis = Axis::x;
  Eigen::VectorXd drive;  ///< b, n_free [kg]
  Eigen::VectorXd
      tilt;  ///< b of a unit tilt about the supports' centroid, n_free [kg m]; empty where there is none
};

[[nodiscard]] Excitation excitation_along(const Tower& tower, const Assembly& assembly, Axis axis);

/// Modal peaks: column j is the response in mode j at the displacement phi_j Gamma_j Sa_j / omega_j^2. The
/// inertia of the supported nodes, M_sf u'', goes straight into the reactions, so that they add up to the
/// base shear m_j Sa_j mode by mode. \param gamma n_modes [sqrt(kg)].    \param acceleration Sa, n_modes
/// [m/s2].
[[nodiscard]] Responses modal_peaks(const Assembly& assembly, const std::vector<SupportDof>& supports,
                                    const Modes& modes, const Excitation& excitation,
                                    const Eigen::VectorXd& gamma, const Eigen::VectorXd& acceleration);

/// The response of the mass that the modes kept do not take along: all other modes move rigidly with the
/// ground, at the zero-period acceleration, under the static forces (b - M Phi Gamma) Sa(0). One column.
/// Source: the residual rigid response of US NRC RG 1.92 (from memory); the same as adding every mode left
/// out with Sa(0), which is how it is tested. \param rigid_acceleration  M_ff^-1 b [-], n_free.
[[nodiscard]] Responses missing_mass_peak(const Assembly& assembly, const std::vector<SupportDof>& supports,
                                          const Factorisation& stiffness, const Modes& modes,
                                          const Excitation& excitation, const Eigen::VectorXd& gamma,
                                          const Eigen::VectorXd& rigid_acceleration,
                                          double zero_period_acceleration);

}  // namespace swaymark
