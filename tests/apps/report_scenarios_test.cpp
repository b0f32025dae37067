#include "apps/report_scenarios.hpp"

#include <catch2/catch.hpp>

#include "apps/report_text.hpp"
#include "apps/table.hpp"
#include "tests/apps/cases_scenarios.hpp"

namespace swaymark::test {

namespace {

// As many scenarios of labels as long as words are.
std::string many(int count) {
  std::string list;
  for (int i = 0; i < count; ++i)
    list +=
        fmt::format("{}{{label: corroded legs {}, area_factor: {{g: 0.{}}}}}", i > 0 ? ", " : "", i, 50 + i);
  return "[" + list + "]";
}

}  // namespace

TEST_CASE("scenarios stand side by side with their change against the tower as stated") {
  const std::string section = scenario_section(lone_mass_study(kHeavySlackAndLoose));
  CHECK(has_line(section, {"as stated", "heavy", "slack", "loose"}));
  CHECK(has_line(section, {"total mass [kg]", "150000.0", "600000.0", "-"}));
  CHECK(has_line(section, {"change [%]", "-50.0", "-50.0", "-"}));
  CHECK(has_line(section, {"heavy", "states masses"}));
  CHECK(has_line(section, {"band fan", "clear", "inside", "inside", "-"}));
  CHECK(has_line(section, {"not met", "0 of 4", "1 of 4", "1 of 4", "not computed"}));
}

TEST_CASE("what the scenarios do not meet stands in one list with the scenario named") {
  const std::string text = on_one_line(scenario_section(lone_mass_study(kHeavySlackAndLoose)));
  CHECK_THAT(text, Catch::Contains("Not met in the scenarios"));
  CHECK_THAT(text, Catch::Contains("heavy: band fan: inside 2.000 to 4.000 Hz"));
  CHECK_THAT(text, Catch::Contains("slack: band fan: inside"));
  CHECK_THAT(text, Catch::Contains("loose: not computed: the tower can move"));
}

TEST_CASE("scenarios that meet everything have no list of what is not met") {
  const Study study = lone_mass_study("[{label: lumped, mass_matrix: lumped}]");
  CHECK(scenario_section(study).find("Not met") == std::string::npos);
  CHECK_THAT(scenario_line(study), Catch::Contains("All checks are met in the scenario"));
  CHECK(scenario_failures(study).empty());
}

TEST_CASE("many scenarios are broken into blocks that fit a page and each shows the tower as stated") {
  const Study study = lone_mass_study(many(14));
  const auto lines = lines_of(scenario_section(study));
  int heads = 0;
  for (const std::string& line : lines) {
    INFO(line);
    CHECK(columns_of(line) <= 88);
    heads += line.find("as stated") != std::string::npos && line.find("change:") == std::string::npos ? 1 : 0;
  }
  CHECK(heads > 2);
  const std::string text = on_one_line(scenario_section(study));
  for (int i = 0; i < 14; ++i) CHECK_THAT(text, Catch::Contains(fmt::format("corroded legs {}", i)));
}

TEST_CASE("the head of the report counts the scenarios that miss something") {
  CHECK(scenario_line(lone_mass_study(kHeavySlackAndLoose)) ==
        "3 of 3 scenarios miss a check or cannot be computed: see SCENARIOS.\n");
  const std::string report = text_report(lone_mass_study(kHeavySlackAndLoose), {});
  CHECK_THAT(report, Catch::Contains("3 of 3 scenarios miss") && Catch::Contains("\nSCENARIOS\n"));
  CHECK(report.find("\nNOTES\n") < report.find("\nSCENARIOS\n"));
}

TEST_CASE("modes of scenarios are compared without checks") {
  const std::string section = scenario_section(lone_mass_study(kHeavySlackAndLoose, Scope::modes));
  CHECK(has_line(section, {"mode 1 [Hz]"}));
  CHECK(section.find("not met") == std::string::npos);
  CHECK(section.find("base shear") == std::string::npos);
}

TEST_CASE("a failure names its scenario") {
  const std::string text = scenario_failures(lone_mass_study(kHeavySlackAndLoose));
  CHECK_THAT(text, Catch::StartsWith("scenario 'loose': tower.yaml: the tower can move"));
  CHECK_THAT(
      scenario_failures(lone_mass_study("[{label: held, supports: [{nodes: [a, b, c], fixed: [x, z]}]}]")),
      Catch::StartsWith("swaymark: scenario 'held': nothing is free to move"));
}

TEST_CASE("of a tower that can move as stated the scenarios that stand are reported alone") {
  const Study study =
      studied(tower_with({"supports: [{nodes: [a], fixed: [x, z]}]",
                          "scenarios: [{label: held, supports: [{nodes: [a, b], fixed: [x, z]}]}]"}));
  REQUIRE(study.stated.mechanisms.any());
  const std::string report = text_report(study, {});
  CHECK_THAT(report, Catch::Contains("SCENARIOS") && Catch::Contains("mode 1 [Hz]"));
  CHECK(report.find("\nMODEL\n") == std::string::npos);
}

TEST_CASE("a warning in a scenario is told with its name") {
  const Study study = lone_mass_study("[{label: by SRSS, seismic: {spectrum: {x: flat}, modes: SRSS}}]");
  CHECK_THAT(scenario_section(study), Catch::Contains("by SRSS: WARNING"));
}

}  // namespace swaymark::test
