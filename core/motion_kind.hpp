#pragma once

#include <vector>

#include "core/free_motion.hpp"

namespace swaymark {

/// What a free motion is to an engineer; in the order in which they are reported, the most serious first.
enum class MotionKind {
  on_too_few_supports,  ///< a body that supports do not hold
  changes_shape,        ///< several nodes, which do not keep their distances
  part_as_body,         ///< several nodes, which do
  sway,                 ///< all from one level upwards, or one whole level, as a body
  plan_distortion,      ///< nodes of one level, in plan
  mid_node,             ///< of K-bracing, square to its face
  crossing_node,        ///< where two diagonals cross, square to the face
  face_node,            ///< any other node whose bars lie in one plane
  line_node,            ///< a node whose bars lie in one line
  loose_node,           ///< a node without a bar
};

class MotionKinds {
 public:
  explicit MotionKinds(const Tower& tower);

  [[nodiscard]] MotionKind of(const FreeMotion& motion) const;
  [[nodiscard]] bool has_bars(std::size_t node) const { return !bars_at_[node].empty(); }

 private:
  [[nodiscard]] MotionKind of_node(std::size_t node) const;
  [[nodiscard]] MotionKind of_shape(const FreeMotion& motion) const;
  [[nodiscard]] bool is_rigid(const FreeMotion& motion) const;
  [[nodiscard]] double height(std::size_t node) const { return tower_.nodes[node].position.z(); }

  const Tower& tower_;
  std::vector<std::vector<Eigen::Vector3d>> bars_at_;  // by node: unit directions away from it
};

}  // namespace swaymark
