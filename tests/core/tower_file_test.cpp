#include "core/tower_file.hpp"

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("the demo tower is read with all it states") {
  const Tower tower = tower_in("harbour_light.yaml");
  CHECK(tower.file == "harbour_light.yaml");
  CHECK(tower.title == "Harbour light tower");
  CHECK(tower.dimensions == 3);
  CHECK(tower.nodes.size() == 20);
  CHECK(tower.bars.size() == 68);  // 16 legs, 32 diagonals, 16 horizontals, 4 of plan bracing
  CHECK(tower.supports.size() == 4);
  CHECK(tower.bar_name(tower.bars.size() - 1) == "plan bracing-4");
}

TEST_CASE("the smallest tower is read") {
  const Tower tower = tower_of(tower_with({}));
  CHECK(tower.title.empty());
  CHECK(tower.damping.empty());
  CHECK(tower.bands.empty());
  CHECK(tower.spectra.empty());
  CHECK_FALSE(tower.seismic.has_value());
}

TEST_CASE("the version is required and must be the one this program reads") {
  CHECK(refusals_of("title: x\n") == Refusals{"1:1 the format version is missing"});
  CHECK(refusals_of("swaymark:\n") == Refusals{"1:1 the format version is missing"});
  for (const std::string version : {"2", "0", "1.0", "one", "[1]"}) {
    // Of a file of another version nothing else is said: its keys may mean something else.
    const Refusals refusals = refusals_with("swaymark: " + version);
    INFO(version);
    REQUIRE(refusals.size() == 1);
    CHECK_THAT(refusals[0], Catch::StartsWith("1:11 format version "));
  }
}

TEST_CASE("what is no map of keys is no tower") {
  CHECK(refusals_of("just words\n") == Refusals{"1:1 a tower file is a map of keys"});
  CHECK(refusals_of("- swaymark: 1\n") == Refusals{"1:1 a tower file is a map of keys"});
  CHECK(refusals_of("") == Refusals{"1:1 the file is empty"});
}

TEST_CASE("a tower has one to three dimensions") {
  for (const std::string dimensions : {"0", "4", "2.5", "two", "3 m"}) {
    const Refusals refusals = refusals_of(
        tower_with({"dimensions: " + dimensions, "nodes: {a: [0, 0, 0], b: [2, 0, 0], c: [1, 0, 1]}"}));
    INFO(dimensions);
    CHECK(refusals ==
          Refusals{"2:13 'dimensions' wants a whole number from 1 to 3, got '" + dimensions + "'"});
  }
}

TEST_CASE("nodes and members are required") {
  CHECK(refusals_of("swaymark: 1\n") ==
        Refusals{"1:1 'nodes' is missing in a tower file", "1:1 'members' is missing in a tower file"});
}

TEST_CASE("an unknown key names the nearest one known") {
  const auto faults = faults_of(tower_with({"suports: [{nodes: [a], fixed: [x]}]"}));
  REQUIRE(faults.size() == 1);
  CHECK(to_string(faults[0]) ==
        "tower.yaml:8:1: unknown key 'suports' in a tower file; did you mean 'supports'?");
}

TEST_CASE("unknown keys are found at every level") {
  CHECK(refusals_with("materials: {steel: {E: 1, density: 1, colour: red}}") ==
        Refusals{"3:39 unknown key 'colour' in material 'steel'"});
  CHECK(refusals_with("sections: {bar: {area: 1, aera: 1}}") ==
        Refusals{"4:27 unknown key 'aera' in section 'bar'"});
  CHECK(refusals_with(
            "members: [{group: g, section: bar, material: steel, bars: [[a, c], [b, c]], count: 2}]") ==
        Refusals{"6:77 unknown key 'count' in a group of members"});
  CHECK(refusals_with("supports: [{nodes: [a, b], fixed: [x, z], held: 1}]") ==
        Refusals{"7:43 unknown key 'held' in a support"});
  CHECK(refusals_with("masses: [{nodes: [c], mass: 1, weight: 5}]") ==
        Refusals{"8:32 unknown key 'weight' in a mass"});
  CHECK(refusals_with("modes: {counts: 5}") == Refusals{"8:9 unknown key 'counts' in 'modes'"});
  CHECK(refusals_with("bands: [{label: b, from: 1, to: 2, marign: 1}]") ==
        Refusals{"8:36 unknown key 'marign' in a band"});
  CHECK(refusals_with("spectra: {s: {points: [[0, 1], [1, 1]], unit: g}}") ==
        Refusals{"8:41 unknown key 'unit' in spectrum 's'"});
}

TEST_CASE("every key of a later version is refused at its line") {
  const std::vector<std::string> lines{"member_bending: true", "uncertainty: {}"};
  for (const std::string& line : lines) {
    const Refusals refusals = refusals_with(line);
    INFO(line);
    REQUIRE(refusals.size() == 1);
    CHECK_THAT(refusals[0], Catch::StartsWith("8:1 '" + line.substr(0, line.find(':')) + "': "));
    CHECK_THAT(refusals[0], Catch::EndsWith("not yet supported"));
  }
}

TEST_CASE("damping is one ratio or a list mode by mode") {
  CHECK(tower_of(tower_with({"damping: 2 %"})).damping == std::vector<double>{0.02});
  CHECK(tower_of(tower_with({"damping: 0"})).damping == std::vector<double>{0.0});
  CHECK(tower_of(tower_with({"damping: [2 %, 0.03, 1 %]"})).damping.size() == 3);
}

TEST_CASE("damping of critical or more and below zero is refused") {
  const auto faults = faults_of(tower_with({"damping: 2"}));
  REQUIRE(faults.size() == 1);
  CHECK(to_string(faults[0]) ==
        "tower.yaml:8:10: 'damping' is a fraction, and '2' is 200 %; write '2 %' or 0.02 if that was meant");
  CHECK(refusals_with("damping: [2 %, -1 %, 100 %]") ==
        Refusals{"8:16 'damping' must not be negative, got '-1 %'",
                 "8:22 'damping' is a fraction, and '100 %' is 100 %"});
  CHECK(refusals_with("damping: []") == Refusals{"8:10 'damping' lists nothing"});
  CHECK(refusals_with("damping: {all: 2 %}") == Refusals{"8:10 'damping' wants a fraction, got a map"});
}

TEST_CASE("stiffening may be none for now") {
  CHECK(refusals_with("stiffening: none").empty());
  CHECK(refusals_with("stiffening: gravity") == Refusals{"8:13 'stiffening: gravity' is not yet supported"});
  CHECK(refusals_with("stiffening: wind") == Refusals{"8:13 'stiffening' cannot be 'wind'"});
}

TEST_CASE("a key with nothing behind it is refused") {
  CHECK(refusals_with("title:") == Refusals{"8:1 nothing stands behind 'title'"});
  CHECK(refusals_with("title: ''") == Refusals{"8:8 nothing stands behind 'title'"});
  CHECK(refusals_with("damping: ~") == Refusals{"8:1 nothing stands behind 'damping'"});
}

TEST_CASE("all faults of a file come in one run and in its order") {
  const Refusals refusals = refusals_of(tower_with(
      {"materials: {steel: {E: 210 kg, density: 7850 kg/m3}}",
       "nodes: {a: [0, 0], b: [2, 0], c: [1, 1], d: [1, 1]}",
       "members: [{group: g, section: baar, material: steel, bars: [[a, c], [b, b]]}]",
       "supports: [{nodes: [a, q], fixed: [x, y]}]", "damping: 2", "scenarios: []", "colour: red"}));
  CHECK(refusals == Refusals{"3:24 'E': a stress or modulus was wanted, got '210 kg', which is a mass",
                             "5:42 nodes 'c' and 'd' stand at the same place",
                             "6:31 there is no section 'baar'", "6:69 bar g-2 joins node 'b' to itself",
                             "7:24 there is no node 'q'", "7:39 'y' is no axis of this tower",
                             "8:10 'damping' is a fraction, and '2' is 200 %",
                             "9:12 'scenarios' lists nothing", "10:1 unknown key 'colour' in a tower file"});
}

TEST_CASE("a merge key is an unknown key and never merges in silence") {
  CHECK(refusals_with("materials: {steel: {E: 1, density: 1, <<: {yield: 2}}}") ==
        Refusals{"3:39 unknown key '<<' in material 'steel'"});
}

TEST_CASE("anchors and aliases may spare writing a part twice") {
  const Tower tower = tower_of(tower_with({"sections: {bar: &bar {area: 10 cm2}, rod: *bar}"}));
  REQUIRE(tower.sections.size() == 2);
  CHECK(tower.sections[1].area == tower.sections[0].area);
}

TEST_CASE("names of any language and any length are read") {
  const Tower tower = tower_of(tower_with({"title: '\xE6\xB5\xB7\xE6\xB8\xAF'"}));
  CHECK(tower.title == "\xE6\xB5\xB7\xE6\xB8\xAF");
}

}  // namespace swaymark::test
