#pragma once

#include "core/assembly.hpp"

namespace swaymark {

/// Whether dead load acts: gravity needs a vertical axis.
[[nodiscard]] bool has_gravity(const Assembly& assembly);

/// The nodes' weights under standard gravity along -z [N], n_dof; zero where the tower has no z axis. Every
/// mass scheme gives the same weights, because the rows of M sum to the same nodal masses.
[[nodiscard]] Eigen::VectorXd weights(const Assembly& assembly);

/// Where a support acts: every fixed degree of freedom, then every spring, in the order of the tower's
/// supports.
struct SupportDof {
  std::size_t node = 0;
  Axis axis = Axis::x;
  Index fixed = -1;  ///< number among the fixed degrees of freedom, or -1
  Index free = -1;   ///< number among the free ones where a spring acts, or -1
};
[[nodiscard]] std::vector<SupportDof> support_dofs(const Tower& tower, const Assembly& assembly);

/// Forces that the supports exert on the tower [N], n_support_dofs x m, along the axes.
///
///   fixed:   K_sf u + f_s      spring: -k u
///
/// \param displacement   u_f [m], n_free x m.
/// \param support_force  f_s [N], n_fixed x m: what must be added at the fixed degrees of freedom, the
/// inertia or
///                       the weight that acts on the supported nodes themselves.
[[nodiscard]] Eigen::MatrixXd reactions(const std::vector<SupportDof>& supports, const Assembly& assembly,
                                        const Eigen::MatrixXd& displacement,
                                        const Eigen::MatrixXd& support_force);

/// Centroid [m] of the supported nodes at the lowest level at which the tower is supported.
[[nodiscard]] Eigen::Vector3d support_centroid(const Tower& tower);

}  // namespace swaymark
