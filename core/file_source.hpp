#pragma once

#include <functional>
#include <optional>
#include <string>

#include "core/error.hpp"

namespace swaymark {

/// How the reader of a tower file comes by another file that the tower file names: takes a path, returns the
/// bytes, throws what the caller likes where it cannot. The library opens no file by itself.
using FileSource = std::function<std::string(const std::string& path)>;

/// A file named in a tower file.
struct OtherFile {
  std::string path;  ///< by which it was fetched, for messages
  std::string text;
};

/// The file that `name` means where it stands in the file `beside`: a path relative to that file's folder, or
/// an absolute one.
[[nodiscard]] std::string path_beside(const std::string& beside, const std::string& name);

/// Fetches a file named at `place` of the tower file; a fault where there is no source to fetch it from.
[[nodiscard]] std::optional<OtherFile> fetch(const std::string& tower_file, const std::string& name,
                                             const FileSource& source, Place place, FaultList& faults);

}  // namespace swaymark
