#include "core/file_source.hpp"

#include <filesystem>

#include "core/wording.hpp"

namespace swaymark {

std::string path_beside(const std::string& beside, const std::string& name) {
  return (std::filesystem::path(beside).parent_path() / name).string();
}

std::optional<OtherFile> fetch(const std::string& tower_file, const std::string& name,
                               const FileSource& source, Place place, FaultList& faults) {
  if (!source) {
    faults.add(place, wording::no_other_files(name));
    return std::nullopt;
  }
  OtherFile other;
  other.path = path_beside(tower_file, name);
  other.text = source(other.path);
  return other;
}

}  // namespace swaymark
