#include <algorithm>
#include <sstream>
#include <vector>

#include "tests/program/shipped.hpp"

namespace swaymark::test {

namespace {

// The fenced block after `<!-- output of: COMMAND -->` in a text; empty where there is none.
std::string block_after(const std::string& text, const std::string& command,
                        const std::string& what = "output of: ") {
  std::istringstream lines(text);
  std::string line;
  const std::string mark = "<!-- " + what + command + " -->";
  while (std::getline(lines, line) && line != mark) {
  }
  if (!std::getline(lines, line) || !line.starts_with("```")) return {};
  std::string block;
  while (std::getline(lines, line) && line != "```") block += line + "\n";
  return block;
}

// The lines of a report without those of the day and of the tower file's bytes.
std::vector<std::string> lasting(const std::string& report) {
  std::istringstream lines(report);
  std::vector<std::string> result;
  for (std::string line; std::getline(lines, line);) {
    if (!line.starts_with("  sha256 ") && !line.starts_with("  date ")) result.push_back(line);
  }
  return result;
}

}  // namespace

TEST_CASE("readme output matches a real run") {
  const std::string shown =
      block_after(bytes_of(source_folder() / "README.md"), "swaymark check data/harbour_light.yaml");
  REQUIRE(!shown.empty());
  const auto expected = lasting(shown);
  const auto actual = lasting(swaymark("check data/harbour_light.yaml").output);
  CHECK(expected.size() > 50);  // a whole report
  CHECK(actual.size() == expected.size());
  // The first line that differs is told; those after it may only be shifted.
  for (std::size_t i = 0; i < std::min(actual.size(), expected.size()); ++i)
    REQUIRE(actual[i] == expected[i]);
}

TEST_CASE("the scenarios shown in the readme are those of a real run") {
  const std::string command = "check data/northfell_common.yaml";
  const std::string shown = block_after(bytes_of(source_folder() / "README.md"), "swaymark " + command,
                                        "scenarios in the output of: ");
  REQUIRE(shown.size() > 500);
  const std::string output = swaymark(command).output;
  const std::size_t begin = output.find("\nSCENARIOS\n");
  const std::size_t end = output.find("\nLIMITS OF THE METHOD\n");
  REQUIRE(begin != std::string::npos);
  REQUIRE(end != std::string::npos);
  CHECK(output.substr(begin + 1, end - begin - 1) == shown);
}

TEST_CASE("a block of output is found by its mark and ends with its fence") {
  const std::string text = "# Title\n<!-- output of: a b -->\n```text\none\n\ntwo\n```\nafter\n";
  CHECK(block_after(text, "a b") == "one\n\ntwo\n");
  CHECK(block_after(text, "a c").empty());
  CHECK(block_after("<!-- output of: a b -->\nno fence\n", "a b").empty());
  CHECK(lasting("a\n  sha256   0\n  date     today\nb\n") == std::vector<std::string>{"a", "b"});
}

}  // namespace swaymark::test
