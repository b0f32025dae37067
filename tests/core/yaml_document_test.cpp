#include "core/yaml_document.hpp"

#include <chrono>

#include <catch2/catch.hpp>
#include <fmt/format.h>

namespace swaymark::test {

namespace {

using Kind = YamlNode::Kind;

YamlNode parsed(std::string_view text) {
  FaultList faults("a.yaml");
  YamlNode root = parse_yaml(text, "a.yaml", faults);
  faults.throw_if_any();
  return root;
}

// "line:column what" of every fault, one a line; empty if the text is read.
std::string refusal_of(std::string_view text, const YamlLimits& limits = {}) {
  std::string result;
  try {
    FaultList faults("a.yaml");
    (void)parse_yaml(text, "a.yaml", faults, limits);
    faults.throw_if_any();
  } catch (const InputError& error) {
    for (const Fault& fault : error.faults()) {
      CHECK(fault.file == "a.yaml");
      if (!result.empty()) result += '\n';
      result += fmt::format("{}:{} {}", fault.place.line, fault.place.column, fault.message.what);
    }
  }
  return result;
}

std::string place_of(const YamlNode& node) {
  return fmt::format("{}:{}", node.place.line, node.place.column);
}

// A hostile file is told within this time.
constexpr std::chrono::seconds kPatience{1};

template <typename Work>
bool is_quick(Work work) {
  const auto begin = std::chrono::steady_clock::now();
  work();
  return std::chrono::steady_clock::now() - begin < kPatience;
}

// Each level lists the one before it nine times: 9^12 values in a few hundred bytes.
std::string alias_bomb() {
  std::string text = "a0: &a0 [x, x, x, x, x, x, x, x, x]\n";
  for (int level = 1; level < 12; ++level) {
    text += fmt::format("a{0}: &a{0} [", level);
    for (int i = 0; i < 9; ++i) text += fmt::format("{}*a{}", i == 0 ? "" : ", ", level - 1);
    text += "]\n";
  }
  return text;
}

}  // namespace

TEST_CASE("values of every kind stand in the tree with their places") {
  const YamlNode root = parsed("name: Tower\nlist: [1, 2 m]\nmap:\n  inner: 'a b'\nnothing:\n");
  REQUIRE(root.kind == Kind::map);
  REQUIRE(root.items.size() == 8);
  CHECK(root.items[0].text == "name");
  CHECK(place_of(root.items[0]) == "1:1");
  CHECK(root.items[1].text == "Tower");
  CHECK(place_of(root.items[1]) == "1:7");
  const YamlNode& list = root.items[3];
  REQUIRE(list.kind == Kind::sequence);
  CHECK(place_of(list) == "2:7");
  CHECK(list.items[1].text == "2 m");
  CHECK(place_of(list.items[1]) == "2:11");
  const YamlNode& map = root.items[5];
  REQUIRE(map.kind == Kind::map);
  CHECK(map.items[1].text == "a b");
  CHECK(place_of(map.items[1]) == "4:10");
  CHECK(root.items[7].kind == Kind::null);
}

TEST_CASE("columns count characters and not bytes") {
  const YamlNode root = parsed("{\xC3\xA4\xE2\x82\xAC: x}");  // two characters of two and three bytes
  CHECK(place_of(root.items[1]) == "1:6");
}

TEST_CASE("what stands there is described for messages") {
  const YamlNode root = parsed("[word, [1], {a: b}, ~]");
  CHECK(root.items[0].description() == "'word'");
  CHECK(root.items[1].description() == "a list");
  CHECK(root.items[2].description() == "a map");
  CHECK(root.items[3].description() == "nothing");
}

TEST_CASE("an alias stands for the value it names at its own place") {
  const YamlNode root = parsed("a: &x {E: 1}\nb: *x\nc: &y word\nd: *y\n");
  REQUIRE(root.items[3].kind == Kind::map);
  CHECK(root.items[3].items[0].text == "E");
  CHECK(place_of(root.items[3]) == "2:4");
  CHECK(root.items[7].text == "word");
}

TEST_CASE("the same anchor written again names the later value") {
  const YamlNode root = parsed("a: &x 1\nb: &x 2\nc: *x\n");
  CHECK(root.items[5].text == "2");
}

TEST_CASE("an alias inside the value it names is refused") {
  CHECK(refusal_of("a: &x [1, *x]\n") == "1:11 an alias stands inside the value it names");
}

TEST_CASE("an alias of nothing is refused at its place") {
  CHECK_THAT(refusal_of("a: 1\nb: *nobody\n"), Catch::StartsWith("2:4 this is no YAML"));
}

TEST_CASE("aliases of aliases are refused before they cost time") {
  const std::string bomb = alias_bomb();
  std::string refusal;
  CHECK(is_quick([&] { refusal = refusal_of(bomb); }));
  CHECK_THAT(refusal, Catch::Contains("aliases of the file stand for more than 100000 values"));
}

TEST_CASE("aliases of a long text count for its length") {
  std::string text = "a: &a '" + std::string(std::size_t{1} << 20U, 'x') + "'\nb: [";
  for (int i = 0; i < 2000; ++i) text += "*a, ";  // two gigabytes if they were copied
  std::string refusal;
  CHECK(is_quick([&] { refusal = refusal_of(text + "]\n"); }));
  CHECK_THAT(refusal, Catch::Contains("aliases of the file stand for more than 100000 values"));
}

TEST_CASE("aliases cannot nest deeper than values may") {
  std::string text = "a0: &a0 [x]\n";
  for (int level = 1; level < 60; ++level) text += fmt::format("a{0}: &a{0} [*a{1}]\n", level, level - 1);
  CHECK_THAT(refusal_of(text), Catch::Contains("nested deeper than 24 levels"));
}

TEST_CASE("nesting is taken to the limit and refused past it") {
  const auto nested = [](std::size_t levels) {
    return std::string(levels, '[') + "x" + std::string(levels, ']');
  };
  CHECK(refusal_of(nested(24)).empty());
  CHECK(refusal_of(nested(25)) == "1:25 values are nested deeper than 24 levels");
  std::string refusal;
  CHECK(is_quick([&] { refusal = refusal_of(std::string(200'000, '[')); }));
  CHECK_THAT(refusal, Catch::Contains("nested deeper than 24 levels"));
  std::string block;
  for (std::size_t i = 0; i < 2000; ++i) block += "- ";
  CHECK(refusal_of(block + "x") == "1:49 values are nested deeper than 24 levels");
}

TEST_CASE("a long line of characters of several bytes is read in one pass") {
  std::string text = "[";
  for (int i = 0; i < 100'000; ++i) text += "\xC3\xA4, ";
  CHECK(is_quick([&] { CHECK(place_of(parsed(text + "x]").items.back()) == "1:300002"); }));
}

TEST_CASE("a file longer than the limit is refused unread") {
  YamlLimits limits;
  limits.bytes = 10;
  CHECK(refusal_of("a: 123456", limits).empty());
  CHECK(refusal_of("a: 12345678", limits) ==
        "0:0 the file has 11 bytes, more than the 10 that a tower file may have");
}

TEST_CASE("more values than the limit are refused") {
  YamlLimits limits;
  limits.nodes = 4;
  CHECK(refusal_of("[1, 2, 3]", limits).empty());
  CHECK(refusal_of("[1, 2, 3, 4]", limits) == "1:11 the file holds more than 4 values");
}

TEST_CASE("a long text is read as it is") {
  const std::string word(1'000'000, 'x');
  CHECK(parsed("a: " + word).items[1].text == word);
}

TEST_CASE("characters that are no text are refused at their place") {
  CHECK(refusal_of("a: 1\nb: \xFF\n") == "2:4 a character that is not UTF-8 text");
  CHECK(refusal_of(std::string_view("a: 1\nb\0: 2\n", 11)) == "2:2 a character that is not UTF-8 text");
  CHECK(refusal_of("a: \x1B[0m") == "1:4 a character that is not UTF-8 text");
  CHECK(refusal_of("\xFF\xFE\x61\x00") == "1:1 a character that is not UTF-8 text");  // UTF-16
}

TEST_CASE("a byte-order mark is skipped and moves no place") {
  const YamlNode root = parsed(
      "\xEF\xBB\xBF"
      "a: 1\n");
  CHECK(root.items[0].text == "a");
  CHECK(place_of(root.items[0]) == "1:1");
  CHECK(place_of(root.items[1]) == "1:4");
}

TEST_CASE("lines may end as on any system") {
  for (const std::string_view end : {"\n", "\r\n"}) {
    const YamlNode root = parsed(fmt::format("a: 1{0}b:{0}  - 2{0}", end));
    CHECK(root.items[1].text == "1");
    CHECK(root.items[3].items[0].text == "2");
    CHECK(place_of(root.items[3].items[0]) == "3:5");
  }
}

TEST_CASE("a key written twice is refused where it stands again") {
  CHECK(refusal_of("a: 1\nb: 2\na: 3\n") == "3:1 'a' stands twice here, first in line 1");
  CHECK(refusal_of("m:\n  k: 1\n  'k': 1\n") == "3:3 'k' stands twice here, first in line 2");
  CHECK(refusal_of("a: {k: 1}\nb: {k: 1}\n").empty());
}

TEST_CASE("every faulty key of a file is told in one run") {
  CHECK(refusal_of("a: 1\na: 2\n[x]: 3\n? {y: 1}\n: 4\n") ==
        "2:1 'a' stands twice here, first in line 1\n"
        "3:1 a key must be a word or a number, not a list\n"
        "4:3 a key must be a word or a number, not a map");
  CHECK_THAT(refusal_of("~: 1\n"), Catch::EndsWith("a key must be a word or a number, not nothing"));
}

TEST_CASE("an empty file is refused at its begin") {
  for (const std::string_view text : {"", "\n\n", "# only a comment\n", "\xEF\xBB\xBF"}) {
    CHECK(refusal_of(text) == "1:1 the file is empty");
  }
}

TEST_CASE("a second document is refused where it begins") {
  CHECK(refusal_of("a: 1\n---\nb: 2\n") == "2:1 the file holds more than one YAML document");
  CHECK(refusal_of("---\na: 1\n...\n").empty());
}

TEST_CASE("a tag is refused") {
  CHECK(refusal_of("a: !!str 1\n") == "1:4 the tag 'tag:yaml.org,2002:str' means nothing in a tower file");
  CHECK_THAT(refusal_of("a: 1\nb: !mine [1]\n"), Catch::StartsWith("2:4 the tag '!mine'"));
  CHECK_THAT(refusal_of("a: !mine {b: 1}\n"), Catch::StartsWith("1:4 the tag '!mine'"));
}

TEST_CASE("a merge key is a key like any other") {
  const YamlNode root = parsed("a: &x {k: 1}\nb: {<<: *x}\n");
  CHECK(root.items[3].items[0].text == "<<");
}

TEST_CASE("what is no YAML is refused with a place") {
  CHECK_THAT(refusal_of("a: [1, 2\nb: 3\n"), Catch::Contains(" this is no YAML: "));
  CHECK_THAT(refusal_of("a: 1\n  b: 2\n"), Catch::StartsWith("2:4 this is no YAML"));
  CHECK_THAT(refusal_of("\ta: 1\n"), Catch::Contains(" this is no YAML: "));
  CHECK_THAT(refusal_of("}"), Catch::StartsWith("1:1 "));
}

TEST_CASE("millions of opened brackets are refused before the parser reads them") {
  for (const char* bracket : {"[", "{"}) {
    std::string text;
    for (int i = 0; i < 8'000'000; ++i) text += bracket;
    CHECK(is_quick([&] { CHECK_THAT(refusal_of(text), Catch::StartsWith("1:10001 ")); }));
  }
}

TEST_CASE("brackets in a comment do not count as nesting as long as they are few") {
  CHECK(refusal_of("# [[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[\na: 1\n").empty());
}

}  // namespace swaymark::test
