#pragma once

#include <string>
#include <string_view>

#include "core/file_source.hpp"
#include "core/tower.hpp"

namespace swaymark {

/// Reads a tower file (YAML, format version 1) from its text.
///
/// Values are converted to SI on the way. The file is read to its end whatever it contains, so that every
/// fault that can be found is reported at once, validate() included. \param text  the bytes of the file.
/// \param name  its file name, for messages, and to find the files it names beside it.
/// \param source  fetches those files; without one, naming another file is a fault.
/// \throws InputError with all faults, each with line, column, what is wrong and what would cure it.
[[nodiscard]] Tower read_tower(std::string_view text, const std::string& name, const FileSource& source = {});

}  // namespace swaymark
