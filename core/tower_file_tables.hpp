#pragma once

#include "core/file_source.hpp"
#include "core/tower_file_parts.hpp"

/// Nodes and bars of a tower that stand in tables of their own. Private to the reader.
namespace swaymark {

/// Reads the table behind `nodes_from` and adds its nodes behind those known.
void read_nodes_from(MapView& file, const FileSource& source, NameTable& nodes, Tower& tower);

/// Reads the table behind `bars_from`. Its bars join the groups that are named under `members`, behind the
/// bars known.
void read_bars_from(MapView& file, const FileSource& source, const NameTable& nodes, const NameTable& groups,
                    Tower& tower);

/// The bars each group has.
[[nodiscard]] std::vector<std::size_t> bars_by_group(const Tower& tower);

/// Adds a fault for every bar whose name another has already. The faults know the tower's files.
void check_bar_names(const Tower& tower, FaultList& faults);

/// Adds a fault for every group that has no bar.
void check_groups_have_bars(const Tower& tower, FaultList& faults);

}  // namespace swaymark
