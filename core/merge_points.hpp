#pragma once

#include <cstddef>
#include <optional>
#include <vector>

#include <Eigen/Core>

/// Points of a drawing that mean one node. Private to the library.
namespace swaymark {

/// Points that are one because steps within the tolerance lead from each to each.
struct MergedPoints {
  std::vector<std::size_t> first;  ///< by point: the earliest one of its cluster, which stands for it
  std::vector<double>
      extent;  ///< by point, where it is the first: diagonal of the box around the cluster [m]
  /// A point with so many others around it that the search was given up.
  std::optional<std::size_t> crowded = {};
};

/// Joins points whose distance is at most `within` [m] > 0, and what is joined with one of them in turn. The
/// clusters do not depend on the order of the points. Where the extent of a cluster is at most `within`, no
/// point is farther than that from any other of its cluster.
[[nodiscard]] MergedPoints merge_points(const std::vector<Eigen::Vector3d>& points, double within);

}  // namespace swaymark
