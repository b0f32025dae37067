#include <algorithm>
#include <regex>
#include <sstream>

#include <catch2/catch.hpp>

#include "core/tower_file.hpp"
#include "tests/support/files.hpp"

namespace swaymark::test {

namespace {

struct Expected {
  std::string place;
  std::string phrase;
};

// The comments at the head of a rejected file: `# refused at line:column: phrase`.
std::vector<Expected> expected_in(const std::string& text) {
  static const std::regex form("# refused at ([0-9]+:[0-9]+): (.+)");
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
    std::vector<Fault> faults = faults_of(text);
    INFO(file.filename().string() << " was refused with\n" << told(faults));
    CHECK(!expected.empty());
    CHECK(faults.size() == expected.size());
    for (const Expected& wanted : expected) {
      INFO("expected at " << wanted.place << ": " << wanted.phrase);
      const auto found = std::find_if(faults.begin(), faults.end(), [&](const Fault& fault) {
        const std::string place = std::to_string(fault.place.line) + ":" + std::to_string(fault.place.column);
        return place == wanted.place && to_string(fault).find(wanted.phrase) != std::string::npos;
      });
      CHECK(found != faults.end());
      if (found != faults.end()) faults.erase(found);
    }
  }
}

TEST_CASE("every fault of a rejected file says what would cure it") {
  for (const auto& file : rejected_files()) {
    for (const Fault& fault : faults_of(bytes_of(file))) {
      INFO(file.filename().string() << ": " << to_string(fault));
      CHECK(!fault.message.what.empty());
      CHECK(!fault.message.cure.empty());
    }
  }
}

}  // namespace swaymark::test
