#include "core/strainless.hpp"

#include <catch2/catch.hpp>

namespace swaymark::test {

namespace {

// Springs in a row from one degree of freedom to the next: what each elongates by.
SparseMatrix chain(Index length, bool held) {
  SparseMatrix elongation(length - (held ? 0 : 1), length);
  if (held) elongation.insert(length - 1, 0) = 1.0;
  for (Index i = 0; i + 1 < length; ++i) {
    elongation.insert(i, i) = -1.0;
    elongation.insert(i, i + 1) = 1.0;
  }
  return elongation;
}

// Elongations of motions whose largest component is 1.
constexpr double kNothing = 1e-9;

}  // namespace

TEST_CASE("a chain that nothing holds moves as one and a held one does not move") {
  const StrainlessMotions motions = strainless_motions(chain(50, false));
  REQUIRE(motions.motions.size() == 1);
  CHECK(motions.complete);
  const Eigen::VectorXd& motion = motions.motions[0];
  CHECK((motion / motion(0) - Eigen::VectorXd::Ones(50)).cwiseAbs().maxCoeff() <= kNothing);
  CHECK(strainless_motions(chain(50, true)).motions.empty());
}

TEST_CASE(
    "motions that elongate nothing are as many as columns without a rank and each has its own component") {
  // Ten chains of five side by side.
  SparseMatrix elongation(40, 50);
  for (Index c = 0; c < 10; ++c) {
    for (Index i = 0; i < 4; ++i) {
      elongation.insert(4 * c + i, 5 * c + i) = -1.0;
      elongation.insert(4 * c + i, 5 * c + i + 1) = 1.0;
    }
  }
  const StrainlessMotions motions = strainless_motions(elongation);
  REQUIRE(motions.motions.size() == 10);
  for (const Eigen::VectorXd& motion : motions.motions) {
    CHECK((elongation * motion).cwiseAbs().maxCoeff() <= kNothing * motion.cwiseAbs().maxCoeff());
    CHECK((motion.cwiseAbs().array() > kNothing).count() == 5);
  }
}

TEST_CASE("a motion that hardly moves any one degree of freedom eliminated late is found") {
  // u1 = s u0 with s from a half to a ten-thousandth: the pivot of the second is of the size of s squared.
  for (const double s : {0.5, 1e-1, 1e-2, 1e-3, 1e-4}) {
    SparseMatrix elongation(1, 2);
    elongation.insert(0, 0) = s;
    elongation.insert(0, 1) = -1.0;
    INFO(s);
    REQUIRE(strainless_motions(elongation).motions.size() == 1);
    CHECK(std::abs((elongation * strainless_motions(elongation).motions[0])(0)) <= kNothing);
  }
}

TEST_CASE("nothing that elongates leaves every degree of freedom to move") {
  CHECK(strainless_motions(SparseMatrix(0, 3)).motions.size() == 3);
}

}  // namespace swaymark::test
