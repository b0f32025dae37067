#include "core/base_study.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

TEST_CASE("the range is walked in equal ratios from end to end") {
  const auto values = studied_stiffnesses({20e6, 1000e6, {}});
  REQUIRE(values.size() == 7);
  CHECK(values.front() == 20e6);
  CHECK(values.back() == 1000e6);
  for (std::size_t i = 2; i < values.size(); ++i)
    CHECK_THAT(values[i] / values[i - 1], is_near(values[1] / values[0], kRoundoff));
}

TEST_CASE("supports fixed upright get springs and everything else stays") {
  Tower tower = bare_tower(3);
  for (int i = 0; i < 3; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  fix(tower, 0);
  fix(tower, 1);
  tower.supports[1].fixed[2] = false;
  tower.supports[1].spring[2] = 7e6;
  REQUIRE(has_studied_support(tower));
  const Tower soft = on_leg_springs(tower, 3e7);
  CHECK(soft.supports[0].fixed == std::array{true, true, false});
  CHECK(soft.supports[0].spring == std::array{0.0, 0.0, 3e7});
  CHECK(soft.supports[1].spring == std::array{0.0, 0.0, 7e6});
  CHECK_FALSE(has_studied_support(soft));
}

TEST_CASE("a tower of one dimension gives way along the only axis it has") {
  Tower tower = rod(2, 3.0, MassScheme::consistent);
  CHECK(studied_axis(tower) == Axis::x);
  CHECK(on_leg_springs(tower, 5e6).supports.at(0).spring[0] == 5e6);
  tower.dimensions = 2;
  CHECK(studied_axis(tower) == Axis::z);
}

}  // namespace swaymark::test
