#pragma once

#include "core/tower.hpp"

/// Springs of a rigid rectangular footing on the surface of an elastic half-space, under slow loads.
///
/// With G the shear modulus and nu Poisson's ratio of the soil, B half of the short side, L half of the long
/// one and q = L/B (A. Pais, E. Kausel, "Approximate formulas for dynamic stiffnesses of rigid foundations",
/// Soil Dyn. Earthq. Eng. 7 (1988); from memory):
///
///   upright               K = G B / (1 - nu) (3.1 q^0.75 + 1.6)
///   along the long side   K = G B / (2 - nu) (6.8 q^0.65 + 2.4)
///   along the short side  K = G B / (2 - nu) (6.8 q^0.65 + 0.8 q + 1.6)
///
/// No embedment, no layers, no damping; neighbouring pads do not feel each other, and what rocks a single pad
/// finds no resistance, because a node has no rotation.
namespace swaymark {

/// A pad longer than this many widths is a strip, for which the formulas were not made.
inline constexpr double kMostSlenderPad = 10.0;

struct PadSprings {
  double x = 0.0;  ///< [N/m]
  double y = 0.0;  ///< [N/m]
  double z = 0.0;  ///< [N/m]
};

[[nodiscard]] PadSprings pad_springs(const Pad& pad);

}  // namespace swaymark
