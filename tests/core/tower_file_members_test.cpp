#include "core/tower_file_members.hpp"

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

std::string members(const std::string& groups) { return "members: [" + groups + "]"; }

}  // namespace

TEST_CASE("bars are numbered within their group and know their place") {
  const Tower tower =
      tower_of(tower_with({members("{group: g, section: bar, material: steel, bars: [[a, c]]}, "
                                   "{group: h, section: bar, material: steel, bars: [[c, b], [a, b]]}")}));
  REQUIRE(tower.bars.size() == 3);
  CHECK(tower.bar_name(0) == "g-1");
  CHECK(tower.bar_name(1) == "h-1");
  CHECK(tower.bar_name(2) == "h-2");
  CHECK(tower.bars[1].from == 2);
  CHECK(tower.bars[1].to == 1);
  CHECK(tower.bars[1].place.line == 6);
  CHECK(tower.bars[1].place.column == 119);
}

TEST_CASE("groups use the sections and materials they name") {
  const Tower tower = tower_of(
      tower_with({"materials: {steel: {E: 210 GPa, density: 7850}, timber: {E: 11 GPa, density: 420}}",
                  "sections: {bar: {area: 10 cm2}, rod: {area: 1 cm2}}",
                  members("{group: g, section: rod, material: timber, bars: [[a, c], [b, c]]}")}));
  CHECK(tower.sections[tower.groups[0].section].name == "rod");
  CHECK(tower.materials[tower.groups[0].material].name == "timber");
}

TEST_CASE("a bar that refers to nothing known names what was probably meant") {
  const std::string nodes = "nodes: {foot: [0, 0], b: [2, 0], c: [1, 1]}";
  const auto faults =
      faults_of(tower_with({nodes, "supports: [{nodes: [foot, b], fixed: [x, z]}]",
                            members("{group: g, section: bar, material: steel, bars: [[fot, c], [b, c]]}")}));
  REQUIRE(faults.size() == 1);
  CHECK(to_string(faults[0]) == "tower.yaml:6:61: there is no node 'fot'; did you mean 'foot'?");
}

TEST_CASE("unknown sections and materials are refused where they are named") {
  CHECK(refusals_with(members("{group: g, section: baar, material: stel, bars: [[a, c], [b, c]]}")) ==
        Refusals{"6:31 there is no section 'baar'", "6:47 there is no material 'stel'"});
}

TEST_CASE("a bar is a pair of node names") {
  CHECK(refusals_with(
            members("{group: g, section: bar, material: steel, bars: [[a, c], [b], c, [a, b, c]]}")) ==
        Refusals{"6:68 a bar is a pair of nodes", "6:73 a bar is a pair of nodes",
                 "6:76 a bar is a pair of nodes"});
  CHECK(refusals_with(members("{group: g, section: bar, material: steel, bars: [[a, [c]], [b, c]]}")) ==
        Refusals{"6:64 'node' wants a name, got a list"});
}

TEST_CASE("a faulty bar does not change the names of those after it") {
  const auto faults = faults_of(
      tower_with({members("{group: g, section: bar, material: steel, bars: [[a, q], [b, c], [b, b]]}")}));
  REQUIRE(faults.size() == 2);
  CHECK(faults[1].message.what == "bar g-3 joins node 'b' to itself");
}

TEST_CASE("bars without length or written twice are refused") {
  CHECK(refusals_with(members("{group: g, section: bar, material: steel, bars: [[a, c], [c, a]]}")) ==
        Refusals{"6:68 bar g-2 joins nodes 'c' and 'a', as bar g-1 does already"});
  CHECK(refusals_with("nodes: {a: [0, 0], b: [2, 0], c: [2, 0]}") ==
        Refusals{"5:31 nodes 'b' and 'c' stand at the same place",
                 "6:68 bar g-2 has no length: nodes 'b' and 'c' stand at the same place"});
}

TEST_CASE("the keys of a group are all required") {
  CHECK(refusals_with(members("{}")) == Refusals{"6:11 'group' is missing in a group of members",
                                                 "6:11 'section' is missing in a group of members",
                                                 "6:11 'material' is missing in a group of members",
                                                 "6:11 'bars' is missing in a group of members"});
  CHECK(refusals_with(members("{group: g, section: bar, material: steel, bars: []}")) ==
        Refusals{"6:59 'bars' lists nothing"});
  CHECK(refusals_with(members("legs")) ==
        Refusals{"6:11 a group of members wants a map of keys, got 'legs'"});
  CHECK(refusals_with("members: []") == Refusals{"6:10 'members' lists nothing"});
  CHECK(refusals_with("members: {}") == Refusals{"6:10 'members' wants a list of groups of bars, got a map"});
}

TEST_CASE("a group may not be named all and no two alike") {
  CHECK(refusals_with(members("{group: all, section: bar, material: steel, bars: [[a, c], [b, c]]}")) ==
        Refusals{"6:19 no group may be called 'all'"});
  CHECK(refusals_with(members("{group: g, section: bar, material: steel, bars: [[a, c]]}, "
                              "{group: g, section: bar, material: steel, bars: [[b, c]]}")) ==
        Refusals{"6:78 the group 'g' is named twice, first in line 6"});
}

TEST_CASE("groups without a readable name are not taken for one another") {
  CHECK(refusals_with(members("{group: [], section: bar, material: steel, bars: [[a, c]]}, "
                              "{group: [], section: bar, material: steel, bars: [[b, c]]}")) ==
        Refusals{"6:19 'group' wants a word, got a list", "6:79 'group' wants a word, got a list"});
}

}  // namespace swaymark::test
