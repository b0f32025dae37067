#pragma once

#include <array>
#include <cstdint>
#include <unordered_map>
#include <vector>

#include <Eigen/Core>

/// Points found again by their place. Private to the library.
namespace swaymark {

/// A regular grid of cubes somewhat wider than the reach, of which only those that hold a point take memory:
/// what lies within the reach of a point is in the one to eight cubes that its surroundings touch.
class PointGrid {
 public:
  /// \param reach  [m] > 0, and no coordinate more than 1e15 times as large.
  explicit PointGrid(double reach);

  /// \param name  by which it is found again.
  void add(std::size_t name, const Eigen::Vector3d& position);

  /// Calls `visit(name, position)` for every point in the cubes around `position`; those within the reach
  /// are among them. The order depends on nothing but the order of adding.
  template <typename Visit>
  void around(const Eigen::Vector3d& position, Visit visit) const {
    const Surroundings cubes = cubes_around(position);
    for (std::size_t c = 0; c < cubes.count; ++c) {
      const auto head = heads_.find(cubes.cubes[c]);
      if (head == heads_.end()) continue;
      for (std::size_t i = head->second; i != kNone; i = entries_[i].next)
        visit(entries_[i].name, entries_[i].position);
    }
  }

 private:
  using Cube = std::array<std::int64_t, 3>;
  struct Surroundings {
    std::array<Cube, 8> cubes{};
    std::size_t count = 1;
  };
  struct Hash {
    std::size_t operator()(const Cube& cube) const;
  };
  struct Entry {
    std::size_t name;
    Eigen::Vector3d position;
    std::size_t next;
  };
  static constexpr std::size_t kNone = static_cast<std::size_t>(-1);

  [[nodiscard]] std::int64_t cube_along(double coordinate) const;
  [[nodiscard]] Surroundings cubes_around(const Eigen::Vector3d& position) const;

  double reach_;
  std::vector<Entry> entries_;
  std::unordered_map<Cube, std::size_t, Hash> heads_;
};

/// A well mixed number of three: equal ones have equal numbers.
[[nodiscard]] std::uint64_t mixed(const std::array<std::int64_t, 3>& numbers);

}  // namespace swaymark
