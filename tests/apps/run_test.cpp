#include "apps/run.hpp"

#include <cstdio>
#include <vector>

#include <catch2/catch.hpp>
#include <fcntl.h>
#include <unistd.h>

#include "apps/exit_status.hpp"
#include "tests/apps/cases.hpp"
#include "tests/support/files.hpp"

namespace swaymark::test {

namespace {

struct Outcome {
  int status = 0;
  std::string output;
  std::string error;
};

// A stream of the process sent to a file for the life of the object.
class Redirected {
 public:
  Redirected(std::FILE* stream, const std::string& file) : stream_(stream), before_(dup(fileno(stream))) {
    std::fflush(stream_);
    const int target = open(file.c_str(), O_WRONLY | O_CREAT | O_TRUNC, 0600);
    dup2(target, fileno(stream_));
    close(target);
  }
  ~Redirected() {
    std::fflush(stream_);
    dup2(before_, fileno(stream_));
    close(before_);
  }
  Redirected(const Redirected&) = delete;
  Redirected& operator=(const Redirected&) = delete;

 private:
  std::FILE* stream_;
  int before_;
};

// What the program does with these arguments, in this process.
Outcome run_with(const std::vector<std::string>& words) {
  std::vector<const char*> argv{"swaymark"};
  for (const std::string& word : words) argv.push_back(word.c_str());
  const ScratchFolder folder;
  Outcome outcome;
  {
    const Redirected output(stdout, (folder.path() / "output").string());
    const Redirected error(stderr, (folder.path() / "error").string());
    outcome.status = run(static_cast<int>(argv.size()), argv.data());
  }
  outcome.output = bytes_of(folder.path() / "output");
  outcome.error = bytes_of(folder.path() / "error");
  return outcome;
}

Outcome check_text(const std::string& tower, std::vector<std::string> options = {}) {
  const ScratchFolder folder;
  options.insert(options.begin(), {"check", folder.write("tower.yaml", tower)});
  return run_with(options);
}

}  // namespace

TEST_CASE("a tower that meets its checks ends with zero and the report alone") {
  const Outcome outcome = check_text(lone_mass());
  CHECK(outcome.status == kAllMet);
  CHECK_THAT(outcome.output, Catch::Contains("All 2 checks are met"));
  CHECK(outcome.error.empty());
}

TEST_CASE("a check that is not met ends with one and says nothing on standard error") {
  const Outcome outcome = run_with({"check", (data_folder() / "harbour_light.yaml").string()});
  CHECK(outcome.status == kNotMet);
  CHECK_THAT(outcome.output, Catch::Contains("NOT MET"));
  CHECK(outcome.error.empty());
}

TEST_CASE("a wrong command line ends with two and one line") {
  const Outcome outcome = run_with({"chekc"});
  CHECK(outcome.status == kUsage);
  CHECK(outcome.output.empty());
  CHECK(lines_of(outcome.error).size() == 1);
}

TEST_CASE("a refused tower file ends with three and a line for each fault with its place") {
  const Outcome outcome = check_text(tower_with({"dimensions: 4", "sections: {bar: {area: 10 kg}}"}));
  CHECK(outcome.status == kRefused);
  CHECK(outcome.output.empty());
  CHECK(has_line(outcome.error, {"tower.yaml:2:"}));
  CHECK(has_line(outcome.error, {"tower.yaml:4:"}));
}

TEST_CASE("very many faults are cut and counted") {
  std::string bars = "members: [{group: g, section: bar, material: steel, bars: [[a, c], [b, c]";
  for (int i = 0; i < 150; ++i) bars += fmt::format(", [a, unknown{}]", i);
  const Outcome outcome = check_text(tower_with({bars + "]}]"}));
  CHECK(outcome.status == kRefused);
  CHECK(lines_of(outcome.error).size() == 101);
  CHECK_THAT(lines_of(outcome.error).back(), Catch::Contains("50 more faults"));
}

TEST_CASE("a mechanism ends with four and what would hold the tower") {
  const Outcome outcome = check_text(swinging_bar());
  CHECK(outcome.status == kNotComputable);
  CHECK(outcome.output.empty());
  CHECK_THAT(outcome.error, Catch::Contains("node c:") && Catch::Contains("cure:"));
}

TEST_CASE("a mechanism is written as JSON where JSON is asked for") {
  const Outcome outcome = check_text(swinging_bar(), {"--json", "-"});
  CHECK(outcome.status == kNotComputable);
  CHECK_THAT(outcome.output, Catch::StartsWith("{") && Catch::Contains("\"mechanisms\""));
}

TEST_CASE("a tower that cannot be computed ends with four and what would cure it") {
  const Outcome outcome = check_text(tower_with({"supports: [{nodes: [a, b, c], fixed: [x, z]}]"}));
  CHECK(outcome.status == kNotComputable);
  CHECK_THAT(outcome.error, Catch::Contains("nothing is free to move; leave"));
}

TEST_CASE("a missing tower file ends with five and names it") {
  const Outcome outcome = run_with({"check", "there-is-no.yaml"});
  CHECK(outcome.status == kFileTrouble);
  CHECK_THAT(outcome.error, Catch::StartsWith("there-is-no.yaml: cannot open"));
}

TEST_CASE("results never take the place of the tower file") {
  const ScratchFolder folder;
  const std::string tower = folder.write("tower.yaml", lone_mass());
  const Outcome outcome = run_with({"check", tower, "--json", folder.path().string() + "/./tower.yaml"});
  CHECK(outcome.status == kFileTrouble);
  CHECK_THAT(outcome.error, Catch::Contains("is an input of this run itself"));
  CHECK(bytes_of(tower) == lone_mass());
}

TEST_CASE("a tower is checked with the tables beside it and results never take their place") {
  const ScratchFolder folder;
  const std::string tower =
      folder.write("tower.yaml",
                   lone_mass({"nodes_from: nodes.csv", "nodes: {a: [0, 0], b: [2, 0]}", "bars_from: bars.csv",
                              "members: [{group: g, section: bar, material: steel}]"}));
  const std::string table = "bar,from,to,group\nleft,a,c,g\nright,b,c,g\n";
  const std::string bars = folder.write("bars.csv", table);
  folder.write("nodes.csv", "node,x [mm],z [mm]\nc,1000,1000\n");
  const Outcome whole = run_with({"check", tower, "--json", "-"});
  CHECK(whole.status == kAllMet);
  CHECK_THAT(whole.output, Catch::Contains("\"bars\": 2"));
  CHECK(run_with({"check", tower, "--json", bars}).status == kFileTrouble);
  CHECK(bytes_of(bars) == table);
}

TEST_CASE("a fault of a table is told in the table by the path it was read from") {
  const ScratchFolder folder;
  const std::string tower = folder.write("tower.yaml", lone_mass({"nodes_from: nodes.csv"}));
  const std::string nodes = folder.write("nodes.csv", "node,x,z\nd,1 kg,5\n");
  const Outcome outcome = run_with({"check", tower});
  CHECK(outcome.status == kRefused);
  CHECK_THAT(outcome.error, Catch::StartsWith(nodes + ":2:3: "));
}

TEST_CASE("a table that is not there ends with five") {
  const ScratchFolder folder;
  const Outcome outcome =
      run_with({"check", folder.write("tower.yaml", lone_mass({"bars_from: there-is-none.csv"}))});
  CHECK(outcome.status == kFileTrouble);
  CHECK_THAT(outcome.error, Catch::Contains("there-is-none.csv: cannot open"));
}

TEST_CASE("JSON on standard output stands in place of the report") {
  const Outcome outcome = check_text(lone_mass(), {"--json", "-"});
  CHECK(outcome.status == kAllMet);
  CHECK_THAT(outcome.output, Catch::StartsWith("{\n") && Catch::EndsWith("}\n"));
  CHECK(outcome.output.find("MODEL") == std::string::npos);
}

TEST_CASE("colour comes where it is asked for and not into a file by itself") {
  CHECK(check_text(lone_mass(), {"--color", "always"}).output.find("\x1b[32mmet") != std::string::npos);
  CHECK(check_text(lone_mass()).output.find('\x1b') == std::string::npos);
}

}  // namespace swaymark::test
