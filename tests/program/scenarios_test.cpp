#include <nlohmann/json.hpp>

#include "tests/program/shipped.hpp"

namespace swaymark::test {

namespace {

std::string sound_tower_and(const std::string& scenarios) {
  return kSoundTower + "scenarios: " + scenarios + "\n";
}

const std::string kOneFails =
    "[{label: lumped, mass_matrix: lumped}, {label: loose, supports: "
    "[{nodes: [a], fixed: [x, z]}]}]";

}  // namespace

TEST_CASE("a check that only a scenario does not meet ends the program with 1") {
  const ScratchFolder folder;
  const std::string tower = folder.write(
      "tower.yaml", sound_tower_and("[{label: fan, bands: [{label: fan, from: 4 Hz, to: 6 Hz}]}]"));
  const Outcome outcome = swaymark("check " + quoted(tower));
  CHECK(outcome.status == 1);
  CHECK(outcome.error.empty());
  CHECK_THAT(outcome.output, Catch::Contains("fan: band fan: inside"));
  CHECK(swaymark("modes " + quoted(tower)).status == 0);
}

TEST_CASE("a scenario that can move ends the program with 4 and all that could be computed is written") {
  const ScratchFolder folder;
  const std::string tower = folder.write("tower.yaml", sound_tower_and(kOneFails));
  const std::string json = (folder.path() / "r.json").string();
  const Outcome outcome = swaymark("check " + quoted(tower) + " --json " + quoted(json) + " --csv " +
                                   quoted(folder.path() / "out"));
  CHECK(outcome.status == 4);
  CHECK_THAT(outcome.error, Catch::StartsWith("scenario 'loose': ") && Catch::Contains("cure:"));
  CHECK_THAT(outcome.output, Catch::Contains("\nSCENARIOS\n") && Catch::Contains("loose: not computed"));
  const auto root = nlohmann::json::parse(bytes_of(json));
  REQUIRE(root["scenarios"].size() == 2);
  CHECK(root["scenarios"][0]["modes"].size() == 2);
  CHECK(root["scenarios"][1]["label"] == "loose");
  CHECK(root["scenarios"][1].contains("mechanisms"));
  CHECK_THAT(bytes_of(folder.path() / "out" / "scenarios.csv"), Catch::Contains("loose,not computed,,\n"));
}

TEST_CASE("a new tower of every kind runs as it stands") {
  // The small wind turbine misses its band on soft ground, as its first lines say.
  const std::vector<std::pair<std::string, int>> kinds{{"telecom-tower", 0},
                                                       {"wind-turbine-tower", 1},
                                                       {"tank-stand", 0},
                                                       {"plane-truss", 0},
                                                       {"nodes-and-bars", 0}};
  for (const auto& [kind, status] : kinds) {
    INFO(kind);
    const ScratchFolder folder;
    const Outcome made = swaymark("new " + kind);
    CHECK(made.status == 0);
    CHECK(made.error.empty());
    const Outcome outcome = swaymark("check " + quoted(folder.write("tower.yaml", made.output)));
    CHECK(outcome.status == status);
    CHECK(outcome.error.empty());
    CHECK_THAT(outcome.output, Catch::Contains("LIMITS OF THE METHOD"));
    CHECK((made.output.find("status 1 on purpose") != std::string::npos) == (status == 1));
  }
}

TEST_CASE("a new tower of no kind or of an unknown one is a wrong command line") {
  const Outcome none = swaymark("new");
  CHECK(none.status == 2);
  CHECK(none.output.empty());
  CHECK_THAT(none.error, Catch::Contains("telecom-tower") && Catch::Contains("nodes-and-bars"));
  const Outcome unknown = swaymark("new tank-stnad");
  CHECK(unknown.status == 2);
  CHECK_THAT(unknown.error, Catch::Contains("did you mean 'tank-stand'?"));
}

}  // namespace swaymark::test
