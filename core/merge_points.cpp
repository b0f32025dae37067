#include "core/merge_points.hpp"

#include <bit>
#include <cstdint>
#include <unordered_map>

#include "core/point_grid.hpp"

namespace swaymark {

namespace {

// Different points around one: far more than the drawn ends of the bars of any joint.
constexpr std::size_t kMostAround = 2000;

// Sets of points by a tree with the earliest point as its root.
class Clusters {
 public:
  explicit Clusters(std::size_t count) : parent_(count) {
    for (std::size_t i = 0; i < count; ++i) parent_[i] = i;
  }
  std::size_t root(std::size_t point) {
    while (parent_[point] != point) {
      parent_[point] = parent_[parent_[point]];
      point = parent_[point];
    }
    return point;
  }
  void join(std::size_t a, std::size_t b) {
    a = root(a);
    b = root(b);
    if (a < b) parent_[b] = a;
    if (b < a) parent_[a] = b;
  }

 private:
  std::vector<std::size_t> parent_;
};

using Bits = std::array<std::int64_t, 3>;
struct BitsHash {
  std::size_t operator()(const Bits& bits) const { return static_cast<std::size_t>(mixed(bits)); }
};

Bits bits_of(const Eigen::Vector3d& point) {
  const auto bits = [](double value) { return std::bit_cast<std::int64_t>(value + 0.0); };  // -0 is 0
  return {bits(point.x()), bits(point.y()), bits(point.z())};
}

void measure(const std::vector<Eigen::Vector3d>& points, MergedPoints& merged) {
  std::vector<Eigen::Vector3d> low = points;
  std::vector<Eigen::Vector3d> high = points;
  for (std::size_t i = 0; i < points.size(); ++i) {
    const std::size_t first = merged.first[i];
    low[first] = low[first].cwiseMin(points[i]);
    high[first] = high[first].cwiseMax(points[i]);
  }
  merged.extent.resize(points.size());
  for (std::size_t i = 0; i < points.size(); ++i) merged.extent[i] = (high[i] - low[i]).norm();
}

}  // namespace

MergedPoints merge_points(const std::vector<Eigen::Vector3d>& points, double within) {
  MergedPoints merged;
  Clusters clusters(points.size());
  std::unordered_map<Bits, std::size_t, BitsHash> same;  // most ends are drawn at the very same point
  same.reserve(points.size());
  PointGrid grid(within);
  for (std::size_t i = 0; i < points.size() && !merged.crowded; ++i) {
    const auto [twin, fresh] = same.emplace(bits_of(points[i]), i);
    if (!fresh) {
      clusters.join(i, twin->second);
      continue;
    }
    std::size_t around = 0;
    grid.around(points[i], [&](std::size_t other, const Eigen::Vector3d& position) {
      ++around;
      if ((position - points[i]).norm() <= within) clusters.join(i, other);
    });
    if (around > kMostAround) merged.crowded = i;
    grid.add(i, points[i]);
  }
  merged.first.resize(points.size());
  for (std::size_t i = 0; i < points.size(); ++i) merged.first[i] = clusters.root(i);
  measure(points, merged);
  return merged;
}

}  // namespace swaymark
