#include "core/wording_masses.hpp"

#include <catch2/catch.hpp>

#include "tests/core/messages.hpp"

namespace swaymark::test {

namespace {

std::vector<Message> messages_about(const std::string& text) {
  using namespace wording;
  return {perimeter_missing({text}), perimeter_missing({text, text, text, text, text}), ice_on_nothing(text),
          liquid_label_taken(text)};
}

}  // namespace

TEST_CASE("every message on ice and liquids says what is wrong and what would cure it") {
  using namespace wording;
  std::vector<Message> messages = messages_about("leg");
  const std::vector<Message> plain{perimeter_too_short(0.1, 0.2), ice_on_nothing("all"),
                                   heights_reversed(2.0, 1.0),    heights_in_one_dimension(),
                                   liquid_in_one_dimension(),     liquid_needs_label(),
                                   liquid_without_mass()};
  messages.insert(messages.end(), plain.begin(), plain.end());
  check_sentences(messages);
}

TEST_CASE("names of sections and labels cannot flood a message on masses or break its line") {
  check_sentences(messages_about(std::string(10'000, 'x') + "\n\x1B[31m"));
}

TEST_CASE("a few sections without an outline are named and the others counted") {
  CHECK_THAT(wording::perimeter_missing({"a", "b"}).what, Catch::EndsWith("sections 'a', 'b'"));
  CHECK_THAT(wording::perimeter_missing({"a", "b", "c", "d", "e"}).what,
             Catch::EndsWith("sections 'a', 'b', 'c' and 2 more"));
}

}  // namespace swaymark::test
