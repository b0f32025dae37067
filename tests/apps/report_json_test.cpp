#include "apps/report_json.hpp"

#include <cmath>
#include <functional>
#include <set>

#include <catch2/catch.hpp>
#include <nlohmann/json.hpp>

#include "apps/report_parts.hpp"
#include "tests/apps/cases_scenarios.hpp"

namespace swaymark::test {

namespace {

using Json = nlohmann::json;
using Keys = std::set<std::string>;

Json json_of(const Analysis& analysis, bool shapes = false) {
  return Json::parse(json_report(analysis, shapes));
}

Keys keys_of(const Json& object) {
  Keys keys;
  for (const auto& [key, value] : object.items()) keys.insert(key);
  return keys;
}

// Every number and every null of a result, wherever it stands.
void visit(const Json& json, const std::function<void(const Json&)>& look) {
  if (json.is_structured()) {
    for (const Json& part : json) visit(part, look);
  } else {
    look(json);
  }
}

Analysis planar() { return checked(lone_mass({kFlatSpectrum, "seismic: {spectrum: {x: flat, z: flat}}"})); }

}  // namespace

TEST_CASE("a whole check writes every key of the contract and the input it came from") {
  const Json json = json_of(harbour_light());
  CHECK(keys_of(json) == Keys{"swaymark", "title", "input", "model", "mass", "mass_matrix", "modes",
                              "completeness", "bands", "seismic", "verdicts", "notes"});
  CHECK(keys_of(json["input"]) == Keys{"file", "sha256", "date"});
  CHECK(keys_of(json["model"]) == Keys{"dimensions", "nodes", "bars", "free_dofs"});
  CHECK(keys_of(json["mass"]) == Keys{"bars", "carried", "total", "moving", "at_supports", "ledger"});
  CHECK(keys_of(json["modes"][0]) == Keys{"mode", "frequency", "period", "damping", "character",
                                          "participation", "effective_mass", "effective_mass_ratio",
                                          "residual"});
  CHECK(keys_of(json["completeness"]) == Keys{"certified", "modes_below", "frequency"});
  CHECK(keys_of(json["seismic"]) ==
        Keys{"modes", "directions", "by_direction", "bars", "nodes", "reactions"});
  CHECK(keys_of(json["seismic"]["by_direction"]) == Keys{"x", "y"});
  CHECK(keys_of(json["seismic"]["by_direction"]["x"]) ==
        Keys{"spectrum", "base_shear", "overturning_moment", "missing_mass_ratio", "per_mode"});
  CHECK(keys_of(json["seismic"]["by_direction"]["x"]["per_mode"][0]) ==
        Keys{"mode", "acceleration", "base_shear"});
  CHECK(keys_of(json["seismic"]["bars"][0]) == Keys{"bar", "gravity", "seismic", "tension", "compression"});
  CHECK(keys_of(json["seismic"]["nodes"][0]) == Keys{"node", "displacement"});
  CHECK(keys_of(json["seismic"]["reactions"][0]) == Keys{"node", "gravity", "seismic", "uplift"});
  CHECK(keys_of(json["verdicts"][0]) == Keys{"check", "met", "detail"});
}

TEST_CASE("what was stated comes back as it was stated") {
  const Json json = json_of(harbour_light());
  CHECK(json["swaymark"] == kStated.version);
  CHECK(json["title"] == "Harbour light tower");
  CHECK(json["input"] == Json({{"file", kStated.file}, {"sha256", kStated.sha256}, {"date", kStated.date}}));
  CHECK(json["model"] == Json({{"dimensions", 3}, {"nodes", 20}, {"bars", 68}, {"free_dofs", 48}}));
  CHECK(json["mass_matrix"] == "consistent");
  CHECK(json["seismic"]["modes"] == "CQC");
  CHECK(json["seismic"]["directions"] == "SRSS");
  CHECK(json["seismic"]["by_direction"]["x"]["spectrum"] == "quay");
  CHECK(json["seismic"]["bars"][0]["bar"] == "legs-1");
  CHECK(json["seismic"]["nodes"][4]["node"] == "5");
  CHECK(json["seismic"]["reactions"][3]["node"] == "4");
}

TEST_CASE("the keys of the example stand in the order of the contract") {
  const auto json = nlohmann::ordered_json::parse(json_report(harbour_light(), false));
  std::vector<std::string> order;
  for (const auto& [key, value] : json.items()) order.push_back(key);
  CHECK(order == std::vector<std::string>{"swaymark", "title", "input", "model", "mass", "mass_matrix",
                                          "modes", "completeness", "bands", "seismic", "verdicts", "notes"});
}

TEST_CASE("figures of modes are those of the analysis to the last bit") {
  const Analysis a = harbour_light();
  const Json json = json_of(a);
  REQUIRE(json["modes"].size() == static_cast<std::size_t>(a.mode_count()));
  for (Index j = 0; j < a.mode_count(); ++j) {
    const Json& mode = json["modes"][static_cast<std::size_t>(j)];
    CHECK(mode["mode"] == j + 1);
    CHECK(mode["frequency"].get<double>() == a.frequency(j));
    CHECK(mode["period"].get<double>() == 1.0 / a.frequency(j));
    CHECK(mode["damping"].get<double>() == 0.02);
    CHECK(mode["character"] == a.character[static_cast<std::size_t>(j)]);
    CHECK(mode["residual"].get<double>() == a.set.modes.residual(j));
    for (const Axis axis : kAllAxes) {
      const std::string key(name_of(axis));
      const double gamma = a.set.participation(j, index_of(axis));
      CHECK(mode["participation"][key].get<double>() == gamma);
      CHECK(mode["effective_mass"][key].get<double>() == gamma * gamma);
      CHECK_THAT(mode["effective_mass_ratio"][key].get<double>() * a.set.moving(index_of(axis)),
                 is_near(gamma * gamma, kRoundoff));
    }
  }
}

TEST_CASE("figures of mass are those of the ledger and add up") {
  const Analysis a = harbour_light();
  const Json mass = json_of(a)["mass"];
  CHECK(mass["bars"].get<double>() == a.ledger.bars);
  CHECK(mass["carried"].get<double>() == a.ledger.carried);
  CHECK(mass["at_supports"].get<double>() == a.ledger.at_supports);
  CHECK(mass["moving"]["y"].get<double>() == a.set.moving(1));
  double sum = 0.0;
  for (const Json& entry : mass["ledger"]) sum += entry["mass"].get<double>();
  CHECK_THAT(sum, is_near(mass["total"].get<double>(), kRoundoff));
  CHECK(mass["ledger"][0] == Json({{"origin", "bars"},
                                   {"group", "legs"},
                                   {"mass", a.ledger.entries[0].mass},
                                   {"centre",
                                    {a.ledger.entries[0].centre.x(), a.ledger.entries[0].centre.y(),
                                     a.ledger.entries[0].centre.z()}}}));
}

TEST_CASE("bands carry their verdict and the numbers of their modes") {
  const Json bands = json_of(harbour_light())["bands"];
  REQUIRE(bands.size() == 4);
  CHECK(
      bands[0] ==
      Json(
          {{"label", "waves"}, {"from", 0.06}, {"to", 0.5}, {"verdict", "clear"}, {"modes", Json::array()}}));
  CHECK(bands[1]["harmonic"] == 1);
  CHECK(bands[2]["harmonic"] == 3);
  CHECK(bands[2]["verdict"] == "inside");
  CHECK(bands[2]["modes"] == Json({1, 2}));
  const Json close = json_of(
      checked(lone_mass({"bands: [{label: fan, from: 5.2 Hz, to: 6 Hz, margin: 10 %, direction: x}]"})));
  CHECK(close["bands"][0]["verdict"] == "close");
  CHECK(close["bands"][0]["modes"] == Json({1}));
}

TEST_CASE("figures of the seismic response are those of the analysis") {
  const Analysis a = harbour_light();
  const SeismicResult& s = *a.seismic;
  const Json json = json_of(a)["seismic"];
  for (const DirectionResult& d : s.directions) {
    const Json& row = json["by_direction"][std::string(name_of(d.axis))];
    CHECK(row["base_shear"].get<double>() == d.base_shear);
    CHECK(row["overturning_moment"].get<double>() == *d.overturning_moment);
    CHECK(row["missing_mass_ratio"].get<double>() == d.missing_mass_ratio);
    CHECK(row["per_mode"].size() == static_cast<std::size_t>(a.mode_count()));
    CHECK(row["per_mode"][1]["acceleration"].get<double>() == d.acceleration(1));
    CHECK(row["per_mode"][1]["base_shear"].get<double>() == d.modal_base_shear(1));
  }
  REQUIRE(json["bars"].size() == 68);
  for (Index b = 0; b < s.bar_force.size(); ++b) {
    const Json& bar = json["bars"][static_cast<std::size_t>(b)];
    const double gravity = bar["gravity"].get<double>();
    const double seismic = bar["seismic"].get<double>();
    CHECK(gravity == s.bar_gravity(b));
    CHECK(seismic == s.bar_force(b));
    CHECK(bar["tension"].get<double>() == std::max(0.0, gravity + seismic));
    CHECK(bar["compression"].get<double>() == std::max(0.0, seismic - gravity));
  }
  REQUIRE(json["nodes"].size() == 20);
  const Eigen::MatrixXd displacements = node_displacements(a);
  CHECK(json["nodes"][0]["displacement"] == Json({{"x", 0.0}, {"y", 0.0}, {"z", 0.0}}));
  CHECK(json["nodes"][19]["displacement"]["y"].get<double>() == displacements(19, 1));
  REQUIRE(json["reactions"].size() == 4);
  for (const Json& reaction : json["reactions"]) {
    CHECK(keys_of(reaction["gravity"]) == Keys{"x", "y", "z"});
    CHECK(reaction["uplift"].get<double>() ==
          std::max(0.0, reaction["seismic"]["z"].get<double>() - reaction["gravity"]["z"].get<double>()));
  }
}

TEST_CASE("shapes are written only where they are asked for and have unit modal mass") {
  const Analysis a = harbour_light();
  const Json json = json_of(a, true);
  for (std::size_t j = 0; j < json["modes"].size(); ++j) {
    const Json& shape = json["modes"][j]["shape"];
    REQUIRE(shape.size() == 20);
    Eigen::VectorXd all(60);
    double largest = 0.0;
    for (Index node = 0; node < 20; ++node) {
      const Json& motion = shape[std::to_string(node + 1)];
      REQUIRE(motion.size() == 3);
      for (Index k = 0; k < 3; ++k) {
        all(3 * node + k) = motion[static_cast<std::size_t>(k)].get<double>();
        if (std::abs(all(3 * node + k)) > std::abs(largest)) largest = all(3 * node + k);
      }
    }
    CHECK(all.head(12).isZero());  // nodes 1 to 4 are held
    CHECK_THAT(all.dot(a.assembly.mass_all * all), is_near(1.0, kSolved));
    CHECK(largest > 0.0);
  }
  const Json without = json_of(a);
  for (const Json& mode : without["modes"]) CHECK(!mode.contains("shape"));
}

TEST_CASE("a tower in two dimensions has no y anywhere and two components in a shape") {
  const Json json = json_of(planar(), true);
  CHECK(keys_of(json["mass"]["moving"]) == Keys{"x", "z"});
  CHECK(keys_of(json["modes"][0]["participation"]) == Keys{"x", "z"});
  CHECK(keys_of(json["modes"][0]["effective_mass_ratio"]) == Keys{"x", "z"});
  CHECK(json["modes"][0]["shape"]["c"].size() == 2);
  CHECK(keys_of(json["seismic"]["nodes"][0]["displacement"]) == Keys{"x", "z"});
  CHECK(keys_of(json["seismic"]["reactions"][0]["seismic"]) == Keys{"x", "z"});
  CHECK(keys_of(json["seismic"]["reactions"][0]["gravity"]) == Keys{"x", "z"});
  CHECK(keys_of(json["seismic"]["by_direction"]) == Keys{"x", "z"});
}

TEST_CASE("shaking upwards has no overturning moment") {
  const Json directions = json_of(planar())["seismic"]["by_direction"];
  CHECK(directions["x"].contains("overturning_moment"));
  CHECK(!directions["z"].contains("overturning_moment"));
}

TEST_CASE("a rod has neither gravity nor uplift nor overturning") {
  const Json seismic = json_of(checked(shaken_rod(2)))["seismic"];
  CHECK(keys_of(seismic["bars"][0]) == Keys{"bar", "seismic", "tension", "compression"});
  CHECK(keys_of(seismic["reactions"][0]) == Keys{"node", "seismic"});
  CHECK(keys_of(seismic["reactions"][0]["seismic"]) == Keys{"x"});
  CHECK(!seismic["by_direction"]["x"].contains("overturning_moment"));
}

TEST_CASE("a tower without damping bands or seismic request leaves their keys out") {
  const Json json = json_of(checked(tower_with({})));
  CHECK(keys_of(json) == Keys{"swaymark", "title", "input", "model", "mass", "mass_matrix", "modes",
                              "completeness", "verdicts", "notes"});
  CHECK(!json["modes"][0].contains("damping"));
  CHECK(!json["mass"]["ledger"][0].contains("label"));
}

TEST_CASE("modes alone leave out bands seismic response and verdicts") {
  const Json json = json_of(harbour_light(Scope::modes));
  CHECK(keys_of(json) ==
        Keys{"swaymark", "title", "input", "model", "mass", "mass_matrix", "modes", "completeness", "notes"});
}

TEST_CASE("motions of one kind are written as one entry with every motion") {
  // Two bars that swing about their held feet.
  const Analysis analysis =
      checked(tower_with({"nodes: {a: [0, 0], b: [2, 0], c: [1, 1], d: [3, 1]}",
                          "members: [{group: g, section: bar, material: steel, bars: [[a, c], [b, d]]}]"}));
  const Json json = json_of(analysis);
  REQUIRE(json["mechanisms"].size() == 1);
  const Json& mechanism = json["mechanisms"][0];
  CHECK(mechanism["count"] == 2);
  REQUIRE(mechanism["motions"].size() == 2);
  CHECK(mechanism["motions"][0] == mechanism["motion"]);
  CHECK(keys_of(mechanism["motions"][1]) == Keys{"d"});
}

TEST_CASE("a mechanism is written with its motion and cures in place of modes") {
  const Json json = json_of(checked(swinging_bar()));
  CHECK(keys_of(json) ==
        Keys{"swaymark", "title", "input", "model", "mass", "mass_matrix", "mechanisms", "notes"});
  CHECK(!json["mass"].contains("moving"));
  REQUIRE(json["mechanisms"].size() == 1);
  const Json& mechanism = json["mechanisms"][0];
  CHECK(keys_of(mechanism) == Keys{"kind", "count", "motion", "cures"});
  CHECK(mechanism["count"] == 1);
  CHECK(!mechanism["cures"].empty());
  REQUIRE(keys_of(mechanism["motion"]) == Keys{"c"});
  // Square to the bar, which rises at 45 degrees.
  const double x = mechanism["motion"]["c"]["x"].get<double>();
  CHECK_THAT(x + mechanism["motion"]["c"]["z"].get<double>(), is_near(0.0, 0.0, kSolved));
  CHECK(std::abs(x) > 0.5);
}

TEST_CASE("every scenario has its label and its whole result") {
  const Study study = lone_mass_study(
      "[{label: heavy, masses: [{nodes: [c], mass: 600000 kg}]}, {label: loose, supports: [{nodes: [a], "
      "fixed: [x, "
      "z]}]}, {label: held, supports: [{nodes: [a, b, c], fixed: [x, z]}]}]");
  const auto root = nlohmann::json::parse(json_report(study, false));
  REQUIRE(root["scenarios"].size() == 3);
  const auto& heavy = root["scenarios"][0];
  CHECK(heavy["label"] == "heavy");
  for (const char* key :
       {"model", "mass", "mass_matrix", "modes", "completeness", "bands", "seismic", "verdicts", "notes"}) {
    INFO(key);
    CHECK(heavy.contains(key));
  }
  CHECK(heavy["modes"][0]["frequency"] == study.scenarios[0].analysis->frequency(0));
  CHECK(root["scenarios"][1].contains("mechanisms"));
  CHECK(root["scenarios"][2]["failure"] == study.scenarios[2].failure);
  CHECK_FALSE(nlohmann::json::parse(json_report(study.stated, false)).contains("scenarios"));
}

TEST_CASE("there is no number that is none and none that does not read back the same") {
  for (const Analysis& a : {harbour_light(), checked(shaken_rod(1)), planar(), checked(swinging_bar())}) {
    const std::string text = json_report(a, true);
    visit(Json::parse(text), [](const Json& value) { CHECK(!value.is_null()); });
    CHECK(text.find("nan") == std::string::npos);
    CHECK(nlohmann::ordered_json::parse(text).dump(2) + "\n" == text);
  }
}

TEST_CASE("numbers stand in the shortest form that reads back the same") {
  const std::string text = json_report(harbour_light(), false);
  CHECK(has_line(text, {"\"from\": 0.06,"}));
  CHECK(has_line(text, {"\"damping\": 0.02,"}));
}

TEST_CASE("words with quotes and many alphabets come back whole and a file name in bytes is made readable") {
  Tower tower = tower_of(tower_with({"title: 'a \"quoted\" \\ \u00e9\u03a6 tower'"}));
  Provenance provenance = kStated;
  provenance.file = "mast-\xff.yaml";
  const Json json = json_of(analyse(std::move(tower), provenance, Scope::check));
  CHECK(json["title"] == "a \"quoted\" \\ \u00e9\u03a6 tower");
  CHECK(json["input"]["file"] == "mast-\ufffd.yaml");
}

TEST_CASE("the base study is a list from soft to rigid") {
  const Json json = json_of(checked(lone_mass({"base_study: [20 kN/mm, 1000 kN/mm]"})));
  const Json& rows = json["base_study"];
  REQUIRE(rows.size() == 8);
  CHECK(keys_of(rows[0]) == Keys{"stiffness", "frequencies", "bound"});
  CHECK(rows[0]["stiffness"] == 20e6);
  // One mass on springs in series, all of them weightless: the bound is the frequency.
  CHECK_THAT(rows[0]["bound"].get<double>(), is_near(rows[0]["frequencies"][0].get<double>(), kSolved));
  CHECK(keys_of(rows[7]) == Keys{"frequencies"});
  CHECK_THAT(rows[7]["frequencies"][0].get<double>(), is_near(lone_frequency(), kSolved));
}

TEST_CASE("ice and liquid stand in the ledger and the parts of the liquid beside it") {
  const Analysis analysis =
      checked(tower_with({"sections: {bar: {area: 10 cm2, perimeter: 0.4 m}}",
                          "masses: [{group: all, ice: 20 mm, density: 900, label: glaze}, "
                          "{nodes: [c], liquid: {radius: 1 m, depth: 1 m, density: 1000}, label: water}]",
                          "modes: {count: 2}"}));
  const Json json = json_of(analysis, true);
  const Json& ledger = json["mass"]["ledger"];
  REQUIRE(ledger.size() == 3);
  CHECK(ledger[1]["origin"] == "ice");
  CHECK(ledger[1]["group"] == "all");
  CHECK(ledger[1]["label"] == "glaze");
  CHECK(ledger[2]["origin"] == "liquid");
  CHECK(ledger[2]["label"] == "water");
  double sum = 0.0;
  for (const Json& entry : ledger) sum += entry["mass"].get<double>();
  CHECK_THAT(sum, is_near(json["mass"]["total"].get<double>(), kRoundoff));
  const Json& liquid = json["mass"]["liquids"][0];
  CHECK(keys_of(liquid) == Keys{"label", "mass", "impulsive", "convective", "spring", "frequency"});
  CHECK_THAT(liquid["impulsive"].get<double>() + liquid["convective"].get<double>(),
             is_near(ledger[2]["mass"].get<double>(), kRoundoff));
  CHECK(json["model"]["nodes"] == 3);
  CHECK(json["modes"][0]["character"] == "liquid");
  CHECK(keys_of(json["modes"][0]["shape"]) == Keys{"a", "b", "c", "water"});
}

}  // namespace swaymark::test
