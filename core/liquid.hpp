#pragma once

#include <vector>

#include "core/dof_map.hpp"

/// Liquid in an upright circular tank, as two masses: one that moves with the tank and one that sloshes.
///
/// With R the radius, H the depth, gamma = H/R and m the mass of the liquid (Housner's model in the form with
/// the first root of J1', e.g. EN 1998-4 Annex A and G. W. Housner, Bull. Seism. Soc. Am. 53 (1963); from
/// memory):
///
///   convective  m_c = m 2 tanh(1.841 gamma) / (1.841 gamma (1.841^2 - 1)),
///               omega^2 = (1.841 g/R) tanh(1.841 gamma), on the spring k = m_c omega^2
///   impulsive   m_i = m - m_c
///
/// The root is 1.8412; the published formulas round it to 1.841, and so does this page (4 parts in 10 000 of
/// m_c). Higher sloshing modes count as impulsive. The heights at which both masses act on the tank are not
/// modelled: they act at the nodes, or in their middle.
namespace swaymark {

struct LiquidSplit {
  double mass = 0.0;        ///< m [kg]
  double impulsive = 0.0;   ///< m_i [kg]
  double convective = 0.0;  ///< m_c [kg]
  double omega = 0.0;       ///< of sloshing in a tank that stands still [rad/s]
  double spring = 0.0;      ///< k [N/m]
};

/// A rigid liquid has no convective part.
[[nodiscard]] LiquidSplit split_liquid(const Liquid& liquid);

/// A spring between one degree of freedom and the mean of others.
struct Link {
  Index dof = 0;
  std::vector<Index> others;  ///< degrees of freedom of equal share
  double stiffness = 0.0;     ///< [N/m]
};

/// The springs of sloshing: one for each liquid that is not rigid and each horizontal axis.
[[nodiscard]] std::vector<Link> liquid_links(const Tower& tower, const DofMap& dofs);

/// The mass [kg] that a liquid gives to each of its nodes along an axis: the impulsive part; upright, where
/// nothing sloshes, the whole.
[[nodiscard]] double liquid_on_node(const Liquid& liquid, const LiquidSplit& split, Axis axis);

}  // namespace swaymark
