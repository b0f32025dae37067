#include "core/point_grid.hpp"

#include <algorithm>
#include <random>
#include <set>

#include <catch2/catch.hpp>

namespace swaymark::test {

namespace {

std::vector<std::size_t> names_around(const PointGrid& grid, const Eigen::Vector3d& position) {
  std::vector<std::size_t> names;
  grid.around(position, [&](std::size_t name, const Eigen::Vector3d& /*at*/) { names.push_back(name); });
  std::sort(names.begin(), names.end());
  return names;
}

}  // namespace

TEST_CASE("every point within the reach is found") {
  constexpr double reach = 0.1;
  std::mt19937 random(7);
  std::uniform_real_distribution<double> coordinate(-1.0, 1.0);
  std::vector<Eigen::Vector3d> points;
  PointGrid grid(reach);
  for (std::size_t i = 0; i < 2000; ++i) {
    points.emplace_back(coordinate(random), coordinate(random), coordinate(random));
    grid.add(i, points.back());
  }
  std::size_t near = 0;
  std::size_t visited = 0;
  for (const Eigen::Vector3d& from : points) {
    const auto names = names_around(grid, from);
    visited += names.size();
    for (std::size_t i = 0; i < points.size(); ++i) {
      if ((points[i] - from).norm() > reach) continue;
      ++near;
      REQUIRE(std::binary_search(names.begin(), names.end(), i));
    }
  }
  CHECK(near > points.size());                          // there were neighbours to find
  CHECK(visited < points.size() * points.size() / 10);  // and most others were not looked at
}

TEST_CASE("a point on the border of a cube is found from both sides") {
  PointGrid grid(1.0);
  grid.add(5, {4.0, 0.0, -4.0});
  CHECK(names_around(grid, {3.5, -0.5, -4.5}) == std::vector<std::size_t>{5});
  CHECK(names_around(grid, {4.5, 0.5, -3.5}) == std::vector<std::size_t>{5});
  CHECK(names_around(grid, {40.0, 0.0, 0.0}).empty());
}

TEST_CASE("neighbouring triples of numbers are mixed to different numbers") {
  std::set<std::uint64_t> seen;
  for (std::int64_t i = -10; i < 10; ++i) {
    for (std::int64_t j = -10; j < 10; ++j) {
      for (std::int64_t k = -10; k < 10; ++k) seen.insert(mixed({i, j, k}));
    }
  }
  CHECK(seen.size() == 8000);
}

}  // namespace swaymark::test
