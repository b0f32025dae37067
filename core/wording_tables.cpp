#include "core/wording_tables.hpp"

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark::wording {

namespace {

std::string millimetres(double length) { return fmt::format("{:.4g} mm", 1e3 * length); }

}  // namespace

Message csv_too_many_cells(std::size_t limit) {
  return {fmt::format("the table has more than the {} cells that it may have", limit),
          "leave out what the tower does not need"};
}
Message table_without_rows(std::string_view owner) {
  return {fmt::format("{} has no row below its first line", owner),
          "add rows, or remove the key that names the file"};
}
Message name_in_two_files(std::string_view kind, std::string_view name, std::string_view first_file,
                          Place first) {
  return {fmt::format("the {} '{}' is named in {}:{}:{} already", kind, excerpt(name), first_file, first.line,
                      first.column),
          "keep one, or give them different names"};
}
Message group_without_bars(std::string_view group) {
  return {fmt::format("no bar is in the group '{}'", excerpt(group)),
          "name the group in a row of the table, give it 'bars', or remove it"};
}
Message frequency_and_period() {
  return {"the columns 'period' and 'frequency' exclude each other", "keep one of them"};
}
Message neither_frequency_nor_period() {
  return {"'period' or 'frequency' is missing in a table of spectrum points",
          "begin with 'period [s],acceleration [g]' or 'frequency [Hz],acceleration [g]'"};
}
Message frequency_twice(std::string_view text, Place first) {
  return {fmt::format("the frequency {} stands twice, first in line {}", excerpt(text), first.line),
          "give each frequency one acceleration"};
}

Message key_needs_segments(std::string_view key) {
  return {fmt::format("'{}' says how line segments are read, and there are none", key),
          "add 'segments_from: lines.csv', or remove it"};
}
Message merge_within_too_small(std::string_view text, double least) {
  return {fmt::format("'merge_within' must be {} at least, got '{}'", millimetres(least), excerpt(text)),
          "nodes nearer than that are one anyway; write 'merge_within: 1 mm'"};
}
Message merge_within_too_large(double within) {
  return {
      fmt::format("more end points lie close together here than any joint has, with 'merge_within' at {}",
                  millimetres(within)),
      "lower 'merge_within' far below the length of the shortest segment, and check the unit in brackets"};
}
Message segment_too_short(double length, double within) {
  return {fmt::format("the segment is {} long, and 'merge_within' ({}) makes its two ends one node",
                      millimetres(length), millimetres(within)),
          "remove the segment, or lower 'merge_within'"};
}
Message ends_form_a_chain(double extent, double within) {
  return {fmt::format("end points follow each other here in steps within 'merge_within' ({}), but together "
                      "they extend over {}: which of them are one node is not clear",
                      millimetres(within), millimetres(extent)),
          fmt::format("raise 'merge_within' above {}, or draw them at one point", millimetres(extent))};
}
Message ends_join_two_nodes(std::string_view node, std::string_view first, double within) {
  return {fmt::format("an end point here lies within 'merge_within' ({}) of the node '{}' and of '{}'",
                      millimetres(within), excerpt(node), excerpt(first)),
          "remove one of the nodes, or lower 'merge_within'"};
}
Message segment_node_taken(std::string_view node, std::string_view file) {
  return {fmt::format("the node '{}' is made from the segments of {} already", excerpt(node), file),
          "choose another name"};
}
Message segments_overlap(std::string_view bar, std::string_view first, double length) {
  return {fmt::format("the bar '{}' lies on '{}' for {:.4g} m", excerpt(bar), excerpt(first), length),
          "remove one of them, or let one end where the other begins"};
}
Message ends_nearly_meet(std::string_view bar, std::string_view first, double distance, double within) {
  return {fmt::format("the bars '{}' and '{}' touch, but their end points are {} apart, farther than "
                      "'merge_within' ({})",
                      excerpt(bar), excerpt(first), millimetres(distance), millimetres(within)),
          fmt::format("raise 'merge_within' above {}, or draw the ends at one point", millimetres(distance))};
}
Message too_dense_for_crossings() {
  return {"the segments lie too densely to be looked through for crossings",
          "check the unit in brackets in the first line, and remove segments that are drawn twice"};
}
Message node_off_segments(std::string_view node, double distance, double within) {
  return {fmt::format("no bar ends at the node '{}': the nearest end point of a segment is {:.4g} m away, "
                      "farther than 'merge_within' ({})",
                      excerpt(node), distance, millimetres(within)),
          "move it onto an end point, raise 'merge_within', join it with a bar, or remove it"};
}
Message node_on_segment(std::string_view node, std::string_view bar) {
  return {fmt::format("no bar ends at the node '{}': it stands on '{}', which passes it by", excerpt(node),
                      excerpt(bar)),
          "write 'split_crossings: true', or let a segment end there"};
}

}  // namespace swaymark::wording
