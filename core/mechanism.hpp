#pragma once

#include <string>
#include <vector>

#include "core/free_motion.hpp"

namespace swaymark {

/// Free motions of one kind, which one cure each would hold.
struct Mechanism {
  std::string kind;                 ///< "node square to a face", "plan distortion of a level", ...
  std::string what;                 ///< "24 mid nodes of K-bracing, square to their faces: L1.m1 ... L6.m4"
  std::vector<FreeMotion> motions;  ///< independent of each other
  std::vector<std::string> cures;   ///< the smallest first; of several motions, shown for the first

  [[nodiscard]] std::size_t count() const { return motions.size(); }
};

/// Maxwell's count: bars + restraints - degrees of freedom = states of self-stress - free motions.
struct MaxwellCount {
  Index bars = 0;
  Index restraints = 0;  ///< axes held by a support or a spring, or tied to others as a liquid is
  Index dofs = 0;        ///< nodes times axes

  [[nodiscard]] Index surplus() const { return bars + restraints - dofs; }
};

struct MechanismReport {
  std::vector<Mechanism> mechanisms;
  MaxwellCount maxwell;
  bool complete = true;  ///< false where there are more that could not be told apart

  [[nodiscard]] bool any() const { return !mechanisms.empty() || !complete; }
  /// Independent free motions of all kinds.
  [[nodiscard]] std::size_t count() const;
};

/// What lets a pin-jointed tower move, by kinds, each with what would hold it; see find_free_motions().
[[nodiscard]] MechanismReport find_mechanisms(const Tower& tower, const Assembly& assembly);

}  // namespace swaymark
