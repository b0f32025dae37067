#include "core/unit_library.hpp"

#include "tests/support/matchers.hpp"

namespace swaymark::test {

using unit_library::factor_to;
using unit_library::Outcome;

TEST_CASE("a unit of the wanted dimension is converted") {
  const auto foot = factor_to("ft", "m");
  CHECK(foot.outcome == Outcome::converted);
  CHECK_THAT(foot.to_si, is_near(0.3048, kRoundoff));  // exact by definition (NIST SP 811, from memory)
}

TEST_CASE("a unit of another dimension is told from an unknown one") {
  CHECK(factor_to("kip", "kg").outcome == Outcome::other_dimension);
  CHECK(factor_to("blorp", "kg").outcome == Outcome::unknown_unit);
  CHECK(factor_to("", "m").outcome == Outcome::other_dimension);
}

TEST_CASE("a reciprocal unit counts as another dimension") {
  CHECK(factor_to("s", "Hz").outcome == Outcome::other_dimension);
}

TEST_CASE("a unit with an offset has no factor") {
  CHECK(factor_to("degC", "K").outcome == Outcome::not_proportional);
}

TEST_CASE("a logarithmic unit has no factor") {
  CHECK(factor_to("lg(re 1 m)", "m").outcome == Outcome::not_proportional);
}

}  // namespace swaymark::test
