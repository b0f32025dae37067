#include "core/tower_file_parts.hpp"

#include <cmath>

#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("a material is read with its unit and its place") {
  const Tower tower =
      tower_of(tower_with({"materials: {steel: {E: 210 GPa, density: 7850 kg/m3, yield: 355 MPa}}"}));
  REQUIRE(tower.materials.size() == 1);
  const Material& steel = tower.materials[0];
  CHECK(steel.name == "steel");
  CHECK_THAT(steel.youngs_modulus, is_near(210e9, kRoundoff));
  CHECK(steel.density == 7850.0);
  CHECK_THAT(steel.yield.value(), is_near(355e6, kRoundoff));
  CHECK(steel.place.line == 3);
  CHECK(steel.place.column == 13);
}

TEST_CASE("a material without mass is read but one without stiffness is not") {
  CHECK(tower_of(tower_with({"materials: {steel: {E: 1, density: 0}}"})).materials[0].density == 0.0);
  CHECK(refusals_with("materials: {steel: {E: 0, density: 1}}") ==
        Refusals{"3:24 'E' must be above zero, got '0'"});
  CHECK(refusals_with("materials: {steel: {E: -210 GPa, density: -1}}") ==
        Refusals{"3:24 'E' must be above zero, got '-210 GPa'",
                 "3:43 'density' must not be negative, got '-1'"});
  CHECK(refusals_with("materials: {steel: {E: 1, density: 1, yield: 0 MPa}}") ==
        Refusals{"3:46 'yield' must be above zero, got '0 MPa'"});
}

TEST_CASE("what a material lacks is named with an example") {
  const auto faults = faults_of(tower_with({"materials: {steel: {E: 210 GPa}}"}));
  REQUIRE(faults.size() == 1);
  CHECK(to_string(faults[0]) ==
        "tower.yaml:3:20: 'density' is missing in material 'steel'; "
        "write for example 'density: 7850 kg/m3'");
}

TEST_CASE("a section by its area may say radius and curve") {
  const Tower tower = tower_of(tower_with({"sections: {bar: {area: 19.2 cm2, radius: 19.5 mm, curve: b}}"}));
  CHECK_THAT(tower.sections[0].area, is_near(19.2e-4, kRoundoff));
  CHECK_THAT(tower.sections[0].radius.value(), is_near(19.5e-3, kRoundoff));
  CHECK(tower.sections[0].curve == "b");
  CHECK_FALSE(tower_of(tower_with({})).sections[0].radius.has_value());
  CHECK_FALSE(tower_of(tower_with({})).sections[0].curve.has_value());
}

TEST_CASE("every buckling curve of the code is known and no other") {
  for (const std::string curve : {"a0", "a", "b", "c", "d"}) {
    CHECK(tower_of(tower_with({"sections: {bar: {area: 1 cm2, curve: " + curve + "}}"})).sections[0].curve ==
          curve);
  }
  CHECK(refusals_with("sections: {bar: {area: 1 cm2, curve: e}}") == Refusals{"4:38 'curve' cannot be 'e'"});
}

TEST_CASE("a tube has the area and radius of a ring") {
  const Tower tower = tower_of(tower_with({"sections: {bar: {tube: [88.9 mm, 5 mm]}}"}));
  // A = pi/4 (D^2 - d^2), I = pi/64 (D^4 - d^4), i = sqrt(I/A).
  const double outside = 88.9e-3;
  const double inside = 78.9e-3;
  const double pi = 3.14159265358979323846;
  const double area = pi / 4.0 * (outside * outside - inside * inside);
  const double inertia = pi / 64.0 * (std::pow(outside, 4) - std::pow(inside, 4));
  CHECK_THAT(tower.sections[0].area, is_near(area, kRoundoff));
  CHECK_THAT(tower.sections[0].radius.value(), is_near(std::sqrt(inertia / area), kRoundoff));
}

TEST_CASE("a tube whose wall meets in the middle is a round bar") {
  const Tower tower = tower_of(tower_with({"sections: {bar: {tube: [20 mm, 10 mm]}}"}));
  CHECK_THAT(tower.sections[0].area, is_near(3.14159265358979323846 * 1e-4, kRoundoff));
  CHECK_THAT(tower.sections[0].radius.value(), is_near(5e-3, kRoundoff));
}

TEST_CASE("a tube that cannot be made is refused") {
  CHECK(refusals_with("sections: {bar: {tube: [20 mm, 11 mm]}}") ==
        Refusals{"4:24 a tube of 0.02 m outside diameter has no wall of 0.011 m"});
  CHECK(refusals_with("sections: {bar: {tube: [20 mm, 0]}}") ==
        Refusals{"4:32 'wall' must be above zero, got '0'"});
  CHECK(refusals_with("sections: {bar: {tube: 20 mm}}") ==
        Refusals{"4:24 'tube' wants [outside diameter, wall thickness], got '20 mm'"});
  CHECK(refusals_with("sections: {bar: {tube: [20 mm]}}") ==
        Refusals{"4:24 'tube' wants [outside diameter, wall thickness], got a list"});
}

TEST_CASE("a section says its area in exactly one way") {
  const Refusals none = refusals_with("sections: {bar: {radius: 2 cm}}");
  REQUIRE(none.size() == 1);
  CHECK_THAT(none[0], Catch::StartsWith("4:12 section 'bar' needs exactly one of 'area'"));
  CHECK(refusals_with("sections: {bar: {area: 1 cm2, tube: [20 mm, 2 mm]}}") ==
        Refusals{"4:12 'area' and 'tube' exclude each other in section 'bar'"});
  CHECK(refusals_with("sections: {bar: {radius: 2 cm, tube: [20 mm, 2 mm]}}") ==
        Refusals{"4:12 'radius' and 'tube' exclude each other in section 'bar'"});
  CHECK(refusals_with("sections: {bar: {area: 0 cm2}}") ==
        Refusals{"4:24 'area' must be above zero, got '0 cm2'"});
  CHECK(refusals_with("sections: {bar: 10 cm2}") ==
        Refusals{"4:17 section 'bar' wants a map of keys, got '10 cm2'"});
}

TEST_CASE("nodes have the axes of the tower and stand in the order of the file") {
  const Tower plane = tower_of(tower_with({}));
  REQUIRE(plane.nodes.size() == 3);
  CHECK(plane.nodes[2].name == "c");
  CHECK(plane.nodes[2].position == Eigen::Vector3d(1.0, 0.0, 1.0));  // x and z
  CHECK(plane.nodes[2].place.line == 5);
  const Tower line = tower_of(tower_with(
      {"dimensions: 1", "nodes: {a: [0], b: [2], c: [1 m]}", "supports: [{nodes: [a], fixed: [x]}]"}));
  CHECK(line.nodes[2].position == Eigen::Vector3d(1.0, 0.0, 0.0));
  const Tower space =
      tower_of(tower_with({"dimensions: 3", "nodes: {a: [0, 0, 0], b: [2, 0, 0], c: [1, 250 cm, 3]}"}));
  CHECK(space.nodes[2].position == Eigen::Vector3d(1.0, 2.5, 3.0));
}

TEST_CASE("a tower without a word on dimensions has three") {
  const Tower tower =
      tower_of(tower_with({"dimensions: 3", "nodes: {a: [0, 0, 0], b: [2, 0, 0], c: [1, 2, 3]}"}));
  CHECK(tower.dimensions == 3);
  std::string text = tower_with({"nodes: {a: [0, 0, 0], b: [2, 0, 0], c: [1, 2, 3]}"});
  text.erase(text.find("dimensions"), std::string("dimensions: 2\n").size());
  CHECK(tower_of(text).dimensions == 3);
}

TEST_CASE("faulty coordinates are refused where they stand and draw no other fault after them") {
  CHECK(refusals_with("nodes: {a: [0, 0, 0], b: [2, 0], c: [1, 1]}") ==
        Refusals{"5:12 node 'a' has 3 coordinates, this tower has 2 axes"});
  CHECK(refusals_with("nodes: {a: [0], b: [0], c: [1, 1]}") ==
        Refusals{"5:12 node 'a' has 1 coordinate, this tower has 2 axes",
                 "5:20 node 'b' has 1 coordinate, this tower has 2 axes"});
  CHECK(refusals_with("nodes: {a: 0, b: {x: 2}, c: [1, 1]}") ==
        Refusals{"5:12 'a' wants [x, z], got '0'", "5:18 'b' wants [x, z], got a map"});
  CHECK(refusals_with("nodes: {a: [0, 2 kg], b: [2, 0], c: [0, inf]}") ==
        Refusals{"5:16 'z': a length was wanted, got '2 kg', which is a mass",
                 "5:41 'z': a length was wanted, got 'inf', which is no finite number with a unit"});
  CHECK(refusals_with("nodes: {a: [0, [1]], b: [2, 0], c: [1, 1]}") ==
        Refusals{"5:16 'z' wants a length, got a list"});
}

TEST_CASE("a coordinate a thousand kilometres away is a slip of the unit") {
  CHECK(refusals_with("nodes: {a: [0, 0], b: [2e9, 0], c: [1, 1]}") ==
        Refusals{"5:24 the coordinate '2e9' lies more than 1000 km away"});
  CHECK(refusals_with("nodes: {a: [0, 0], b: [1e6, 0], c: [1, 1]}").empty());
}

TEST_CASE("names written twice are one fault and the first one stands") {
  CHECK(refusals_with("nodes: {a: [0, 0], b: [2, 0], c: [1, 1], a: [0, 0]}") ==
        Refusals{"5:42 'a' stands twice here, first in line 5"});
  CHECK(refusals_with("materials: {steel: {E: 1, density: 1}, steel: {E: bad}}") ==
        Refusals{"3:40 'steel' stands twice here, first in line 3"});
  CHECK(refusals_with("sections: {bar: {area: 1}, bar: {area: bad}}") ==
        Refusals{"4:28 'bar' stands twice here, first in line 4"});
}

TEST_CASE("parts that are no maps are refused") {
  CHECK_THAT(refusals_with("materials: [steel]"),
             Catch::VectorContains(std::string("3:12 'materials' wants a map of names, got a list")));
  CHECK_THAT(refusals_with("nodes: 5"),
             Catch::VectorContains(std::string("5:8 'nodes' wants a map of names, got '5'")));
  CHECK(refusals_with("sections: {bar: }") ==
        Refusals{"4:12 nothing stands behind 'bar'", "6:31 there is no section 'bar'"});
}

}  // namespace swaymark::test
