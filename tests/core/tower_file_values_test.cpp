#include "core/tower_file_values.hpp"

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

YamlNode yaml(std::string_view text) {
  FaultList faults("a.yaml");
  return parse_yaml(text, "a.yaml", faults);
}

// The faults so far, one a line.
std::string told(FaultList faults) {
  try {
    faults.throw_if_any();
  } catch (const InputError& error) {
    return error.what();
  }
  return "";
}

}  // namespace

TEST_CASE("a value is read in SI and its refusal names the key") {
  FaultList faults("a.yaml");
  CHECK(read_value(yaml("5 cm"), "width", Quantity::length, Range::any, faults) == 0.05);
  CHECK(faults.empty());
  CHECK_FALSE(read_value(yaml("5 kg"), "width", Quantity::length, Range::any, faults));
  CHECK(told(faults) ==
        "a.yaml:1:1: 'width': a length was wanted, got '5 kg', which is a mass; use m, cm or mm");
}

TEST_CASE("each range ends where it says") {
  struct Limit {
    Range range;
    std::string_view text;
    bool within;
  };
  for (const Limit& limit : std::vector<Limit>{{Range::any, "-1e9", true},
                                               {Range::positive, "1e-300", true},
                                               {Range::positive, "0", false},
                                               {Range::positive, "-1", false},
                                               {Range::not_negative, "0", true},
                                               {Range::not_negative, "-1e-300", false},
                                               {Range::below_one, "0 %", true},
                                               {Range::below_one, "99.9 %", true},
                                               {Range::below_one, "100 %", false},
                                               {Range::below_one, "-1 %", false},
                                               {Range::share, "100 %", true},
                                               {Range::share, "100.1 %", false},
                                               {Range::share, "0", false}}) {
    FaultList faults("a.yaml");
    INFO(limit.text);
    CHECK(read_value(yaml(limit.text), "k", Quantity::fraction, limit.range, faults).has_value() ==
          limit.within);
    CHECK(faults.empty() == limit.within);
  }
}

TEST_CASE("a whole number is one from 1 to its limit and bare") {
  for (const auto& [text, value] :
       std::vector<std::pair<std::string, int>>{{"1", 1}, {"20", 20}, {"2e1", 20}, {"3.0", 3}}) {
    FaultList faults("a.yaml");
    CHECK(read_whole_number(yaml(text), "count", 20, faults) == value);
  }
  for (const std::string text : {"0", "21", "-3", "2.5", "2 kg", "many", "nan", "1e300", "[1]"}) {
    FaultList faults("a.yaml");
    INFO(text);
    CHECK_FALSE(read_whole_number(yaml(text), "count", 20, faults));
    CHECK(faults.size() == 1);
  }
}

TEST_CASE("a flag is true or false and no other word") {
  FaultList faults("a.yaml");
  CHECK(read_flag(yaml("true"), "flag", faults) == true);
  CHECK(read_flag(yaml("false"), "flag", faults) == false);
  CHECK(faults.empty());
  for (const std::string text : {"yes", "1", "True", "{a: b}"}) {
    CHECK_FALSE(read_flag(yaml(text), "flag", faults));
  }
  CHECK(faults.size() == 4);
}

TEST_CASE("a word is not empty and not a list") {
  FaultList faults("a.yaml");
  CHECK(read_word(yaml("two words"), "label", faults) == "two words");
  CHECK(faults.empty());
  CHECK_FALSE(read_word(yaml("''"), "label", faults));
  CHECK_FALSE(read_word(yaml("[a]"), "label", faults));
  CHECK(faults.size() == 2);
}

TEST_CASE("a list has items") {
  FaultList faults("a.yaml");
  const YamlNode list = yaml("[1, 2]");
  REQUIRE(read_list(list, "bars", "pairs", faults) != nullptr);
  CHECK(read_list(list, "bars", "pairs", faults)->size() == 2);
  CHECK(read_list(yaml("[]"), "bars", "pairs", faults) == nullptr);
  CHECK(read_list(yaml("{a: 1}"), "bars", "pairs", faults) == nullptr);
  CHECK(faults.size() == 2);
}

TEST_CASE("a name is found or the nearest one is offered") {
  NameTable names("section");
  names.add("leg", 4, {1, 1});
  names.add("brace", 5, {2, 1});
  names.add("leg", 6, {3, 1});  // the first one stands
  FaultList faults("a.yaml");
  CHECK(names.find(yaml("leg"), faults) == std::size_t{4});
  CHECK(names.place_of("leg")->line == 1);
  CHECK_FALSE(names.place_of("strut"));
  CHECK(faults.empty());
  CHECK_FALSE(names.find(yaml("brase"), faults));
  CHECK(told(faults) == "a.yaml:1:1: there is no section 'brase'; did you mean 'brace'?");
}

TEST_CASE("a list of nodes names each once and goes on past a fault") {
  NameTable names("node");
  for (std::size_t i = 0; i < 3; ++i) names.add(std::to_string(i), i, {1, 1});
  FaultList faults("a.yaml");
  CHECK(read_node_list(yaml("[0, 9, 2, 0]"), names, faults) == std::vector<std::size_t>{0, 2});
  CHECK(faults.size() == 2);
}

TEST_CASE("a map tells known keys from unknown ones") {
  const YamlNode node = yaml("{area: 1 cm2, radios: 2 mm, empty: }");
  FaultList faults("a.yaml");
  MapView view(node, "section 'leg'", faults);
  CHECK(view.is_map());
  CHECK(view.owner() == "section 'leg'");
  CHECK(view.has("area"));
  CHECK_FALSE(view.has("radius"));
  CHECK(view.find("area")->text == "1 cm2");
  CHECK(view.find("radius") == nullptr);
  CHECK(faults.empty());
  CHECK(view.has("empty"));
  CHECK(view.find("empty") == nullptr);
  view.refuse_unknown();
  CHECK(told(faults) ==
        "a.yaml:1:15: unknown key 'radios' in section 'leg'; did you mean 'radius'?\n"
        "a.yaml:1:29: nothing stands behind 'empty'; give a value or remove the key");
}

TEST_CASE("what is no map has no keys and is one fault") {
  const YamlNode node = yaml("word");
  FaultList faults("a.yaml");
  MapView view(node, "a band", faults);
  CHECK_FALSE(view.is_map());
  CHECK(view.find("label") == nullptr);
  CHECK(view.require("label", "label: rotor") == nullptr);
  CHECK_FALSE(view.value("from", Quantity::frequency, Range::any));
  view.refuse_later("later", "it is");
  view.refuse_unknown();
  CHECK(told(faults) ==
        "a.yaml:1:1: a band wants a map of keys, got 'word'; write {key: value, ...} or one key a line");
}

TEST_CASE("a key of a later version is refused even when nothing stands behind it") {
  const YamlNode node = yaml("{ice: }");
  FaultList faults("a.yaml");
  MapView view(node, "a mass", faults);
  view.refuse_later("ice", "ice on the bars is");
  view.refuse_unknown();
  CHECK(told(faults) ==
        "a.yaml:1:2: 'ice': ice on the bars is not yet supported; remove it for now; it is never ignored");
}

TEST_CASE("named things are visited in the order of the file") {
  std::string visited;
  FaultList faults("a.yaml");
  for_each_named(yaml("{b: 1, a: 2, c: }"), "sections", faults,
                 [&](const std::string& name, const YamlNode& key, const YamlNode& value) {
                   visited += fmt::format("{}@{}={} ", name, key.place.column, value.text);
                 });
  CHECK(visited == "b@2=1 a@8=2 ");
  CHECK(faults.size() == 1);
  for_each_named(yaml("[1]"), "sections", faults, [&](auto&&...) { FAIL("visited"); });
  CHECK(faults.size() == 2);
}

}  // namespace swaymark::test
