#pragma once

#include <cstddef>
#include <string_view>

#include "core/error.hpp"

/// Sentences about nodes, bars, points and segments that stand in tables of their own.
namespace swaymark::wording {

[[nodiscard]] Message csv_too_many_cells(std::size_t limit);
[[nodiscard]] Message table_without_rows(std::string_view owner);
[[nodiscard]] Message name_in_two_files(std::string_view kind, std::string_view name,
                                        std::string_view first_file, Place first);
[[nodiscard]] Message group_without_bars(std::string_view group);
[[nodiscard]] Message frequency_and_period();
[[nodiscard]] Message neither_frequency_nor_period();
[[nodiscard]] Message frequency_twice(std::string_view text, Place first);

// Segments; lengths in m.
[[nodiscard]] Message key_needs_segments(std::string_view key);
[[nodiscard]] Message merge_within_too_small(std::string_view text, double least);
[[nodiscard]] Message merge_within_too_large(double within);
[[nodiscard]] Message segment_too_short(double length, double within);
[[nodiscard]] Message ends_form_a_chain(double extent, double within);
[[nodiscard]] Message ends_join_two_nodes(std::string_view node, std::string_view first, double within);
[[nodiscard]] Message segment_node_taken(std::string_view node, std::string_view file);
[[nodiscard]] Message segments_overlap(std::string_view bar, std::string_view first, double length);
[[nodiscard]] Message ends_nearly_meet(std::string_view bar, std::string_view first, double distance,
                                       double within);
[[nodiscard]] Message too_dense_for_crossings();
[[nodiscard]] Message node_off_segments(std::string_view node, double distance, double within);
[[nodiscard]] Message node_on_segment(std::string_view node, std::string_view bar);

}  // namespace swaymark::wording
