#include "tests/core/messages.hpp"

#include <string>

#include <catch2/catch.hpp>

namespace swaymark::test {

void check_sentences(const std::vector<Message>& messages) {
  for (const Message& message : messages) {
    INFO(message.what << "; " << message.cure);
    for (const std::string& clause : {message.what, message.cure}) {
      CHECK(clause.size() > 4);
      CHECK(clause.size() < 400);
      CHECK((clause.back() != '.' || clause.ends_with("...")));  // of words that were cut
      CHECK(clause.find_first_of("\n\x1B") == std::string::npos);
    }
  }
}

}  // namespace swaymark::test
