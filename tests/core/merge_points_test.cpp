#include "core/merge_points.hpp"

#include <algorithm>
#include <random>

#include <catch2/catch.hpp>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

using Points = std::vector<Eigen::Vector3d>;
using Indices = std::vector<std::size_t>;

}  // namespace

TEST_CASE("points within the tolerance become the first of them") {
  const Points points{{0, 0, 0}, {1, 0, 0}, {0.0004, 0, 0}, {1, 0.0005, 0}, {1, 0, 0}, {0, 0.002, 0}};
  const MergedPoints merged = merge_points(points, 1e-3);
  CHECK(merged.first == Indices{0, 1, 0, 1, 1, 5});
  CHECK_FALSE(merged.crowded);
  CHECK_THAT(merged.extent[0], is_near(0.0004, kRoundoff));
  CHECK_THAT(merged.extent[1], is_near(0.0005, kRoundoff));
  CHECK(merged.extent[5] == 0.0);
}

TEST_CASE("the two zeros are one place") {
  CHECK(merge_points({{0.0, 0.0, 0.0}, {-0.0, 0.0, -0.0}}, 1e-6).first == Indices{0, 0});
}

TEST_CASE("a chain is one cluster that extends over its whole length in whatever order it comes") {
  Points chain;
  for (int i = 0; i < 6; ++i) chain.emplace_back(0.0008 * i, 2.0, 3.0);
  std::mt19937 random(3);
  for (int round = 0; round < 20; ++round) {
    const MergedPoints merged = merge_points(chain, 1e-3);
    CHECK(merged.first == Indices(6, 0));
    CHECK_THAT(merged.extent[0], is_near(0.004, 1e-9));  // coordinates near 3 m carry 1e-15 m
    std::shuffle(chain.begin(), chain.end(), random);
  }
}

TEST_CASE("clusters are those that comparing every pair gives") {
  constexpr double within = 0.02;
  std::mt19937 random(11);
  std::uniform_real_distribution<double> coordinate(0.0, 0.4);
  Points points;
  for (int i = 0; i < 400; ++i)
    points.emplace_back(coordinate(random), coordinate(random), coordinate(random));
  Indices label(points.size());
  for (std::size_t i = 0; i < label.size(); ++i) label[i] = i;
  for (bool changed = true; changed;) {
    changed = false;
    for (std::size_t i = 0; i < points.size(); ++i) {
      for (std::size_t j = 0; j < points.size(); ++j) {
        if (label[j] >= label[i] || (points[i] - points[j]).norm() > within) continue;
        label[i] = label[j];
        changed = true;
      }
    }
  }
  CHECK(merge_points(points, within).first == label);
}

TEST_CASE("a crowd that no drawing has is given up and told") {
  Points points;
  for (int i = 0; i < 5000; ++i) points.emplace_back(1e-5 * i, 0.0, 0.0);
  CHECK(merge_points(points, 1.0).crowded.has_value());
  CHECK_FALSE(merge_points(points, 1e-6).crowded.has_value());
  CHECK_FALSE(merge_points(Points(5000, Eigen::Vector3d(1, 2, 3)), 1.0).crowded.has_value());
}

TEST_CASE("no points are no clusters") { CHECK(merge_points({}, 1.0).first.empty()); }

}  // namespace swaymark::test
