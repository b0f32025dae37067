#include "apps/plausibility.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

namespace {

// Whether a plausibility note with this phrase is given.
bool asks(const Analysis& analysis, const std::string& phrase) {
  for (const std::string& note : plausibility_notes(analysis)) {
    CHECK_THAT(note, Catch::StartsWith("Plausible? "));
    if (note.find(phrase) != std::string::npos) return true;
  }
  return false;
}

bool asks_with(const std::string& line, const std::string& phrase) {
  return asks(checked(tower_with({line})), phrase);
}

}  // namespace

TEST_CASE("a common tower is not asked about") { CHECK(plausibility_notes(harbour_light()).empty()); }

TEST_CASE("a density that no metal has and one that steel has not are asked about") {
  CHECK(asks_with("materials: {steel: {E: 210 GPa, density: 78.5 kg/m3}}", "modulus of steel"));
  CHECK(!asks_with("materials: {steel: {E: 210 GPa, density: 7850 kg/m3}}", "modulus of steel"));
  const std::string foam = "materials: {steel: {E: 70 GPa, density: 270 kg/m3}}";
  CHECK(asks_with(foam, "no metal's"));
  CHECK(!asks_with("materials: {steel: {E: 70 GPa, density: 2700 kg/m3}}", "no metal's"));
}

TEST_CASE("a modulus far too small for a bare number in pascal is asked about") {
  CHECK(asks_with("materials: {steel: {E: 210, density: 7850 kg/m3}}", "E = 210 Pa"));
  CHECK(!asks_with("materials: {steel: {E: 210 GPa, density: 7850 kg/m3}}", "a bare number"));
}

TEST_CASE("a band in turns a minute without the unit is asked about") {
  CHECK(asks_with("bands: [{label: fan, speed: 990}]", "rpm"));
  CHECK(!asks_with("bands: [{label: fan, speed: 990 rpm}]", "rpm"));
}

TEST_CASE("a spectrum in parts of gravity without the unit is asked about") {
  const std::string use = "seismic: {spectrum: {x: s}}";
  CHECK(asks(checked(lone_mass({"spectra: {s: {points: [[0, 0.08], [1, 0.1]]}}", use})), "not g"));
  CHECK(!asks(checked(lone_mass({"spectra: {s: {points: [[0, 0.08 g], [1, 0.1 g]]}}", use})), "not g"));
}

TEST_CASE("a bar much longer than the tower is high is asked about") {
  CHECK(asks_with("nodes: {a: [0, 0], b: [2, 0], c: [1000, 1]}", "Bar g-1 is"));
  CHECK(!asks_with("nodes: {a: [0, 0], b: [2, 0], c: [1, 1]}", "Bar "));
}

TEST_CASE("a carried mass equal to that of the bars is asked about") {
  // 2 sqrt(2) m of 10 cm2 of steel weigh 22.20 kg.
  CHECK(asks_with("masses: [{nodes: [c], mass: 22.2 kg, label: self weight}]", "'self weight'"));
  CHECK(!asks_with("masses: [{nodes: [c], mass: 20 kg, label: lantern}]", "counted twice"));
}

TEST_CASE("a tower that carries very many times its own mass is asked about") {
  CHECK(asks_with("masses: [{nodes: [c], mass: 2220 kg}]", "times the mass of its bars"));
  CHECK(!asks_with("masses: [{nodes: [c], mass: 222 kg}]", "times the mass of its bars"));
}

TEST_CASE("a frequency far from what towers of that height have is asked about") {
  CHECK(asks_with("masses: [{nodes: [c], mass: 20 kg}]", "lattice towers"));  // some 400 Hz at 1 m of height
  CHECK(!asks(harbour_light(), "lattice towers"));
}

TEST_CASE("ice in metres without the unit and ice of stone are asked about") {
  const std::string outlined = "sections: {bar: {area: 10 cm2, perimeter: 0.4 m}}";
  const auto iced = [&](const std::string& ice) {
    return checked(tower_with({outlined, "masses: [{group: g, " + ice + ", label: glaze}]"}));
  };
  CHECK(asks(iced("ice: 2, density: 900"), "Ice 'glaze' is 2000 mm thick"));
  CHECK(asks(iced("ice: 20 mm, density: 2600"), "Ice 'glaze' has 2600 kg/m3"));
  CHECK(!asks(iced("ice: 20 mm, density: 900"), "Ice"));
}

TEST_CASE("a liquid that is no liquid and one that is carried twice are asked about") {
  const auto tank = [&](const std::string& density, const std::string& mass) {
    return checked(tower_with({"masses: [{nodes: [c], liquid: {radius: 1 m, depth: 1 m, density: " + density +
                               "}, label: water}, {nodes: [c], mass: " + mass + "}]"}));
  };
  CHECK(asks(tank("1", "100 kg"), "Liquid 'water' has 1 kg/m3"));
  // pi t of water.
  CHECK(asks(tank("1000", "3142 kg"), "Liquid 'water' weighs as much as the mass of 3142 kg"));
  CHECK(!asks(tank("1000", "1000 kg"), "Liquid"));
}

TEST_CASE("soil softer than any and harder than rock is asked about") {
  const auto pad = [&](const std::string& modulus) {
    return checked(tower_with(
        {"supports: [{nodes: [a, b], pad: {length: 2, width: 2, poisson: 0.3, shear_modulus: " + modulus +
         "}}]"}));
  };
  CHECK(asks(pad("60"), "G = 60 Pa"));
  CHECK(asks(pad("60 GPa"), "under node 'a'"));
  CHECK(!asks(pad("60 MPa"), "soil"));
}

TEST_CASE("sloshing below the range of towers is not asked about") {
  const std::string tank =
      "masses: [{nodes: [c], liquid: {radius: 1 m, depth: 1 m, density: 1000}, label: water}]";
  const Analysis analysis = checked(tower_with({tank, "modes: {count: 3}"}));
  REQUIRE(analysis.frequency(0) < 1.0);  // a meter of height: common are 10 to 300 Hz
  REQUIRE(analysis.character.front() == "liquid");
  CHECK(!asks(analysis, "lattice towers"));
}

TEST_CASE("a rod is not asked about heights") {
  for (const std::string& note : plausibility_notes(checked(shaken_rod(1)))) {
    CHECK(note.find("high") == std::string::npos);
  }
}

TEST_CASE("a bar a million times softer than the others is asked about and is no mechanism") {
  const auto with_brace = [](const std::string& area) {
    return checked(
        "swaymark: 1\ndimensions: 2\nmaterials: {steel: {E: 210 GPa, density: 7850}}\n"
        "sections: {post: {area: 10 cm2}, brace: {area: " +
        area +
        "}}\nnodes: {a: [0, 0], b: [2, 0], c: [0, 2], d: [2, 2]}\n"
        "members: [{group: g, section: post, material: steel, bars: [[a, c], [b, d], [c, d]]}, "
        "{group: h, section: brace, material: steel, bars: [[a, d]]}]\n"
        "supports: [{nodes: [a, b], fixed: [x, z]}]\n");
  };
  const Analysis soft = with_brace("0.00001 cm2");
  CHECK(!soft.mechanisms.any());
  CHECK(asks(soft, "Bar h-1 is 1.4e+06 times softer"));
  CHECK(!asks(with_brace("1 cm2"), "softer"));
}

}  // namespace swaymark::test
