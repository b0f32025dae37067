#pragma once

#include <algorithm>
#include <filesystem>
#include <string>
#include <vector>

#include <nlohmann/json.hpp>

#include "apps/analysis.hpp"
#include "tests/support/files.hpp"
#include "tests/support/matchers.hpp"

/// The cases of data/reference: what is published beside what the program finds.
namespace swaymark::test {

using Json = nlohmann::json;

inline Json reference_data(const std::string& name) {
  return Json::parse(bytes_of(data_folder() / "reference" / (name + ".json")));
}

/// The names of all cases, sorted.
inline std::vector<std::string> reference_names() {
  std::vector<std::string> names;
  for (const auto& entry : std::filesystem::directory_iterator(data_folder() / "reference")) {
    if (entry.path().extension() == ".json") names.push_back(entry.path().stem().string());
  }
  std::sort(names.begin(), names.end());
  return names;
}

inline Tower reference_tower(const Json& data) {
  return tower_in("reference/" + data.at("tower").get<std::string>());
}

inline Analysis analysed(Tower tower) { return analyse(std::move(tower), {}, Scope::check); }

/// Where a figure comes from, for the message of a check that fails.
inline std::string source_of(const Json& data) {
  return data.at("case").get<std::string>() + ": " + data.at("citation").get<std::string>() + " (" +
         data.value("standing", "standing given with each table") + ")";
}

}  // namespace swaymark::test
