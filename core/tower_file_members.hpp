#pragma once

#include "core/tower_file_parts.hpp"

/// The key `members` of a tower file: groups and their bars. Private to the reader.
namespace swaymark {

/// Reads groups and bars into the tower. \return the groups by name
[[nodiscard]] NameTable read_members(MapView& file, const PartNames& parts, Tower& tower);

}  // namespace swaymark
