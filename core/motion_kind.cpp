#include "core/motion_kind.hpp"

#include <algorithm>
#include <cmath>

#include <Eigen/Cholesky>
#include <Eigen/Geometry>

namespace swaymark {

namespace {

constexpr double kSame = 1e-6;  // of a unit direction or of the tower's extent

}  // namespace

MotionKinds::MotionKinds(const Tower& tower) : tower_(tower), bars_at_(tower.nodes.size()) {
  for (const Bar& bar : tower.bars) {
    const Eigen::Vector3d along =
        (tower.nodes[bar.to].position - tower.nodes[bar.from].position).normalized();
    bars_at_[bar.from].push_back(along);
    bars_at_[bar.to].emplace_back(-along);
  }
}

MotionKind MotionKinds::of(const FreeMotion& motion) const {
  switch (motion.found_as) {
    case MotionClass::loose_node:
      return MotionKind::loose_node;
    case MotionClass::node:
      return of_node(motion.parts.front().node);
    case MotionClass::body:
      return MotionKind::on_too_few_supports;
    default:
      return of_shape(motion);
  }
}

MotionKind MotionKinds::of_node(std::size_t node) const {
  const auto& bars = bars_at_[node];
  const auto parallel = [](const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
    return a.cross(b).norm() < kSame;
  };
  const bool one_line = std::all_of(bars.begin(), bars.end(),
                                    [&](const Eigen::Vector3d& bar) { return parallel(bar, bars.front()); });
  if (one_line) return MotionKind::line_node;
  std::size_t opposite = 0;
  for (std::size_t i = 0; i < bars.size(); ++i) {
    for (std::size_t j = 0; j < i; ++j) opposite += (bars[i] + bars[j]).norm() < kSame ? 1 : 0;
  }
  if (opposite == 1 && bars.size() >= 3) return MotionKind::mid_node;
  return opposite == 2 && bars.size() == 4 ? MotionKind::crossing_node : MotionKind::face_node;
}

MotionKind MotionKinds::of_shape(const FreeMotion& motion) const {
  std::vector<bool> moves(tower_.nodes.size(), false);
  double lowest = height(motion.parts.front().node);
  double highest = lowest;
  bool level = true;
  for (const auto& part : motion.parts) {
    moves[part.node] = true;
    lowest = std::min(lowest, height(part.node));
    highest = std::max(highest, height(part.node));
    level = level && std::abs(part.direction.z()) <= kSame;
  }
  const double near = kSame * tower_.extent();
  const bool rigid = is_rigid(motion);
  bool all_above = true;
  bool whole_level = true;
  for (std::size_t n = 0; n < tower_.nodes.size(); ++n) {
    if (moves[n] || bars_at_[n].empty()) continue;
    all_above = all_above && height(n) < lowest + near;
    whole_level = whole_level && std::abs(height(n) - lowest) > near;
  }
  const bool flat = highest - lowest <= near && level && tower_.dimensions == 3;
  if (flat && !(rigid && whole_level)) return MotionKind::plan_distortion;
  if (rigid && level && whole_level && (all_above || highest - lowest <= near)) return MotionKind::sway;
  return rigid ? MotionKind::part_as_body : MotionKind::changes_shape;
}

// Whether the nodes that move keep their distances: u = t + w x r to within the noise.
bool MotionKinds::is_rigid(const FreeMotion& motion) const {
  using Motions = Eigen::Matrix<double, 3, 6>;
  const Eigen::Vector3d origin = tower_.nodes[motion.parts.front().node].position;
  double size = 0.0;
  for (const auto& part : motion.parts)
    size = std::max(size, (tower_.nodes[part.node].position - origin).norm());
  const auto rigid_at = [&](std::size_t node) {
    const Eigen::Vector3d r = (tower_.nodes[node].position - origin) / (size > 0.0 ? size : 1.0);
    Motions rigid;
    rigid.leftCols<3>().setIdentity();
    rigid.rightCols<3>() << 0.0, r.z(), -r.y(), -r.z(), 0.0, r.x(), r.y(), -r.x(), 0.0;
    return rigid;
  };
  Eigen::Matrix<double, 6, 6> normal = Eigen::Matrix<double, 6, 6>::Zero();
  Eigen::Matrix<double, 6, 1> right = Eigen::Matrix<double, 6, 1>::Zero();
  for (const auto& part : motion.parts) {
    const Motions rigid = rigid_at(part.node);
    normal += rigid.transpose() * rigid;
    right += rigid.transpose() * part.direction;
  }
  // Nodes in one line leave the turn about it open; LDLT gives one of the solutions.
  const Eigen::Matrix<double, 6, 1> fit = normal.ldlt().solve(right);
  return std::all_of(motion.parts.begin(), motion.parts.end(), [&](const auto& part) {
    return (rigid_at(part.node) * fit - part.direction).cwiseAbs().maxCoeff() < 10.0 * kSame;
  });
}

}  // namespace swaymark
