#include "core/point_grid.hpp"

#include <cmath>

namespace swaymark {

namespace {

constexpr double kCubeWidth = 4.0;  // times the reach: most surroundings then lie in one cube

}  // namespace

std::uint64_t mixed(const std::array<std::int64_t, 3>& numbers) {
  std::uint64_t hash = 0;
  for (const std::int64_t number : numbers) {
    // An odd factor near 2^64 over the golden ratio, and the high bits folded down (D. E. Knuth, The Art of
    // Computer Programming, vol. 3, 6.4: multiplicative hashing).
    hash = (hash ^ static_cast<std::uint64_t>(number)) * 0x9E3779B97F4A7C15U;
    hash ^= hash >> 32U;
  }
  return hash;
}

PointGrid::PointGrid(double reach) : reach_(reach) {}

std::size_t PointGrid::Hash::operator()(const Cube& cube) const {
  return static_cast<std::size_t>(mixed(cube));
}

std::int64_t PointGrid::cube_along(double coordinate) const {
  return static_cast<std::int64_t>(std::floor(coordinate / (kCubeWidth * reach_)));
}

void PointGrid::add(std::size_t name, const Eigen::Vector3d& position) {
  const Cube cube{cube_along(position.x()), cube_along(position.y()), cube_along(position.z())};
  const auto [head, fresh] = heads_.emplace(cube, kNone);
  entries_.push_back({name, position, fresh ? kNone : head->second});
  head->second = entries_.size() - 1;
}

PointGrid::Surroundings PointGrid::cubes_around(const Eigen::Vector3d& position) const {
  Surroundings result;
  for (std::size_t axis = 0; axis < 3; ++axis) {
    const double coordinate = position[static_cast<Eigen::Index>(axis)];
    const std::int64_t low = cube_along(coordinate - reach_);
    const std::int64_t high = cube_along(coordinate + reach_);
    const std::size_t count = result.count;
    for (std::size_t i = 0; i < count; ++i) {
      result.cubes[i][axis] = low;
      if (high == low) continue;
      result.cubes[result.count] = result.cubes[i];
      result.cubes[result.count++][axis] = high;
    }
  }
  return result;
}

}  // namespace swaymark
