#include "core/tower_file_damping.hpp"

#include <catch2/catch.hpp>

#include "tests/core/tower_text.hpp"

namespace swaymark::test {

TEST_CASE("damping is one ratio for every mode or a list mode by mode") {
  CHECK(tower_of(tower_with({})).damping.empty());
  CHECK(tower_of(tower_with({"damping: 2 %"})).damping == std::vector<double>{0.02});
  CHECK(tower_of(tower_with({"damping: [1 %, 0.03]"})).damping == std::vector<double>{0.01, 0.03});
}

TEST_CASE("damping of critical or more is refused where it stands") {
  CHECK(refusals_with("damping: [1 %, 2]") == Refusals{"8:16 'damping' is a fraction, and '2' is 200 %"});
  CHECK(refusals_with("damping: []").size() == 1);
}

}  // namespace swaymark::test
