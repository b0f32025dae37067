#include "tests/reference/cases.hpp"

#include <algorithm>
#include <filesystem>
#include <utility>

namespace swaymark::test {

Json reference_data(const std::string& name) {
  return Json::parse(bytes_of(data_folder() / "reference" / (name + ".json")));
}

std::vector<std::string> reference_names() {
  std::vector<std::string> names;
  for (const auto& entry : std::filesystem::directory_iterator(data_folder() / "reference")) {
    if (entry.path().extension() == ".json") names.push_back(entry.path().stem().string());
  }
  std::sort(names.begin(), names.end());
  return names;
}

Tower reference_tower(const Json& data) {
  return tower_in("reference/" + data.at("tower").get<std::string>());
}

Analysis analysed(Tower tower) { return analyse(std::move(tower), {}, Scope::check); }

std::string source_of(const Json& data) {
  return data.at("case").get<std::string>() + ": " + data.at("citation").get<std::string>() + " (" +
         data.value("standing", "standing given with each table") + ")";
}

}  // namespace swaymark::test
