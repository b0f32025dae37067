#pragma once

#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

/// The keys `masses` and `mass_matrix` of a tower file. Private to the reader.
namespace swaymark {

void read_masses(MapView& file, const NameTable& nodes, const NameTable& groups, Tower& tower);
void read_mass_matrix(MapView& file, Tower& tower);

}  // namespace swaymark
