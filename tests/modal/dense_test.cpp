#include "modal/dense.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

TEST_CASE("the dense solver gives reciprocals of squared frequencies and the largest first") {
  std::mt19937 random(3);
  const Model model = model_of(random_truss(3, 12, random));
  const Oracle oracle = oracle_of(model);
  const ReciprocalPairs pairs = solve_dense(Factorisation(model.stiffness()), model.mass(), 36);
  REQUIRE(pairs.converged);
  REQUIRE(pairs.mu.size() == 36);
  for (Index j = 0; j < 36; ++j) {
    INFO("pair " << j);
    CHECK_THAT(1.0 / std::sqrt(pairs.mu(j)), is_near(oracle.omega(j), kTwoSolvers));
  }
  CHECK_THAT((pairs.v.transpose() * pairs.v).eval(),
             matrix_near(Eigen::MatrixXd::Identity(36, 36), kRoundoff));
}

TEST_CASE("the dense solver hands out as many pairs as are asked for") {
  const Model model = model_of(rod(10, 10.0, MassScheme::consistent));
  const ReciprocalPairs few = solve_dense(Factorisation(model.stiffness()), model.mass(), 3);
  const ReciprocalPairs all = solve_dense(Factorisation(model.stiffness()), model.mass(), 10);
  REQUIRE(few.mu.size() == 3);
  CHECK(few.v.cols() == 3);
  CHECK_THAT(few.mu, matrix_near(all.mu.head(3), kRoundoff));
}

TEST_CASE("degrees of freedom without mass end up as zero reciprocals in the dense solver") {
  const Model model = model_of(massless_mast(4, 2));
  const Index n = model.mass().rows();
  const ReciprocalPairs pairs = solve_dense(Factorisation(model.stiffness()), model.mass(), n);
  CHECK(pairs.mu(11) > 1e-6 * pairs.mu(0));  // four top nodes of three axes each
  for (Index j = 12; j < n; ++j) CHECK(std::abs(pairs.mu(j)) <= kRoundoff * pairs.mu(0));
}

}  // namespace swaymark::test
