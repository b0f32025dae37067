#include "modal/damping.hpp"

#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("one damping ratio holds for every mode") {
  CHECK(modal_damping({0.02}, 4) == Eigen::VectorXd::Constant(4, 0.02));
}

TEST_CASE("a list of damping ratios goes mode by mode and its last value is held") {
  Eigen::VectorXd expected(5);
  expected << 0.01, 0.02, 0.05, 0.05, 0.05;
  CHECK(modal_damping({0.01, 0.02, 0.05}, 5) == expected);
}

TEST_CASE("damping ratios beyond the last mode are left out") {
  CHECK(modal_damping({0.01, 0.02, 0.05}, 2) == Eigen::Vector2d(0.01, 0.02));
  CHECK(modal_damping({0.01}, 0).size() == 0);
}

}  // namespace swaymark::test
