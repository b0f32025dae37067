#pragma once

#include "core/drawing.hpp"

namespace swaymark {

/// Adds a bar for every segment, looks for crossings, and splits the bars there if that is asked for: new
/// nodes are `c<k>`, the pieces of a bar `<bar>.<i>`. A crossing takes a node that lies within the tolerance
/// of it.
///
/// Segments whose ends are one node, and overlaps, are faults; crossings are searched only where there is
/// none. \param node_of  from draw_nodes().
void draw_bars(Drawing& drawing, const std::vector<std::size_t>& node_of);

}  // namespace swaymark
