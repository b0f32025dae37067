#include "apps/notes.hpp"

#include <algorithm>

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

namespace {

// The only note with this phrase; empty where there is none.
std::string note_with(const Analysis& analysis, const std::string& phrase) {
  std::string found;
  for (const std::string& note : analysis.notes) {
    if (note.find(phrase) == std::string::npos) continue;
    CHECK(found.empty());
    found = note;
  }
  return found;
}

}  // namespace

TEST_CASE("a tower that says nothing doubtful has no note of the modes or the combination") {
  const Analysis analysis = checked(lone_mass());
  for (const std::string& note : analysis.notes) CHECK_THAT(note, Catch::StartsWith("Plausible?"));
}

TEST_CASE("more modes than the tower has are answered by their number") {
  CHECK_THAT(note_with(checked(lone_mass({"modes: {count: 7}"})), "modes are asked for"),
             Catch::Contains("7 modes are asked for; the tower has 2"));
  CHECK(note_with(checked(lone_mass({"modes: {count: 2}"})), "modes are asked for").empty());
}

TEST_CASE("modes kept for a band beyond the count asked for are told") {
  const std::string phrase = "are kept instead of";
  Tower tower = rod(8, 8.0, MassScheme::consistent);
  tower.modes = {};
  tower.modes.count = 1;
  CHECK(note_with(checked(tower), phrase).empty());
  BandStatement band;
  band.label = "machine";
  band.from = 400.0;  // the second mode of the rod lies near 3c/4L = 485 Hz
  band.to = 500.0;
  tower.bands = {band};
  CHECK_THAT(note_with(checked(tower), phrase), Catch::StartsWith("2 modes are kept instead of 1"));
  tower.modes.count = 2;
  CHECK(note_with(checked(tower), phrase).empty());
}

TEST_CASE("the other half of a repeated pair is kept and told") {
  CHECK_THAT(note_with(checked(lone_mass({"modes: {count: 1}"})), "repeated mode"),
             Catch::StartsWith("1 mode is kept besides"));
  CHECK(note_with(checked(lone_mass({"modes: {count: 2}"})), "repeated mode").empty());
}

TEST_CASE("degrees of freedom without mass are counted") {
  Tower tower = rod(4, 4.0, MassScheme::lumped);
  tower.materials.front().density = 0.0;
  carry(tower, 4, 100.0);
  CHECK_THAT(note_with(checked(tower), "have no mass"), Catch::StartsWith("3 free degrees"));
  CHECK(note_with(checked(rod(4, 4.0, MassScheme::lumped)), "have no mass").empty());
}

TEST_CASE("a list of damping that ends before the modes is told with the value that is held") {
  const std::string phrase = "Damping is listed";
  Tower tower = shaken_rod(3);
  tower.damping = {0.02, 0.035};
  CHECK_THAT(note_with(checked(tower), phrase),
             Catch::Contains("listed for 2 modes") && Catch::Contains("3.5 %"));
  tower.damping = {0.02, 0.03, 0.035};
  CHECK(note_with(checked(tower), phrase).empty());
  tower.damping = {0.02};
  CHECK(note_with(checked(tower), phrase).empty());
}

TEST_CASE("a mode within a band that takes too little mass to count is told") {
  const std::string bands = "bands: [{label: rotor, from: 4 Hz, to: 6 Hz, direction: ";
  // The pair of the lone mass is turned to x and z: each takes nothing of the other's mass.
  const Analysis along_x = checked(lone_mass({bands + "x}]"}));
  CHECK_THAT(note_with(along_x, "not count"),
             Catch::Contains("Band rotor: mode 2 ") && Catch::Contains("direction x"));
  CHECK(note_with(checked(lone_mass({bands + "any}]"})), "not count").empty());
}

TEST_CASE("periods outside a spectrum are told with their modes") {
  const std::string along = "seismic: {spectrum: {x: s}}";
  const auto with_points = [&](const std::string& points) {
    return checked(lone_mass({"spectra: {s: {points: [" + points + "]}}", along}));
  };
  // The period of the lone mass is 0.2 s.
  const Analysis shorter = with_points("[0.5 s, 0.2 g], [1 s, 0.1 g]");
  CHECK_THAT(note_with(shorter, "shorter than its first point"),
             Catch::Contains("Spectrum s along x: the period of modes 1 and 2"));
  CHECK(note_with(shorter, "longer than its last point").empty());
  const Analysis longer = with_points("[0 s, 0.2 g], [0.1 s, 0.1 g]");
  CHECK_THAT(note_with(longer, "longer than its last point"), Catch::Contains("modes 1 and 2"));
  const Analysis within = with_points("[0 s, 0.2 g], [1 s, 0.1 g]");
  CHECK(note_with(within, "acceleration is held").empty());
}

TEST_CASE("a spectrum for another damping is told with eta whether it was corrected or not") {
  const auto with_damping = [&](const std::string& keys) {
    return checked(
        lone_mass({"spectra: {flat: {" + keys + "points: [[0 s, 0.2 g], [10 s, 0.2 g]]}}", kAlongX}));
  };
  // eta = sqrt(10 / (5 + 2)) = 1.195, EN 1998-1:2004 (3.6)
  CHECK_THAT(note_with(with_damping("damping: 5 %, "), "Spectrum flat is drawn for 5 %"),
             Catch::Contains("as they stand") && Catch::Contains("1.195") && Catch::Contains("2 %"));
  CHECK_THAT(note_with(with_damping("damping: 5 %, damping_correction: true, "), "Spectrum flat is drawn"),
             Catch::Contains("was corrected by eta = 1.195"));
  CHECK(note_with(with_damping("damping: 2 %, "), "Spectrum flat is drawn").empty());
  CHECK(note_with(with_damping(""), "Spectrum flat is drawn").empty());
}

TEST_CASE("SRSS with close modes is warned of with its ratio to CQC") {
  Tower tower = tower_in("harbour_light.yaml");
  CHECK(note_with(checked(tower), "SRSS with modes closer").empty());
  const double cqc = checked(tower).seismic->directions.front().base_shear;
  tower.seismic->modes = ModalRule::srss;
  const Analysis analysis = checked(tower);
  const double ratio = analysis.seismic->directions.front().base_shear / cqc;
  const std::string warning = note_with(analysis, "closer than 10 % along x");
  CHECK_THAT(warning, Catch::StartsWith("WARNING:"));
  CHECK_THAT(warning, Catch::Contains(fmt::format("SRSS / CQC = {:.3f} for the base shear", ratio)));
  CHECK(!note_with(analysis, "closer than 10 % along y").empty());
}

TEST_CASE("SRSS without close modes is not warned of") {
  Tower tower = shaken_rod(3);
  tower.seismic->modes = ModalRule::srss;
  CHECK(note_with(checked(tower), "SRSS").empty());
}

TEST_CASE("supports that lift are named and those that do not are not") {
  const auto shaken = [](const std::string& acceleration) {
    return checked(lone_mass(
        {"spectra: {flat: {points: [[0 s, " + acceleration + "], [10 s, " + acceleration + "]]}}", kAlongX}));
  };
  // Each foot carries half the weight; the sway force m Sa at 1 m height lifts with m Sa / 2.
  CHECK_THAT(note_with(shaken("1.1 g"), "lifts"), Catch::Contains("supports at nodes a, b:"));
  CHECK(note_with(shaken("0.9 g"), "lifts").empty());
}

TEST_CASE("a section that changes its shape before the tower sways is told") {
  const std::string phrase = "is plan bracing missing?";
  Tower tower = tower_in("harbour_light.yaml");
  CHECK(note_with(checked(tower), phrase).empty());
  // Plan bracing as thin as a wire holds the square no longer.
  for (Group& group : tower.groups) {
    if (group.name != "plan bracing") continue;
    Section wire;
    wire.name = "wire";
    wire.area = 1e-8;
    tower.sections.push_back(wire);
    group.section = tower.sections.size() - 1;
  }
  CHECK_THAT(note_with(checked(tower), phrase), Catch::StartsWith("Mode 1 "));
}

TEST_CASE("strengths that this version does not use are told") {
  const std::string phrase = "checks no resistances";
  CHECK(note_with(checked(lone_mass()), phrase).empty());
  CHECK(
      !note_with(checked(lone_mass({"materials: {steel: {E: 210 GPa, density: 0, yield: 355 MPa}}"})), phrase)
           .empty());
}

}  // namespace swaymark::test
