#include "apps/study.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases_scenarios.hpp"

namespace swaymark::test {

TEST_CASE("a tower without scenarios is its own study") {
  const Study study = studied(lone_mass());
  CHECK(study.scenarios.empty());
  CHECK(study.labels() == std::vector<std::string>{"as stated"});
  CHECK(study.states().size() == 1);
  CHECK_THAT(study.stated.frequency(0), is_near(lone_frequency(), kSolved));
}

TEST_CASE("four times the mass and a quarter of the stiffness each halve the frequency") {
  const Study study = lone_mass_study(
      "[{label: heavy, masses: [{nodes: [c], mass: 600000 kg}]}, {label: slack, stiffness_factor: 0.25}]");
  REQUIRE(study.scenarios.size() == 2);
  for (const ScenarioResult& scenario : study.scenarios) {
    INFO(scenario.label);
    REQUIRE(scenario.computed());
    CHECK_THAT(scenario.analysis->frequency(0), is_near(0.5 * lone_frequency(), kSolved));
  }
  CHECK(study.scenarios[0].keys == std::vector<std::string>{"masses"});
}

TEST_CASE("a scenario that can move costs the others nothing") {
  const Study study = lone_mass_study(kHeavySlackAndLoose);
  REQUIRE(study.scenarios.size() == 3);
  CHECK(study.scenarios[0].computed());
  CHECK(study.scenarios[1].computed());
  CHECK_FALSE(study.scenarios[2].computed());
  REQUIRE(study.scenarios[2].analysis);
  CHECK(study.scenarios[2].analysis->mechanisms.any());
  CHECK(study.states()[3] == nullptr);
  CHECK(study.states()[0] == &study.stated);
}

TEST_CASE("a scenario that cannot be computed says why and costs the others nothing") {
  const Study study = lone_mass_study(
      "[{label: held, supports: [{nodes: [a, b, c], fixed: [x, z]}]}, {label: lumped, mass_matrix: lumped}]");
  CHECK_FALSE(study.scenarios[0].computed());
  CHECK_FALSE(study.scenarios[0].analysis);
  CHECK_THAT(study.scenarios[0].failure, Catch::Contains("nothing is free to move; leave"));
  CHECK(study.scenarios[1].computed());
}

TEST_CASE("states that differ in mass alone share the work on their stiffness") {
  const Study study = lone_mass_study(
      "[{label: heavy, masses: [{nodes: [c], mass: 600000 kg}]}, {label: slack, stiffness_factor: 0.25},"
      " {label: lumped, mass_matrix: lumped}, {label: heavier, more_masses: [{nodes: [c], mass: 1 t}]}]");
  CHECK(study.different == 2);
}

}  // namespace swaymark::test
