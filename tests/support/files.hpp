#pragma once

#include <filesystem>
#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"
#include "core/tower.hpp"

/// Towers and faults from text and from the project's data.
namespace swaymark::test {

/// The project's data folder.
[[nodiscard]] std::filesystem::path data_folder();

/// The bytes of a file; the test fails if it cannot be read.
[[nodiscard]] std::string bytes_of(const std::filesystem::path& file);

/// The tower a text describes. \throws InputError
[[nodiscard]] Tower tower_of(std::string_view text);

/// The tower of a file under the data folder. \throws InputError
[[nodiscard]] Tower tower_in(const std::string& file);

/// The faults a text is refused with; none if it is accepted.
[[nodiscard]] std::vector<Fault> faults_of(std::string_view text);

/// A folder of its own that is removed with all it holds.
class ScratchFolder {
 public:
  ScratchFolder();
  ~ScratchFolder();
  ScratchFolder(const ScratchFolder&) = delete;
  ScratchFolder& operator=(const ScratchFolder&) = delete;
  [[nodiscard]] const std::filesystem::path& path() const { return path_; }
  /// Writes a file into the folder and returns its name.
  std::string write(const std::string& name, std::string_view text) const;

 private:
  std::filesystem::path path_;
};

}  // namespace swaymark::test
