#include "apps/report_csv.hpp"

#include <algorithm>

#include <catch2/catch.hpp>

#include "apps/report_parts.hpp"
#include "tests/apps/cases_scenarios.hpp"

namespace swaymark::test {

namespace {

using Row = std::vector<std::string>;

// The rows of a CSV text by RFC 4180: quotes around a cell, a quote in it written twice.
std::vector<Row> rows_of(const std::string& text) {
  std::vector<Row> rows;
  Row row{""};
  bool quoted = false;
  for (std::size_t i = 0; i < text.size(); ++i) {
    const char c = text[i];
    if (c == '"' && quoted && i + 1 < text.size() && text[i + 1] == '"') {
      row.back() += text[++i];
    } else if (c == '"') {
      quoted = !quoted;
    } else if (c == ',' && !quoted) {
      row.emplace_back();
    } else if (c == '\n' && !quoted) {
      rows.push_back(row);
      row = {""};
    } else {
      row.back() += c;
    }
  }
  CHECK(!quoted);
  CHECK(row == Row{""});  // the last line ends as the others do
  return rows;
}

std::vector<std::string> names_of(const std::vector<NamedText>& sheets) {
  std::vector<std::string> names;
  for (const NamedText& sheet : sheets) names.push_back(sheet.name);
  return names;
}

std::vector<Row> sheet_of(const Analysis& analysis, const std::string& name) {
  for (const NamedText& sheet : csv_report(analysis, true)) {
    if (sheet.name == name) return rows_of(sheet.text);
  }
  FAIL("no sheet " << name);
  return {};
}

// A cell by the name of its column; reads back as the very number.
double number(const std::vector<Row>& rows, std::size_t row, const std::string& column) {
  const auto at = std::find(rows.front().begin(), rows.front().end(), column);
  INFO(column);
  REQUIRE(at != rows.front().end());
  return std::stod(rows.at(row).at(static_cast<std::size_t>(at - rows.front().begin())));
}

using Names = std::vector<std::string>;

}  // namespace

TEST_CASE("a whole check writes one sheet for each part that applies") {
  CHECK(names_of(csv_report(harbour_light(), false)) == Names{"modes.csv", "ledger.csv", "bands.csv",
                                                              "ordinates.csv", "base.csv", "bars.csv",
                                                              "nodes.csv", "reactions.csv", "verdicts.csv"});
  CHECK(names_of(csv_report(checked(tower_with({})), false)) ==
        Names{"modes.csv", "ledger.csv", "verdicts.csv"});
  CHECK(names_of(csv_report(harbour_light(Scope::modes), true)) ==
        Names{"modes.csv", "ledger.csv", "shapes.csv"});
}

TEST_CASE("every row of every sheet has as many cells as its header") {
  for (const Analysis& a : {harbour_light(), checked(shaken_rod(2)), checked(tower_with({}))}) {
    for (const NamedText& sheet : csv_report(a, true)) {
      INFO(sheet.name);
      const auto rows = rows_of(sheet.text);
      REQUIRE(rows.size() > 1);
      for (const Row& row : rows) CHECK(row.size() == rows.front().size());
      for (const std::string& head : rows.front()) CHECK(!head.empty());
    }
  }
}

TEST_CASE("the sheet of modes holds the figures of the analysis") {
  const Analysis a = harbour_light();
  const auto rows = sheet_of(a, "modes.csv");
  REQUIRE(rows.size() == static_cast<std::size_t>(a.mode_count()) + 1);
  for (std::size_t j = 1; j < rows.size(); ++j) {
    const auto mode = static_cast<Index>(j) - 1;
    CHECK(rows[j][0] == std::to_string(j));
    CHECK(number(rows, j, "frequency [Hz]") == a.frequency(mode));
    CHECK(number(rows, j, "participation y [sqrt(kg)]") == a.set.participation(mode, 1));
    CHECK_THAT(number(rows, j, "effective mass x [kg]"),
               is_near(std::pow(a.set.participation(mode, 0), 2), kRoundoff));
    CHECK(number(rows, j, "effective mass ratio x") == a.mass_ratio(mode, 0));
  }
}

TEST_CASE("the sheets of the seismic response hold the figures of the analysis") {
  const Analysis a = harbour_light();
  const SeismicResult& s = *a.seismic;
  const auto bars = sheet_of(a, "bars.csv");
  REQUIRE(bars.size() == 69);
  CHECK(Row(bars[1].begin(), bars[1].begin() + 3) == Row{"legs-1", "1", "5"});
  for (std::size_t b = 1; b < bars.size(); ++b) {
    CHECK(number(bars, b, "gravity [N]") == s.bar_gravity(static_cast<Index>(b) - 1));
    CHECK(number(bars, b, "seismic [N]") == s.bar_force(static_cast<Index>(b) - 1));
  }
  const auto base = sheet_of(a, "base.csv");
  CHECK(number(base, 1, "base shear [N]") == s.directions[0].base_shear);
  CHECK(number(base, 2, "overturning moment [N m]") == *s.directions[1].overturning_moment);
  const auto reactions = sheet_of(a, "reactions.csv");
  CHECK(number(reactions, 2, "uplift [N]") == *node_reactions(a)[1].uplift);
  const auto ordinates = sheet_of(a, "ordinates.csv");
  CHECK(ordinates.size() == 1 + 2 * static_cast<std::size_t>(a.mode_count()));
  CHECK(number(ordinates, 1, "acceleration [m/s2]") == s.directions[0].acceleration(0));
  const auto nodes = sheet_of(a, "nodes.csv");
  CHECK(number(nodes, 20, "displacement x [m]") == node_displacements(a)(19, 0));
}

TEST_CASE("the sheet of verdicts agrees with the analysis") {
  const Analysis a = harbour_light();
  const auto rows = sheet_of(a, "verdicts.csv");
  REQUIRE(rows.size() == a.verdicts.size() + 1);
  for (std::size_t v = 0; v < a.verdicts.size(); ++v) {
    CHECK(rows[v + 1] ==
          Row{a.verdicts[v].check, a.verdicts[v].met ? "true" : "false", a.verdicts[v].detail});
  }
}

TEST_CASE("the sheet of bands names the modes inside and within the margin") {
  const auto rows = sheet_of(harbour_light(), "bands.csv");
  REQUIRE(rows.size() == 5);
  CHECK(rows[3][0] == "wind charger");
  CHECK(rows[3][1] == "3");
  CHECK(rows[3][6] == "inside");
  CHECK(rows[3][7] == "1 2");
  CHECK(rows[1][1].empty());
}

TEST_CASE("shapes are one row for each mode and node and zero at held nodes") {
  const Analysis a = checked(lone_mass());
  const auto rows = sheet_of(a, "shapes.csv");
  REQUIRE(rows.size() == 1 + 2 * 3);
  CHECK(rows[0] == Row{"mode", "node", "x [1/sqrt(kg)]", "z [1/sqrt(kg)]"});
  CHECK(rows[1] == Row{"1", "a", "0", "0"});
  CHECK_THAT(number(rows, 3, "x [1/sqrt(kg)]"), is_near(1.0 / std::sqrt(150'000.0), kSolved));
}

TEST_CASE("labels with commas quotes and line ends come back whole") {
  const std::string label = "lamp, \"old\"\nand gallery";
  Tower tower = tower_of(lone_mass());
  tower.node_masses.front().label = label;
  const auto rows = sheet_of(checked(tower), "ledger.csv");
  CHECK(std::any_of(rows.begin(), rows.end(), [&](const Row& row) { return row.at(2) == label; }));
}

TEST_CASE("a rod has empty cells where gravity does not apply and no column for other axes") {
  const auto rows = sheet_of(checked(shaken_rod(1)), "reactions.csv");
  CHECK(rows[0] == Row{"node", "gravity x [N]", "seismic x [N]", "uplift [N]"});
  CHECK(rows[1][1].empty());
  CHECK(rows[1][3].empty());
}

TEST_CASE("scenarios are compared in two sheets beside those of the tower as stated") {
  const Study study = lone_mass_study(kHeavySlackAndLoose);
  const auto sheets = csv_report(study, false);
  REQUIRE(sheets.size() == csv_report(study.stated, false).size() + 2);
  const auto figures = rows_of(sheets[sheets.size() - 2].text);
  CHECK(sheets[sheets.size() - 2].name == "scenarios.csv");
  CHECK(figures.front() == Row{"scenario", "figure", "value", "change"});
  const auto frequency = std::find_if(figures.begin(), figures.end(), [](const Row& row) {
    return row[0] == "heavy" && row[1] == "mode 1 [Hz]";
  });
  REQUIRE(frequency != figures.end());
  CHECK(std::stod((*frequency)[2]) == study.scenarios[0].analysis->frequency(0));
  CHECK_THAT(std::stod((*frequency)[3]), is_near(-0.5, kSolved));
  CHECK(figures.back() == Row{"loose", "not computed", "", ""});
  const auto checks = rows_of(sheets.back().text);
  CHECK(sheets.back().name == "scenario_checks.csv");
  CHECK(std::find(checks.begin(), checks.end(), Row{"heavy", "band fan", "inside"}) != checks.end());
}

TEST_CASE("modes without damping have an empty cell for it") {
  const auto rows = sheet_of(checked(tower_with({})), "modes.csv");
  CHECK(rows[0][3] == "damping");
  CHECK(rows[1][3].empty());
}

TEST_CASE("the base study is a sheet whose last row is the rigid base") {
  const Analysis analysis = checked(lone_mass({"base_study: [20 kN/mm, 1000 kN/mm]"}));
  const auto rows = sheet_of(analysis, "base_study.csv");
  REQUIRE(rows.size() == 9);
  CHECK(rows[0].front() == "stiffness [N/m]");
  CHECK(rows[0][1] == "frequency 1 [Hz]");
  CHECK(rows[0].back() == "bound [Hz]");
  CHECK_THAT(std::stod(rows[1].front()), is_near(20e6, kRoundoff));
  CHECK_THAT(std::stod(rows[1].back()), is_near(*analysis.base_study->rows[0].bound, kRoundoff));
  CHECK(rows[8].front().empty());
  CHECK(rows[8].back().empty());
  CHECK_THAT(std::stod(rows[8][1]), is_near(lone_frequency(), kSolved));
}

}  // namespace swaymark::test
