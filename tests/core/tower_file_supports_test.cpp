#include "core/tower_file_supports.hpp"

#include "core/pad.hpp"
#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("a support fixes the axes it names at every node it names") {
  const Tower tower =
      tower_of(tower_with({"supports: [{nodes: [a], fixed: [x, z]}, {nodes: [b, c], fixed: [z]}]"}));
  REQUIRE(tower.supports.size() == 3);
  CHECK(tower.supports[0].fixed == std::array<bool, 3>{true, false, true});
  CHECK(tower.supports[1].node == 1);
  CHECK(tower.supports[1].fixed == std::array<bool, 3>{false, false, true});
  CHECK(tower.supports[2].node == 2);
}

TEST_CASE("a spring has a stiffness along each axis it names") {
  const Tower tower = tower_of(tower_with(
      {"supports: [{nodes: [a], fixed: [x, z]}, {nodes: [b], springs: {x: 50 MN/m, z: 120 kN/mm}}]"}));
  CHECK_THAT(tower.supports[1].spring[0], is_near(50e6, kRoundoff));
  CHECK(tower.supports[1].spring[1] == 0.0);
  CHECK_THAT(tower.supports[1].spring[2], is_near(120e6, kRoundoff));
}

TEST_CASE("what several entries say of one node is one support") {
  const Tower tower =
      tower_of(tower_with({"supports: [{nodes: [a, b], fixed: [z]}, {nodes: [a], fixed: [x]}, {nodes: [b], "
                           "springs: {x: 1 kN/m}}]"}));
  REQUIRE(tower.supports.size() == 2);
  CHECK(tower.supports[0].fixed == std::array<bool, 3>{true, false, true});
  CHECK(tower.supports[1].fixed == std::array<bool, 3>{false, false, true});
  CHECK(tower.supports[1].spring[0] == 1000.0);
}

TEST_CASE("a tower without supports is read because it may be meant to float") {
  std::string text = tower_with({});
  text.erase(text.find("supports"));
  CHECK(tower_of(text).supports.empty());
}

TEST_CASE("an axis held twice at a node is refused where it is held again") {
  CHECK(refusals_with("supports: [{nodes: [a, b], fixed: [x, z]}, {nodes: [b], fixed: [z]}]") ==
        Refusals{"7:44 node 'b' is held twice along z, first in line 7"});
  CHECK(refusals_with(
            "supports: [{nodes: [a], fixed: [x, z]}, {nodes: [b], fixed: [x], springs: {x: 1 MN/m}}]") ==
        Refusals{"7:41 node 'b' is held twice along x, first in line 7"});
  CHECK(refusals_with("supports: [{nodes: [a, a], fixed: [x, z]}]") ==
        Refusals{"7:24 the node 'a' is named twice, first in line 7"});
}

TEST_CASE("an axis the tower does not have cannot be held") {
  CHECK(refusals_with("supports: [{nodes: [a, b], fixed: [x, y]}]") ==
        Refusals{"7:39 'y' is no axis of this tower"});
  CHECK(refusals_with("supports: [{nodes: [a, b], fixed: [x, [z]]}]") ==
        Refusals{"7:39 a list is no axis of this tower"});
  CHECK(refusals_with("supports: [{nodes: [a, b], springs: {y: 1 MN/m}}]") ==
        Refusals{"7:38 unknown key 'y' in 'springs'"});
}

TEST_CASE("a support must hold something somewhere") {
  CHECK(refusals_with("supports: [{nodes: [a, b]}]") ==
        Refusals{"7:12 a support needs 'fixed', 'springs', 'pad' or 'stabilise'"});
  CHECK(refusals_with("supports: [{fixed: [x]}]") == Refusals{"7:12 'nodes' is missing in a support"});
  CHECK(refusals_with("supports: [{nodes: [], fixed: [x]}]") == Refusals{"7:20 'nodes' lists nothing"});
  CHECK(refusals_with("supports: [{nodes: [a, b], fixed: []}]") == Refusals{"7:35 'fixed' lists nothing"});
  CHECK(refusals_with("supports: [{nodes: [a, b], fixed: x}]") ==
        Refusals{"7:35 'fixed' wants a list of axes, got 'x'"});
  CHECK(refusals_with("supports: [{nodes: [a, q], fixed: [x]}]") == Refusals{"7:24 there is no node 'q'"});
}

TEST_CASE("a spring is a stiffness above zero") {
  CHECK(refusals_with("supports: [{nodes: [a, b], springs: {x: 0, z: -1 MN/m}}]") ==
        Refusals{"7:41 'x' must be above zero, got '0'", "7:47 'z' must be above zero, got '-1 MN/m'"});
  CHECK(refusals_with("supports: [{nodes: [a, b], springs: {x: 5 kN}}]") ==
        Refusals{"7:41 'x': a stiffness was wanted, got '5 kN', which is a force"});
}

TEST_CASE("a pad becomes springs along every axis of each of its nodes") {
  const Tower tower = tower_of(tower_with(
      {"supports: [{nodes: [a, b], pad: {length: 3 m, width: 2 m, shear_modulus: 60 MPa, poisson: 0.3}}]"}));
  const PadSprings springs = pad_springs({3.0, 2.0, 60e6, 0.3});
  REQUIRE(tower.supports.size() == 2);
  for (const Support& support : tower.supports) {
    CHECK(support.fixed == std::array{false, false, false});
    CHECK(support.spring == std::array{springs.x, 0.0, springs.z});  // the small tower has no y
    REQUIRE(support.pad.has_value());
    CHECK(support.pad->length == 3.0);
  }
}

TEST_CASE("a pad states its soil and holds every axis itself") {
  CHECK(refusals_with("supports: [{nodes: [a, b], pad: {width: 2 m}}]") ==
        Refusals{"7:33 'length' is missing in 'pad'", "7:33 'shear_modulus' is missing in 'pad'",
                 "7:33 'poisson' is missing in 'pad'"});
  const std::string pad = "pad: {length: 2 m, width: 2 m, shear_modulus: 60 MPa, poisson: 30 %}";
  CHECK(refusals_with("supports: [{nodes: [a, b], springs: {x: 1}, " + pad + "}]") ==
        Refusals{"7:12 'springs' stands beside 'pad', which holds every axis of its nodes already"});
  CHECK(refusals_with("supports: [{nodes: [a, b], " + pad + "}, {nodes: [b], fixed: [z]}]") ==
        Refusals{"7:99 node 'b' is held twice along z, first in line 7"});
}

TEST_CASE("a base study is a range of stiffness for supports that are fixed upright") {
  const Tower tower = tower_of(tower_with({"base_study: [20 kN/mm, 1000 kN/mm]"}));
  REQUIRE(tower.base_study.has_value());
  CHECK_THAT(tower.base_study->from, is_near(20e6, kRoundoff));
  CHECK_THAT(tower.base_study->to, is_near(1e9, kRoundoff));
  CHECK_FALSE(tower_of(tower_with({})).base_study.has_value());
  CHECK(refusals_with("base_study: 20 kN/mm") ==
        Refusals{"8:13 'base_study' wants two stiffnesses, got '20 kN/mm'"});
  CHECK(refusals_with("base_study: [0, 5]") == Refusals{"8:14 'base_study' must be above zero, got '0'"});
  CHECK(refusals_with("base_study: [5, 5]") ==
        Refusals{"8:13 the range ends at 5 N/m, not above its begin at 5 N/m"});
}

TEST_CASE("springs that stabilise are read beside supports and once a node") {
  const std::string straight = "nodes: {a: [0, 0], b: [2, 0], c: [1, 0]}";
  const Tower tower = tower_of(
      tower_with({straight, "supports: [{nodes: [a, b], fixed: [x, z]}, {nodes: [c], stabilise: 1 MN/m}]"}));
  REQUIRE(tower.stabilisers.size() == 1);
  CHECK(tower.stabilisers[0].node == 2);
  CHECK(tower.stabilisers[0].stiffness == 1e6);
  CHECK(tower.supports.size() == 2);
  CHECK(refusals_of(tower_with(
            {straight,
             "supports: [{nodes: [a, b], fixed: [x, z]}, {nodes: [c], stabilise: 1}, {nodes: [c], "
             "stabilise: 2}]"})) == Refusals{"7:72 node 'c' is stabilised twice, first in line 7"});
}

}  // namespace swaymark::test
