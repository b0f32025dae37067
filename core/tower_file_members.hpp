#pragma once

#include "core/tower_file_parts.hpp"

/// The key `members` of a tower file: groups and their bars. Private to the reader.
namespace swaymark {

/// Reads groups and bars into the tower, after those of its lattice if it has one.
void read_members(MapView& file, const PartNames& parts, NameTable& groups, Tower& tower);

}  // namespace swaymark
