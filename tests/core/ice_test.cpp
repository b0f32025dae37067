#include "core/ice.hpp"

#include <cmath>
#include <numbers>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

IceMass glaze(double thickness, std::optional<double> from = {}, std::optional<double> to = {}) {
  return {std::nullopt, thickness, 900.0, from, to, "", {}};
}

// A post from z = 0 to 4 m, a beam at z = 4 m and a beam at z = 0.
Tower frame() {
  Tower tower = bare_tower(3);
  tower.sections[0].perimeter = 0.5;
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {0.0, 0.0, 4.0});
  add_node(tower, {3.0, 0.0, 4.0});
  add_node(tower, {3.0, 0.0, 0.0});
  add_bar(tower, 0, 1);
  add_bar(tower, 1, 2);
  add_bar(tower, 0, 3);
  return tower;
}

}  // namespace

TEST_CASE("ice on a circular bar weighs what ISO 12494 gives for glaze") {
  // 900 pi t (t + d) for d = 100 mm: ISO 12494 classes G1 to G5 (from memory), to the digit printed.
  const std::vector<std::pair<double, double>> published{
      {0.010, 3.1}, {0.020, 6.8}, {0.030, 11.0}, {0.040, 15.8}, {0.050, 21.2}};
  for (const auto& [thickness, mass] : published) {
    INFO(thickness);
    CHECK_THAT(ice_per_length(glaze(thickness), 0.1 * std::numbers::pi), is_near(mass, 0.0, 0.05));
  }
}

TEST_CASE("ice around a circle is the ring between two circles") {
  const double d = 0.137;
  const double t = 0.023;
  const double ring = std::numbers::pi * (std::pow(0.5 * d + t, 2) - std::pow(0.5 * d, 2));
  CHECK_THAT(ice_per_length(glaze(t), std::numbers::pi * d), is_near(900.0 * ring, kRoundoff));
}

TEST_CASE("a bar carries the share of its length that lies within the heights") {
  const Tower tower = frame();
  const Bar& post = tower.bars[0];
  CHECK(iced_share(tower, glaze(0.02), post) == 1.0);
  CHECK(iced_share(tower, glaze(0.02, 1.0), post) == 0.75);
  CHECK(iced_share(tower, glaze(0.02, {}, 1.0), post) == 0.25);
  CHECK(iced_share(tower, glaze(0.02, 1.0, 3.0), post) == 0.5);
  CHECK(iced_share(tower, glaze(0.02, -5.0, 9.0), post) == 1.0);
  CHECK(iced_share(tower, glaze(0.02, 4.0, 9.0), post) == 0.0);
  CHECK(iced_share(tower, glaze(0.02, 5.0, 9.0), post) == 0.0);
}

TEST_CASE("a level bar belongs to one of two ranges that meet at its height") {
  const Tower tower = frame();
  const Bar& beam = tower.bars[1];
  CHECK(iced_share(tower, glaze(0.02, 1.0, 4.0), beam) == 1.0);
  CHECK(iced_share(tower, glaze(0.02, 4.0, 9.0), beam) == 0.0);
  CHECK(iced_share(tower, glaze(0.02, 1.0, 3.9), beam) == 0.0);
  // Nothing lies below the lowest level that could have it.
  CHECK(iced_share(tower, glaze(0.02, 0.0, 4.0), tower.bars[2]) == 1.0);
}

TEST_CASE("ranges that meet add up to the ice of the whole") {
  const Tower tower = frame();
  for (const Bar& bar : tower.bars) {
    const double whole = ice_on_bar(tower, glaze(0.02), bar, 3.0);
    const double parts = ice_on_bar(tower, glaze(0.02, 0.0, 1.3), bar, 3.0) +
                         ice_on_bar(tower, glaze(0.02, 1.3, 4.0), bar, 3.0);
    CHECK(whole > 0.0);
    CHECK_THAT(parts, is_near(whole, kRoundoff));
  }
}

TEST_CASE("ice of another group lies on none of a bar") {
  const Tower tower = frame();
  IceMass ice = glaze(0.02);
  ice.group = 0;
  CHECK(ice_on_bar(tower, ice, tower.bars[0], 4.0) > 0.0);
  ice.group = 1;
  CHECK(ice_on_bar(tower, ice, tower.bars[0], 4.0) == 0.0);
}

}  // namespace swaymark::test
