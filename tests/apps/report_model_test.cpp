#include "apps/report_model.hpp"

#include <catch2/catch.hpp>

#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("the model is repeated as it was understood") {
  const std::string text = on_one_line(model_section(checked(tower_with({}))));
  CHECK_THAT(text,
             Catch::Contains("2 dimensions, 3 nodes, 2 bars, 2 free degrees of freedom, consistent mass"));
  CHECK_THAT(text, Catch::Contains("x 0.00 to 2.00 m, z 0.00 to 1.00 m"));
  CHECK_THAT(text, Catch::Contains("Support at a, b: fixed x z"));
}

TEST_CASE("each group is repeated with the length of its bars and its section and material in handy units") {
  const std::string text = model_section(checked(tower_with({})));
  CHECK(
      has_line(text, {"  g ", " 2 ", "2.83", "bar", " 10 ", "steel", "210", "7850"}));  // 2 sqrt(2) m, 10 cm2
}

TEST_CASE("springs are repeated with their stiffness") {
  const std::string text =
      model_section(checked(tower_with({"supports: [{nodes: [a, b], fixed: [x], springs: {z: 120 MN/m}}]"})));
  CHECK_THAT(text, Catch::Contains("Support at a, b: fixed x; springs z 120 MN/m") ||
                       Catch::Contains("Support at a, b: fixed x; spring z 120 MN/m"));
}

TEST_CASE("spectra are repeated with their points and whether they are used") {
  const std::string spectra =
      "spectra: {quay: {damping: 5 %, points: [[0 s, 0.1 g], [0.5 s, 0.25 g]]}, spare: {points: [[0 s, 0.1 "
      "g], "
      "[1 s, 0.2 g]], interpolation: linear}}";
  const std::string lines =
      on_one_line(model_section(checked(lone_mass({spectra, "seismic: {spectrum: {x: quay}}"}))));
  CHECK_THAT(lines,
             Catch::Contains("Spectrum quay, 5 % damping, linear interpolation: 0 s 0.1 g, 0.5 s 0.25 g"));
  CHECK_THAT(lines, Catch::Contains("Spectrum spare (not used)"));
  CHECK(lines.find("quay (not used)") == std::string::npos);
}

TEST_CASE("modes alone repeat no spectrum") {
  const Analysis analysis = harbour_light(Scope::modes);
  CHECK(model_section(analysis).find("Spectrum") == std::string::npos);
  CHECK_THAT(model_section(harbour_light()), Catch::Contains("Spectrum quay"));
}

TEST_CASE("very many supports of one kind are cut and counted") {
  Tower tower = bare_tower(2);
  const std::size_t top = add_node(tower, {0.0, 0.0, 5.0});
  for (int i = 0; i < 15; ++i) {
    const std::size_t foot = add_node(tower, {1.0 * i, 0.0, 0.0});
    fix(tower, foot);
    add_bar(tower, foot, top);
  }
  CHECK_THAT(on_one_line(model_section(checked(tower))), Catch::Contains("and 3 more: fixed x z"));
}

}  // namespace swaymark::test
