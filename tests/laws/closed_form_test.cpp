#include <numbers>

#include "tests/laws/whole.hpp"

/// Small structures whose answers are known by hand.
namespace swaymark::test {

namespace {

constexpr double kTurn = 2.0 * std::numbers::pi;
constexpr double kModulus = 210e9;

struct Pod {
  int legs = 4;
  double height = 8.0;
  double radius = 3.0;
  double area = 2e-3;
  double mass = 1500.0;

  [[nodiscard]] double length() const { return std::hypot(height, radius); }
  [[nodiscard]] double sine() const { return radius / length(); }  // of the angle to the vertical
  [[nodiscard]] double cosine() const { return height / length(); }
  [[nodiscard]] double axial() const { return kModulus * area / length(); }
};

// Weightless legs from a ring of fixed feet to one apex that carries the mass.
Tower tower_of_pod(const Pod& pod, double turn = 0.0) {
  Tower tower = bare_tower(3, pod.area);
  tower.materials.front().density = 0.0;
  const std::size_t apex = add_node(tower, {0.0, 0.0, pod.height});
  for (int k = 0; k < pod.legs; ++k) {
    const double angle = turn + kTurn * k / pod.legs;
    const std::size_t foot =
        add_node(tower, {pod.radius * std::cos(angle), pod.radius * std::sin(angle), 0.0});
    fix(tower, foot);
    add_bar(tower, foot, apex);
  }
  carry(tower, apex, pod.mass);
  return tower;
}

}  // namespace

TEST_CASE("a pod of legs sways and lifts at its closed-form frequencies") {
  // Kx = Ky = n/2 EA/L sin^2, Kz = n EA/L cos^2; the sway pair is exactly repeated. Derived.
  for (const int legs : {3, 4, 5, 6, 8, 12}) {
    for (const double turn : {0.0, 0.37}) {
      INFO(legs << " legs turned by " << turn);
      Pod pod;
      pod.legs = legs;
      Tower tower = tower_of_pod(pod, turn);
      ask_for_all_modes(tower);
      const Analysis analysis = analysed(tower);
      const double sway = std::sqrt(0.5 * legs * pod.axial() * std::pow(pod.sine(), 2) / pod.mass) / kTurn;
      const double lift = std::sqrt(legs * pod.axial() * std::pow(pod.cosine(), 2) / pod.mass) / kTurn;
      REQUIRE(analysis.mode_count() == 3);
      CHECK_THAT(analysis.frequency(0), is_near(sway, kRoundoff));
      CHECK_THAT(analysis.frequency(1), is_near(sway, kRoundoff));
      CHECK_THAT(analysis.frequency(2), is_near(lift, kRoundoff));
    }
  }
}

TEST_CASE("a pod under one plateau has its shear moment leg forces and sway by hand") {
  constexpr double plateau = 2.5;  // invented [m/s2]
  const Pod pod;
  Tower tower = tower_of_pod(pod);
  shake(tower, {Axis::x});
  tower.spectra.front().points = {{0.0, plateau}, {4.0, plateau}};
  ask_for_all_modes(tower);
  for (const ModalRule rule : {ModalRule::cqc, ModalRule::srss, ModalRule::absolute_sum}) {
    tower.seismic->modes = rule;
    const Analysis analysis = analysed(tower);
    const DirectionResult& x = along(analysis, Axis::x);
    const double shear = pod.mass * plateau;
    const double stiffness = 0.5 * pod.legs * pod.axial() * std::pow(pod.sine(), 2);
    CHECK_THAT(x.base_shear, is_near(shear, kSolved));
    CHECK_THAT(*x.overturning_moment, is_near(shear * pod.height, kSolved));
    CHECK(x.missing_mass_ratio < kSolved);
    // Displacement of the apex: V / K along x, none along y and z.
    CHECK_THAT(x.displacement(0), is_near(shear / stiffness, kSolved));
    CHECK(x.displacement.tail(2).maxCoeff() < kSolved * shear / stiffness);
    // Legs in the plane of motion share the shear, the other two have none: N = V / (2 sin).
    const double leg = shear / (2.0 * pod.sine());
    CHECK_THAT(x.bar_force(0), is_near(leg, kSolved));
    CHECK_THAT(x.bar_force(2), is_near(leg, kSolved));
    CHECK(x.bar_force(1) < kSolved * leg);
    CHECK(x.bar_force(3) < kSolved * leg);
    // Gravity: each leg carries m g / (n cos) in compression.
    CHECK_THAT(analysis.seismic->bar_gravity(0),
               is_near(-pod.mass * 9.80665 / (4.0 * pod.cosine()), kSolved));
    // The foot in the plane of motion: half the shear across, and the moment over the base vertically.
    CHECK_THAT(x.reaction(0), is_near(0.5 * shear, kSolved));
    CHECK_THAT(x.reaction(2), is_near(shear * pod.height / (2.0 * pod.radius), kSolved));
  }
}

TEST_CASE("a mass on a bar on a spring has the series frequency") {
  // 1/f^2 = 1/f_fixed^2 + 1/f_base^2: exact for one mass on springs in series without mass between.
  for (const double spring : {1e6, 5e7, 1e10}) {
    constexpr double mass = 800.0;
    Tower tower = bare_tower(1, 1e-3);
    tower.materials.front().density = 0.0;
    add_node(tower, {0.0, 0.0, 0.0});
    add_node(tower, {5.0, 0.0, 0.0});
    add_bar(tower, 0, 1);
    Support base;
    base.node = 0;
    base.spring[0] = spring;
    tower.supports.push_back(base);
    carry(tower, 1, mass);
    tower.modes = {};
    tower.modes.count = 1;
    const Analysis analysis = analysed(tower);
    REQUIRE(analysis.mode_count() == 1);
    const double bar = kModulus * 1e-3 / 5.0;
    const double inverse_square = kTurn * kTurn * mass * (1.0 / bar + 1.0 / spring);
    CHECK_THAT(analysis.frequency(0), is_near(1.0 / std::sqrt(inverse_square), kSolved));
  }
}

TEST_CASE("a two-storey chain has the frequencies and effective masses of its closed form") {
  // m1 = 2 m, m2 = m, k1 = 2 k, k2 = k: omega = sqrt(k / 2m), sqrt(2k / m); M* = 8/3 m, 1/3 m.
  // Chopra, Dynamics of Structures (from memory).
  constexpr double mass = 1000.0;
  Tower tower = bare_tower(1, 2e-5);
  tower.materials.front().density = 0.0;
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {1.0, 0.0, 0.0});
  add_node(tower, {3.0, 0.0, 0.0});  // twice as long, half as stiff
  add_bar(tower, 0, 1);
  add_bar(tower, 1, 2);
  fix(tower, 0);
  carry(tower, 1, 2.0 * mass);
  carry(tower, 2, mass);
  ask_for_all_modes(tower);
  const Analysis analysis = analysed(tower);
  const double k = kModulus * 2e-5 / 2.0;
  REQUIRE(analysis.mode_count() == 2);
  CHECK_THAT(analysis.frequency(0), is_near(std::sqrt(k / (2.0 * mass)) / kTurn, kRoundoff));
  CHECK_THAT(analysis.frequency(1), is_near(std::sqrt(2.0 * k / mass) / kTurn, kRoundoff));
  CHECK_THAT(std::pow(analysis.set.participation(0, 0), 2), is_near(8.0 / 3.0 * mass, kSolved));
  CHECK_THAT(std::pow(analysis.set.participation(1, 0), 2), is_near(1.0 / 3.0 * mass, kSolved));
}

TEST_CASE("a five-storey chain with two modes kept misses a thirtieth of its mass") {
  // 0.0333 of the mass: derived from M*/m = cot^2(theta/2) / (2N + 1), theta = (2n - 1) pi / (2N + 1).
  constexpr double derived = 0.0333;
  constexpr double four_digits = 0.5e-4;
  Tower tower = rod(5, 5.0, MassScheme::lumped);
  tower.materials.front().density = 0.0;
  for (std::size_t node = 1; node <= 5; ++node) carry(tower, node, 4000.0);
  shake(tower, {Axis::x});
  tower.modes = {};
  tower.modes.count = 2;
  const Analysis analysis = analysed(tower);
  double kept = 0.0;
  for (int n = 1; n <= 2; ++n) {
    const double half = (2.0 * n - 1.0) * std::numbers::pi / 22.0;
    kept += 1.0 / (std::pow(std::tan(half), 2) * 11.0) / 5.0;
  }
  CHECK_THAT(along(analysis, Axis::x).missing_mass_ratio, is_near(derived, 0.0, four_digits));
  CHECK_THAT(along(analysis, Axis::x).missing_mass_ratio, is_near(1.0 - kept, kSolved));
}

}  // namespace swaymark::test
