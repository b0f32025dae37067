#include "modal/inertia.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

namespace {

Index below(const Oracle& oracle, double omega_squared) {
  return (oracle.omega.array().square() < omega_squared).count();
}

// The count is claimed for the shift that was counted at, which lies at or hardly above the one asked for.
void check_count(const Model& model, const Oracle& oracle, double asked) {
  INFO("shift " << asked);
  const auto counted = count_modes_below(model.stiffness(), model.mass(), asked);
  REQUIRE(counted.has_value());
  CHECK(counted->omega_squared >= asked);
  CHECK(counted->omega_squared <= asked * (1.0 + 1e-5));  // at most a few steps of a millionth
  CHECK(counted->below == below(oracle, counted->omega_squared));
}

}  // namespace

TEST_CASE("modes below random shifts are counted right on random trusses") {
  std::mt19937 random(11);
  for (const int dimensions : {1, 2, 3}) {
    const Model model = model_of(random_truss(dimensions, 60 / dimensions, random));
    const Oracle oracle = oracle_of(model);
    std::uniform_real_distribution<double> exponent(std::log(0.5 * oracle.omega(0)),
                                                    std::log(1.5 * oracle.omega.maxCoeff()));
    for (int i = 0; i < 100; ++i) check_count(model, oracle, std::pow(std::exp(exponent(random)), 2));
  }
}

TEST_CASE("modes are counted right a millionth to either side of every frequency") {
  std::mt19937 random(12);
  const Model model = model_of(random_truss(3, 20, random));
  const Oracle oracle = oracle_of(model);
  for (Index j = 0; j < oracle.omega.size(); ++j) {
    const double square = std::pow(oracle.omega(j), 2);
    check_count(model, oracle, square * (1.0 - 1e-6));
    check_count(model, oracle, square * (1.0 + 1e-6));
  }
}

TEST_CASE("a repeated pair counts twice as soon as the shift has passed it") {
  const Model model = model_of(regular_mast({}));
  const Oracle oracle = oracle_of(model);
  const double pair = std::pow(oracle.omega(0), 2);
  REQUIRE_THAT(oracle.omega(1), is_near(oracle.omega(0), kTwoSolvers));
  CHECK(count_modes_below(model.stiffness(), model.mass(), pair * (1.0 - 1e-6))->below == 0);
  CHECK(count_modes_below(model.stiffness(), model.mass(), pair * (1.0 + 1e-6))->below == 2);
}

TEST_CASE("the count is right where a shift makes a diagonal entry vanish on a regular lattice") {
  // Without pivoting the factorisation divides by that entry: the shifts on which it is most often wrong.
  for (const int legs : {3, 4, 6}) {
    for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped}) {
      Mast mast;
      mast.legs = legs;
      mast.panels = 5;
      mast.top_radius = mast.radius;
      Tower tower = regular_mast(mast);
      tower.mass_scheme = scheme;
      const Model model = model_of(tower);
      const Oracle oracle = oracle_of(model);
      const Eigen::VectorXd stiffness = model.stiffness().diagonal();
      const Eigen::VectorXd mass = model.mass().diagonal();
      INFO("legs " << legs << ", scheme " << name_of(scheme));
      Index given = 0;
      for (Index j = 0; j < mass.size(); ++j) {
        const auto counted = count_modes_below(model.stiffness(), model.mass(), stiffness(j) / mass(j));
        if (!counted) continue;  // saying nothing is allowed, a wrong count is not
        // A shift on a frequency to rounding has no right count.
        const auto distance = (oracle.omega.array().square() / counted->omega_squared - 1.0).abs().minCoeff();
        if (distance < 1e-11) continue;
        ++given;
        INFO("degree of freedom " << j);
        CHECK(counted->below == below(oracle, counted->omega_squared));
      }
      CHECK(given > mass.size() / 2);
    }
  }
}

TEST_CASE("degrees of freedom without mass count no mode") {
  const Model model = model_of(massless_mast(4, 3));
  CHECK(count_modes_below(model.stiffness(), model.mass(), 1e-3)->below == 0);
  CHECK(count_modes_below(model.stiffness(), model.mass(), 1e14)->below == 12);
}

TEST_CASE("no mode lies below zero and all lie below a frequency beyond the last") {
  const Model model = model_of(rod(7, 10.0, MassScheme::consistent));
  CHECK(count_modes_below(model.stiffness(), model.mass(), 0.0)->below == 0);
  CHECK(count_modes_below(model.stiffness(), model.mass(), 1e12)->below == 7);
}

TEST_CASE("a count at a shift that is no number is not given") {
  const Model model = model_of(rod(7, 10.0, MassScheme::consistent));
  CHECK_FALSE(count_modes_below(model.stiffness(), model.mass(), std::numeric_limits<double>::infinity()));
  CHECK_FALSE(count_modes_below(model.stiffness(), model.mass(), std::numeric_limits<double>::quiet_NaN()));
}

}  // namespace swaymark::test
