#include "core/wording_bases.hpp"

#include <catch2/catch.hpp>

#include "tests/core/messages.hpp"

namespace swaymark::test {

TEST_CASE("every message on pads and base studies says what is wrong and what would cure it") {
  using namespace wording;
  check_sentences({pad_in_one_dimension(), pad_beside("fixed"), pad_too_slender(20.0, 10.0),
                   pad_without_stiffness(), poisson_out_of_range(0.7), study_is_a_range("a map"),
                   study_reversed(2.0, 1.0), study_of_nothing("z"), stabilised_twice("m1", {7, 3}),
                   stabilise_without_bars("m1"), nothing_to_stabilise("m1")});
}

TEST_CASE("faults of springs that stabilise name the node and the way out") {
  CHECK_THAT(wording::stabilised_twice("m1", {7, 3}).what,
             Catch::Contains("'m1'") && Catch::Contains("line 7"));
  CHECK_THAT(wording::nothing_to_stabilise("m1").what, Catch::Contains("'m1'"));
  CHECK_THAT(wording::stabilise_without_bars("m1").what, Catch::Contains("no bar joins node 'm1'"));
  CHECK_THAT(wording::nothing_to_stabilise("m1").cure, Catch::Contains("bar"));
}

}  // namespace swaymark::test
