#include "apps/report_text.hpp"

#include <regex>

#include <catch2/catch.hpp>

#include "apps/figure.hpp"
#include "apps/table.hpp"
#include "tests/apps/cases.hpp"

namespace swaymark::test {

namespace {

std::string plain(const Analysis& analysis) { return text_report(analysis, {}); }

void check_width(const std::string& text) {
  for (const std::string& line : lines_of(text)) {
    INFO(line);
    CHECK(columns_of(line) <= 100);
    CHECK((line.empty() || line.back() != ' '));
  }
}

// The text between two headings.
std::string section_of(const std::string& text, const std::string& head, const std::string& next) {
  const std::size_t begin = text.find("\n" + head + "\n");
  REQUIRE(begin != std::string::npos);
  return text.substr(begin, text.find("\n" + next + "\n", begin) - begin);
}

}  // namespace

TEST_CASE("the report of the demo tower fits a page of a hundred columns") {
  check_width(plain(harbour_light()));
  check_width(plain(harbour_light(Scope::modes)));
}

TEST_CASE("the reports of the reference trusses fit a page of a hundred columns") {
  for (const char* file :
       {"truss72_kaveh_zolghadr_css.yaml", "truss72_sedaghati_2002.yaml", "truss37_dpso_2014.yaml",
        "truss10_wang_2004.yaml", "rod8_lumped.yaml", "chain5_chopra.yaml"}) {
    INFO(file);
    check_width(plain(checked(tower_in("reference/" + std::string(file)))));
  }
}

TEST_CASE("names of common length keep the report within a hundred columns whatever is asked for") {
  Tower tower = tower_in("harbour_light.yaml");
  tower.spectra.front().name = "quay, vertical too";
  tower.seismic->spectrum = {0, 0, 0};
  tower.seismic->modes = ModalRule::srss;
  tower.damping = {0.02, 0.03, 0.05};
  check_width(plain(checked(tower)));
}

TEST_CASE("the report names the tower its file its fingerprint its date and the version") {
  const std::string text = plain(harbour_light());
  CHECK_THAT(text, Catch::StartsWith("Harbour light tower\n"));
  for (const std::string& word : {kStated.file, kStated.sha256, kStated.date, kStated.version}) {
    CHECK_THAT(text, Catch::Contains(word));
  }
  CHECK_THAT(plain(checked(tower_with({}))), Catch::StartsWith("Tower without a title\n"));
}

TEST_CASE("a check that is not met stands at the head and in its list in words") {
  const std::string text = plain(harbour_light());
  const std::string head = text.substr(0, text.find("\nMODEL\n"));
  CHECK_THAT(head, Catch::Contains("1 of 8 checks is NOT MET:\n  band wind charger, harmonic 3: "));
  CHECK(has_line(section_of(text, "CHECKS", "NOTES"), {"NOT MET", "band wind charger, harmonic 3"}));
}

TEST_CASE("a tower that meets all its checks says so at the head") {
  const std::string text = plain(checked(lone_mass()));
  CHECK_THAT(text, Catch::Contains("All 2 checks are met.\n"));
  CHECK(text.find("NOT MET") == std::string::npos);
}

TEST_CASE("every check stands in the list with its outcome in words") {
  const Analysis analysis = harbour_light();
  const std::string checks = section_of(plain(analysis), "CHECKS", "NOTES");
  std::size_t listed = 0;
  for (const std::string& line : lines_of(checks)) {
    if (line.starts_with("  met ") || line.starts_with("  NOT MET")) ++listed;
  }
  CHECK(listed == analysis.verdicts.size());
  for (const Verdict& verdict : analysis.verdicts) {
    CHECK(has_line(checks, {verdict.met ? "  met      " + verdict.check : "  NOT MET  " + verdict.check}));
    CHECK_THAT(on_one_line(checks), Catch::Contains(verdict.detail));
  }
}

TEST_CASE("colour adds nothing but escape codes") {
  const Analysis analysis = harbour_light();
  const std::string coloured = text_report(analysis, {true});
  CHECK_THAT(coloured, Catch::Contains("\x1b[1;31mNOT MET\x1b[0m"));
  CHECK(std::regex_replace(coloured, std::regex("\x1b\\[[0-9;]*m"), "") == plain(analysis));
  CHECK(plain(analysis).find('\x1b') == std::string::npos);
}

TEST_CASE("every mode stands with its frequency period and share of the moving mass") {
  const Analysis analysis = harbour_light();
  const std::string modes = section_of(plain(analysis), "MODES", "EXCITATION BANDS");
  for (Index j = 0; j < analysis.mode_count(); ++j) {
    CHECK(has_line(modes,
                   {" " + std::to_string(j + 1) + " ", figure(analysis.frequency(j), 3),
                    figure(1.0 / analysis.frequency(j), 4), percent(analysis.mass_ratio(j, 0)),
                    percent(analysis.mass_ratio(j, 1)), analysis.character[static_cast<std::size_t>(j)]}));
  }
}

TEST_CASE("every entry of the ledger stands with its mass and the total") {
  const Analysis analysis = harbour_light();
  const std::string ledger = section_of(plain(analysis), "MASS BY ORIGIN", "MODES");
  const double total = analysis.ledger.total();
  for (const LedgerEntry& entry : analysis.ledger.entries) {
    CHECK(has_line(ledger, {std::string(name_of(entry.origin)), entry.group, entry.label,
                            kilograms(entry.mass, total)}));
  }
  CHECK(has_line(ledger, {"total", kilograms(total, total)}));
}

TEST_CASE("every band stands with its verdict") {
  const Analysis analysis = harbour_light();
  const std::string bands = section_of(plain(analysis), "EXCITATION BANDS", "SEISMIC RESPONSE");
  CHECK(has_line(bands, {"waves", "0.060", "0.500", "clear"}));
  CHECK(has_line(bands, {"wind charger, harmonic 3", "inside", "1 and 2"}));
}

TEST_CASE("notes stand in the report word by word") {
  const Analysis analysis = harbour_light();
  REQUIRE(!analysis.notes.empty());
  const std::string text = on_one_line(plain(analysis));
  for (const std::string& note : analysis.notes) CHECK_THAT(text, Catch::Contains(note));
  Analysis silent = analysis;
  silent.notes.clear();
  CHECK_THAT(plain(analysis), Catch::Contains("\nNOTES\n"));
  CHECK(plain(silent).find("\nNOTES\n") == std::string::npos);
}

TEST_CASE("the limits of the method close every report") {
  for (const Analysis& analysis : {harbour_light(), harbour_light(Scope::modes), checked(tower_with({}))}) {
    const std::string text = on_one_line(plain(analysis));
    CHECK_THAT(text, Catch::Contains("LIMITS OF THE METHOD"));
    CHECK_THAT(text, Catch::Contains("axial force only") && Catch::Contains("licensed engineer") &&
                         Catch::Contains("codes in force"));
  }
}

TEST_CASE("the report of SRSS with close modes carries the warning") {
  Tower tower = tower_in("harbour_light.yaml");
  tower.seismic->modes = ModalRule::srss;
  CHECK_THAT(
      on_one_line(plain(checked(tower))),
      Catch::Contains("WARNING: SRSS with modes closer than 10 %") && Catch::Contains("SRSS / CQC = "));
}

TEST_CASE("modes alone show no bands no seismic response and no verdict") {
  const std::string text = plain(harbour_light(Scope::modes));
  for (const char* head : {"EXCITATION BANDS", "SEISMIC RESPONSE", "CHECKS", "NOT MET"}) {
    CHECK(text.find(head) == std::string::npos);
  }
  CHECK_THAT(text, Catch::Contains("\nMODES\n"));
}

TEST_CASE("labels of many alphabets keep the columns of the ledger in line") {
  const auto centre_of = [](const std::string& label) {
    Tower tower = tower_of(lone_mass());
    tower.node_masses.front().label = label;
    const std::string text = plain(checked(tower));
    for (const std::string& line : lines_of(text)) {
      if (line.starts_with("  discrete")) return columns_of(line);
    }
    return std::size_t{0};
  };
  CHECK(centre_of("lantern") > 0);
  CHECK(centre_of("lantern") == centre_of("Laterne"));
  CHECK(centre_of("lantern") == centre_of("\u03c6\u03ac\u03c1\u03bf\u03c2-1"));
}

TEST_CASE("no figure of a report is minus zero") {
  const std::regex minus_zero("-0([.]0*)?([^0-9.]|$)");
  for (const Analysis& analysis :
       {harbour_light(), checked(tower_in("reference/truss72_sedaghati_2002.yaml")),
        checked(lone_mass({kFlatSpectrum, kAlongX}))}) {
    const std::string text = plain(analysis);
    std::smatch found;
    if (std::regex_search(text, found, minus_zero))
      FAIL_CHECK(
          "..." << found.prefix().str().substr(found.prefix().length() > 60
                                                   ? static_cast<std::size_t>(found.prefix().length()) - 60
                                                   : 0)
                << found.str());
  }
}

TEST_CASE("what a report shows is what the analysis found and not a number that is none") {
  for (const Analysis& analysis : {harbour_light(), checked(shaken_rod(1)), checked(lone_mass())}) {
    CHECK(!std::regex_search(plain(analysis), std::regex("(^|[^a-z])(nan|inf)([^a-z]|$)")));
  }
}

}  // namespace swaymark::test
