#pragma once

#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

namespace swaymark {

/// Reads `damping` into the tower: one ratio for every mode, or a list. Private to the reader.
void read_damping(MapView& file, Tower& tower);

}  // namespace swaymark
