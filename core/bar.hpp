#pragma once

#include <vector>

#include "core/matrix.hpp"
#include "core/tower.hpp"

/// The straight pinned bar: axial force only.
///
/// On the displacements (u_from, u_to), with n the unit vector along the bar,
///
///   K = EA/L [ n nT, -n nT; -n nT, n nT ]
///   M = m/6 [ 2 I, I; I, 2 I ]   consistent: exact for motion linear along the bar
///   M = m/2 [ I, 0; 0, I ]       lumped
///   M = m/12 [ 5 I, I; I, 5 I ]  averaged: half of each
///
/// Every direction carries the whole mass m, so the coefficients of one direction add up to m in each scheme.
/// Sources: published closed forms of the two-node bar, e.g. J. S. Przemieniecki, Theory of Matrix Structural
/// Analysis (1968), ch. 11 (from memory); the sums are common practice.
namespace swaymark {

struct BarElement {
  std::size_t from = 0;
  std::size_t to = 0;
  Eigen::Vector3d direction = Eigen::Vector3d::Zero();  ///< unit vector from -> to
  double length = 0.0;                                  ///< L [m]
  double axial_stiffness = 0.0;                         ///< EA/L [N/m]
  double own_mass = 0.0;                                ///< rho A L [kg]
  double carried_mass = 0.0;                            ///< allowance, linear ancillaries and ice [kg]

  [[nodiscard]] double mass() const { return own_mass + carried_mass; }
};

/// Coefficients of one direction of the mass matrix: at a bar's own end, and between its ends; sums to 1/2.
struct MassShares {
  double own_end = 0.0;
  double other_end = 0.0;
};

[[nodiscard]] MassShares mass_shares(MassScheme scheme);

/// The elements of all bars, in the tower's order.
[[nodiscard]] std::vector<BarElement> bar_elements(const Tower& tower);

}  // namespace swaymark
