#include "modal/eigenproblem.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

namespace {

// Residuals of a solution through K^-1: rounding times the condition of a tower of a hundred unknowns.
constexpr double kResidual = 1e-9;

void check_well_formed(const Modes& modes, const Model& model) {
  CHECK_THAT(modes.shapes, m_orthonormal(model.mass()));
  for (Index j = 0; j < modes.count(); ++j) {
    INFO("mode " << j + 1);
    const Eigen::VectorXd shape = modes.shapes.col(j);
    Index largest = 0;
    shape.cwiseAbs().maxCoeff(&largest);
    CHECK(shape(largest) > 0.0);
    if (j > 0) CHECK(modes.omega(j) >= modes.omega(j - 1) * (1.0 - kRoundoff));
    const Eigen::VectorXd force = model.stiffness() * shape;
    const Eigen::VectorXd out = force - std::pow(modes.omega(j), 2) * (model.mass() * shape);
    CHECK_THAT(modes.residual(j), is_near(out.norm() / force.norm(), kSolved, kResidual));
    CHECK(modes.residual(j) < kResidual);
  }
}

}  // namespace

TEST_CASE("dense and shift and invert modes agree with another solver on random trusses") {
  std::mt19937 random(31);
  for (const int dimensions : {1, 2, 3}) {
    for (const int unknowns : {10, 30, 60, 120, 180, 300}) {
      INFO(dimensions << " dimensions, " << unknowns << " unknowns");
      const Model model = model_of(random_truss(dimensions, unknowns / dimensions, random));
      const Oracle oracle = oracle_of(model);
      const Eigenproblem problem = model.problem();
      // Lanczos needs room for the four more pairs that are sought.
      const Index count = unknowns < 60 ? 2 : 15;
      for (const EigenMethod method :
           {EigenMethod::dense, EigenMethod::shift_invert, EigenMethod::automatic}) {
        const Modes modes = problem.lowest(count, method);
        REQUIRE(modes.status == ModesStatus::complete);
        CHECK(modes.count() >= count);
        check_same_modes(modes, oracle, model.mass());
        check_well_formed(modes, model);
      }
    }
  }
}

TEST_CASE("all modes of a truss can be had in every mass scheme") {
  std::mt19937 random(32);
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    for (const int nodes : {4, 40, 70}) {
      Tower tower = random_truss(3, nodes, random);
      tower.mass_scheme = scheme;
      const Model model = model_of(tower);
      const Eigenproblem problem = model.problem();
      const Modes modes = problem.lowest(problem.mode_count());
      REQUIRE(modes.status == ModesStatus::complete);
      CHECK(modes.count() == 3 * nodes);
      check_same_modes(modes, oracle_of(model), model.mass());
      check_well_formed(modes, model);
    }
  }
}

TEST_CASE("more modes than there are gives all there are") {
  const Model model = model_of(rod(6, 10.0, MassScheme::consistent));
  const Eigenproblem problem = model.problem();
  const Modes modes = problem.lowest(1000);
  CHECK(modes.status == ModesStatus::complete);
  CHECK(modes.count() == 6);
  CHECK(problem.most_modes() == 6);
}

TEST_CASE("a factorisation made before gives the same modes to the last bit") {
  std::mt19937 random(5);
  const Model model = model_of(random_truss(3, 10, random));
  const auto factor = std::make_shared<const Factorisation>(model.stiffness());
  const Eigenproblem shared(model.stiffness(), model.mass(), factor);
  CHECK(&shared.factor() == factor.get());
  const Modes first = model.problem().lowest(5);
  const Modes second = shared.lowest(5);
  CHECK(first.omega == second.omega);
  CHECK(first.shapes == second.shapes);
}

TEST_CASE("one free degree of freedom has the frequency of its spring and mass") {
  Tower tower = rod(1, 2.0, MassScheme::lumped);
  const Model model = model_of(tower);
  const Modes modes = model.problem().lowest(1);
  REQUIRE(modes.status == ModesStatus::complete);
  REQUIRE(modes.count() == 1);
  // k = E A / L, m = rho A L / 2
  CHECK_THAT(modes.omega(0), is_near(std::sqrt(2.0 * 210e9 / 7850.0) / 2.0, kRoundoff));
  CHECK_THAT(modes.shapes(0, 0), is_near(1.0 / std::sqrt(7850.0 * 1e-3), kRoundoff));
  REQUIRE(modes.certificate.has_value());
  CHECK(modes.certificate->below == 1);
  CHECK(modes.certificate->omega > modes.omega(0));
}

TEST_CASE("a stiffness that is not positive definite is said by the status") {
  SparseMatrix stiffness(2, 2);
  stiffness.insert(0, 0) = 1.0;
  stiffness.insert(0, 1) = -1.0;
  stiffness.insert(1, 0) = -1.0;
  stiffness.insert(1, 1) = 1.0;
  SparseMatrix mass(2, 2);
  mass.setIdentity();
  for (const EigenMethod method : {EigenMethod::automatic, EigenMethod::dense, EigenMethod::shift_invert}) {
    const Modes modes = Eigenproblem(stiffness, mass).lowest(1, method);
    CHECK(modes.status == ModesStatus::not_positive_definite);
    CHECK_FALSE(modes.usable());
    CHECK(modes.count() == 0);
  }
}

TEST_CASE("a certificate counts the modes below a frequency that lies between two modes") {
  std::mt19937 random(33);
  const Model model = model_of(random_truss(3, 60, random));
  const Oracle oracle = oracle_of(model);
  const Eigenproblem problem = model.problem();
  for (Index count = 1; count <= 20; ++count) {
    const Modes modes = problem.lowest(count);
    REQUIRE(modes.certificate.has_value());
    const double omega = modes.certificate->omega;
    CHECK(omega > modes.omega(modes.count() - 1));
    CHECK((oracle.omega.array() < omega).count() == modes.certificate->below);
    CHECK(modes.certificate->below == modes.count());
  }
}

TEST_CASE("the first of given modes are certified afresh") {
  std::mt19937 random(34);
  const Model model = model_of(random_truss(2, 30, random));
  const Eigenproblem problem = model.problem();
  const Modes all = problem.lowest(20);
  for (Index count = 1; count <= all.count(); ++count) {
    const Modes some = problem.first(all, count);
    INFO(count);
    CHECK(some.status == ModesStatus::complete);
    CHECK(some.count() == count);
    CHECK(some.omega == all.omega.head(count));
    CHECK(some.certificate->below >= count);
  }
}

TEST_CASE("a set that is cut within a repeated pair is certified past its copy") {
  const Model model = model_of(regular_mast({}));
  const Eigenproblem problem = model.problem();
  const Modes pair = problem.lowest(1);
  REQUIRE(pair.count() == 2);  // the copy comes along
  const Modes one = problem.first(problem.lowest(6), 1);
  CHECK(one.count() == 1);
  CHECK(one.status == ModesStatus::complete);
  CHECK(one.certificate->below == 2);
}

TEST_CASE("a set of modes with a hole in it is not complete") {
  std::mt19937 random(35);
  const Model model = model_of(random_truss(3, 15, random));
  const Eigenproblem problem = model.problem();
  const Modes all = problem.lowest(10);
  Modes holed = all;
  holed.omega.segment(3, 6) = all.omega.segment(4, 6).eval();
  holed.shapes.middleCols(3, 6) = all.shapes.middleCols(4, 6).eval();
  CHECK(problem.first(holed, 8).status == ModesStatus::incomplete);
  CHECK(problem.first(holed, 2).status == ModesStatus::complete);
}

TEST_CASE("modes below a frequency are as many as another solver has") {
  std::mt19937 random(36);
  const Model model = model_of(random_truss(3, 15, random));
  const Oracle oracle = oracle_of(model);
  const Eigenproblem problem = model.problem();
  for (Index j = 1; j < oracle.omega.size(); ++j) {
    const double between = 0.5 * (oracle.omega(j - 1) + oracle.omega(j));
    CHECK(problem.below(between * between)->below == j);
  }
}

}  // namespace swaymark::test
