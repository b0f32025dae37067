#pragma once

#include <string>
#include <vector>

#include "core/free_motion.hpp"

namespace swaymark {

/// "x", or "(0.5, 0, 1)" of a direction along no axis.
[[nodiscard]] std::string direction_words(const Eigen::Vector3d& direction);

/// What would hold free motions with the least that is built, the smallest first.
class Cures {
 public:
  explicit Cures(const Tower& tower, const FreeMotions& motions);

  /// Bars from a node that moves to one that does not follow: the two that stiffen most for their length,
  /// each as "a bar from L1.m1 to L1.3". A bar that would lie along others or pass through a node is none.
  [[nodiscard]] std::vector<std::string> bars(const FreeMotion& motion) const;

  /// Supports that hold all of the motions together, one for each: "hold node A1 along x by a support".
  /// Preferably at nodes that have one or stand lowest.
  [[nodiscard]] std::vector<std::string> supports(const std::vector<FreeMotion>& motions) const;

 private:
  struct Candidate {
    std::size_t from = 0;
    std::size_t to = 0;
    double effect = 0.0;  ///< elongation per unit motion
    double length = 0.0;  ///< [m]
  };
  [[nodiscard]] std::vector<Candidate> candidates(const FreeMotion& motion) const;
  [[nodiscard]] bool may_be_built(const Candidate& candidate) const;

  [[nodiscard]] bool is_smaller_change(Index dof, Index than, const Eigen::VectorXd& motion) const;

  const Tower& tower_;
  std::vector<std::vector<std::size_t>> neighbours_;  // by node
  std::vector<std::vector<Eigen::Vector3d>> open_;    // by node: unit directions it is free in by itself
  std::vector<bool> supported_;                       // by node
  double usual_length_ = 0.0;                         // of the bars [m]
};

}  // namespace swaymark
