#include "modal/repeated_modes.hpp"

#include <numbers>

#include <Eigen/Geometry>

#include "modal/participation.hpp"
#include "tests/support/models.hpp"

namespace swaymark::test {

namespace {

// The sway pair of the square mast, turned within its subspace as a solver might by chance.
Modes turned_by(const Modes& modes, double angle) {
  Modes turned = modes;
  const Eigen::Rotation2Dd rotation(angle);
  turned.shapes.leftCols(2) = modes.shapes.leftCols(2) * rotation.toRotationMatrix();
  return turned;
}

const std::vector<double> kAngles{0.0, 0.4, 1.1, 0.5 * std::numbers::pi, 2.0, 3.0, 4.5};

}  // namespace

TEST_CASE("turned shapes of a sway pair take one direction each") {
  const Model model = model_of(regular_mast({}));
  const Modes modes = model.problem().lowest(6);
  for (const double angle : kAngles) {
    const Modes turned = turn_repeated(model.stiffness(), model.mass(), turned_by(modes, angle), model.drive);
    const Eigen::MatrixXd gamma = participation(turned.shapes, model.drive);
    const double whole = gamma.topRows(2).norm();
    INFO("turned by " << angle);
    CHECK(std::abs(gamma(0, 1)) < kSolved * whole);
    CHECK(std::abs(gamma(1, 0)) < kSolved * whole);
    CHECK_THAT(std::abs(gamma(0, 0)), is_near(std::abs(gamma(1, 1)), kSolved));
  }
}

TEST_CASE("turned shapes do not depend on how the solver turned them") {
  const Model model = model_of(regular_mast({}));
  const Modes modes = model.problem().lowest(6);
  const Modes expected = turn_repeated(model.stiffness(), model.mass(), modes, model.drive);
  for (const double angle : kAngles) {
    INFO("turned by " << angle);
    const Modes turned = turn_repeated(model.stiffness(), model.mass(), turned_by(modes, angle), model.drive);
    for (Index j = 0; j < 2; ++j) {
      // Up to sign: where several components are the largest, rounding picks the one that is made positive.
      const double same = turned.shapes.col(j).dot(model.mass() * expected.shapes.col(j));
      CHECK_THAT(std::abs(same), is_near(1.0, kSolved));
    }
  }
}

TEST_CASE("a repeated pair that no direction drives is turned to the same shapes all the same") {
  const Model model = model_of(regular_mast({}));
  const Modes modes = model.problem().lowest(6);
  const Eigen::MatrixXd nothing = Eigen::MatrixXd::Zero(model.mass().rows(), 3);
  const Modes expected = turn_repeated(model.stiffness(), model.mass(), modes, nothing);
  for (const double angle : kAngles) {
    const Modes turned = turn_repeated(model.stiffness(), model.mass(), turned_by(modes, angle), nothing);
    for (Index j = 0; j < 2; ++j) {
      CHECK_THAT(std::abs(turned.shapes.col(j).dot(model.mass() * expected.shapes.col(j))),
                 is_near(1.0, kSolved));
    }
  }
}

TEST_CASE("turning keeps the subspace and the sum of effective masses of every repeated mode") {
  for (const int legs : {3, 4, 6}) {
    Mast mast;
    mast.legs = legs;
    mast.turn = 0.7;
    const Model model = model_of(regular_mast(mast));
    const Modes modes = model.problem().lowest(20);
    const Modes turned = turn_repeated(model.stiffness(), model.mass(), modes, model.drive);
    CHECK_THAT(turned.shapes, m_orthonormal(model.mass()));
    CHECK_THAT(turned.shapes, same_subspace(modes.shapes, model.mass()));
    check_same_modes(turned, oracle_of(model), model.mass());
    const Eigen::MatrixXd before = participation(modes.shapes, model.drive);
    const Eigen::MatrixXd after = participation(turned.shapes, model.drive);
    CHECK_THAT((after.transpose() * after).eval(), matrix_near(before.transpose() * before, kSolved));
  }
}

TEST_CASE("turned shapes keep unit modal mass and small residuals and a positive largest component") {
  const Model model = model_of(regular_mast({}));
  const Modes turned =
      turn_repeated(model.stiffness(), model.mass(), turned_by(model.problem().lowest(8), 0.9), model.drive);
  CHECK_THAT(turned.shapes, m_orthonormal(model.mass()));
  for (Index j = 0; j < turned.count(); ++j) {
    INFO("mode " << j + 1);
    CHECK(turned.residual(j) < kSolved);
    CHECK(turned.shapes.col(j).maxCoeff() >= -turned.shapes.col(j).minCoeff());
  }
  CHECK(turned.omega(0) == turned.omega(1));
}

TEST_CASE("single modes are left as they are") {
  std::mt19937 random(51);
  const Model model = model_of(random_truss(3, 15, random));
  const Modes modes = model.problem().lowest(12);
  const Modes turned = turn_repeated(model.stiffness(), model.mass(), modes, model.drive);
  CHECK(turned.shapes == modes.shapes);
  CHECK(turned.omega == modes.omega);
}

TEST_CASE("modes a millionth apart are not taken for a repeated mode") {
  SparseMatrix stiffness(2, 2);
  stiffness.insert(0, 0) = 1.0;
  stiffness.insert(1, 1) = 1.0 + 2e-6;
  SparseMatrix mass(2, 2);
  mass.setIdentity();
  const Eigen::MatrixXd drive = Eigen::Vector2d(1.0, 1.0);
  const Modes modes = Eigenproblem(stiffness, mass).lowest(2);
  CHECK(turn_repeated(stiffness, mass, modes, drive).shapes == modes.shapes);
}

}  // namespace swaymark::test
