#include "apps/starter.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases_scenarios.hpp"

namespace swaymark::test {

TEST_CASE("every starter is the file of its name under data") {
  const auto all = starters();
  CHECK(all.size() == 5);
  for (const Starter& starter : all) {
    INFO(starter.kind);
    std::string name = starter.kind;
    std::replace(name.begin(), name.end(), '-', '_');
    CHECK(starter.text == bytes_of(data_folder() / "starters" / (name + ".yaml")));
  }
}

TEST_CASE("every starter is read and stands and explains itself line by line") {
  for (const Starter& starter : starters()) {
    INFO(starter.kind);
    const Study study = studied(std::string(starter.text));
    for (const Analysis* state : study.states()) CHECK(state != nullptr);
    for (const std::string& line : lines_of(std::string(starter.text))) {
      INFO(line);
      CHECK(line.size() <= 120);
      // A key of the first level has a comment behind it.
      const bool key = !line.empty() && line.front() >= 'a' && line.front() <= 'z' && line.back() == ':';
      const bool explained = line.find('#') != std::string::npos || !key;
      CHECK(explained);
    }
  }
}

TEST_CASE("a starter raises no question of plausibility") {
  for (const Starter& starter : starters()) {
    INFO(starter.kind);
    for (const std::string& note : studied(std::string(starter.text)).stated.notes) {
      INFO(note);
      CHECK(note.find("Plausible?") == std::string::npos);
      CHECK(note.find("WARNING") == std::string::npos);
    }
  }
}

TEST_CASE("a starter is found by its kind and by nothing else") {
  REQUIRE(starter_of("tank-stand"));
  CHECK_THAT(std::string(starter_of("tank-stand")->text), Catch::Contains("tank"));
  CHECK_FALSE(starter_of("tank_stand"));
  CHECK_FALSE(starter_of(""));
}

}  // namespace swaymark::test
