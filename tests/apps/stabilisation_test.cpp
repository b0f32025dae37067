#include "apps/stabilisation.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

namespace {

// A tower of K-braced panels of 3 m on held corners; its mid nodes are held by springs.
std::string k_braced(const std::string& stiffness, const std::string& masses = "") {
  return "swaymark: 1\nmaterials: {steel: {E: 210 GPa, density: 7850}}\n"
         "sections: {leg: {area: 20 cm2}, strut: {area: 6 cm2}}\n"
         "lattice: {plan: square, width: 2, material: steel, panels: [{height: 3, width: 1.6, repeat: 3, "
         "legs: leg, "
         "diagonals: strut, horizontals: strut, plan_bracing: strut, bracing: K}]}\n"
         "modes: {count: 2}\n"
         "supports:\n  - {nodes: base, fixed: [x, y, z]}\n"
         "  - {nodes: [L1.m1, L1.m2, L1.m3, L1.m4, L2.m1, L2.m2, L2.m3, L2.m4, L3.m1, L3.m2, L3.m3, L3.m4], "
         "stabilise: " +
         stiffness + "}\n" + masses;
}

Stabilisation studied(const Analysis& analysis) {
  return study_stabilisation(analysis, Eigenproblem(analysis.assembly.stiffness, analysis.assembly.mass));
}

constexpr const char* kTopMass = "masses: [{nodes: top, mass: 4000 kg}]\n";

}  // namespace

TEST_CASE("springs that stabilise light nodes do not change the first frequencies") {
  const Analysis analysis = checked(k_braced("10 MN/m", kTopMass));
  REQUIRE(!analysis.mechanisms.any());
  const Stabilisation study = studied(analysis);
  CHECK(study.springs == 12);
  REQUIRE(!study.rows.empty());
  CHECK(study.rows[0].mode == 0);
  CHECK(study.rows[0].frequency[1] == analysis.frequency(0));
  CHECK(study.independent());
  CHECK_THAT(stabilisation_note(study), Catch::StartsWith("12 stabilising springs of 10 MN/m") &&
                                            Catch::Contains("do not depend on them"));
}

TEST_CASE("springs that hold a heavy node up change the first frequencies and a warning says so") {
  // The free node carries most of the mass, so that its motion on the spring is a mode of the whole.
  const Analysis analysis =
      checked(k_braced("20 kN/m", "masses: [{nodes: [L2.m1], mass: 2000 kg}, {nodes: top, mass: 500 kg}]\n"));
  const Stabilisation study = studied(analysis);
  CHECK_FALSE(study.independent());
  CHECK_THAT(stabilisation_note(study), Catch::StartsWith("WARNING: ") && Catch::Contains("DEPEND on them"));
}

TEST_CASE("the frequency of a node on a stabilising spring follows by hand") {
  // One mass on two bars in line, held square to them by a spring k: omega^2 = k / m, whatever the bars.
  const Analysis analysis = checked(
      "swaymark: 1\ndimensions: 2\nmaterials: {steel: {E: 210 GPa, density: 0}}\nsections: {bar: {area: 10 "
      "cm2}}\n"
      "nodes: {a: [0, 0], b: [2, 0], c: [1, 0]}\n"
      "members: [{group: g, section: bar, material: steel, bars: [[a, c], [b, c]]}]\n"
      "supports: [{nodes: [a, b], fixed: [x, z]}, {nodes: [c], stabilise: 40 kN/m}]\n"
      "masses: [{nodes: [c], mass: 100 kg}]\nmodes: {count: 1}\n");
  CHECK_THAT(analysis.frequency(0), is_near(20.0 / (2.0 * std::numbers::pi), kSolved));
  const Stabilisation study = studied(analysis);
  // f goes with the root of k: 10^-0.75 and 10^0.75.
  CHECK_THAT(study.rows[0].frequency[0] / study.rows[0].frequency[1],
             is_near(std::pow(10.0, -0.75), kSolved));
  CHECK_THAT(study.rows[0].frequency[2] / study.rows[0].frequency[1], is_near(std::pow(10.0, 0.75), kSolved));
  // All of the weight hangs on the spring.
  CHECK_THAT(study.share_of_weight, is_near(1.0, kSolved));
}

TEST_CASE("the study of stabilising springs is among the notes of an analysis") {
  const Analysis analysis = checked(k_braced("10 MN/m", kTopMass));
  CHECK(std::any_of(analysis.notes.begin(), analysis.notes.end(), [](const std::string& note) {
    return note.find("stabilising springs") != std::string::npos;
  }));
}

TEST_CASE("reactions equal the weight of a tower whose loose nodes are stabilised") {
  const Analysis analysis = checked(k_braced(
      "1 MN/m",
      "masses: [{nodes: top, mass: 500 kg}]\ndamping: 2 %\n"
      "spectra: {flat: {points: [[0.01 s, 0.2 g], [10 s, 0.2 g]]}}\nseismic: {spectrum: {x: flat}}\n"));
  const SeismicResult& seismic = analysis.seismic.value();
  double lifted = 0.0;
  for (std::size_t i = 0; i < seismic.supports.size(); ++i) {
    if (seismic.supports[i].axis == Axis::z) lifted += seismic.reaction_gravity(static_cast<Index>(i));
  }
  CHECK_THAT(lifted, is_near(9.80665 * analysis.ledger.total(), kSolved));
}

TEST_CASE("stabilised nodes sway with the tower as nodes that weightless ties hold") {
  // The ties run from each mid node to a corner out of its face, and carry nothing but what holds the node.
  const Analysis stabilised = checked(k_braced("10 MN/m", kTopMass));
  std::string tied = k_braced("1 MN/m", kTopMass);
  tied.erase(tied.find("  - {nodes: [L1.m1,"),
             tied.find("stabilise: 1 MN/m}\n") + 19 - tied.find("  - {nodes: [L1.m1,"));
  tied.replace(tied.find("materials: {"), 12, "materials: {nothing: {E: 210 GPa, density: 0}, ");
  tied += "members: [{group: ties, section: strut, material: nothing, bars: [";
  for (const char* level : {"L1", "L2", "L3"}) {
    for (const auto& [mid, corner] : {std::pair{".m1", ".3"}, {".m2", ".4"}, {".m3", ".1"}, {".m4", ".2"}})
      tied += std::string("[") + level + mid + ", " + level + corner + "], ";
  }
  tied.replace(tied.size() - 2, 2, "]}]\n");
  const Analysis by_ties = checked(tied);
  REQUIRE(!by_ties.mechanisms.any());
  constexpr double ties_stiffen = 2e-3;  // they act as plan bracing, too
  CHECK_THAT(stabilised.frequency(0), is_near(by_ties.frequency(0), ties_stiffen));
}

}  // namespace swaymark::test
