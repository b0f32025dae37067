#include "modal/participation.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

TEST_CASE("participation is the projection of the drive on every shape") {
  Eigen::MatrixXd shapes(2, 2);
  shapes << 1.0, 2.0, 3.0, 4.0;
  Eigen::MatrixXd drive(2, 1);
  drive << 10.0, 100.0;
  CHECK(participation(shapes, drive) == Eigen::Vector2d(310.0, 420.0));
}

TEST_CASE("the mass is solved for with zeros where there is none") {
  SparseMatrix mass(3, 3);
  mass.insert(0, 0) = 2.0;
  mass.insert(2, 2) = 5.0;
  mass.makeCompressed();
  const Eigen::MatrixXd solution = solve_mass(mass, Eigen::Vector3d(4.0, 0.0, 10.0));
  CHECK(solution == Eigen::Vector3d(2.0, 0.0, 2.0));
}

TEST_CASE("the mass is solved for where an entry without mass is stored") {
  SparseMatrix mass(2, 2);
  mass.insert(0, 0) = 2.0;
  mass.insert(1, 1) = 0.0;
  mass.makeCompressed();
  const Eigen::MatrixXd solution = solve_mass(mass, Eigen::Vector2d(4.0, 0.0));
  CHECK(solution == Eigen::Vector2d(2.0, 0.0));
}

TEST_CASE("the moving mass is the whole mass of nodes that move on their own") {
  // Lumped: b = M r, so bT M^-1 b = rT M r.
  Tower tower = rod(5, 10.0, MassScheme::lumped);
  const Model model = model_of(tower);
  const double element = 7850.0 * 1e-3 * 2.0;
  CHECK_THAT(moving_mass(model.mass(), model.drive)(0), is_near(4.5 * element, kRoundoff));
}

TEST_CASE("effective masses of all modes add up to the moving mass of a random truss") {
  std::mt19937 random(21);
  for (const int dimensions : {1, 2, 3}) {
    for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
      Tower tower = random_truss(dimensions, 15, random);
      tower.mass_scheme = scheme;
      const Model model = model_of(tower);
      const Modes modes = model.problem().lowest(model.mass().rows());
      REQUIRE(modes.status == ModesStatus::complete);
      const Eigen::VectorXd sums =
          participation(modes.shapes, model.drive).array().square().colwise().sum().transpose();
      CHECK_THAT(sums, matrix_near(moving_mass(model.mass(), model.drive), kSolved));
    }
  }
}

}  // namespace swaymark::test
