#include "apps/report_base.hpp"

#include <fmt/format.h>

#include "apps/report_text.hpp"
#include "core/liquid.hpp"
#include "tests/apps/cases.hpp"

namespace swaymark::test {

namespace {

const std::string kTank =
    "masses: [{nodes: [c], liquid: {radius: 2 m, depth: 2 m, density: 1000}, label: water}]";

}  // namespace

TEST_CASE("the base study is a table from soft to rigid") {
  const Analysis analysis = checked(lone_mass({"base_study: [20 kN/mm, 1000 kN/mm]"}));
  const std::string text = base_study_section(analysis);
  CHECK(has_line(text, {"STIFFNESS OF THE BASE"}));
  CHECK(has_line(text, {"20 "}));
  CHECK(has_line(text, {"1000 "}));
  CHECK(has_line(text, {"rigid", fmt::format("{:.3f}", lone_frequency()), "100.0"}));
  CHECK(on_one_line(text).find("2 supports fixed along z") != std::string::npos);
  CHECK(text_report(analysis, {}).find(text) != std::string::npos);
}

TEST_CASE("a report without a base study does not speak of one") {
  CHECK(text_report(checked(lone_mass()), {}).find("STIFFNESS OF THE BASE") == std::string::npos);
}

TEST_CASE("the springs of a pad are reported with what they came from") {
  const Analysis analysis = checked(tower_with(
      {"supports: [{nodes: [a, b], pad: {length: 3, width: 2, shear_modulus: 60 MPa, poisson: 0.3}}]"}));
  const std::string text = on_one_line(text_report(analysis, {}));
  CHECK(text.find("from a pad of 3 x 2 m, G = 60 MPa, nu = 0.3") != std::string::npos);
  CHECK(text.find(fmt::format("z {:.4g} MN/m", 1e-6 * analysis.tower.supports[0].spring[2])) !=
        std::string::npos);
}

TEST_CASE("a liquid is reported with its two masses and its own frequency") {
  const Analysis analysis = checked(tower_with({kTank, "modes: {count: 2}"}));
  const LiquidSplit split = split_liquid(analysis.tower.liquids.at(0));
  const std::string words = on_one_line(liquids_text(analysis.tower));
  CHECK(words.find("Liquid water, radius 2 m, depth 2 m: 25132.7 kg") != std::string::npos);
  CHECK(words.find(fmt::format("convective {:.1f} kg", split.convective)) != std::string::npos);
  CHECK(words.find("0.466 Hz by itself") != std::string::npos);  // sqrt(8.584) / 2 pi
  const std::string text = on_one_line(text_report(analysis, {}));
  CHECK(text.find(words.substr(1)) != std::string::npos);
  CHECK(text.find("3 nodes, 2 bars") != std::string::npos);
}

TEST_CASE("a rigid liquid is said to move with its nodes") {
  const Tower tower = tower_of(
      tower_with({"masses: [{nodes: [c], liquid: {radius: 2 m, depth: 2 m, density: 1000, rigid: true}}]"}));
  CHECK(on_one_line(liquids_text(tower)).find("all of it moving with the nodes") != std::string::npos);
}

}  // namespace swaymark::test
