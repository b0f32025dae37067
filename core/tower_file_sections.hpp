#pragma once

#include <string>

#include "core/file_source.hpp"
#include "core/section_table.hpp"
#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

/// The sections of a tower file: by area, as a tube, or by size. Private to the reader.
namespace swaymark {

/// The built-in sizes, and those of the table that `sections_from` names.
[[nodiscard]] SectionTable read_section_sizes(MapView& file, const std::string& tower_file,
                                              const FileSource& source);

/// \param at  the section's name in the file. \param value  its map.
[[nodiscard]] Section read_section(const std::string& name, const YamlNode& at, const YamlNode& value,
                                   const SectionTable& sizes, FaultList& faults);

}  // namespace swaymark
