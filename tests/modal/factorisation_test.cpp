#include "modal/factorisation.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

namespace {

SparseMatrix sparse(const Eigen::MatrixXd& dense) { return dense.sparseView(); }

}  // namespace

TEST_CASE("a factorisation solves for many right-hand sides at once") {
  std::mt19937 random(1);
  const Model model = model_of(random_truss(3, 20, random));
  const Factorisation factor(model.stiffness());
  REQUIRE(factor.usable());
  CHECK(factor.size() == 60);
  const Eigen::MatrixXd expected = Eigen::MatrixXd::Random(60, 5);
  CHECK_THAT(factor.solve(model.stiffness() * expected), matrix_near(expected, kSolved));
}

TEST_CASE("forward and backward substitution split the inverse of the stiffness in two") {
  std::mt19937 random(2);
  const Model model = model_of(random_truss(2, 15, random));
  const Factorisation factor(model.stiffness());
  const Index n = factor.size();
  Eigen::MatrixXd inverse(n, n);
  Eigen::MatrixXd congruence(n, n);
  for (Index j = 0; j < n; ++j) {
    const Eigen::VectorXd unit = Eigen::VectorXd::Unit(n, j);
    inverse.col(j) = factor.backward(factor.forward(unit));
    congruence.col(j) = factor.forward(model.stiffness() * factor.backward(unit));
  }
  CHECK_THAT(inverse, matrix_near(factor.solve(Eigen::MatrixXd::Identity(n, n)), kSolved));
  // L^-1 P K PT L^-T = I
  CHECK_THAT(congruence, matrix_near(Eigen::MatrixXd::Identity(n, n), kSolved));
}

TEST_CASE("a factorisation of one unknown is its square root") {
  const Factorisation factor(sparse(Eigen::MatrixXd::Constant(1, 1, 4.0)));
  REQUIRE(factor.usable());
  CHECK(factor.forward(Eigen::VectorXd::Ones(1))(0) == 0.5);
  CHECK(factor.backward(Eigen::VectorXd::Ones(1))(0) == 0.5);
}

TEST_CASE("a matrix that is not positive definite gives a factorisation that is not usable") {
  Eigen::Matrix2d indefinite;
  indefinite << 1.0, 2.0, 2.0, 1.0;
  Eigen::Matrix2d singular;
  singular << 1.0, -1.0, -1.0, 1.0;
  CHECK_FALSE(Factorisation(sparse(indefinite)).usable());
  CHECK_FALSE(Factorisation(sparse(singular)).usable());
}

}  // namespace swaymark::test
