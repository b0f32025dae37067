#pragma once

#include <cmath>
#include <initializer_list>
#include <numbers>

#include "core/assembly.hpp"
#include "spectrum/seismic.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

/// Small towers whose response spectra follow by hand, and their analysis.
namespace swaymark::test {

inline constexpr double kTurn = 2.0 * std::numbers::pi;
/// Axial stiffness of a bar of bare_tower, 1 m long [N/m].
inline constexpr double kStiff = 210e9 * 1e-3;

[[nodiscard]] Eigen::VectorXd vector_of(std::initializer_list<double> values);

/// A tower with the modes it asks for by number, or with all it has. Not to be copied: the problem refers to
/// the matrices.
struct Vibrating {
  explicit Vibrating(const Tower& stated);
  Vibrating(const Vibrating&) = delete;
  Vibrating& operator=(const Vibrating&) = delete;

  Tower tower;
  Assembly assembly;
  Eigenproblem problem;
  ModeSet set;
};

[[nodiscard]] SeismicResult shake(const Vibrating& vibrating);
[[nodiscard]] SeismicResult shake(const Tower& tower);

/// Excites an axis by a spectrum of these points; 5 % damping where none is stated yet.
void excite(Tower& tower, Axis axis, std::vector<std::pair<double, double>> points);

/// Excites an axis by the same acceleration [m/s2] at every period.
void excite(Tower& tower, Axis axis, double acceleration);

/// Bars without mass, so that only what the nodes carry has inertia.
[[nodiscard]] Tower massless(int dimensions);

/// The two storeys of Chopra, Dynamics of Structures (from memory): masses 2 m and m on springs 2 k and k,
/// with 2 k = kStiff. With phi_1 = (1, 2) and phi_2 = (1, -1) it follows by hand that omega^2 = k/2m and
/// 2k/m, that Gamma phi = (2/3, 4/3) and (1/3, -1/3), and that the effective masses are 8/3 m and 1/3 m.
struct TwoStoreys {
  double m = 1000.0;
  double k = kStiff / 2.0;
  double first_period = kTurn / std::sqrt(k / (2.0 * m));
  double second_period = kTurn / std::sqrt(2.0 * k / m);

  [[nodiscard]] Tower tower() const {
    Tower tower = massless(1);
    fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
    carry(tower, add_node(tower, {1.0, 0.0, 0.0}), 2.0 * m);
    carry(tower, add_node(tower, {3.0, 0.0, 0.0}), m);
    add_bar(tower, 0, 1);
    add_bar(tower, 1, 2);
    return tower;
  }
  /// Excited so that the first mode has the ordinate `first`, the second `second` and period zero as well.
  [[nodiscard]] Tower excited(double first, double second) const {
    Tower tower = this->tower();
    excite(tower, Axis::x, {{0.0, second}, {second_period, second}, {first_period, first}});
    return tower;
  }
};

/// A mass on two legs in the plane, its feet 2 a apart and h below it; bars without mass. Statically
/// determinate: a force F along x gives F L/2a in the legs, F/2 and F h/2a in the feet.
struct TwoLegs {
  double a = 1.5;
  double h = 2.0;
  double m = 800.0;
  double foot_level = 0.0;

  [[nodiscard]] double length() const { return std::hypot(a, h); }
  [[nodiscard]] Tower tower() const {
    Tower tower = massless(2);
    fix(tower, add_node(tower, {-a, 0.0, foot_level}));
    fix(tower, add_node(tower, {a, 0.0, foot_level}));
    carry(tower, add_node(tower, {0.0, 0.0, foot_level + h}), m);
    add_bar(tower, 0, 2);
    add_bar(tower, 1, 2);
    return tower;
  }
};

/// A mass on four legs, two in the plane of x and two in that of y, which take one horizontal direction each.
struct FourLegs {
  double a = 1.5;
  double h = 2.0;
  double m = 800.0;

  [[nodiscard]] double length() const { return std::hypot(a, h); }
  [[nodiscard]] Tower tower() const {
    Tower tower = massless(3);
    for (const auto& [x, y] : {std::pair{-a, 0.0}, {a, 0.0}, {0.0, -a}, {0.0, a}})
      fix(tower, add_node(tower, {x, y, 0.0}));
    carry(tower, add_node(tower, {0.0, 0.0, h}), m);
    for (std::size_t leg = 0; leg < 4; ++leg) add_bar(tower, leg, 4);
    return tower;
  }
};

}  // namespace swaymark::test
