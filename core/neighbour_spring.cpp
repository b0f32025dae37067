#include "core/neighbour_spring.hpp"

#include <Eigen/QR>

#include "core/open_direction.hpp"

namespace swaymark {

namespace {

constexpr double kSolved = 1e-9;  // of the condition that the neighbours' middle is the node

Eigen::VectorXd weights_of(const Tower& tower, std::size_t node, const std::vector<std::size_t>& neighbours) {
  const auto count = static_cast<Index>(neighbours.size());
  Eigen::MatrixXd conditions(4, count);
  double size = 0.0;
  for (Index i = 0; i < count; ++i) {
    const Eigen::Vector3d arm =
        tower.nodes[neighbours[static_cast<std::size_t>(i)]].position - tower.nodes[node].position;
    conditions(0, i) = 1.0;
    conditions.block<3, 1>(1, i) = arm;
    size = std::max(size, arm.norm());
  }
  conditions.bottomRows(3) /= size;
  const Eigen::Vector4d wanted(1.0, 0.0, 0.0, 0.0);
  const Eigen::VectorXd weights = conditions.completeOrthogonalDecomposition().solve(wanted);
  if ((conditions * weights - wanted).norm() < kSolved) return weights;
  return Eigen::VectorXd::Constant(count, 1.0 / static_cast<double>(count));
}

}  // namespace

std::vector<NeighbourSpring> neighbour_springs(const Tower& tower, const DofMap& dofs) {
  std::vector<NeighbourSpring> springs;
  if (tower.stabilisers.empty()) return springs;
  std::vector<std::vector<std::size_t>> neighbours(tower.nodes.size());
  for (const Bar& bar : tower.bars) {
    neighbours[bar.from].push_back(bar.to);
    neighbours[bar.to].push_back(bar.from);
  }
  const auto open = open_directions(tower);
  for (const Stabiliser& stabiliser : tower.stabilisers) {
    const auto& around = neighbours[stabiliser.node];
    if (around.empty()) continue;
    const Eigen::VectorXd weights = weights_of(tower, stabiliser.node, around);
    for (const Eigen::Vector3d& direction : open[stabiliser.node]) {
      NeighbourSpring spring{stabiliser.node, {}, stabiliser.stiffness};
      for (std::size_t k = 0; k < dofs.axes().size(); ++k) {
        const double along = direction[index_of(dofs.axes()[k])];
        if (along == 0.0) continue;
        spring.elongation.emplace_back(dofs.dof(stabiliser.node, k), along);
        for (std::size_t i = 0; i < around.size(); ++i)
          spring.elongation.emplace_back(dofs.dof(around[i], k), -along * weights(static_cast<Index>(i)));
      }
      springs.push_back(std::move(spring));
    }
  }
  return springs;
}

}  // namespace swaymark
