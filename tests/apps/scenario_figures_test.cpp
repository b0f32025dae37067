#include "apps/scenario_figures.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases_scenarios.hpp"

namespace swaymark::test {

namespace {

const FigureRow& row(const std::vector<FigureRow>& rows, const std::string& name) {
  for (const FigureRow& each : rows) {
    if (each.name == name) return each;
  }
  throw std::logic_error("no row " + name);
}

}  // namespace

TEST_CASE("frequencies masses and base shear stand beside those of the tower as stated") {
  const auto rows = figure_rows(lone_mass_study(kHeavySlackAndLoose));
  const FigureRow& mass = row(rows, "total mass");
  CHECK_THAT(mass.values[0].value(), is_near(150'000.0, kRoundoff));
  CHECK_THAT(mass.values[1].value(), is_near(600'000.0, kRoundoff));
  const FigureRow& mode = row(rows, "mode 1");
  CHECK(mode.unit == "Hz");
  CHECK_THAT(mode.values[2].value(), is_near(0.5 * lone_frequency(), kSolved));
  // A rigid mass under 0.2 g at every period.
  const FigureRow& shear = row(rows, "base shear x");
  CHECK_THAT(shear.values[0].value(), is_near(150'000.0 * 0.2 * 9.80665, kSolved));
  CHECK_THAT(shear.values[1].value(), is_near(600'000.0 * 0.2 * 9.80665, kSolved));
}

TEST_CASE("a change is a fraction of the value as stated") {
  const auto rows = figure_rows(lone_mass_study(kHeavySlackAndLoose));
  const FigureRow& mode = row(rows, "mode 1");
  CHECK_FALSE(mode.change(0).has_value());
  CHECK_THAT(mode.change(1).value(), is_near(-0.5, kSolved));
  CHECK_THAT(row(rows, "base shear x").change(1).value(), is_near(3.0, kSolved));
}

TEST_CASE("a state that could not be computed has no figures") {
  for (const FigureRow& each : figure_rows(lone_mass_study(kHeavySlackAndLoose))) {
    INFO(each.name);
    CHECK_FALSE(each.values[3].has_value());
    CHECK_FALSE(each.change(3).has_value());
  }
}

TEST_CASE("the first torsion is told where a mode has that character") {
  const Study study = study_of(read_tower_file(bytes_of(data_folder() / "northfell_common.yaml"), "n"),
                               kStated, Scope::modes);
  const auto rows = figure_rows(study);
  const FigureRow& torsion = row(rows, "first torsion");
  CHECK(torsion.values[0].value() > row(rows, "mode 2").values[0].value());
  CHECK_THROWS(row(figure_rows(lone_mass_study("[{label: l, mass_matrix: lumped}]")), "first torsion"));
}

TEST_CASE("outcomes are those of the bands and of every other check") {
  const auto rows = outcome_rows(lone_mass_study(kHeavySlackAndLoose));
  REQUIRE(rows.size() == 4);
  CHECK(rows[0].check == "band fan");
  CHECK(rows[0].outcomes == std::vector<std::string>{"clear", "inside", "inside", ""});
  CHECK(rows[1].check == "effective mass x");
  CHECK(rows[1].outcomes[0] == "met");
}

TEST_CASE("checks that a scenario alone has are listed and empty for the others") {
  const auto rows =
      outcome_rows(lone_mass_study("[{label: other, bands: [{label: saw, from: 1 Hz, to: 1.5 Hz}]}]"));
  CHECK(rows.back().check == "band saw");
  CHECK(rows.back().outcomes == std::vector<std::string>{"", "clear"});
  CHECK(rows.front().outcomes == std::vector<std::string>{"clear", ""});
}

TEST_CASE("checks that are not met are counted") {
  const Study study = lone_mass_study(kHeavySlackAndLoose);
  CHECK(unmet(study.stated) == 0);
  CHECK(unmet(*study.scenarios[0].analysis) == 1);
}

TEST_CASE("sloshing is compared with nothing but sloshing") {
  const Study study =
      study_of(read_tower_file(bytes_of(data_folder() / "saltmarsh_halt.yaml"), "s"), {}, Scope::modes);
  REQUIRE(study.labels()[2] == "full, sloshing");
  std::optional<double> tower;
  std::optional<double> sloshing;
  for (const FigureRow& row : figure_rows(study)) {
    if (row.name == "tower's mode 1") tower = row.change(2);
    if (row.name != "first sloshing") continue;
    CHECK_FALSE(row.values[0]);
    sloshing = row.values[2];
  }
  // A part of the water moves by itself, so that the stand carries less mass and sways faster.
  CHECK(tower.value() > 0.0);
  CHECK(sloshing.value() == study.states()[2]->frequency(0));
}

}  // namespace swaymark::test
