#pragma once

#include <vector>

#include "core/bar.hpp"
#include "core/dof_map.hpp"
#include "core/liquid.hpp"
#include "core/matrix.hpp"
#include "core/neighbour_spring.hpp"
#include "core/tower.hpp"

namespace swaymark {

/// The matrices of a tower; f: free, s: fixed degrees of freedom.
struct Assembly {
  DofMap dofs;
  std::vector<BarElement> bars;
  SparseMatrix stiffness;          ///< K_ff [N/m], n_free x n_free, support springs included
  SparseMatrix support_stiffness;  ///< K_sf [N/m], n_fixed x n_free
  SparseMatrix mass;               ///< M_ff [kg], n_free x n_free
  SparseMatrix support_mass;       ///< M_sf [kg], n_fixed x n_free
  SparseMatrix mass_all;           ///< M [kg], n_dof x n_dof
  SparseMatrix axial;       ///< n_bars x n_free: bar forces [N], tension positive, from free displacements
  Eigen::VectorXd springs;  ///< n_free: stiffness of the support spring at each free dof [N/m]
  std::vector<Link> links;  ///< springs between nodes that are no bars
  std::vector<NeighbourSpring> stabilisers;  ///< one for each direction of each stabilised node
};

/// \throws ComputationError if a coefficient is not finite.    Cost: linear in nodes and bars.
[[nodiscard]] Assembly assemble(const Tower& tower);

/// r [-], n_dof: displacement of every degree of freedom for a unit translation along the axis.
[[nodiscard]] Eigen::VectorXd rigid_translation(const DofMap& dofs, Axis axis);

/// w [m], n_dof: displacement for a unit rotation that moves what lies above `centre` along +direction; about
/// the horizontal axis square to `direction` (x or y) through `centre`.
[[nodiscard]] Eigen::VectorXd rigid_tilt(const Tower& tower, const DofMap& dofs, Axis direction,
                                         const Eigen::Vector3d& centre);

/// b = M_ff r_f + M_fs r_s [kg], n_free: how ground motion along r drives the free degrees of freedom. With
/// r replaced by a tilt it gives the moment of the inertia forces.
[[nodiscard]] Eigen::VectorXd inertia_vector(const Assembly& assembly, const Eigen::VectorXd& rigid);

/// b of a translation along each axis [kg], n_free x n_axes: column k belongs to the tower's k-th axis.
[[nodiscard]] Eigen::MatrixXd inertia_vectors(const Assembly& assembly);

}  // namespace swaymark
