#include "core/wording_lattice.hpp"

#include <string>

#include <catch2/catch.hpp>

#include "tests/core/messages.hpp"

namespace swaymark::test {

TEST_CASE("every message on lattices says what is wrong and what would cure it") {
  using namespace wording;
  check_sentences({lattice_needs_space(2), lattice_without_material(), lattice_too_high(2.0, 1.0),
                   lattice_too_many_nodes(2.0, 1), k_without_horizontals(), k_down_without_horizontals(true),
                   k_down_without_horizontals(false), diamond_without_mid_nodes(),
                   triangle_is_rigid_in_plan()});
}

TEST_CASE("dimensions of a panel cannot flood a message or break its line") {
  for (const std::string& text : {std::string("1 mm"), std::string(10'000, 'x') + "\n\x1B[31m"})
    check_sentences({wording::legs_meet(text, 0.001), wording::panel_too_low(text, 0.001)});
}

}  // namespace swaymark::test
