#include "core/statics.hpp"

#include <algorithm>

#include "core/quantity.hpp"

namespace swaymark {

bool has_gravity(const Assembly& assembly) {
  const auto& axes = assembly.dofs.axes();
  return std::find(axes.begin(), axes.end(), Axis::z) != axes.end();
}

Eigen::VectorXd weights(const Assembly& assembly) {
  return -kStandardGravity * (assembly.mass_all * rigid_translation(assembly.dofs, Axis::z));
}

std::vector<SupportDof> support_dofs(const Tower& tower, const Assembly& assembly) {
  std::vector<SupportDof> list;
  const DofMap& dofs = assembly.dofs;
  for (const Support& support : tower.supports) {
    for (std::size_t k = 0; k < dofs.axes().size(); ++k) {
      const auto axis = static_cast<std::size_t>(dofs.axes()[k]);
      const Index dof = dofs.dof(support.node, k);
      if (support.fixed[axis]) {
        list.push_back({support.node, dofs.axes()[k], dofs.fixed(dof), -1});
      } else if (support.spring[axis] > 0.0) {
        list.push_back({support.node, dofs.axes()[k], -1, dofs.free(dof)});
      }
    }
  }
  return list;
}

Eigen::MatrixXd reactions(const std::vector<SupportDof>& supports, const Assembly& assembly,
                          const Eigen::MatrixXd& displacement, const Eigen::MatrixXd& support_force) {
  const Eigen::MatrixXd fixed = assembly.support_stiffness * displacement + support_force;
  Eigen::MatrixXd result(static_cast<Index>(supports.size()), displacement.cols());
  for (std::size_t i = 0; i < supports.size(); ++i) {
    const auto row = static_cast<Index>(i);
    if (supports[i].fixed >= 0) {
      result.row(row) = fixed.row(supports[i].fixed);
    } else {
      result.row(row) = -assembly.springs(supports[i].free) * displacement.row(supports[i].free);
    }
  }
  return result;
}

Eigen::Vector3d support_centroid(const Tower& tower) {
  Eigen::Vector3d sum = Eigen::Vector3d::Zero();
  if (tower.supports.empty()) return sum;
  double lowest = tower.nodes[tower.supports.front().node].position.z();
  for (const Support& support : tower.supports)
    lowest = std::min(lowest, tower.nodes[support.node].position.z());
  const double tolerance = 1e-6 * std::max(1.0, tower.extent());
  int count = 0;
  for (const Support& support : tower.supports) {
    const Eigen::Vector3d& at = tower.nodes[support.node].position;
    if (at.z() > lowest + tolerance) continue;
    sum += at;
    ++count;
  }
  return sum / count;
}

}  // namespace swaymark
