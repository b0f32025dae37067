#include "spectrum/seismic.hpp"

#include "spectrum/combine_modes.hpp"
#include "tests/spectrum/shaken.hpp"

namespace swaymark::test {

namespace {

using List = std::vector<Index>;

}  // namespace

TEST_CASE("an oscillator takes its mass times the ordinate at its period") {
  Tower tower = massless(1);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  carry(tower, add_node(tower, {1.0, 0.0, 0.0}), 500.0);
  add_bar(tower, 0, 1);
  const double period = kTurn / std::sqrt(kStiff / 500.0);
  excite(tower, Axis::x, {{0.0, 1.0}, {2.0 * period, 4.0}});
  const SeismicResult result = shake(tower);
  REQUIRE(result.directions.size() == 1);
  const DirectionResult& x = result.directions.front();
  CHECK(x.axis == Axis::x);
  CHECK(x.spectrum == "spectrum 1");
  CHECK_THAT(x.acceleration(0), is_near(2.5, kSolved));
  CHECK(x.zero_period_acceleration == 1.0);
  CHECK_THAT(x.modal_base_shear(0), is_near(1250.0, kSolved));
  CHECK_THAT(x.base_shear, is_near(1250.0, kSolved));
  CHECK_FALSE(x.overturning_moment.has_value());
  CHECK_THAT(x.missing_mass_ratio, is_near(0.0, 0.0, kSolved));
  CHECK_THAT(result.displacement(0), is_near(1250.0 / kStiff, kSolved));
  CHECK_THAT(result.bar_force(0), is_near(1250.0, kSolved));
  CHECK_THAT(result.reaction(0), is_near(1250.0, kSolved));
}

TEST_CASE("two storeys combine every response from its own modal values") {
  // By hand, in units of m and m/k: bar 2 carries 4/3 Sa1 and -1/3 Sa2, node 1 moves 4/3 Sa1 and 1/6 Sa2,
  // node 2 moves 8/3 Sa1 and -1/6 Sa2.
  const TwoStoreys storeys;
  const SeismicResult result = shake(storeys.excited(1.0, 20.0));
  const double m = storeys.m;
  const double soft = m / storeys.k;
  const double rho = cqc_correlation(1.0, 2.0, 0.05, 0.05);  // omega2 / omega1 = 2
  const auto cqc = [rho](double a, double b) { return std::sqrt(a * a + b * b + 2.0 * rho * a * b); };
  const DirectionResult& x = result.directions.front();
  CHECK_THAT(x.modal_base_shear(0), is_near(8.0 / 3.0 * m, kSolved));
  CHECK_THAT(x.modal_base_shear(1), is_near(20.0 / 3.0 * m, kSolved));
  CHECK_THAT(x.base_shear, is_near(m * cqc(8.0 / 3.0, 20.0 / 3.0), kSolved));
  CHECK_THAT(x.bar_force(0), is_near(m * cqc(8.0 / 3.0, 20.0 / 3.0), kSolved));
  CHECK_THAT(x.bar_force(1), is_near(m * cqc(4.0 / 3.0, -20.0 / 3.0), kSolved));
  CHECK_THAT(x.displacement(0), is_near(soft * cqc(4.0 / 3.0, 20.0 / 6.0), kSolved));
  CHECK_THAT(x.displacement(1), is_near(soft * cqc(8.0 / 3.0, -20.0 / 6.0), kSolved));
  CHECK_THAT(x.reaction(0), is_near(x.base_shear, kSolved));
}

TEST_CASE("the force of a bar is far from what combined displacements would give") {
  const TwoStoreys storeys;
  const SeismicResult result = shake(storeys.excited(1.0, 20.0));
  const double from_combined = storeys.k * (result.displacement(1) - result.displacement(0));
  CHECK(result.bar_force(1) > 5.0 * from_combined);
}

TEST_CASE("every modal rule is applied to every response") {
  const TwoStoreys storeys;
  Tower tower = storeys.excited(1.0, 20.0);
  tower.seismic->modes = ModalRule::srss;
  const DirectionResult srss = shake(tower).directions.front();
  CHECK_THAT(srss.base_shear, is_near(storeys.m * std::hypot(8.0 / 3.0, 20.0 / 3.0), kSolved));
  CHECK_THAT(srss.bar_force(1), is_near(storeys.m * std::hypot(4.0 / 3.0, 20.0 / 3.0), kSolved));
  CHECK_THAT(srss.displacement(1),
             is_near(storeys.m / storeys.k * std::hypot(8.0 / 3.0, 20.0 / 6.0), kSolved));
  CHECK_THAT(srss.reaction(0), is_near(srss.base_shear, kSolved));
  tower.seismic->modes = ModalRule::absolute_sum;
  const DirectionResult sum = shake(tower).directions.front();
  CHECK_THAT(sum.base_shear, is_near(storeys.m * 28.0 / 3.0, kSolved));
  CHECK_THAT(sum.bar_force(1), is_near(storeys.m * 8.0, kSolved));
  CHECK_THAT(sum.displacement(1), is_near(storeys.m / storeys.k * 6.0, kSolved));
  CHECK_THAT(sum.reaction(0), is_near(sum.base_shear, kSolved));
}

TEST_CASE("the mass that is missing joins as one more term at the zero-period acceleration") {
  // One of two modes kept: 1/3 m of 3 m is missing and moves with the ground at 0.5 m/s2. Its static forces
  // on the nodes are those of the mode left out: 2/3 m and -1/3 m.
  const TwoStoreys storeys;
  Tower tower = storeys.excited(2.0, 0.5);
  tower.modes.count = 1;
  const DirectionResult with = shake(tower).directions.front();
  CHECK_THAT(with.missing_mass_ratio, is_near(1.0 / 9.0, kSolved));
  CHECK_THAT(with.base_shear, is_near(storeys.m * std::hypot(16.0 / 3.0, 0.5 / 3.0), kSolved));
  CHECK_THAT(with.bar_force(1), is_near(storeys.m * std::hypot(8.0 / 3.0, 0.5 / 3.0), kSolved));
  CHECK_THAT(with.displacement(1),
             is_near(storeys.m / storeys.k * std::hypot(16.0 / 3.0, 0.5 / 6.0), kSolved));
  CHECK_THAT(with.reaction(0), is_near(with.base_shear, kSolved));
  CHECK(with.modal_base_shear.size() == 1);
}

TEST_CASE("the mass that is missing is left out where the tower file says so but still counted") {
  const TwoStoreys storeys;
  Tower tower = storeys.excited(2.0, 0.5);
  tower.modes.count = 1;
  tower.seismic->missing_mass = false;
  const DirectionResult without = shake(tower).directions.front();
  CHECK_THAT(without.missing_mass_ratio, is_near(1.0 / 9.0, kSolved));
  CHECK_THAT(without.base_shear, is_near(storeys.m * 16.0 / 3.0, kSolved));
  CHECK_THAT(without.bar_force(1), is_near(storeys.m * 8.0 / 3.0, kSolved));
  CHECK_THAT(without.reaction(0), is_near(without.base_shear, kSolved));
}

TEST_CASE("a tower whose mass is all missing answers with the ground") {
  // A spectrum that is zero at the first period and 3 m/s2 at period zero leaves the residual alone.
  const TwoStoreys storeys;
  Tower tower = storeys.tower();
  excite(tower, Axis::x, {{0.0, 3.0}, {storeys.second_period / 2.0, 0.0}, {10.0, 0.0}});
  tower.modes.count = 1;
  const DirectionResult x = shake(tower).directions.front();
  CHECK(x.acceleration(0) == 0.0);
  CHECK_THAT(x.base_shear, is_near(storeys.m, kSolved));
}

TEST_CASE("the factor scales every seismic response and leaves gravity") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 2.0);
  const SeismicResult plain = shake(tower);
  tower.seismic->factor = 1.4;
  const SeismicResult scaled = shake(tower);
  const auto check = [](const Eigen::VectorXd& value, const Eigen::VectorXd& expected) {
    CHECK_THAT(Eigen::MatrixXd(value), matrix_near(expected, kSolved));
  };
  check(scaled.bar_force, 1.4 * plain.bar_force);
  check(scaled.displacement, 1.4 * plain.displacement);
  check(scaled.reaction, 1.4 * plain.reaction);
  check(scaled.bar_gravity, plain.bar_gravity);
  check(scaled.reaction_gravity, plain.reaction_gravity);
  CHECK_THAT(scaled.directions[0].base_shear, is_near(1.4 * plain.directions[0].base_shear, kSolved));
  CHECK_THAT(*scaled.directions[0].overturning_moment,
             is_near(1.4 * *plain.directions[0].overturning_moment, kSolved));
}

TEST_CASE("ordinates are corrected by the damping of each mode") {
  const TwoStoreys storeys;
  Tower tower = storeys.excited(1.0, 20.0);
  tower.damping = {0.02, 0.10};
  tower.spectra.front().damping = 0.05;
  tower.spectra.front().damping_correction = true;
  const DirectionResult x = shake(tower).directions.front();
  CHECK_THAT(x.acceleration(0), is_near(std::sqrt(10.0 / 7.0), kSolved));
  CHECK_THAT(x.acceleration(1), is_near(20.0 * std::sqrt(10.0 / 15.0), kSolved));
  CHECK(x.zero_period_acceleration == 20.0);
}

TEST_CASE("modes outside the table of a spectrum are listed by the end they lie beyond") {
  const TwoStoreys storeys;
  Tower tower = storeys.tower();
  excite(tower, Axis::x, {{1.1 * storeys.second_period, 5.0}, {0.9 * storeys.first_period, 3.0}});
  const DirectionResult beyond = shake(tower).directions.front();
  CHECK(beyond.below_table == List{1});
  CHECK(beyond.above_table == List{0});
  CHECK(beyond.acceleration(0) == 3.0);
  CHECK(beyond.acceleration(1) == 5.0);
  tower.spectra.front().points = {{0.9 * storeys.second_period, 5.0}, {1.1 * storeys.first_period, 3.0}};
  const DirectionResult within = shake(tower).directions.front();
  CHECK(within.below_table.empty());
  CHECK(within.above_table.empty());
}

TEST_CASE("directions are combined for each response by itself under every rule") {
  // Legs 1 and 2 feel x alone, 3 and 4 feel y alone, and all feel z: each has a major direction of its own.
  const FourLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 3.0);
  excite(tower, Axis::y, 2.0);
  excite(tower, Axis::z, 1.0);
  const double unit = legs.m * legs.length();
  const double x = 3.0 * unit / (2.0 * legs.a);
  const double y = 2.0 * unit / (2.0 * legs.a);
  const double z = 1.0 * unit / (4.0 * legs.h);
  const auto forces = [&](DirectionalRule rule) {
    tower.seismic->directions = rule;
    return shake(tower).bar_force;
  };
  const auto check = [](const Eigen::MatrixXd& value, double leg_x, double leg_y) {
    CHECK_THAT(value, matrix_near(vector_of({leg_x, leg_x, leg_y, leg_y}), kSolved));
  };
  check(forces(DirectionalRule::srss), std::hypot(x, z), std::hypot(y, z));
  check(forces(DirectionalRule::percent_30), x + 0.3 * z, y + 0.3 * z);
  check(forces(DirectionalRule::percent_40), x + 0.4 * z, y + 0.4 * z);
}

TEST_CASE("displacements and reactions are combined over directions as bar forces are") {
  const FourLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 3.0);
  excite(tower, Axis::y, 2.0);
  tower.seismic->directions = DirectionalRule::percent_30;
  const SeismicResult result = shake(tower);
  const double sway = kStiff / legs.length() * 2.0 * std::pow(legs.a / legs.length(), 2);
  CHECK_THAT(Eigen::MatrixXd(result.displacement),
             matrix_near(vector_of({3.0 * legs.m / sway, 2.0 * legs.m / sway, 0.0}), kSolved));
  // Foot 1, in the plane of x: half of the push along x, and its lever upwards.
  CHECK_THAT(Eigen::MatrixXd(result.reaction.head(3)),
             matrix_near(vector_of({1.5 * legs.m, 0.0, 1.5 * legs.m * legs.h / legs.a}), kSolved));
  REQUIRE(result.directions.size() == 2);
  CHECK(result.directions[0].axis == Axis::x);
  CHECK(result.directions[1].axis == Axis::y);
  CHECK(result.directions[1].spectrum == "spectrum 2");
}

TEST_CASE("a direction without a spectrum is not excited") {
  const FourLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::y, 2.0);
  const SeismicResult result = shake(tower);
  REQUIRE(result.directions.size() == 1);
  CHECK(result.directions.front().axis == Axis::y);
  CHECK(result.bar_force(0) <= kSolved * result.bar_force(2));
}

TEST_CASE("nothing is shaken where the spectrum is zero") {
  const TwoLegs legs;
  Tower tower = legs.tower();
  excite(tower, Axis::x, 0.0);
  tower.seismic->modes = ModalRule::srss;
  const SeismicResult result = shake(tower);
  CHECK(result.bar_force == Eigen::Vector2d::Zero());
  CHECK(result.directions.front().base_shear == 0.0);
}

}  // namespace swaymark::test
