#include "core/wording_scenarios.hpp"

#include <catch2/catch.hpp>

#include "tests/core/messages.hpp"

namespace swaymark::test {

TEST_CASE("every message about scenarios says what is wrong and what would cure it and stays short") {
  using namespace wording;
  const std::string hostile = std::string(10'000, 'x') + "\n\x1B[31m";
  for (const std::string& word : {std::string("word"), hostile}) {
    check_sentences({too_many_scenarios(3, 2), scenario_changes_nothing(word),
                     key_same_in_all_scenarios(word, {"masses"}), key_of_a_scenario("area_factor"),
                     section_not_in_group(word, word, {word}), section_not_in_group(word, word, {})});
  }
}

TEST_CASE("many sections of a group are cut") {
  const std::vector<std::string> many(40, "L 80x80x8");
  CHECK(wording::section_not_in_group("legs", "leg", many).cure.size() < 200);
}

}  // namespace swaymark::test
