#pragma once

#include "core/tower_file_parts.hpp"

/// The key `lattice` of a tower file: a tower written by panels. Private to the reader.
namespace swaymark {

/// Adds the nodes, groups and bars of the lattice, if there is one, to the tower and to the names: each node
/// and group by its own, corners by `top`, `base` and `L<level>`. Where the lattice is faulty nothing is
/// added and the names are left open.
void read_lattice(MapView& file, PartNames& parts, NameTable& groups, Tower& tower);

}  // namespace swaymark
