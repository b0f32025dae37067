#pragma once

#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

/// The key `supports` of a tower file. Private to the reader.
namespace swaymark {

/// Reads the supports into the tower: one for each node, joined from all entries that name it.
void read_supports(MapView& file, const NameTable& nodes, Tower& tower);

/// The key `base_study`, once the supports are known.
void read_base_study(MapView& file, Tower& tower);

}  // namespace swaymark
