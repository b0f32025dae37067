#include "core/crossings.hpp"

#include <random>
#include <set>

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

using Points = std::vector<Eigen::Vector3d>;
constexpr double kWithin = 1e-3;

std::vector<Meeting> meetings(const Points& points, const std::vector<Stick>& sticks) {
  const Meetings found = find_meetings(points, sticks, kWithin);
  CHECK(found.complete);
  return found.list;
}

}  // namespace

TEST_CASE("two diagonals cross in their middle") {
  const auto list = meetings({{0, 0, 0}, {2, 0, 2}, {2, 0, 0}, {0, 0, 2}}, {{0, 1}, {2, 3}});
  REQUIRE(list.size() == 1);
  CHECK(list[0].kind == MeetingKind::crossing);
  CHECK(list[0].first == 0);
  CHECK(list[0].second == 1);
  CHECK((list[0].position - Eigen::Vector3d(1, 0, 1)).norm() < 1e-12);  // rounding of metres
}

TEST_CASE("bars that pass each other farther than the tolerance do not cross") {
  CHECK(meetings({{0, 0, 0}, {2, 0, 2}, {2, 0.0011, 0}, {0, 0.0011, 2}}, {{0, 1}, {2, 3}}).empty());
  const auto list = meetings({{0, 0, 0}, {2, 0, 2}, {2, 0.0009, 0}, {0, 0.0009, 2}}, {{0, 1}, {2, 3}});
  REQUIRE(list.size() == 1);
  CHECK_THAT(list[0].position.y(), is_near(0.00045, 1e-9));  // half way between the two
}

TEST_CASE("bars that share a node cross nowhere") {
  CHECK(meetings({{0, 0, 0}, {2, 0, 2}, {2, 0, 0}}, {{0, 1}, {1, 2}, {2, 0}}).empty());
  CHECK(meetings({{0, 0, 0}, {1, 0, 0}, {2, 0, 0}}, {{0, 1}, {1, 2}}).empty());
}

TEST_CASE("an end on another bar is told with its node from either side") {
  const Points points{{0, 0, 0}, {4, 0, 0}, {1, 0, 0}, {1, 0, 3}};
  for (const auto& sticks : {std::vector<Stick>{{0, 1}, {2, 3}}, std::vector<Stick>{{3, 2}, {1, 0}}}) {
    const auto list = meetings(points, sticks);
    REQUIRE(list.size() == 1);
    CHECK(list[0].kind == MeetingKind::end_on);
    CHECK(list[0].node == 2);
    CHECK(sticks[list[0].first].from + sticks[list[0].first].to == 5);  // the one between points 2 and 3
  }
}

TEST_CASE("a point without a bar is found on the bar that it stands on") {
  const auto list = meetings({{0, 0, 0}, {4, 0, 0}, {1, 0, 0}, {1, 0, 1}, {5, 0, 0}}, {{0, 1}});
  REQUIRE(list.size() == 1);
  CHECK(list[0].kind == MeetingKind::node_on);
  CHECK(list[0].first == 0);
  CHECK(list[0].node == 2);
}

TEST_CASE("bars that lie on each other are told with the length they do") {
  const Points line{{0, 0, 0}, {1, 0, 0}, {2, 0, 0}, {3, 0, 0}};
  const auto length = [&](Stick a, Stick b) {
    auto list = meetings(line, {a, b});  // points of the line that are no ends are met as well
    std::erase_if(list, [](const Meeting& m) { return m.kind == MeetingKind::node_on; });
    REQUIRE(list.size() == 1);
    CHECK(list[0].kind == MeetingKind::overlap);
    return list[0].length;
  };
  CHECK_THAT(length({0, 2}, {1, 3}), is_near(1.0, kRoundoff));
  CHECK_THAT(length({0, 3}, {2, 1}), is_near(1.0, kRoundoff));
  CHECK_THAT(length({0, 1}, {0, 3}), is_near(1.0, kRoundoff));  // with a node in common
  CHECK_THAT(length({1, 3}, {3, 0}), is_near(2.0, kRoundoff));
}

TEST_CASE("ends that touch without being one node are told with their distance") {
  // The second passes the end of the first nearer than its own end lies.
  const auto across =
      meetings({{0, 0, 0}, {1, 0, 0}, {1, 0.0008, -0.0008}, {1, 0.0008, 2}}, {{0, 1}, {2, 3}});
  REQUIRE(across.size() == 1);
  CHECK(across[0].kind == MeetingKind::nearly_ends);
  CHECK_THAT(across[0].length, is_near(0.0008 * std::sqrt(2.0), 1e-9));
}

TEST_CASE("a long bar among short ones meets all that cross it") {
  Points points{{-50.0, 0.0, 0.0}, {50.0, 0.3, 0.0}};
  std::vector<Stick> sticks{{0, 1}};
  for (int i = 0; i < 200; ++i) {
    const double x = -49.75 + 0.5 * i;
    sticks.push_back({points.size(), points.size() + 1});
    points.emplace_back(x, -1.0, 0.0);
    points.emplace_back(x + 0.1, 1.0, 0.0);
  }
  const auto list = meetings(points, sticks);
  CHECK(list.size() == 200);
  for (std::size_t i = 0; i + 1 < list.size(); ++i) CHECK(list[i].position.x() < list[i + 1].position.x());
}

TEST_CASE("the grid finds what comparing every pair finds") {
  std::mt19937 random(5);
  std::uniform_real_distribution<double> coordinate(-3.0, 3.0);
  Points points;
  std::vector<Stick> sticks;
  for (int i = 0; i < 300; ++i) {
    sticks.push_back({points.size(), points.size() + 1});
    points.emplace_back(coordinate(random), 0.0, coordinate(random));  // in a plane, where lines do cross
    const double length = i % 10 == 0 ? 2.0 : 0.1;
    points.emplace_back(points.back() +
                        length * Eigen::Vector3d(coordinate(random), 0.0, coordinate(random)));
  }
  std::set<std::pair<std::size_t, std::size_t>> expected;
  for (std::size_t a = 0; a < sticks.size(); ++a) {
    for (std::size_t b = a + 1; b < sticks.size(); ++b) {
      // Both ends of each lie on different sides of the other.
      const auto side = [&](const Stick& line, std::size_t point) {
        const Eigen::Vector3d u = points[line.to] - points[line.from];
        const Eigen::Vector3d v = points[point] - points[line.from];
        return u.z() * v.x() - u.x() * v.z() > 0.0;
      };
      if (side(sticks[a], sticks[b].from) != side(sticks[a], sticks[b].to) &&
          side(sticks[b], sticks[a].from) != side(sticks[b], sticks[a].to))
        expected.emplace(a, b);
    }
  }
  std::set<std::pair<std::size_t, std::size_t>> found;
  for (const Meeting& m : find_meetings(points, sticks, 1e-9).list) {
    CHECK(m.kind == MeetingKind::crossing);
    found.emplace(m.first, m.second);
  }
  CHECK(expected.size() > 100);
  CHECK(found == expected);
}

TEST_CASE("sticks too dense to be looked through are given up") {
  Points points;
  std::vector<Stick> sticks;
  for (int i = 0; i < 30'000; ++i) {
    sticks.push_back({points.size(), points.size() + 1});
    points.emplace_back(1e-4 * i, 0.0, 0.0);
    points.emplace_back(1e-4 * i, 0.0, 10.0);
  }
  CHECK_FALSE(find_meetings(points, sticks, 1e-6).complete);
}

TEST_CASE("nothing meets nothing") { CHECK(meetings({}, {}).empty()); }

}  // namespace swaymark::test
