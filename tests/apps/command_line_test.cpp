#include "apps/command_line.hpp"

#include <algorithm>
#include <vector>

#include <catch2/catch.hpp>

#include "apps/exit_status.hpp"
#include "apps/provenance.hpp"
#include "apps/starter.hpp"

namespace swaymark::test {

namespace {

Parsed parsed(const std::vector<std::string>& words) {
  std::vector<const char*> argv{"swaymark"};
  for (const std::string& word : words) argv.push_back(word.c_str());
  return parse_command_line(static_cast<int>(argv.size()), argv.data());
}

// What the command line is refused with; empty where it is followed.
std::string refusal(const std::vector<std::string>& words) {
  const Parsed result = parsed(words);
  if (result.command || result.status == kAllMet) return {};
  CHECK(result.status == kUsage);
  CHECK(result.output.empty());
  CHECK(result.error.find('\n') == std::string::npos);
  CHECK_THAT(result.error, Catch::Contains("--help"));
  return result.error;
}

}  // namespace

TEST_CASE("a command and a tower file are enough") {
  const Parsed result = parsed({"check", "mast.yaml"});
  REQUIRE(result.command);
  CHECK(result.command->scope == Scope::check);
  CHECK(result.command->tower == "mast.yaml");
  CHECK(!result.command->json);
  CHECK(!result.command->csv);
  CHECK(!result.command->shapes);
  CHECK(result.command->colour == ColourChoice::automatic);
  CHECK(parsed({"modes", "mast.yaml"}).command->scope == Scope::modes);
}

TEST_CASE("options stand in any order before and after the tower file") {
  std::vector<std::vector<std::string>> parts{
      {"mast.yaml"}, {"--json", "r.json"}, {"--csv=out"}, {"--shapes"}, {"--color", "never"}};
  std::sort(parts.begin(), parts.end());
  do {
    std::vector<std::string> words{"check"};
    for (const auto& part : parts) words.insert(words.end(), part.begin(), part.end());
    const Parsed result = parsed(words);
    INFO(result.error);
    REQUIRE(result.command);
    CHECK(result.command->tower == "mast.yaml");
    CHECK(result.command->json == "r.json");
    CHECK(result.command->csv == "out");
    CHECK(result.command->shapes);
    CHECK(result.command->colour == ColourChoice::never);
  } while (std::next_permutation(parts.begin(), parts.end()));
}

TEST_CASE("an option and its value are one word or two") {
  CHECK(parsed({"check", "t", "--json=a=b.json"}).command->json == "a=b.json");
  CHECK(parsed({"check", "t", "--json", "r"}).command->json == "r");
  CHECK(parsed({"check", "t", "--color=always"}).command->colour == ColourChoice::always);
}

TEST_CASE("a single dash is standard input or standard output") {
  const Parsed result = parsed({"check", "-", "--json", "-"});
  REQUIRE(result.command);
  CHECK(result.command->tower == "-");
  CHECK(result.command->json == "-");
}

TEST_CASE("what follows two dashes is a file name whatever it looks like") {
  CHECK(parsed({"check", "--", "--help"}).command->tower == "--help");
  CHECK(parsed({"check", "--json", "r", "--", "--json"}).command->tower == "--json");
  CHECK_THAT(refusal({"check", "--", "a.yaml", "-b.yaml"}), Catch::Contains("more than one tower file"));
}

TEST_CASE("colour can be asked for and turned off") {
  CHECK(parsed({"check", "t", "--color", "auto"}).command->colour == ColourChoice::automatic);
  CHECK(parsed({"check", "t", "--no-color"}).command->colour == ColourChoice::never);
  CHECK(parsed({"check", "t", "--color", "always", "--no-color"}).command->colour == ColourChoice::never);
  CHECK_THAT(refusal({"check", "t", "--color", "blue"}), Catch::Contains("auto, always or never"));
}

TEST_CASE("an unknown option is named with the nearest known one") {
  CHECK_THAT(refusal({"check", "t", "--jsn", "r"}), Catch::Contains("'--jsn', did you mean '--json'?"));
  CHECK_THAT(refusal({"check", "t", "--shape"}), Catch::Contains("did you mean '--shapes'?"));
  CHECK_THAT(refusal({"check", "t", "--no-colour"}), Catch::Contains("did you mean '--no-color'?"));
  CHECK_THAT(refusal({"check", "t", "--bogus"}), Catch::Contains("unknown option '--bogus';"));
  CHECK_THAT(refusal({"check", "t", "-q"}), Catch::Contains("unknown option '-q'"));
}

TEST_CASE("an option without its value is named") {
  CHECK_THAT(refusal({"check", "t", "--json"}), Catch::Contains("'--json' lacks its value"));
  CHECK_THAT(refusal({"check", "t", "--json="}), Catch::Contains("'--json' lacks its value"));
  CHECK_THAT(refusal({"check", "t", "--json", "--csv", "out"}), Catch::Contains("'--json' lacks its value"));
  CHECK_THAT(refusal({"check", "t", "--color", "--shapes"}), Catch::Contains("'--color' lacks its value"));
  CHECK_THAT(refusal({"check", "t", "--csv", ""}), Catch::Contains("empty"));
}

TEST_CASE("an option given twice is refused because one of its values would be lost") {
  CHECK_THAT(refusal({"check", "t", "--json", "a", "--json=b"}), Catch::Contains("'--json' is given twice"));
}

TEST_CASE("one tower file is checked at a time") {
  CHECK_THAT(refusal({"check", "a.yaml", "b.yaml"}), Catch::Contains("more than one tower file"));
  CHECK_THAT(refusal({"check"}), Catch::Contains("no tower file"));
  CHECK_THAT(refusal({"modes", "--shapes", "--json", "r"}), Catch::Contains("no tower file"));
}

TEST_CASE("an unknown command is named with the nearest known one") {
  CHECK_THAT(refusal({"chekc", "t"}), Catch::Contains("unknown command 'chekc', did you mean 'check'?"));
  CHECK_THAT(refusal({"mast.yaml"}), Catch::Contains("unknown command 'mast.yaml';"));
  CHECK_THAT(refusal({"--json", "r", "check", "t"}), Catch::Contains("no command"));
}

TEST_CASE("what is not yet supported is said to be so") {
  CHECK_THAT(refusal({"compare", "t"}), Catch::Contains("'compare' is not yet supported"));
  CHECK_THAT(refusal({"check", "t", "--html", "r.html"}), Catch::Contains("'--html' is not yet supported"));
}

TEST_CASE("a new tower file is text to print") {
  const Parsed result = parsed({"new", "tank-stand"});
  CHECK(result.status == kAllMet);
  CHECK(!result.command);
  CHECK(result.output == std::string(starter_of("tank-stand")->text));
}

TEST_CASE("a new tower file wants one kind that is known") {
  for (const char* kind :
       {"telecom-tower", "wind-turbine-tower", "tank-stand", "plane-truss", "nodes-and-bars"})
    CHECK_THAT(refusal({"new"}), Catch::Contains(kind));
  CHECK_THAT(refusal({"new", "telecom-towr"}), Catch::Contains("did you mean 'telecom-tower'?"));
  CHECK_THAT(refusal({"new", "submarine"}), Catch::Contains("the kinds are telecom-tower"));
  CHECK_THAT(refusal({"new", "tank-stand", "plane-truss"}), Catch::Contains("one kind"));
  CHECK_THAT(refusal({"new", "--json"}), Catch::Contains("no option '--json'"));
}

TEST_CASE("shapes without a file to hold them and a folder that is none are refused") {
  CHECK_THAT(refusal({"check", "t", "--shapes"}), Catch::Contains("--json or --csv"));
  CHECK_THAT(refusal({"check", "t", "--csv", "-"}), Catch::Contains("folder"));
}

TEST_CASE("help comes in every common form and names every command option and status") {
  const std::string text = parsed({"--help"}).output;
  for (const char* word : {"check", "modes", "--json", "--csv", "--shapes", "--color", "--no-color",
                           "--version", "NO_COLOR", "standard input", "70", "new KIND", "plane-truss"}) {
    CHECK_THAT(text, Catch::Contains(word));
  }
  for (const std::vector<std::string>& words : {std::vector<std::string>{},
                                                {"-h"},
                                                {"help"},
                                                {"help", "check"},
                                                {"check", "--help"},
                                                {"check", "t", "-h"}}) {
    const Parsed result = parsed(words);
    CHECK(result.output == text);
    CHECK(result.error.empty());
    CHECK(result.status == kAllMet);
    CHECK(!result.command);
  }
}

TEST_CASE("the version is one line") {
  const Parsed result = parsed({"--version"});
  CHECK(result.output == "swaymark " + program_version() + "\n");
  CHECK(result.status == kAllMet);
}

}  // namespace swaymark::test
