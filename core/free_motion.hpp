#pragma once

#include <vector>

#include "core/assembly.hpp"

namespace swaymark {

/// What shows that a motion strains nothing.
enum class MotionClass {
  loose_node,  ///< a node without a bar
  node,        ///< one node, square to all its bars
  body,        ///< nodes joined by bars that move together as a rigid body, for want of supports
  shape,       ///< several nodes, between bars that keep their lengths
};

/// One way in which nodes can move without straining any bar or spring.
struct FreeMotion {
  struct Part {
    std::size_t node = 0;
    Eigen::Vector3d direction = Eigen::Vector3d::Zero();  ///< largest component over the motion: 1
  };
  MotionClass found_as = MotionClass::shape;
  std::vector<Part> parts;  ///< those that move, largest first

  /// Zero where the node stands still.
  [[nodiscard]] Eigen::Vector3d of(std::size_t node) const;
};

struct FreeMotions {
  std::vector<FreeMotion> list;  ///< independent of each other
  bool complete = true;          ///< false where there are more, which could not be told apart
};

/// Finds all that a pin-jointed tower leaves free, by geometry alone: every bar and spring counts with unit
/// stiffness, so that a soft bar is never taken for a missing one.
///
/// First each node with its neighbours held: a direction that no bar or support opposes. With those held,
/// each part that bars join as a rigid body on its supports. With those held as well, the whole:
/// strainless_motions(). Cost: one sparse factorisation where the tower is stable.
[[nodiscard]] FreeMotions find_free_motions(const Tower& tower, const Assembly& assembly);

}  // namespace swaymark
