#include <algorithm>
#include <regex>
#include <sstream>

#include <catch2/catch.hpp>

#include "core/tower_file.hpp"
#include "tests/support/files.hpp"

namespace swaymark::test {

namespace {

const std::string kTower = "tower.yaml";

struct Expected {
  std::string place;  // line:column, behind the name of a file beside the tower file where it is in one
  std::string phrase;
};

// The comments at the head of a rejected file: `# refused at line:column: phrase`.
std::vector<Expected> expected_in(const std::string& text) {
  static const std::regex form("# refused at ((?:[^: ]+[.]csv:)?[0-9]+:[0-9]+): (.+)");
  std::vector<Expected> result;
  std::istringstream lines(text);
  std::string line;
  std::smatch match;
  while (std::getline(lines, line) && std::regex_match(line, match, form)) {
    result.push_back({match[1], match[2]});
  }
  return result;
}

std::vector<std::filesystem::path> rejected_files() {
  std::vector<std::filesystem::path> files;
  for (const auto& entry : std::filesystem::directory_iterator(data_folder() / "rejected")) {
    if (entry.path().extension() == ".yaml") files.push_back(entry.path());
  }
  std::sort(files.begin(), files.end());
  return files;
}

// Files that the tower file names are taken from beside it.
std::vector<Fault> faults_beside(std::string_view text) {
  const auto source = [](const std::string& path) { return bytes_of(data_folder() / "rejected" / path); };
  try {
    static_cast<void>(read_tower(text, kTower, source));
  } catch (const InputError& error) {
    return error.faults();
  }
  return {};
}

std::string place_of(const Fault& fault) {
  const std::string file = fault.file == kTower ? "" : fault.file + ":";
  return file + std::to_string(fault.place.line) + ":" + std::to_string(fault.place.column);
}

std::string told(const std::vector<Fault>& faults) {
  std::string result;
  for (const Fault& fault : faults) result += to_string(fault) + '\n';
  return result;
}

}  // namespace

TEST_CASE("every rejected file is refused for the faults it states and no others") {
  const auto files = rejected_files();
  REQUIRE(files.size() >= 30);
  for (const auto& file : files) {
    const std::string text = bytes_of(file);
    const std::vector<Expected> expected = expected_in(text);
    std::vector<Fault> faults = faults_beside(text);
    INFO(file.filename().string() << " was refused with\n" << told(faults));
    CHECK(!expected.empty());
    CHECK(faults.size() == expected.size());
    for (const Expected& wanted : expected) {
      INFO("expected at " << wanted.place << ": " << wanted.phrase);
      const auto found = std::find_if(faults.begin(), faults.end(), [&](const Fault& fault) {
        return place_of(fault) == wanted.place && to_string(fault).find(wanted.phrase) != std::string::npos;
      });
      CHECK(found != faults.end());
      if (found != faults.end()) faults.erase(found);
    }
  }
}

TEST_CASE("every table beside the rejected files is named by one of them") {
  std::string all;
  for (const auto& file : rejected_files()) all += bytes_of(file);
  for (const auto& entry : std::filesystem::directory_iterator(data_folder() / "rejected")) {
    if (entry.path().extension() != ".csv") continue;
    INFO(entry.path().filename().string());
    CHECK(all.find("_from: " + entry.path().filename().string()) != std::string::npos);
  }
}

TEST_CASE("every fault of a rejected file says what would cure it") {
  for (const auto& file : rejected_files()) {
    for (const Fault& fault : faults_beside(bytes_of(file))) {
      INFO(file.filename().string() << ": " << to_string(fault));
      CHECK(!fault.message.what.empty());
      CHECK(!fault.message.cure.empty());
    }
  }
}

}  // namespace swaymark::test
