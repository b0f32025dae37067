#pragma once

#include "core/file_source.hpp"
#include "core/tower_file_parts.hpp"

/// A tower drawn by line segments. Private to the reader.
namespace swaymark {

/// Reads the table behind `segments_from` with `merge_within` and `split_crossings` beside it, and adds its
/// nodes and bars behind those known.
///
/// End points within the tolerance of each other are one node, that of the tower if one lies there too; else
/// a new node where the first of them is drawn, named `n<k>`: k counts the places where segments end in the
/// order of the file, those of the tower's own nodes included. Bars are named after their group. Where
/// crossings are split, new nodes there are `c<k>` and the pieces of a bar `<bar>.<i>`.
void read_segments(MapView& file, const FileSource& source, PartNames& parts, const NameTable& groups,
                   Tower& tower);

}  // namespace swaymark
