#pragma once

#include "core/file_source.hpp"
#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

/// The named parts of a tower file that members are made of: materials, sections, nodes. Private to the
/// reader.
namespace swaymark {

struct PartNames {
  NameTable materials{"material"};
  NameTable sections{"section"};
  NameTable nodes{"node"};
};

inline constexpr double kFarthest = 1e6;  ///< a coordinate may be from the origin [m]

/// Where the node of that index waits while its place is unknown: alone, so that it coincides with no other.
[[nodiscard]] Eigen::Vector3d out_of_the_way(std::size_t index);

/// Reads the parts into the tower, whose file and dimensions are known by then.
[[nodiscard]] PartNames read_parts(MapView& file, Tower& tower, const FileSource& source);

}  // namespace swaymark
