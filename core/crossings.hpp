#pragma once

#include <cstddef>
#include <vector>

#include <Eigen/Core>

/// Where straight bars of a drawing meet away from a common node. Geometry alone; private to the library.
namespace swaymark {

/// A bar between two points, by their indices.
struct Stick {
  std::size_t from = 0;
  std::size_t to = 0;
};

enum class MeetingKind {
  crossing,     ///< within both
  end_on,       ///< `node`, the end of one, within the other
  node_on,      ///< `node`, no end of either, within `first`; there is no second
  overlap,      ///< they lie on each other for `length`
  nearly_ends,  ///< their ends, which are different points `length` apart, are where they touch
};

struct Meeting {
  MeetingKind kind = MeetingKind::crossing;
  std::size_t first = 0;                               ///< a stick; of `end_on` the one that ends there
  std::size_t second = 0;                              ///< another
  std::size_t node = 0;                                ///< a point, where the kind has one
  Eigen::Vector3d position = Eigen::Vector3d::Zero();  ///< [m]
  double length = 0.0;                                 ///< [m], where the kind has one
};

struct Meetings {
  std::vector<Meeting> list;  ///< by the earlier stick, then along it
  bool complete = true;       ///< false: the sticks lie so densely that the search was given up
};

/// Every meeting of two sticks that come nearer than `within` [m] > 0 and of a stick with a point.
///
/// Sticks that share a point are only looked at for an overlap, and those that share both not at all. A stick
/// counts as ending somewhere if its end is nearer than `within` along it. \param points  [m], farther than
/// `within` from each other. \param sticks  each longer than 0. Closest points of two segments after
/// C. Ericson, Real-Time Collision Detection (2005), 5.1.9, from memory.
[[nodiscard]] Meetings find_meetings(const std::vector<Eigen::Vector3d>& points,
                                     const std::vector<Stick>& sticks, double within);

}  // namespace swaymark
