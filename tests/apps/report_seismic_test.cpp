#include "apps/report_seismic.hpp"

#include <catch2/catch.hpp>

#include "apps/figure.hpp"
#include "apps/report_parts.hpp"
#include "core/quantity.hpp"
#include "tests/apps/cases.hpp"

namespace swaymark::test {

TEST_CASE("the rules of combination are told with the figures") {
  Tower tower = tower_of(lone_mass({kFlatSpectrum, kAlongX}));
  CHECK_THAT(on_one_line(seismic_section(checked(tower))), Catch::Contains("by CQC") &&
                                                               Catch::Contains("by SRSS") &&
                                                               Catch::Contains("missing mass added"));
  tower.seismic->modes = ModalRule::absolute_sum;
  tower.seismic->directions = DirectionalRule::percent_30;
  tower.seismic->missing_mass = false;
  tower.seismic->factor = 1.4;
  CHECK_THAT(on_one_line(seismic_section(checked(tower))),
             Catch::Contains("by absolute sum") && Catch::Contains("by 100-30") &&
                 Catch::Contains("missing mass not added") && Catch::Contains("1.4"));
}

TEST_CASE("base shear and reactions of one shaken mass stand as computed by hand") {
  const std::string text = seismic_section(checked(lone_mass({kFlatSpectrum, kAlongX})));
  const double weight = 150'000.0 * kStandardGravity;
  const double sway = 0.2 * weight;
  CHECK(has_line(text, {"  1 ", figure(1.0 / lone_frequency(), 4), "0.2000", kilo(sway)}));
  CHECK(has_line(text, {"  x ", "flat", kilo(sway), kilo(sway), "0.0"}));
  // Each bar, at 45 degrees, takes half of the weight and half of the sway over sin 45.
  CHECK(has_line(text, {"g-1", "a to c", kilo(-weight / std::sqrt(2.0)), kilo(sway / std::sqrt(2.0)), "0.00",
                        kilo((weight + sway) / std::sqrt(2.0))}));
  CHECK(has_line(text, {"  a ", kilo(weight / 2.0), kilo(sway / 2.0), kilo((weight + sway) / 2.0), "0.00"}));
}

TEST_CASE("the most loaded bars come first and are counted") {
  const Analysis analysis = harbour_light();
  const std::string text = seismic_section(analysis);
  CHECK_THAT(text, Catch::Contains("10 of 68"));
  double largest = 0.0;
  std::string name;
  for (Index b = 0; b < analysis.seismic->bar_force.size(); ++b) {
    const Extremes e = bar_extremes(analysis.seismic->bar_gravity(b), analysis.seismic->bar_force(b));
    const double most = std::max(e.tension, e.compression);
    if (most > largest) name = analysis.tower.bar_name(static_cast<std::size_t>(b));
    largest = std::max(largest, most);
  }
  const auto lines = lines_of(text);
  const auto unit = std::find_if(lines.begin(), lines.end(), [](const std::string& line) {
    return line.find("between nodes") != std::string::npos && line.find("[kN]") != std::string::npos;
  });
  REQUIRE(unit != lines.end());
  CHECK_THAT(*(unit + 1), Catch::Contains(name + " ") && Catch::Contains(kilo(largest)));
}

TEST_CASE("a rod shows neither gravity nor uplift at its support") {
  const std::string text = seismic_section(checked(shaken_rod(1)));
  CHECK(text.find("uplift") == std::string::npos);
  CHECK(text.find("down") == std::string::npos);
  CHECK(has_line(text, {"x ", "flat", " - "}));  // no overturning
}

TEST_CASE("a spectrum along z alone is told without an overturning moment") {
  const std::string text =
      seismic_section(checked(lone_mass({kFlatSpectrum, "seismic: {spectrum: {z: flat}}"})));
  CHECK(has_line(text, {"  z ", "flat", " - "}));
  CHECK(text.find("Sa x") == std::string::npos);
}

TEST_CASE("a spring foot shows only the axes in which it holds") {
  const std::string text = seismic_section(checked(
      lone_mass({"supports: [{nodes: [a], fixed: [x, z]}, {nodes: [b], springs: {x: 50 MN/m, z: 90 MN/m}}, "
                 "{nodes: [c], springs: {x: 50 MN/m}}]",
                 kFlatSpectrum, kAlongX})));
  const auto lines = lines_of(text);
  const auto at = std::find_if(lines.rbegin(), lines.rend(),
                               [](const std::string& line) { return line.starts_with("  c "); });
  REQUIRE(at != lines.rend());
  CHECK(std::count(at->begin(), at->end(), '-') >= 2);
}

TEST_CASE("the rigid row holds what the missing mass adds and is left out where it adds nothing") {
  Tower tower = shaken_rod(1);
  const Analysis analysis = checked(tower);
  const double missing = analysis.seismic->directions[0].missing_mass_ratio * analysis.set.moving(0);
  CHECK(has_line(seismic_section(analysis), {"rigid", kilo(missing * 1.0)}));  // at 1 m/s2
  tower.seismic->missing_mass = false;
  CHECK(seismic_section(checked(tower)).find("rigid") == std::string::npos);
}

}  // namespace swaymark::test
