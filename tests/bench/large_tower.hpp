#pragma once

#include <string>

#include "core/file_source.hpp"

/// A tower as large as the format is meant for, written in several ways.
namespace swaymark::bench {

struct WrittenTower {
  std::string yaml;
  std::string nodes;     ///< behind `nodes_from`
  std::string bars;      ///< behind `bars_from`
  std::string segments;  ///< behind `segments_from`

  [[nodiscard]] FileSource source() const;
};

enum class Written { nodes_and_bars, tables, segments, crossing_segments };
[[nodiscard]] const char* name_of(Written how);

/// A block of cubes with a diagonal in every face that is not the ground: `cells` cubes along x and y,
/// `levels` up. Of segments every joint is drawn anew at each end, some tenths of a millimetre off; where
/// they cross, the faces that look along y have both diagonals. Invented.
[[nodiscard]] WrittenTower large_tower(Written how, int cells, int levels);

}  // namespace swaymark::bench
