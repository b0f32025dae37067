#pragma once

#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

/// The keys `masses` and `mass_matrix` of a tower file. Private to the reader.
namespace swaymark {

/// Leaves the tower with the bars' own mass alone.
void drop_masses(Tower& tower);
/// Adds a fault for ice whose bars are not there or have no outline, once their sections were exchanged.
void check_ice(const Tower& tower, FaultList& faults);
/// Adds the masses listed under `key` to the tower's.
void read_masses(MapView& file, std::string_view key, const NameTable& nodes, const NameTable& groups,
                 Tower& tower);
void read_mass_matrix(MapView& file, Tower& tower);

}  // namespace swaymark
