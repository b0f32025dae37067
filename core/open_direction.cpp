#include "core/open_direction.hpp"

#include <algorithm>
#include <array>

#include <Eigen/Eigenvalues>

namespace swaymark {

namespace {

// Of unit stiffness: a direction is open where its bars oppose it by less.
constexpr double kOpen = 1e-10;

using Held = std::array<bool, 3>;

std::vector<Held> held_axes(const Tower& tower) {
  Held none{true, true, true};
  for (const Axis axis : tower.axes()) none[static_cast<std::size_t>(axis)] = false;
  std::vector<Held> held(tower.nodes.size(), none);
  for (const Support& support : tower.supports) {
    for (std::size_t a = 0; a < 3; ++a)
      held[support.node][a] = held[support.node][a] || support.fixed[a] || support.spring[a] > 0.0;
  }
  for (const Liquid& liquid : tower.liquids) {
    if (liquid.node) held[*liquid.node] = {true, true, true};
  }
  return held;
}

std::vector<Eigen::Vector3d> open_at(Eigen::Matrix3d stiffness, const Held& held) {
  const double largest = std::max(1.0, stiffness.trace());
  for (std::size_t a = 0; a < 3; ++a) {
    if (!held[a]) continue;
    const auto axis = static_cast<Eigen::Index>(a);
    stiffness.row(axis).setZero();
    stiffness.col(axis).setZero();
    stiffness(axis, axis) = 2.0 * largest;
  }
  const Eigen::SelfAdjointEigenSolver<Eigen::Matrix3d> solver(stiffness);
  std::vector<Eigen::Vector3d> open;
  for (Eigen::Index k = 0; k < 3 && solver.eigenvalues()(k) <= kOpen * largest; ++k)
    open.emplace_back(solver.eigenvectors().col(k));
  return open;
}

}  // namespace

std::vector<std::vector<Eigen::Vector3d>> open_directions(const Tower& tower) {
  std::vector<Eigen::Matrix3d> stiffness(tower.nodes.size(), Eigen::Matrix3d::Zero());
  for (const Bar& bar : tower.bars) {
    const Eigen::Vector3d along =
        (tower.nodes[bar.to].position - tower.nodes[bar.from].position).normalized();
    stiffness[bar.from] += along * along.transpose();
    stiffness[bar.to] += along * along.transpose();
  }
  const std::vector<Held> held = held_axes(tower);
  std::vector<std::vector<Eigen::Vector3d>> open;
  open.reserve(tower.nodes.size());
  for (std::size_t node = 0; node < tower.nodes.size(); ++node)
    open.push_back(open_at(stiffness[node], held[node]));
  return open;
}

}  // namespace swaymark
