#include "core/tower_file_lattice.hpp"

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// Line 1 is the version, line 4 the lattice; what follows begins in line 6.
std::string file_with(const std::string& lattice, const std::string& rest = "") {
  return fmt::format(
      "swaymark: 1\n"
      "materials: {{steel: {{E: 210 GPa, density: 7850 kg/m3}}, iron: {{E: 100 GPa, density: 7200 kg/m3}}}}\n"
      "sections: {{leg: {{area: 20 cm2}}, brace: {{area: 8 cm2}}, strut: {{area: 5 cm2}}}}\n"
      "lattice: {}\n"
      "supports: [{{nodes: base, fixed: [x, y, z]}}]\n{}",
      lattice, rest);
}

const std::string kSound =
    "{plan: square, width: 2 m, material: steel, panels: [{height: 3 m, width: 2 m, repeat: 2, bracing: X, "
    "legs: leg, "
    "diagonals: brace}, {height: 3 m, width: 1 m, bracing: X, legs: brace, diagonals: brace, horizontals: "
    "strut, "
    "plan_bracing: strut, material: iron}]}";

// A lattice of one panel; its keys begin in column 64 of line 4.
std::string one_panel(const std::string& panel) {
  return "{plan: square, width: 2 m, material: steel, panels: [{" + panel + "}]}";
}

std::vector<std::string> names(const Tower& tower, const std::vector<std::size_t>& nodes) {
  std::vector<std::string> result;
  for (const std::size_t node : nodes) result.push_back(tower.nodes[node].name);
  return result;
}

// What a panel is refused for, without the places.
std::vector<std::string> told_of(const std::string& text) {
  std::vector<std::string> result;
  for (const Fault& fault : faults_of(text)) result.push_back(fault.message.what);
  return result;
}

using Words = std::vector<std::string>;

}  // namespace

TEST_CASE("a lattice becomes nodes and groups of bars and needs no others") {
  const Tower tower = tower_of(file_with(kSound));
  CHECK(tower.nodes.size() == 16);
  REQUIRE(tower.groups.size() == 4);
  CHECK(tower.groups[0].name == "legs");
  CHECK(tower.groups[1].name == "diagonals");
  CHECK(tower.groups[2].name == "horizontals");
  CHECK(tower.groups[3].name == "plan bracing");
  CHECK(tower.bars.size() == 12 + 24 + 4 + 1);
  CHECK(tower.supports.size() == 4);
  CHECK(tower.lattice_leaves_loose.empty());
}

TEST_CASE("bars of a lattice are numbered through all panels and have the section of their own") {
  const Tower tower = tower_of(file_with(kSound));
  CHECK(tower.bar_name(0) == "legs-1");
  CHECK(tower.bar_name(11) == "legs-12");
  CHECK(tower.bar_name(12) == "diagonals-1");
  CHECK(tower.section_of(tower.bars[7]).name == "leg");
  CHECK(tower.section_of(tower.bars[8]).name == "brace");
  CHECK(tower.material_of(tower.bars[7]).name == "steel");
  CHECK(tower.material_of(tower.bars[8]).name == "iron");
  CHECK(tower.material_of(tower.bars.back()).name == "iron");
}

TEST_CASE("a group that no panel has does not exist") {
  const std::string lattice = one_panel("height: 3, width: 2, bracing: X, legs: leg, diagonals: brace");
  CHECK(tower_of(file_with(lattice)).groups.size() == 2);
  CHECK(refusals_of(file_with(lattice, "masses: [{group: horizontals, per_length: 5}]\n")) ==
        Refusals{"6:18 there is no group 'horizontals'"});
}

TEST_CASE("top and base and levels name corner nodes alone and among others") {
  const Tower tower = tower_of(file_with(
      kSound,
      "nodes: {hub: [0, 0, 12]}\n"
      "members: [{group: frame, section: leg, material: steel, bars: [[L3.1, hub], [L3.2, hub], [L3.3, "
      "hub]]}]\n"
      "masses: [{nodes: top, mass: 5}, {nodes: [hub, L2, L1.3], mass: 6}, {nodes: hub, mass: 7}]\n"));
  REQUIRE(tower.node_masses.size() == 3);
  CHECK(names(tower, tower.node_masses[0].nodes) == Words{"L3.1", "L3.2", "L3.3", "L3.4"});
  CHECK(names(tower, tower.node_masses[1].nodes) == Words{"hub", "L2.1", "L2.2", "L2.3", "L2.4", "L1.3"});
  CHECK(names(tower, tower.node_masses[2].nodes) == Words{"hub"});
  std::vector<std::size_t> held;
  for (const Support& support : tower.supports) held.push_back(support.node);
  CHECK(names(tower, held) == Words{"L0.1", "L0.2", "L0.3", "L0.4"});
}

TEST_CASE("top does not name mid nodes") {
  const Tower tower = tower_of(
      file_with(one_panel("height: 3, width: 2, bracing: K, legs: leg, diagonals: brace, horizontals: strut"),
                "masses: [{nodes: top, mass: 5}]\n"));
  CHECK(tower.node_masses[0].nodes.size() == 4);
  CHECK(tower.nodes.size() == 12);
}

TEST_CASE("words for levels mean nothing where there is no lattice") {
  CHECK(refusals_with("masses: [{nodes: top, mass: 5}]") == Refusals{"8:18 there is no node 'top'"});
}

TEST_CASE("names are used once and mean one thing") {
  const auto refusals = [](const std::string& rest) { return refusals_of(file_with(kSound, rest)); };
  CHECK(refusals("nodes: {L1.2: [0, 0, 9]}\n") ==
        Refusals{"6:9 the node 'L1.2' is made by the lattice in line 4 already"});
  CHECK(refusals("nodes: {top: [0, 0, 12], L2: [0, 0, 13]}\n") ==
        Refusals{"6:9 no node may be called 'top'", "6:26 no node may be called 'L2'"});
  CHECK(refusals("nodes: {a: [0, 0, 12]}\n"
                 "members: [{group: legs, section: leg, material: steel, bars: [[L3.1, a]]}]\n") ==
        Refusals{"7:19 the group 'legs' is made by the lattice in line 4 already"});
  CHECK(refusals("masses: [{nodes: [top, L3.2], mass: 5}]\n") ==
        Refusals{"6:24 the node 'L3.2' is named twice, first in line 6"});
  CHECK(refusals("nodes: {a: [0, 0, 12]}\n"
                 "members: [{group: g, section: leg, material: steel, bars: [[top, a]]}]\n") ==
        Refusals{"7:61 one node is wanted here, and 'top' names 4"});
  CHECK(refusals("masses: [{nodes: tops, mass: 5}]\n") == Refusals{"6:18 there is no node 'tops'"});
}

TEST_CASE("a lattice wants its keys") {
  CHECK(told_of(file_with("{plan: square}")) ==
        Words{"'width' is missing in the lattice", "'panels' is missing in the lattice"});
  CHECK(told_of(file_with("{width: 2, panels: []}")) ==
        Words{"'plan' is missing in the lattice", "'panels' lists nothing"});
  CHECK(told_of(file_with("5 m")) == Words{"the lattice wants a map of keys, got '5 m'"});
  CHECK(told_of(file_with("")) == Words{"nothing stands behind 'lattice'"});
  CHECK(told_of(file_with("{plan: square, width: 2, panels: [{}]}")) ==
        Words{"'height' is missing in a panel", "'width' is missing in a panel",
              "'bracing' is missing in a panel", "'legs' is missing in a panel",
              "'diagonals' is missing in a panel", "this panel has no material"});
  CHECK(told_of(file_with(
            "{plan: hexagon, width: 2, material: steel, wide: 3, panels: [{height: 3, width: 2, bracing: "
            "X, legs: leg, diagonals: brace, struts: 5}]}")) == Words{"'plan' cannot be 'hexagon'",
                                                                      "unknown key 'wide' in the lattice",
                                                                      "unknown key 'struts' in a panel"});
}

TEST_CASE("the numbers of a panel are refused where they stand") {
  const auto refusals = [](const std::string& start) {
    return refusals_of(file_with(one_panel(start + ", bracing: X, legs: leg, diagonals: brace")));
  };
  CHECK(refusals("height: -3 m, width: 2") == Refusals{"4:72 'height' must be above zero, got '-3 m'"});
  CHECK(refusals("height: 3 um, width: 2") ==
        Refusals{"4:72 a panel of height '3 um' is lower than 0.001 m"});
  CHECK(refusals("height: 3 m, width: 0") == Refusals{"4:84 the legs meet: a width of '0' is under 0.001 m"});
  CHECK(refusals("height: 3 m, width: -2") == Refusals{"4:84 'width' must not be negative, got '-2'"});
  CHECK(refusals("height: 3 m, width: 2e7").size() == 1);
  CHECK(refusals("height: 3 kg, width: 2").size() == 1);
  CHECK(refusals("height: 3, width: 2, repeat: 0") ==
        Refusals{"4:93 'repeat' wants a whole number from 1 to 250000, got '0'"});
  CHECK(refusals("height: 3, width: 2, repeat: 1.5").size() == 1);
  CHECK(refusals("height: 3, width: 2, repeat: 1e9").size() == 1);
  CHECK(refusals("height: 1, width: 2, repeat: 250000") ==
        Refusals{"4:10 the lattice would have 1000004 nodes, more than 1000000"});
  CHECK(refusals("height: 9 km, width: 2, repeat: 1000") ==
        Refusals{"4:10 the panels add up to 9e+06 m, more than 1e+06 m"});
}

TEST_CASE("words and names of a panel are refused where they stand with the nearest known") {
  const auto faults = [](const std::string& rest) {
    return faults_of(file_with(one_panel("height: 3, width: 2, " + rest)));
  };
  const auto bracing = faults("bracing: alternate, legs: leg, diagonals: brace");
  REQUIRE(bracing.size() == 1);
  CHECK(bracing[0].message.what == "'bracing' cannot be 'alternate'");
  CHECK(bracing[0].message.cure ==
        "did you mean 'alternating'? possible: X, single, alternating, K or K down");
  const auto section = faults("bracing: X, legs: legs, diagonals: brace");
  REQUIRE(section.size() == 1);
  CHECK(section[0].message.what == "there is no section 'legs'");
  CHECK(section[0].message.cure == "did you mean 'leg'?");
  const auto pattern =
      faults("bracing: X, legs: leg, diagonals: brace, plan_bracing: {section: strut, pattern: cross}");
  REQUIRE(pattern.size() == 1);
  CHECK(pattern[0].message.what == "'pattern' cannot be 'cross'");
  CHECK(faults("bracing: X, legs: leg, diagonals: brace, material: stel").size() == 1);
}

TEST_CASE("patterns that need a horizontal or a mid node say what is missing") {
  const auto told = [](const std::string& rest) {
    return told_of(file_with(one_panel("height: 3, width: 2, legs: leg, diagonals: brace, " + rest)));
  };
  const std::string k =
      "K-bracing meets in the middle of the horizontals at the panel's top, and there are none";
  const std::string down =
      "bracing 'K down' meets in the middle of the horizontals at the panel's foot, and there are none";
  const std::string diamond = "a diamond joins the middles of the horizontals, and no diagonals meet there";
  CHECK(told("bracing: K") == Words{k});
  CHECK(told("bracing: K down, horizontals: strut") == Words{down});
  CHECK(told("bracing: X, horizontals: strut, plan_bracing: {section: strut, pattern: diamond}") ==
        Words{diamond});
  CHECK(told("bracing: K, horizontals: strut, plan_bracing: {section: strut, pattern: diamond}").empty());

  const std::string base =
      "{plan: square, width: 2, material: steel, base_horizontals: strut, panels: [{height: 3, "
      "width: 2, legs: leg, diagonals: brace, bracing: K down";
  CHECK(told_of(file_with(base + "}]}")).empty());
  CHECK(told_of(file_with(base + ", repeat: 2}]}")) == Words{k});
  CHECK(told_of(file_with(base + ", repeat: 2, horizontals: strut}]}")).empty());
}

TEST_CASE("a triangle takes a diamond in plan and no diagonal") {
  const auto told = [](const std::string& rest) {
    return told_of(
        file_with("{plan: triangle, width: 2, material: steel, panels: [{height: 3, width: 2, bracing: K, "
                  "legs: leg, diagonals: brace, horizontals: strut, plan_bracing: " +
                  rest + "}]}"));
  };
  CHECK(told("strut") == Words{"a triangle needs no diagonal in plan and has none"});
  CHECK(told("{section: strut, pattern: diamond}").empty());
}

TEST_CASE("a lattice stands in three dimensions") {
  CHECK(refusals_of(file_with(kSound, "dimensions: 2\n")).at(0) ==
        "4:10 a lattice by panels stands in 3 dimensions, this tower in 2");
}

TEST_CASE("a faulty lattice is not also blamed for the names it would have made") {
  CHECK(told_of(file_with(
            "{plan: square, width: 2, panels: 5}",
            "masses: [{nodes: top, mass: 5}, {group: legs, per_length: 3}, {nodes: L3.1, mass: 2}]\n")) ==
        Words{"'panels' wants a list of panels, got '5'"});
}

TEST_CASE("what the pattern leaves loose names the tower's own nodes") {
  const Tower tower = tower_of(
      file_with(one_panel("height: 3, width: 2, bracing: K, legs: leg, diagonals: brace, horizontals: strut"),
                "nodes: {a: [0, 0, 9], b: [0, 0, 10]}\n"));
  REQUIRE(tower.lattice_leaves_loose.size() == 1);
  CHECK(names(tower, tower.lattice_leaves_loose[0].nodes) == Words{"L1.m1", "L1.m2", "L1.m3", "L1.m4"});
}

}  // namespace swaymark::test
