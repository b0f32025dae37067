#include "core/pad.hpp"

#include <cmath>
#include <numbers>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("a square pad is nearly a disc of the same area") {
  // Rigid disc on a half-space, exact upright: K_z = 4 G R / (1 - nu), K_x = 8 G R / (2 - nu) (from memory).
  // A square stirs a little more ground than the disc of its area: up to 5 % more stiffness, common practice.
  constexpr double modulus = 60e6;
  for (const double nu : {0.0, 0.2, 0.3, 0.49}) {
    for (const double side : {0.5, 2.0, 6.0}) {
      INFO("nu " << nu << ", side " << side);
      const double radius = side / std::sqrt(std::numbers::pi);
      const PadSprings springs = pad_springs({side, side, modulus, nu});
      const double disc_z = 4.0 * modulus * radius / (1.0 - nu);
      const double disc_x = 8.0 * modulus * radius / (2.0 - nu);
      CHECK(springs.z > disc_z);
      CHECK(springs.z < 1.05 * disc_z);
      CHECK(springs.x > disc_x);
      CHECK(springs.x < 1.05 * disc_x);
      CHECK_THAT(springs.y, is_near(springs.x, kRoundoff));
    }
  }
}

TEST_CASE("a square pad has the springs of the formulas by hand") {
  // G B = 60 MN/m, nu = 0.3: K_z = 60 / 0.7 * 4.7 = 402.86 MN/m, K_x = 60 / 1.7 * 9.2 = 324.71 MN/m.
  const PadSprings springs = pad_springs({2.0, 2.0, 60e6, 0.3});
  CHECK_THAT(springs.z, is_near(402.857e6, 0.0, 0.0005e6));
  CHECK_THAT(springs.x, is_near(324.706e6, 0.0, 0.0005e6));
}

TEST_CASE("a turned pad exchanges its horizontal springs") {
  const PadSprings along = pad_springs({4.0, 2.0, 60e6, 0.3});
  const PadSprings across = pad_springs({2.0, 4.0, 60e6, 0.3});
  CHECK(along.x == across.y);
  CHECK(along.y == across.x);
  CHECK(along.z == across.z);
  // Square to its long side a pad is the stiffer.
  CHECK(along.y > along.x);
}

TEST_CASE("springs grow with the modulus and with the size of a pad in proportion") {
  const PadSprings one = pad_springs({3.0, 2.0, 50e6, 0.25});
  const PadSprings stiffer = pad_springs({3.0, 2.0, 100e6, 0.25});
  const PadSprings larger = pad_springs({6.0, 4.0, 50e6, 0.25});
  for (const auto axis : {&PadSprings::x, &PadSprings::y, &PadSprings::z}) {
    CHECK_THAT(stiffer.*axis, is_near(2.0 * one.*axis, kRoundoff));
    CHECK_THAT(larger.*axis, is_near(2.0 * one.*axis, kRoundoff));
  }
}

}  // namespace swaymark::test
