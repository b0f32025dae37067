#pragma once

#include <string>
#include <vector>

#include "core/assembly.hpp"

namespace swaymark {

/// One way in which nodes can move without straining any bar or spring.
struct Mechanism {
  struct Motion {
    std::size_t node = 0;
    Eigen::Vector3d direction = Eigen::Vector3d::Zero();  ///< largest component over the mechanism: 1
  };
  std::string kind;
  std::vector<Motion> motion;  ///< largest first
  std::vector<std::string> cures;
};

struct MechanismReport {
  std::vector<Mechanism> mechanisms;
  bool complete = true;  ///< false where the list was cut because there are very many

  [[nodiscard]] bool any() const { return !mechanisms.empty(); }
};

/// Finds what lets a pin-jointed tower move.
///
/// The search looks at geometry only: every bar and spring counts with unit stiffness, so that a soft bar is
/// never taken for a missing one. First each node is looked at with its neighbours held (a direction no bar
/// or support opposes); then, with those held, the whole: a null space of the unit stiffness found by inverse
/// iteration and confirmed by the elongations themselves, which are accurate to rounding where uT K u is not.
/// Cost: one sparse factorisation where the tower is stable.
[[nodiscard]] MechanismReport find_mechanisms(const Tower& tower, const Assembly& assembly);

}  // namespace swaymark
