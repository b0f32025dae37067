#include "tests/support/files.hpp"

#include <cstdlib>
#include <fstream>
#include <sstream>
#include <stdexcept>

#include "core/tower_file.hpp"

namespace swaymark::test {

std::filesystem::path data_folder() { return SWAYMARK_DATA; }

std::string bytes_of(const std::filesystem::path& file) {
  std::ifstream stream(file, std::ios::binary);
  if (!stream) throw std::runtime_error("cannot read " + file.string());
  std::ostringstream bytes;
  bytes << stream.rdbuf();
  return bytes.str();
}

Tower tower_of(std::string_view text) { return read_tower(text, "tower.yaml"); }

Tower tower_in(const std::string& file) { return read_tower(bytes_of(data_folder() / file), file); }

std::vector<Fault> faults_of(std::string_view text) {
  try {
    (void)tower_of(text);
  } catch (const InputError& error) {
    return error.faults();
  }
  return {};
}

ScratchFolder::ScratchFolder() {
  std::string name = (std::filesystem::temp_directory_path() / "swaymark-XXXXXX").string();
  if (mkdtemp(name.data()) == nullptr) throw std::runtime_error("cannot make a scratch folder");
  path_ = name;
}

ScratchFolder::~ScratchFolder() {
  std::error_code ignored;
  std::filesystem::remove_all(path_, ignored);
}

std::string ScratchFolder::write(const std::string& name, std::string_view text) const {
  const auto file = path_ / name;
  std::ofstream stream(file, std::ios::binary);
  stream << text;
  if (!stream.flush()) throw std::runtime_error("cannot write " + file.string());
  return file.string();
}

}  // namespace swaymark::test
