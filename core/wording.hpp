#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"

/// Every sentence the input can be refused with, in one place: what is wrong, then what would cure it.
namespace swaymark::wording {

// The file as a whole.
[[nodiscard]] Message file_too_long(std::size_t bytes, std::size_t limit);
[[nodiscard]] Message invalid_character();
[[nodiscard]] Message empty_file();
[[nodiscard]] Message several_documents();
[[nodiscard]] Message not_yaml(std::string_view reason);
[[nodiscard]] Message too_deep(std::size_t limit);
[[nodiscard]] Message too_many_values(std::size_t limit);
[[nodiscard]] Message aliases_too_large(std::size_t limit);
[[nodiscard]] Message alias_to_itself();
[[nodiscard]] Message tag_not_used(std::string_view tag);
[[nodiscard]] Message not_a_tower();
[[nodiscard]] Message version_missing();
[[nodiscard]] Message version_not_ours(std::string_view version);

// Keys.
[[nodiscard]] Message key_is_no_word(std::string_view description);
[[nodiscard]] Message key_twice(std::string_view key, Place first);
[[nodiscard]] Message key_unknown(std::string_view key, std::string_view owner,
                                  const std::optional<std::string>& nearest,
                                  const std::vector<std::string>& known);
[[nodiscard]] Message key_missing(std::string_view key, std::string_view owner, std::string_view example);
[[nodiscard]] Message key_empty(std::string_view key);
[[nodiscard]] Message keys_exclude(std::string_view key, std::string_view other, std::string_view owner);
[[nodiscard]] Message one_key_of(std::string_view keys, std::string_view owner);
[[nodiscard]] Message not_yet_supported(std::string_view what);

// Values.
[[nodiscard]] Message wrong_kind(std::string_view key, std::string_view wanted, std::string_view came);
[[nodiscard]] Message wants_map(std::string_view owner, std::string_view came);
[[nodiscard]] Message not_a_choice(std::string_view key, std::string_view came,
                                   const std::vector<std::string>& choices);
[[nodiscard]] Message not_a_number(std::string_view text, std::string_view quantity, std::string_view units);
[[nodiscard]] Message decimal_comma(std::string_view text);
[[nodiscard]] Message number_out_of_range(std::string_view text);
[[nodiscard]] Message unknown_unit(std::string_view unit, std::string_view quantity, std::string_view units);
[[nodiscard]] Message ambiguous_unit(std::string_view unit, std::string_view choices);
[[nodiscard]] Message wrong_dimension(std::string_view text, std::string_view wanted, std::string_view units,
                                      std::string_view came);
[[nodiscard]] Message no_unit_database(std::string_view unit, std::string_view units);
[[nodiscard]] Message must_be_positive(std::string_view key, std::string_view text);
[[nodiscard]] Message must_not_be_negative(std::string_view key, std::string_view text);
[[nodiscard]] Message not_a_fraction(std::string_view key, std::string_view text, double value);
[[nodiscard]] Message not_a_whole_number(std::string_view key, std::string_view text, long limit);
[[nodiscard]] Message too_far_away(std::string_view text);

// Names.
[[nodiscard]] Message name_unknown(std::string_view kind, std::string_view name,
                                   const std::optional<std::string>& nearest);
[[nodiscard]] Message name_twice(std::string_view kind, std::string_view name, Place first);
[[nodiscard]] Message name_reserved(std::string_view kind, std::string_view name);
[[nodiscard]] Message name_means_several(std::string_view kind, std::string_view name, std::size_t count);
[[nodiscard]] Message name_generated(std::string_view kind, std::string_view name, Place lattice);
[[nodiscard]] Message axis_unknown(std::string_view came, const std::vector<std::string>& axes);
[[nodiscard]] Message nothing_listed(std::string_view key, std::string_view wanted);

// The structure.
[[nodiscard]] Message coordinates_count(std::string_view node, std::size_t came,
                                        const std::vector<std::string>& axes);
[[nodiscard]] Message bar_is_pair();
[[nodiscard]] Message bar_to_itself(std::string_view bar, std::string_view node);
[[nodiscard]] Message bar_without_length(std::string_view bar, std::string_view from, std::string_view to);
[[nodiscard]] Message bar_twice(std::string_view bar, std::string_view first, std::string_view from,
                                std::string_view to);
[[nodiscard]] Message nodes_coincide(std::string_view node, std::string_view first);
[[nodiscard]] Message held_twice(std::string_view node, std::string_view axis, Place first);
[[nodiscard]] Message holds_nothing();
[[nodiscard]] Message tube_wall(double diameter, double wall);

// Sizes of sections.
[[nodiscard]] Message size_not_read(std::string_view size);
[[nodiscard]] Message size_unknown(std::string_view size, const std::vector<std::string>& nearest);
[[nodiscard]] Message size_family_unknown(std::string_view family, const std::vector<std::string>& families);
[[nodiscard]] Message size_listed_already(std::string_view size);
[[nodiscard]] Message radius_beside_size(std::string_view owner);
[[nodiscard]] Message double_needs_angle();
[[nodiscard]] Message gap_needs_double();

// Other files, and tables in CSV.
[[nodiscard]] Message no_other_files(std::string_view name);
[[nodiscard]] Message csv_too_long(std::size_t bytes, std::size_t limit);
[[nodiscard]] Message csv_empty();
[[nodiscard]] Message csv_quote();
[[nodiscard]] Message csv_separator();
[[nodiscard]] Message csv_cells(std::size_t came, std::size_t columns);
[[nodiscard]] Message csv_not_a_number(std::string_view column, std::string_view text, std::string_view unit);
[[nodiscard]] Message csv_word_without_unit(std::string_view column);

// Requests.
[[nodiscard]] Message band_reversed(double from, double to);
[[nodiscard]] Message band_without_width();
[[nodiscard]] Message points_need_two();
[[nodiscard]] Message point_is_pair();
[[nodiscard]] Message periods_must_rise(double before, double period);
[[nodiscard]] Message log_needs_positive();
[[nodiscard]] Message correction_needs_damping();
[[nodiscard]] Message seismic_needs_damping();
[[nodiscard]] Message no_direction_excited();

}  // namespace swaymark::wording
