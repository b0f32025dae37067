#include "spectrum/peak.hpp"

namespace swaymark {

namespace {

// displacement u, n_free x m; acceleration a, n_free x m [m/s2]: what the inertia forces M a of these states
// come from, positive along the forces that bend the tower.
Responses responses_of(const Assembly& assembly, const std::vector<SupportDof>& supports,
                       const Excitation& excitation, const Eigen::MatrixXd& displacement,
                       const Eigen::MatrixXd& acceleration) {
  Responses result;
  result.displacement = displacement;
  result.bar_force = assembly.axial * displacement;
  result.reaction = reactions(supports, assembly, displacement, -(assembly.support_mass * acceleration));
  result.base_shear = excitation.drive.transpose() * acceleration;
  if (excitation.tilt.size() > 0) result.overturning = excitation.tilt.transpose() * acceleration;
  return result;
}

}  // namespace

Excitation excitation_along(const Tower& tower, const Assembly& assembly, Axis axis) {
  Excitation excitation;
  excitation.axis = axis;
  excitation.drive = inertia_vector(assembly, rigid_translation(assembly.dofs, axis));
  if (axis != Axis::z && has_gravity(assembly)) {
    excitation.tilt =
        inertia_vector(assembly, rigid_tilt(tower, assembly.dofs, axis, support_centroid(tower)));
  }
  return excitation;
}

Responses modal_peaks(const Assembly& assembly, const std::vector<SupportDof>& supports, const Modes& modes,
                      const Excitation& excitation, const Eigen::VectorXd& gamma,
                      const Eigen::VectorXd& acceleration) {
  const Eigen::VectorXd scale = gamma.array() * acceleration.array();
  const Eigen::MatrixXd a = modes.shapes * scale.asDiagonal();
  const Eigen::MatrixXd u = a * modes.omega.array().square().inverse().matrix().asDiagonal();
  return responses_of(assembly, supports, excitation, u, a);
}

Responses missing_mass_peak(const Assembly& assembly, const std::vector<SupportDof>& supports,
                            const Factorisation& stiffness, const Modes& modes, const Excitation& excitation,
                            const Eigen::VectorXd& gamma, const Eigen::VectorXd& rigid_acceleration,
                            double zero_period_acceleration) {
  const Eigen::VectorXd a = (rigid_acceleration - modes.shapes * gamma) * zero_period_acceleration;
  return responses_of(assembly, supports, excitation, stiffness.solve(assembly.mass * a), a);
}

}  // namespace swaymark
