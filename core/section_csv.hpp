#pragma once

#include <string_view>

#include "core/error.hpp"
#include "core/section_table.hpp"

/// Sections from a table of the engineer's own. Private to the tower-file reader.
namespace swaymark {

/// Adds the sizes of a table with the columns `size`, `area`, and, if known, `radius` (the smallest radius of
/// gyration) and `perimeter`; units in brackets, as in `area [cm2]`. A size that `table` has already is a
/// fault: one name never means two sections. `faults` are those of the CSV file.
void read_section_csv(std::string_view text, FaultList& faults, SectionTable& table);

}  // namespace swaymark
