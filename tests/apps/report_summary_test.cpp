#include "apps/report_summary.hpp"

#include <algorithm>

#include <catch2/catch.hpp>
#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_parts.hpp"
#include "core/quantity.hpp"
#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("the summary shows the lowest frequencies with what moves") {
  const std::string text = on_one_line(summary_section(checked(lone_mass())));
  const std::string frequency = figure(lone_frequency(), 3);
  CHECK_THAT(text, Catch::Contains(frequency + " Hz (sway x), " + frequency + " Hz (vertical)"));
  CHECK(text.find("base shear") == std::string::npos);
}

TEST_CASE("the summary shows base shear and overturning of one shaken mass as computed by hand") {
  const std::string text = summary_section(checked(lone_mass({kFlatSpectrum, kAlongX})));
  // m Sa = 150 t times 0.2 g, 1 m above the feet
  const std::string force = kilo(150'000.0 * 0.2 * kStandardGravity);
  CHECK(has_line(text, {"base shear", "x " + force + " kN"}));
  CHECK(has_line(text, {"overturning", "x " + force + " kNm"}));
  CHECK(has_line(text, {"uplift", "none"}));
  CHECK(text.find("tension") == std::string::npos);  // gravity keeps both bars in compression
}

TEST_CASE("the largest bar forces of the summary are those of all bars") {
  const Analysis analysis = harbour_light();
  double tension = 0.0;
  double compression = 0.0;
  for (Index b = 0; b < analysis.seismic->bar_force.size(); ++b) {
    const Extremes e = bar_extremes(analysis.seismic->bar_gravity(b), analysis.seismic->bar_force(b));
    tension = std::max(tension, e.tension);
    compression = std::max(compression, e.compression);
  }
  const std::string text = summary_section(analysis);
  CHECK(has_line(text, {"largest tension", kilo(tension) + " kN in "}));
  CHECK(has_line(text, {"largest compression", kilo(compression) + " kN in "}));
}

TEST_CASE("the summary names the support that lifts most") {
  const Analysis analysis = harbour_light();
  double uplift = 0.0;
  std::string node;
  for (const NodeReaction& reaction : node_reactions(analysis)) {
    if (*reaction.uplift <= uplift) continue;
    uplift = *reaction.uplift;
    node = analysis.tower.nodes[reaction.node].name;
  }
  REQUIRE(uplift > 0.0);
  CHECK(has_line(summary_section(analysis), {"uplift", kilo(uplift) + " kN at node " + node, "4 of 4"}));
}

TEST_CASE("a rod has neither overturning nor uplift in its summary") {
  const std::string text = summary_section(checked(shaken_rod(1)));
  CHECK_THAT(text, Catch::Contains("base shear") && Catch::Contains("frequency"));
  CHECK(text.find("overturning") == std::string::npos);
  CHECK(text.find("uplift") == std::string::npos);
}

}  // namespace swaymark::test
