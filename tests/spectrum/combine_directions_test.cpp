#include "spectrum/combine_directions.hpp"

#include "tests/support/matchers.hpp"

namespace swaymark::test {

TEST_CASE("three directions of 3 and 2 and 1 combine to 3.742 by SRSS and 3.9 by 100-30 and 4.2 by 100-40") {
  // EN 1998-1:2004 4.3.3.5 and US NRC RG 1.92, from memory; the figures follow by hand.
  const auto one = [](double value) { return Eigen::VectorXd::Constant(1, value); };
  const std::vector<Eigen::VectorXd> peaks{one(3.0), one(2.0), one(1.0)};
  CHECK_THAT(combine_directions(peaks, DirectionalRule::srss)(0), is_near(3.741657386773941, kRoundoff));
  CHECK_THAT(combine_directions(peaks, DirectionalRule::percent_30)(0), is_near(3.9, kRoundoff));
  CHECK_THAT(combine_directions(peaks, DirectionalRule::percent_40)(0), is_near(4.2, kRoundoff));
}

TEST_CASE("the major direction is found for every response by itself") {
  Eigen::Vector2d x(3.0, 1.0);
  Eigen::Vector2d y(1.0, 3.0);
  const Eigen::VectorXd combined = combine_directions({x, y}, DirectionalRule::percent_30);
  CHECK_THAT(combined(0), is_near(3.3, kRoundoff));
  CHECK_THAT(combined(1), is_near(3.3, kRoundoff));
}

TEST_CASE("a single direction stays what it is under every rule") {
  const Eigen::VectorXd only = Eigen::VectorXd::LinSpaced(4, 0.0, 3.0);
  for (const auto rule : {DirectionalRule::srss, DirectionalRule::percent_30, DirectionalRule::percent_40})
    CHECK_THAT(Eigen::MatrixXd(combine_directions({only}, rule)), matrix_near(only, kRoundoff));
}

}  // namespace swaymark::test
