#include "modal/shift_invert.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

namespace {

Eigen::MatrixXd nothing_known(const Model& model) { return Eigen::MatrixXd(model.mass().rows(), 0); }

}  // namespace

TEST_CASE("shift and invert finds the pairs that the dense solver finds") {
  std::mt19937 random(4);
  const Model model = model_of(random_truss(3, 30, random));
  const Factorisation factor(model.stiffness());
  const ReciprocalPairs dense = solve_dense(factor, model.mass(), 10);
  const ReciprocalPairs lanczos = solve_shift_invert(factor, model.mass(), 10, nothing_known(model));
  REQUIRE(lanczos.converged);
  CHECK_THAT(lanczos.mu, matrix_near(dense.mu, kSolved));
  CHECK_THAT((lanczos.v.transpose() * lanczos.v).eval(),
             matrix_near(Eigen::MatrixXd::Identity(10, 10), kSolved));
}

TEST_CASE("shift and invert looks square to what is known") {
  std::mt19937 random(5);
  const Model model = model_of(random_truss(2, 40, random));
  const Factorisation factor(model.stiffness());
  const ReciprocalPairs dense = solve_dense(factor, model.mass(), 9);
  // Known: the first, the third and the fifth pair; the next four are 2, 4, 6, 7.
  Eigen::MatrixXd known(dense.v.rows(), 3);
  known << dense.v.col(0), dense.v.col(2), dense.v.col(4);
  const ReciprocalPairs rest = solve_shift_invert(factor, model.mass(), 4, known);
  REQUIRE(rest.converged);
  CHECK_THAT(rest.mu,
             matrix_near(Eigen::Vector4d(dense.mu(1), dense.mu(3), dense.mu(5), dense.mu(6)), kSolved));
  CHECK((known.transpose() * rest.v).cwiseAbs().maxCoeff() < kSolved);
}

TEST_CASE("a shift and invert run can be repeated to the last digit") {
  std::mt19937 random(6);
  const Model model = model_of(random_truss(3, 25, random));
  const Factorisation factor(model.stiffness());
  const ReciprocalPairs first = solve_shift_invert(factor, model.mass(), 6, nothing_known(model));
  const ReciprocalPairs second = solve_shift_invert(factor, model.mass(), 6, nothing_known(model));
  CHECK(first.mu == second.mu);
  CHECK(first.v == second.v);
}

TEST_CASE("shift and invert allows degrees of freedom without mass") {
  const Model model = model_of(massless_mast(4, 8));
  const Factorisation factor(model.stiffness());
  const ReciprocalPairs dense = solve_dense(factor, model.mass(), 4);
  const ReciprocalPairs lanczos = solve_shift_invert(factor, model.mass(), 4, nothing_known(model));
  REQUIRE(lanczos.converged);
  // A repeated pair may come once from here; what is found is true all the same.
  for (Index j = 0; j < 4; ++j) {
    CHECK((dense.mu.array() - lanczos.mu(j)).abs().minCoeff() <= kSolved * dense.mu(0));
  }
  CHECK_THAT(lanczos.mu(0), is_near(dense.mu(0), kSolved));
}

}  // namespace swaymark::test
