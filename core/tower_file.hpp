#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "core/file_source.hpp"
#include "core/tower.hpp"

namespace swaymark {

/// What the tower without a scenario is called beside them.
inline constexpr const char* kAsStated = "as stated";

/// The tower in another state: some keys of its file replaced.
struct Scenario {
  std::string label;              ///< unique in the file
  std::vector<std::string> keys;  ///< that it states, in the file's order
  Tower tower;                    ///< whole; nodes and bars are those of the tower as stated
  Place place;
};

struct TowerFile {
  Tower tower;  ///< as stated
  std::vector<Scenario> scenarios;
};

/// Reads a tower file (YAML, format version 1) from its text.
///
/// Values are converted to SI on the way. The file is read to its end whatever it contains, so that every
/// fault that can be found is reported at once, validate() included. \param text  the bytes of the file.
/// \param name  its file name, for messages, and to find the files it names beside it.
/// \param source  fetches those files; without one, naming another file is a fault.
/// \throws InputError with all faults, each with line, column, what is wrong and what would cure it.
[[nodiscard]] TowerFile read_tower_file(std::string_view text, const std::string& name,
                                        const FileSource& source = {});

/// The tower alone, as stated; its scenarios are read and checked, too.
[[nodiscard]] Tower read_tower(std::string_view text, const std::string& name, const FileSource& source = {});

}  // namespace swaymark
