#include "core/text.hpp"

#include <catch2/catch.hpp>

namespace swaymark::test {

namespace {

const std::vector<std::string> kKeys{"material", "members", "masses", "mass_matrix", "modes", "z"};

std::string place_words(std::string_view text) {
  const auto place = first_invalid_character(text);
  return place ? std::to_string(place->line) + ":" + std::to_string(place->column) : "valid";
}

}  // namespace

TEST_CASE("a slip of the pen finds the word that was meant") {
  CHECK(nearest("membres", kKeys) == "members");     // neighbours swapped
  CHECK(nearest("materials", kKeys) == "material");  // a letter too many
  CHECK(nearest("mode", kKeys) == "modes");          // a letter missing
  CHECK(nearest("MASSES", kKeys) == "masses");       // another case
  CHECK(nearest("mass matrix", kKeys) == "mass_matrix");
}

TEST_CASE("a word that resembles nothing finds nothing") {
  CHECK(nearest("weather", kKeys) == std::nullopt);
  CHECK(nearest("", kKeys) == std::nullopt);
  CHECK(nearest("y", kKeys) == std::nullopt);  // no letter of it would be kept
  CHECK(nearest("members", {}) == std::nullopt);
}

TEST_CASE("a swap of neighbours counts as one slip") { CHECK(nearest("ab", {"ba"}) == "ba"); }

TEST_CASE("very long words are not compared") {
  CHECK(nearest(std::string(1000, 'a'), {std::string(1000, 'a')}) == std::nullopt);
}

TEST_CASE("text of every length of character is valid") {
  CHECK(place_words("") == "valid");
  CHECK(place_words("plain\ttext\r\nand lines\n") == "valid");
  CHECK(place_words("\xC3\xA4 \xE2\x82\xAC \xF0\x9F\x97\xBC") == "valid");  // a umlaut, euro sign, a tower
}

TEST_CASE("a faulty byte is found by line and column counted in characters") {
  CHECK(place_words("ab\n\xC3\xA4\xFF") == "2:2");
  CHECK(place_words(std::string_view("a\0b", 3)) == "1:2");
  CHECK(place_words("a\x1B[31m") == "1:2");
  CHECK(place_words("\x7F") == "1:1");
}

TEST_CASE("malformed sequences are refused as RFC 3629 says") {
  // RFC 3629 section 4 (from memory): no overlong forms, no surrogates, nothing above U+10FFFF.
  for (const std::string_view text :
       {"\x80", "\xC0\x80", "\xC1\xBF", "\xC3", "\xC3(", "\xE0\x80\x80", "\xE2\x82", "\xED\xA0\x80",
        "\xF0\x80\x80\x80", "\xF0\x9F\x97", "\xF4\x90\x80\x80", "\xF5\x80\x80\x80", "\xFE", "\xFF"}) {
    CHECK(place_words(text) == "1:1");
  }
  for (const std::string_view text : {"\xED\x9F\xBF", "\xEE\x80\x80", "\xF4\x8F\xBF\xBF", "\xC2\x80"}) {
    CHECK(place_words(text) == "valid");
  }
}

TEST_CASE("an excerpt is one line of limited length") {
  CHECK(excerpt("short") == "short");
  CHECK(excerpt("two\nlines\tand\x1B") == "two?lines?and?");
  CHECK(excerpt("abcdef", 3) == "abc...");
  CHECK(excerpt("abc", 3) == "abc");
  CHECK(excerpt("\xC3\xA4\xC3\xB6\xC3\xBC", 2) == "\xC3\xA4\xC3\xB6...");  // characters stay whole
  CHECK(excerpt("a\xFF"
                "b") == "a?b");
}

TEST_CASE("alternatives read as a sentence does") {
  CHECK(alternatives({}).empty());
  CHECK(alternatives({"x"}) == "x");
  CHECK(alternatives({"x", "z"}) == "x or z");
  CHECK(alternatives({"x", "y", "z"}) == "x, y or z");
}

}  // namespace swaymark::test
