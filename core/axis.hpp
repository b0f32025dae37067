#pragma once

#include <array>
#include <string_view>
#include <vector>

namespace swaymark {

/// The axes of space; z is up. Their number is the row of a position vector.
enum class Axis { x = 0, y = 1, z = 2 };

inline constexpr std::array<Axis, 3> kAllAxes{Axis::x, Axis::y, Axis::z};

[[nodiscard]] constexpr int index_of(Axis axis) { return static_cast<int>(axis); }

[[nodiscard]] constexpr std::string_view name_of(Axis axis) {
  constexpr std::array<std::string_view, 3> names{"x", "y", "z"};
  return names[static_cast<std::size_t>(axis)];
}

/// The axes a tower of 1, 2 or 3 dimensions moves in: x; x and z; x, y and z.
[[nodiscard]] inline std::vector<Axis> axes_of(int dimensions) {
  if (dimensions == 1) return {Axis::x};
  if (dimensions == 2) return {Axis::x, Axis::z};
  return {Axis::x, Axis::y, Axis::z};
}

}  // namespace swaymark
