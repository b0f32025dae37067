#include <algorithm>
#include <chrono>
#include <sstream>

#include "tests/program/shipped.hpp"

namespace swaymark::test {

namespace {

Outcome check_text(const std::string& tower) {
  const ScratchFolder folder;
  return swaymark("check " + quoted(folder.write("tower.yaml", tower)));
}

// A failure: this status, nothing on standard output, something on standard error.
void check_failure(const Outcome& outcome, int status, const std::string& phrase) {
  INFO(outcome.error);
  CHECK(outcome.status == status);
  CHECK(outcome.output.empty());
  CHECK_THAT(outcome.error, Catch::Contains(phrase));
}

}  // namespace

TEST_CASE("the program ends with 0 and only a report where all checks are met") {
  const Outcome outcome = check_text(kSoundTower);
  CHECK(outcome.status == 0);
  CHECK_THAT(outcome.output, Catch::Contains("checks are met."));
  CHECK(outcome.error.empty());
}

TEST_CASE("the program ends with 1 and only a report where a check is not met") {
  const Outcome outcome = swaymark("check data/harbour_light.yaml");
  CHECK(outcome.status == 1);
  CHECK_THAT(outcome.output, Catch::Contains("NOT MET"));
  CHECK(outcome.error.empty());
}

TEST_CASE("the program ends with 2 where the command line is wrong") {
  for (const char* arguments :
       {"chekc x.yaml", "check", "check x.yaml --jsn", "check x.yaml --json", "compare x.yaml", "new mast",
        "check a.yaml b.yaml", "check x.yaml --color blue"}) {
    INFO(arguments);
    check_failure(swaymark(arguments), 2, "swaymark: ");
  }
}

TEST_CASE("the program ends with 3 for every rejected file and names file line and column") {
  int files = 0;
  for (const auto& entry : std::filesystem::directory_iterator(data_folder() / "rejected")) {
    if (entry.path().extension() != ".yaml") continue;
    ++files;
    // The fault stands in the tower file or in a table of the same folder.
    const std::string folder = "data/rejected/";
    const std::string name = folder + entry.path().filename().string();
    INFO(name);
    const Outcome outcome = swaymark("check " + name);
    check_failure(outcome, 3, folder);
    std::istringstream lines(outcome.error);
    for (std::string line; std::getline(lines, line);) {
      INFO(line);
      CHECK_THAT(line, Catch::Matches("data/rejected/[^:]+:[0-9]+:[0-9]+: .+; .+"));
    }
  }
  CHECK(files >= 30);
}

TEST_CASE("the program ends with 4 where nothing can be computed and says what would cure it") {
  check_failure(check_text(sound_tower_with(", [b, c]", "")), 4, "cure:");
  check_failure(check_text(sound_tower_with("masses: [{nodes: [c], mass: 150000 kg}]\n", "")), 4,
                "has mass; give");
  check_failure(check_text(sound_tower_with("nodes: [a, b], fixed", "nodes: [a, b, c], fixed")), 4,
                "nothing is free to move; leave");
}

TEST_CASE("the program ends with 5 where a file cannot be read") {
  check_failure(swaymark("check there-is-no.yaml"), 5, "there-is-no.yaml: cannot open: No such file");
  check_failure(swaymark("check data"), 5, "data: cannot read: Is a directory");
  check_failure(swaymark("check /proc/self/mem"), 5, "/proc/self/mem: cannot read");
  check_failure(swaymark("check data/harbour_light.yaml/x"), 5, "cannot open: Not a directory");
}

TEST_CASE("the program ends with 5 where results cannot be written") {
  check_failure(swaymark("check data/harbour_light.yaml --json no-such-folder/r.json"), 5,
                "no-such-folder/r.json");
  check_failure(swaymark("check data/harbour_light.yaml --csv no-such-folder/sheets"), 5,
                "no-such-folder/sheets");
  check_failure(swaymark("check data/harbour_light.yaml --json data"), 5,
                "data: cannot write: Is a directory");
  check_failure(swaymark("check data/harbour_light.yaml --json /dev/full"), 5, "No space left");
  check_failure(swaymark("check data/harbour_light.yaml --json /proc/r.json"), 5,
                "/proc/r.json: cannot write");
  check_failure(swaymark("check data/harbour_light.yaml >/dev/full"), 5,
                "standard output: cannot write: No space");
  check_failure(swaymark("--help >/dev/full"), 5, "standard output: cannot write");
}

TEST_CASE("a file far too long is refused at once") {
  const ScratchFolder folder;
  const std::string file = folder.write("long.yaml", "swaymark: 1\n");
  std::filesystem::resize_file(file, std::uintmax_t{200} << 20U);  // a hole: nothing is on the disk
  const auto start = std::chrono::steady_clock::now();
  const Outcome outcome = swaymark("check " + quoted(file));
  const std::chrono::duration<double> seconds = std::chrono::steady_clock::now() - start;
  check_failure(outcome, 3, "long.yaml:");
  CHECK(seconds.count() < 5.0);
  check_failure(swaymark("check /dev/zero"), 3, "/dev/zero:");
}

TEST_CASE("aliases that multiply are refused within two seconds") {
  std::string text = "swaymark: 1\na0: &a0 [x, x, x, x, x, x, x, x, x, x]\n";
  for (int i = 1; i < 30; ++i) {
    const std::string before = "*a" + std::to_string(i - 1);
    text += "a" + std::to_string(i) + ": &a" + std::to_string(i) + " [";
    for (int k = 0; k < 9; ++k) text += before + ", ";
    text += before + "]\n";
  }
  const auto start = std::chrono::steady_clock::now();
  const Outcome outcome = check_text(text);
  const std::chrono::duration<double> seconds = std::chrono::steady_clock::now() - start;
  check_failure(outcome, 3, "alias");
  CHECK(seconds.count() < 2.0);
}

TEST_CASE("help and version end with 0 on standard output") {
  const Outcome help = swaymark("--help");
  CHECK(help.status == 0);
  CHECK_THAT(help.output, Catch::StartsWith("Usage: swaymark"));
  CHECK(help.error.empty());
  const Outcome version = swaymark("--version");
  CHECK(version.status == 0);
  CHECK_THAT(version.output, Catch::Matches("swaymark [0-9]+[.][0-9]+[.][0-9]+\n"));
  CHECK(swaymark("").output == help.output);
}

}  // namespace swaymark::test
