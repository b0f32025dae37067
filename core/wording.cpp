#include "core/wording.hpp"

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark::wording {

namespace {

std::string listed(const std::vector<std::string>& words) {
  constexpr std::size_t most = 24;
  if (words.size() <= most) return alternatives(words);
  const std::vector<std::string> head(words.begin(), words.begin() + most);
  return fmt::format("{} ... ({} in all)", fmt::join(head, ", "), words.size());
}

}  // namespace

Message file_too_long(std::size_t bytes, std::size_t limit) {
  return {fmt::format("the file has {} bytes, more than the {} that a tower file may have", bytes, limit),
          "give nodes and bars in fewer words"};
}
Message invalid_character() {
  return {"a character that is not UTF-8 text", "save the file as UTF-8 without control characters"};
}
Message empty_file() { return {"the file is empty", "begin with 'swaymark: 1'"}; }
Message several_documents() {
  return {"the file holds more than one YAML document",
          "keep one tower in one file; remove what follows '---'"};
}
Message not_yaml(std::string_view reason) {
  return {fmt::format("this is no YAML: {}", excerpt(reason, 100)),
          "check indentation, brackets, quotes and colons here and just above"};
}
Message too_deep(std::size_t limit) {
  return {fmt::format("values are nested deeper than {} levels", limit),
          "no key of a tower file needs that; remove brackets"};
}
Message too_many_values(std::size_t limit) {
  return {fmt::format("the file holds more than {} values", limit), "give nodes and bars in fewer words"};
}
Message aliases_too_large(std::size_t limit) {
  return {fmt::format("the aliases of the file stand for more than {} values", limit),
          "use fewer aliases, or name smaller values by them"};
}
Message alias_to_itself() { return {"an alias stands inside the value it names", "write the value out"}; }
Message tag_not_used(std::string_view tag) {
  return {fmt::format("the tag '{}' means nothing in a tower file", excerpt(tag)), "remove it"};
}
Message not_a_tower() {
  return {"a tower file is a map of keys", "begin with 'swaymark: 1', then 'nodes:' and 'members:'"};
}
Message version_missing() {
  return {"the format version is missing", "write 'swaymark: 1' as the first line"};
}
Message version_not_ours(std::string_view version) {
  return {
      fmt::format("format version {} is not known to this program, which reads version 1", excerpt(version)),
      "use a newer program, or write 'swaymark: 1' and the keys of that version"};
}

Message key_is_no_word(std::string_view description) {
  return {fmt::format("a key must be a word or a number, not {}", description), "write 'key: value'"};
}
Message key_twice(std::string_view key, Place first) {
  return {fmt::format("'{}' stands twice here, first in line {}", excerpt(key), first.line),
          "keep one of them"};
}
Message key_unknown(std::string_view key, std::string_view owner, const std::optional<std::string>& nearest,
                    const std::vector<std::string>& known) {
  return {
      fmt::format("unknown key '{}' in {}", excerpt(key), owner),
      nearest ? fmt::format("did you mean '{}'?", *nearest) : fmt::format("known here: {}", listed(known))};
}
Message key_missing(std::string_view key, std::string_view owner, std::string_view example) {
  return {fmt::format("'{}' is missing in {}", key, owner), fmt::format("write for example '{}'", example)};
}
Message key_empty(std::string_view key) {
  return {fmt::format("nothing stands behind '{}'", excerpt(key)), "give a value or remove the key"};
}
Message keys_exclude(std::string_view key, std::string_view other, std::string_view owner) {
  return {fmt::format("'{}' and '{}' exclude each other in {}", key, other, owner), "keep one of them"};
}
Message one_key_of(std::string_view keys, std::string_view owner) {
  return {fmt::format("{} needs exactly one of {}", owner, keys), "give the one that applies"};
}
Message not_yet_supported(std::string_view what) {
  return {fmt::format("{} not yet supported", what), "remove it for now; it is never ignored"};
}

Message wrong_kind(std::string_view key, std::string_view wanted, std::string_view came) {
  return {fmt::format("'{}' wants {}, got {}", excerpt(key), wanted, came), fmt::format("give {}", wanted)};
}
Message wants_map(std::string_view owner, std::string_view came) {
  return {fmt::format("{} wants a map of keys, got {}", owner, came),
          "write {key: value, ...} or one key a line"};
}
Message not_a_choice(std::string_view key, std::string_view came, const std::vector<std::string>& choices) {
  const auto close = nearest(came, choices);
  return {fmt::format("'{}' cannot be '{}'", key, excerpt(came)),
          close ? fmt::format("did you mean '{}'? possible: {}", *close, listed(choices))
                : fmt::format("possible: {}", listed(choices))};
}
Message not_a_number(std::string_view text, std::string_view quantity, std::string_view units) {
  return {
      fmt::format("{} was wanted, got '{}', which is no finite number with a unit", quantity, excerpt(text)),
      fmt::format("write a number, then a unit such as {}", units)};
}
Message decimal_comma(std::string_view text) {
  return {fmt::format("'{}' has a comma in its number", excerpt(text)),
          "use a point as decimal sign and nothing between thousands"};
}
Message number_out_of_range(std::string_view text) {
  return {fmt::format("'{}' is too large or too small to compute with", excerpt(text)),
          "check the unit and the exponent"};
}
Message unknown_unit(std::string_view unit, std::string_view quantity, std::string_view units) {
  return {fmt::format("'{}' is no unit for {}", excerpt(unit), quantity), fmt::format("use {}", units)};
}
Message ambiguous_unit(std::string_view unit, std::string_view choices) {
  return {fmt::format("'{}' means different things at different places", unit),
          fmt::format("write {}", choices)};
}

Message wrong_dimension(std::string_view text, std::string_view wanted, std::string_view units,
                        std::string_view came) {
  std::string cure = fmt::format("use {}", units);
  const auto mentions = [](std::string_view words, std::string_view word) {
    return words.find(word) != std::string_view::npos;
  };
  // A force per length has the dimension of a stiffness.
  if (mentions(wanted, "mass") && (mentions(came, "force") || mentions(came, "stiffness"))) {
    cure = fmt::format("a mass is never a weight: divide by 9.80665 m/s2 and write {}",
                       mentions(wanted, "per length") ? "kg/m" : "kg");
  }
  return {fmt::format("{} was wanted, got '{}', which is {}", wanted, excerpt(text),
                      came.empty() ? "something else" : came),
          cure};
}
Message no_unit_database(std::string_view unit, std::string_view units) {
  return {
      fmt::format("the unit '{}' cannot be looked up: the UDUNITS-2 database does not open", excerpt(unit)),
      fmt::format("install libudunits2-data, or use {}", units)};
}
Message must_be_positive(std::string_view key, std::string_view text) {
  return {fmt::format("'{}' must be above zero, got '{}'", key, excerpt(text)),
          "check the sign and the value"};
}
Message must_not_be_negative(std::string_view key, std::string_view text) {
  return {fmt::format("'{}' must not be negative, got '{}'", key, excerpt(text)), "check the sign"};
}
Message not_a_fraction(std::string_view key, std::string_view text, double value) {
  return {fmt::format("'{}' is a fraction, and '{}' is {:.4g} %", key, excerpt(text), 100.0 * value),
          value >= 2.0 && value <= 100.0  // 1.1 is no slip for 1.1 %
              ? fmt::format("write '{:.4g} %' or {:.4g} if that was meant", value, value / 100.0)
              : std::string("give a value between 0 % and 100 %")};
}
Message not_a_whole_number(std::string_view key, std::string_view text, long limit) {
  return {fmt::format("'{}' wants a whole number from 1 to {}, got '{}'", key, limit, excerpt(text)),
          "write the number alone, without unit or fraction"};
}
Message too_far_away(std::string_view text) {
  return {fmt::format("the coordinate '{}' lies more than 1000 km away", excerpt(text)),
          "bare numbers are metres; write '4000 mm' if that was meant"};
}

Message name_unknown(std::string_view kind, std::string_view name,
                     const std::optional<std::string>& nearest) {
  return {fmt::format("there is no {} '{}'", kind, excerpt(name)),
          nearest ? fmt::format("did you mean '{}'?", *nearest)
                  : fmt::format("define it, or name another {}", kind)};
}
Message name_twice(std::string_view kind, std::string_view name, Place first) {
  return {fmt::format("the {} '{}' is named twice, first in line {}", kind, excerpt(name), first.line),
          "keep one, or give them different names"};
}
Message name_reserved(std::string_view kind, std::string_view name) {
  return {fmt::format("no {} may be called '{}'", kind, excerpt(name)),
          "the word has a meaning of its own; choose another"};
}
Message name_means_several(std::string_view kind, std::string_view name, std::size_t count) {
  return {fmt::format("one {} is wanted here, and '{}' names {}", kind, excerpt(name), count),
          "name one of them"};
}
Message name_generated(std::string_view kind, std::string_view name, Place lattice) {
  return {
      fmt::format("the {} '{}' is made by the lattice in line {} already", kind, excerpt(name), lattice.line),
      "choose another name"};
}
Message axis_unknown(std::string_view came, const std::vector<std::string>& axes) {
  return {fmt::format("{} is no axis of this tower", came), fmt::format("use {}", alternatives(axes))};
}
Message nothing_listed(std::string_view key, std::string_view wanted) {
  return {fmt::format("'{}' lists nothing", key), fmt::format("give {}, or remove the key", wanted)};
}

Message coordinates_count(std::string_view node, std::size_t came, const std::vector<std::string>& axes) {
  return {fmt::format("node '{}' has {} coordinate{}, this tower has {} axes", excerpt(node), came,
                      came == 1 ? "" : "s", axes.size()),
          fmt::format("give [{}], or change 'dimensions'", fmt::join(axes, ", "))};
}
Message bar_is_pair() { return {"a bar is a pair of nodes", "write [from, to]"}; }
Message bar_to_itself(std::string_view bar, std::string_view node) {
  return {fmt::format("bar {} joins node '{}' to itself", bar, node), "give two different nodes"};
}
Message bar_without_length(std::string_view bar, std::string_view from, std::string_view to) {
  return {fmt::format("bar {} has no length: nodes '{}' and '{}' stand at the same place", bar, from, to),
          "move one of the nodes or remove the bar"};
}
Message bar_twice(std::string_view bar, std::string_view first, std::string_view from, std::string_view to) {
  return {fmt::format("bar {} joins nodes '{}' and '{}', as bar {} does already", bar, from, to, first),
          "remove one; two bars side by side are one bar of twice the area"};
}
Message nodes_coincide(std::string_view node, std::string_view first) {
  return {fmt::format("nodes '{}' and '{}' stand at the same place", first, node),
          "keep one of them and let all bars meet there"};
}
Message held_twice(std::string_view node, std::string_view axis, Place first) {
  return {fmt::format("node '{}' is held twice along {}, first in line {}", node, axis, first.line),
          "an axis is fixed, or on one spring, or free"};
}
Message holds_nothing() {
  return {"a support needs 'fixed', 'springs', 'pad' or 'stabilise'", "write for example 'fixed: [x, y, z]'"};
}
Message tube_wall(double diameter, double wall) {
  return {fmt::format("a tube of {:.6g} m outside diameter has no wall of {:.6g} m", diameter, wall),
          "give [outside diameter, wall thickness]; the wall is at most half of the diameter"};
}

Message size_not_read(std::string_view size) {
  return {fmt::format("'{}' is no size of a section", excerpt(size)),
          "write family and millimetres, such as 'L 80x80x8', 'CHS 168.3x6.3' or 'SHS 100x100x5'"};
}
Message size_unknown(std::string_view size, const std::vector<std::string>& nearest) {
  return {fmt::format("there is no size '{}' in the tables", excerpt(size)),
          fmt::format("nearest: {}; a size of your own goes into the table of 'sections_from'",
                      alternatives(nearest))};
}
Message size_family_unknown(std::string_view family, const std::vector<std::string>& families) {
  return {
      fmt::format("there is no family '{}' of sections in the tables", excerpt(family)),
      fmt::format("known: {}; a size of your own goes into the table of 'sections_from'", listed(families))};
}
Message size_listed_already(std::string_view size) {
  return {fmt::format("the size '{}' is in the tables already", excerpt(size)),
          "remove the row, or give it a name of its own"};
}
Message radius_beside_size(std::string_view owner) {
  return {fmt::format("'radius' stands beside 'size' in {}, which brings its own", owner),
          "remove 'radius', or give 'area' and 'radius' in place of 'size'"};
}
Message double_needs_angle() {
  return {"'double' is known for equal angles by size only",
          "write for example '{size: L 80x80x8, double: true, gap: 10 mm}', or give 'area' and 'radius'"};
}
Message gap_needs_double() {
  return {"'gap' is the gap of a pair, and this section is single", "add 'double: true' or remove 'gap'"};
}

Message no_other_files(std::string_view name) {
  return {
      fmt::format("the file '{}' is out of reach here: only the tower file itself was given", excerpt(name)),
      "write its content into the tower file"};
}
Message csv_too_long(std::size_t bytes, std::size_t limit) {
  return {fmt::format("the table has {} bytes, more than the {} that it may have", bytes, limit),
          "leave out what the tower does not need"};
}
Message csv_empty() {
  return {"the table is empty", "begin with a line that names the columns, units in brackets"};
}
Message csv_quote() {
  return {"a quoted cell does not end, or goes on after its closing quote",
          "close the quotes in the same line, and write a quote inside them twice"};
}
Message csv_separator() {
  return {"the columns are not separated by commas",
          "save the table with commas between the cells and points as decimal signs"};
}
Message csv_cells(std::size_t came, std::size_t columns) {
  return {fmt::format("the row has {} cell{}, the first line names {} column{}", came, came == 1 ? "" : "s",
                      columns, columns == 1 ? "" : "s"),
          "separate cells by commas, write decimals with a point, and quote a cell that holds a comma"};
}
Message csv_not_a_number(std::string_view column, std::string_view text, std::string_view unit) {
  return {fmt::format("'{}' wants a plain number, got '{}'", excerpt(column), excerpt(text)),
          fmt::format("the unit [{}] stands in the first line already", excerpt(unit))};
}
Message csv_word_without_unit(std::string_view column) {
  return {fmt::format("the column '{}' holds words, which have no unit", excerpt(column)),
          fmt::format("write '{}' alone", excerpt(column))};
}

Message band_reversed(double from, double to) {
  return {fmt::format("the band ends at {:.6g} Hz, not above its begin at {:.6g} Hz", to, from),
          "exchange 'from' and 'to'"};
}
Message band_without_width() { return {"a band without width is never hit", "give 'to' above 'from'"}; }
Message points_need_two() {
  return {"a spectrum needs two points or more", "write [[period, acceleration], ...]"};
}
Message point_is_pair() { return {"a point of a spectrum is a pair", "write [period, acceleration]"}; }
Message periods_must_rise(double before, double period) {
  return {fmt::format("the periods of a spectrum must rise, but {:.6g} s follows {:.6g} s", period, before),
          "sort the points by period, each period once"};
}
Message log_needs_positive() {
  return {"log-log interpolation has no logarithm of zero",
          "give periods and accelerations above zero, or interpolate linearly"};
}
Message correction_needs_damping() {
  return {"'damping_correction' needs to know the damping the spectrum was drawn for",
          "add 'damping: 5 %' to the spectrum"};
}
Message seismic_needs_damping() {
  return {"a seismic check needs the tower's damping", "add 'damping: 2 %' (of critical) to the file"};
}
Message no_direction_excited() {
  return {"'seismic' excites no direction",
          "give a spectrum for at least one axis, such as 'spectrum: {x: quay}'"};
}

}  // namespace swaymark::wording
