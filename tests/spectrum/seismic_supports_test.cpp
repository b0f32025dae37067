#include "spectrum/seismic.hpp"
#include "tests/spectrum/shaken.hpp"

namespace swaymark::test {

TEST_CASE("a mass on two legs has the forces and moments that follow by hand") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 3.0);
  const SeismicResult result = shake(tower);
  const double force = legs.m * 3.0;
  const double along_leg = force * legs.length() / (2.0 * legs.a);
  CHECK_THAT(result.directions.front().base_shear, is_near(force, kSolved));
  CHECK_THAT(*result.directions.front().overturning_moment, is_near(force * legs.h, kSolved));
  CHECK_THAT(Eigen::MatrixXd(result.bar_force), matrix_near(vector_of({along_leg, along_leg}), kSolved));
  // Feet: x then z of each.
  const double pair = force * legs.h / (2.0 * legs.a);
  CHECK_THAT(Eigen::MatrixXd(result.reaction),
             matrix_near(vector_of({force / 2.0, pair, force / 2.0, pair}), kSolved));
  const double sway = kStiff / legs.length() * 2.0 * std::pow(legs.a / legs.length(), 2);
  CHECK_THAT(Eigen::MatrixXd(result.displacement), matrix_near(vector_of({force / sway, 0.0}), kSolved));
}

TEST_CASE("gravity presses both legs and their feet by half the weight") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 3.0);
  const SeismicResult result = shake(tower);
  const double half = legs.m * 9.80665 / 2.0;
  const double leg = -half * legs.length() / legs.h;
  CHECK_THAT(Eigen::MatrixXd(result.bar_gravity), matrix_near(vector_of({leg, leg}), kSolved));
  const double thrust = half * legs.a / legs.h;
  CHECK_THAT(Eigen::MatrixXd(result.reaction_gravity),
             matrix_near(vector_of({thrust, half, -thrust, half}), kSolved));
}

TEST_CASE("a foot lifts where the seismic pull beats half the weight") {
  // F h / 2a against m g / 2: lifts from Sa = g a / h on.
  const TwoLegs legs;
  const double balance = 9.80665 * legs.a / legs.h;
  for (const double share : {0.99, 1.01}) {
    Tower tower = legs.tower();
    excite(tower, Axis::x, share * balance);
    const SeismicResult result = shake(tower);
    for (const Index foot : {Index{1}, Index{3}}) {
      CHECK(result.supports[static_cast<std::size_t>(foot)].axis == Axis::z);
      CHECK_THAT(result.reaction(foot) - result.reaction_gravity(foot),
                 is_near((share - 1.0) * legs.m * 9.80665 / 2.0, kSolved));
    }
  }
}

TEST_CASE("the weight of bars goes to their ends and that of a carried mass at a support straight into it") {
  TwoLegs legs;
  Tower tower = legs.tower();
  tower.materials.front().density = 7850.0;
  carry(tower, 0, 120.0);
  excite(tower, Axis::x, 3.0);
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    tower.mass_scheme = scheme;
    const SeismicResult result = shake(tower);
    const double bar = 7850.0 * 1e-3 * legs.length();
    const double apex = 9.80665 * (legs.m + bar);
    const double foot = 9.80665 * bar / 2.0;
    const double leg = -apex / 2.0 * legs.length() / legs.h;
    CHECK_THAT(Eigen::MatrixXd(result.bar_gravity), matrix_near(vector_of({leg, leg}), kSolved));
    CHECK_THAT(result.reaction_gravity(1), is_near(apex / 2.0 + foot + 9.80665 * 120.0, kSolved));
    CHECK_THAT(result.reaction_gravity(3), is_near(apex / 2.0 + foot, kSolved));
  }
}

TEST_CASE("a tripod carries a third of the weight in each leg and shares a push by its plan") {
  // Legs at 0, 120 and 240 degrees: under F along x the first takes 2/3 F / sin(beta), the others half of it.
  constexpr double a = 1.2;
  constexpr double h = 3.0;
  constexpr double m = 900.0;
  Tower tower = massless(3);
  for (const double turn : {0.0, 1.0, 2.0})
    fix(tower, add_node(tower, {a * std::cos(kTurn * turn / 3.0), a * std::sin(kTurn * turn / 3.0), 0.0}));
  carry(tower, add_node(tower, {0.0, 0.0, h}), m);
  for (std::size_t leg = 0; leg < 3; ++leg) add_bar(tower, leg, 3);
  excite(tower, Axis::x, 2.0);
  const SeismicResult result = shake(tower);
  const double slope = std::hypot(a, h);
  const double weight = -m * 9.80665 / 3.0 * slope / h;
  CHECK_THAT(Eigen::MatrixXd(result.bar_gravity), matrix_near(vector_of({weight, weight, weight}), kSolved));
  const double push = m * 2.0 * slope / a;
  CHECK_THAT(Eigen::MatrixXd(result.bar_force),
             matrix_near(vector_of({2.0 / 3.0 * push, push / 3.0, push / 3.0}), kSolved));
  CHECK_THAT(*result.directions.front().overturning_moment, is_near(m * 2.0 * h, kSolved));
}

TEST_CASE("vertical excitation presses all legs alike and overturns nothing") {
  const FourLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::z, 1.5);
  const SeismicResult result = shake(tower);
  REQUIRE(result.directions.size() == 1);
  const DirectionResult& z = result.directions.front();
  CHECK(z.axis == Axis::z);
  CHECK_THAT(z.base_shear, is_near(legs.m * 1.5, kSolved));
  CHECK_FALSE(z.overturning_moment.has_value());
  const double leg = legs.m * 1.5 / 4.0 * legs.length() / legs.h;
  CHECK_THAT(Eigen::MatrixXd(result.bar_force), matrix_near(vector_of({leg, leg, leg, leg}), kSolved));
  for (std::size_t i = 0; i < result.supports.size(); ++i) {
    if (result.supports[i].axis == Axis::z)
      CHECK_THAT(result.reaction(static_cast<Index>(i)), is_near(legs.m * 1.5 / 4.0, kSolved));
  }
}

TEST_CASE("a tower in the plane shakes vertically without swaying") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::z, 1.5);
  const SeismicResult result = shake(tower);
  const double leg = legs.m * 1.5 / 2.0 * legs.length() / legs.h;
  CHECK_THAT(Eigen::MatrixXd(result.bar_force), matrix_near(vector_of({leg, leg}), kSolved));
  CHECK_THAT(result.displacement(0), is_near(0.0, 0.0, kSolved * result.displacement(1)));
}

TEST_CASE("a tower of one dimension has no gravity") {
  const SeismicResult result = shake(TwoStoreys{}.excited(1.0, 2.0));
  CHECK(result.bar_gravity == Eigen::Vector2d::Zero());
  CHECK(result.reaction_gravity == Eigen::VectorXd::Zero(1));
}

TEST_CASE("springs under the feet give the reactions that fixed feet give where statics alone decide") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 3.0);
  for (Support& support : tower.supports) {
    support.fixed = {true, false, false};
    support.spring = {0.0, 0.0, 5e7};
  }
  const SeismicResult result = shake(tower);
  REQUIRE(result.supports.size() == 4);
  CHECK(result.supports[1].free >= 0);
  CHECK(result.supports[1].fixed < 0);
  const double force = legs.m * 3.0;
  const double pair = force * legs.h / (2.0 * legs.a);
  CHECK_THAT(Eigen::MatrixXd(result.reaction),
             matrix_near(vector_of({force / 2.0, pair, force / 2.0, pair}), kSolved));
  const double half = legs.m * 9.80665 / 2.0;
  const double thrust = half * legs.a / legs.h;
  CHECK_THAT(Eigen::MatrixXd(result.reaction_gravity),
             matrix_near(vector_of({thrust, half, -thrust, half}), kSolved));
}

TEST_CASE("a spring to the ground lengthens the period and carries the whole base shear") {
  // Two springs in series: 1/k = 1/k_bar + 1/k_ground.
  Tower tower = massless(1);
  add_node(tower, {0.0, 0.0, 0.0});
  carry(tower, add_node(tower, {1.0, 0.0, 0.0}), 500.0);
  add_bar(tower, 0, 1);
  Support ground;
  ground.spring[0] = kStiff / 3.0;
  tower.supports.push_back(ground);
  const double series = kStiff / 4.0;
  const double period = kTurn / std::sqrt(series / 500.0);
  excite(tower, Axis::x, {{0.0, 0.0}, {2.0 * period, 4.0}});
  const SeismicResult result = shake(tower);
  CHECK_THAT(result.directions.front().acceleration(0), is_near(2.0, kSolved));
  CHECK_THAT(result.reaction(0), is_near(1000.0, kSolved));
  CHECK_THAT(Eigen::MatrixXd(result.displacement),
             matrix_near(vector_of({1000.0 / (kStiff / 3.0), 1000.0 / series}), kSolved));
}

TEST_CASE("a mass at a support takes no part in the base shear") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 3.0);
  const SeismicResult plain = shake(tower);
  carry(tower, 0, 5000.0);
  const SeismicResult loaded = shake(tower);
  CHECK_THAT(loaded.directions[0].base_shear, is_near(plain.directions[0].base_shear, kSolved));
  CHECK_THAT(Eigen::MatrixXd(loaded.reaction), matrix_near(plain.reaction, kSolved));
  CHECK_THAT(loaded.directions[0].missing_mass_ratio, is_near(0.0, 0.0, kSolved));
}

}  // namespace swaymark::test
