#include <algorithm>
#include <vector>

#include <nlohmann/json.hpp>

#include "tests/program/shipped.hpp"

namespace swaymark::test {

namespace fs = std::filesystem;

namespace {

std::vector<std::string> names_in(const fs::path& folder) {
  std::vector<std::string> names;
  for (const auto& entry : fs::directory_iterator(folder)) names.push_back(entry.path().filename().string());
  std::sort(names.begin(), names.end());
  return names;
}

using Names = std::vector<std::string>;

const std::string kHarbour = "check data/harbour_light.yaml";

}  // namespace

TEST_CASE("a tower from standard input gives the report of the file but for its name") {
  const Outcome from_file = swaymark(kHarbour);
  const Outcome piped = swaymark("check - <data/harbour_light.yaml");
  CHECK(piped.status == from_file.status);
  std::string expected = from_file.output;
  const std::string name = "data/harbour_light.yaml";
  expected.replace(expected.find(name), name.size(), "standard input");
  CHECK(piped.output == expected);
  CHECK_THAT(shell("printf 'swaymark: 9\\n' | \"$SWAYMARK\" check -").error,
             Catch::StartsWith("standard input:1:11: "));
}

TEST_CASE("a tower from standard input finds its tables from the folder of the run") {
  const ScratchFolder folder;
  const std::string tower =
      sound_tower_with("nodes: {a: [0, 0], b: [2, 0], c: [1, 1]}", "nodes_from: nodes.csv");
  folder.write("tower.yaml", tower);
  folder.write("nodes.csv", "node,x [mm],z [mm]\na,0,0\nb,2000,0\nc,1000,1000\n");
  const Outcome piped =
      shell("cd " + quoted(folder.path().string()) + "\n\"$SWAYMARK\" check - --json - <tower.yaml");
  CHECK(piped.error.empty());
  CHECK(piped.status == 0);
  const auto results = nlohmann::json::parse(piped.output);
  CHECK(results["model"]["nodes"] == 3);
}

TEST_CASE("JSON on standard output is JSON and nothing else") {
  const Outcome outcome = swaymark(kHarbour + " --json -");
  CHECK(outcome.status == 1);
  CHECK(outcome.error.empty());
  const auto json = nlohmann::json::parse(outcome.output);
  CHECK(json["title"] == "Harbour light tower");
  CHECK(json["input"]["file"] == "data/harbour_light.yaml");
  const std::string hash = shell("sha256sum data/harbour_light.yaml").output.substr(0, 64);
  CHECK(json["input"]["sha256"] == hash);
}

TEST_CASE("JSON in a file stands beside the report and holds the same as on standard output") {
  const ScratchFolder folder;
  const fs::path file = folder.path() / "r.json";
  const Outcome outcome = swaymark(kHarbour + " --json " + quoted(file.string()));
  CHECK(outcome.status == 1);
  CHECK(outcome.output == swaymark(kHarbour).output);
  CHECK(bytes_of(file) == swaymark(kHarbour + " --json -").output);
  CHECK(names_in(folder.path()) == Names{"r.json"});
}

TEST_CASE("CSV writes its sheets into a new folder and over those of an earlier run") {
  const ScratchFolder folder;
  const fs::path sheets = folder.path() / "sheets";
  for (int run = 0; run < 2; ++run) {
    CHECK(swaymark(kHarbour + " --shapes --csv " + quoted(sheets.string())).status == 1);
    CHECK(names_in(sheets) == Names{"bands.csv", "bars.csv", "base.csv", "ledger.csv", "modes.csv",
                                    "nodes.csv", "ordinates.csv", "reactions.csv", "shapes.csv",
                                    "verdicts.csv"});
    CHECK_THAT(bytes_of(sheets / "modes.csv"), Catch::StartsWith("mode,frequency [Hz],"));
  }
}

TEST_CASE("where one output fails no other is left behind and an earlier one is as it was") {
  const ScratchFolder folder;
  const std::string json = folder.write("r.json", "before");
  const Outcome outcome = swaymark(kHarbour + " --json " + quoted(json) + " --csv no-such-folder/sheets");
  CHECK(outcome.status == 5);
  CHECK(outcome.output.empty());
  CHECK(bytes_of(json) == "before");
  CHECK(names_in(folder.path()) == Names{"r.json"});
  CHECK(!fs::exists(source_folder() / "no-such-folder"));
}

TEST_CASE("results that would be written twice or over the tower are refused") {
  const ScratchFolder folder;
  fs::create_directory(folder.path() / "out");
  const std::string out = (folder.path() / "out").string();
  CHECK(swaymark(kHarbour + " --csv " + quoted(out) + " --json " + quoted(out + "/modes.csv")).status == 5);
  CHECK(names_in(folder.path() / "out").empty());
  const std::string tower = folder.write("tower.yaml", kSoundTower);
  CHECK(swaymark("check " + quoted(tower) + " --json " + quoted(tower)).status == 5);
  CHECK(bytes_of(tower) == kSoundTower);
}

TEST_CASE("a refused tower writes no results") {
  const ScratchFolder folder;
  const std::string json = (folder.path() / "r.json").string();
  const std::string sheets = (folder.path() / "sheets").string();
  CHECK(swaymark("check data/rejected/unknown_key.yaml --json " + quoted(json) + " --csv " + quoted(sheets))
            .status == 3);
  CHECK(names_in(folder.path()).empty());
}

TEST_CASE("a mechanism is in the JSON and on standard error and ends with 4") {
  const ScratchFolder folder;
  const std::string tower = folder.write("tower.yaml", sound_tower_with(", [b, c]", ""));
  const Outcome outcome = swaymark("check " + quoted(tower) + " --json -");
  CHECK(outcome.status == 4);
  CHECK_THAT(outcome.error, Catch::Contains("node c:"));
  const auto json = nlohmann::json::parse(outcome.output);
  CHECK(json["mechanisms"].size() == 1);
  CHECK(!json.contains("modes"));
}

TEST_CASE("a pipe gets no colour unless it is asked for") {
  CHECK(swaymark(kHarbour).output.find('\x1b') == std::string::npos);
  CHECK(swaymark(kHarbour + " --color always").output.find("\x1b[1;31mNOT MET") != std::string::npos);
  CHECK(swaymark(kHarbour + " --color=never").output.find('\x1b') == std::string::npos);
}

TEST_CASE("a terminal gets colour unless NO_COLOR or a dumb terminal forbids it") {
  // script gives the program a terminal to write to.
  if (shell("command -v script").status != 0) return;
  const auto on_terminal = [](const std::string& setting) {
    return shell(setting + " script -qec '\"$SWAYMARK\" " + kHarbour + "' /dev/null").output;
  };
  CHECK(on_terminal("").find("\x1b[1;31mNOT MET") != std::string::npos);
  CHECK(on_terminal("NO_COLOR=1").find('\x1b') == std::string::npos);
  CHECK(on_terminal("NO_COLOR=").find('\x1b') != std::string::npos);
  CHECK(on_terminal("TERM=dumb").find('\x1b') == std::string::npos);
}

TEST_CASE("a reader that goes away or an output that is closed ends the program with 5 and not by a signal") {
  // The reader ends at once; what is written is more than a pipe holds.
  const Outcome broken = shell("{ \"$SWAYMARK\" " + kHarbour +
                               " --shapes --json -; echo \"ended $?\" >&2; } | sh -c 'exec <&-; sleep 0.2'");
  CHECK_THAT(broken.error, Catch::Contains("ended 5") && Catch::Contains("standard output: cannot write"));
  const Outcome closed = swaymark(kHarbour + " >&-");
  CHECK(closed.status == 5);
  CHECK_THAT(closed.error, Catch::Contains("standard output: cannot write"));
  CHECK(swaymark(kHarbour + " 2>&-").status == 1);
  CHECK(swaymark("check there-is-no.yaml 2>&-").status == 5);
}

TEST_CASE("two runs on the same day give the same bytes") {
  const auto run = [](const std::string& options) {
    return shell("SOURCE_DATE_EPOCH=1700000000 \"$SWAYMARK\" " + kHarbour + options);
  };
  for (const char* options : {"", " --json - --shapes"}) {
    const Outcome first = run(options);
    CHECK_THAT(first.output, Catch::Contains("2023-11-14"));
    CHECK(first.output == run(options).output);
  }
}

TEST_CASE("a language with a decimal comma changes no figure") {
  // Where the system has no such language the test passes on the languages it has.
  const std::string plain = swaymark(kHarbour).output;
  const std::string names = shell("locale -a 2>/dev/null").output;
  for (const char* language : {"C", "C.UTF-8", "de_DE.utf8", "fr_FR.utf8", "tr_TR.utf8"}) {
    INFO(language << " of " << names);
    CHECK(shell("LC_ALL=" + std::string(language) + " \"$SWAYMARK\" " + kHarbour).output == plain);
  }
}

TEST_CASE("the name of a file may hold blanks quotes and other alphabets") {
  const ScratchFolder folder;
  const std::string tower = folder.write("my \"odd\" t\u00f6wer.yaml", kSoundTower);
  const Outcome outcome = swaymark("check " + quoted(tower) + " --json -");
  CHECK(outcome.status == 0);
  CHECK(nlohmann::json::parse(outcome.output)["input"]["file"] == tower);
}

TEST_CASE("modes print frequencies and leave the checks out") {
  const Outcome outcome = swaymark("modes data/harbour_light.yaml");
  CHECK(outcome.status == 0);
  CHECK_THAT(outcome.output, Catch::Contains("\nMODES\n"));
  CHECK(outcome.output.find("NOT MET") == std::string::npos);
  CHECK(outcome.error.empty());
}

}  // namespace swaymark::test
