#pragma once

/// Section properties by closed form, from the dimensions and the radii of the corners.
///
/// Every shape is built of rectangles and of fillets; a fillet of radius r is what a quarter circle leaves of
/// a square r x r at the corner away from its centre. About the sides of that square, with x and y counted
/// from the corner (integrals of the square less those of the quarter circle; derived):
///
///     A = r2 (1 - pi/4)    ∫x dA = r3 (5/6 - pi/4)    ∫x2 dA = r4 (1 - 5 pi/16)    ∫xy dA = r4 (19/24 -
///     pi/4)
///
/// Lengths in m, areas in m2, second moments in m4; nothing here depends on the unit, as long as it is one.
namespace swaymark {

/// What a truss needs to know of a section.
struct SectionProperties {
  double area = 0.0;       ///< A
  double radius = 0.0;     ///< smallest radius of gyration, √(I_min / A)
  double perimeter = 0.0;  ///< of the outline: the surface to paint, or to ice, per length
};

/// An equal leg angle as EN 10056-1 draws it: both legs of one thickness, the root rounded by `root`, the
/// inner edge of each toe by `toe`, all other edges sharp.
struct AngleDimensions {
  double leg = 0.0;        ///< b, over the outside
  double thickness = 0.0;  ///< t, 0 < t < b
  double root = 0.0;       ///< r1, 0 <= r1 <= b - t - r2
  double toe = 0.0;        ///< r2, 0 <= r2 <= t; EN 10056-1 takes r1/2 (from memory)
};

struct AngleProperties {
  double area = 0.0;            ///< t (2b - t) + (1 - pi/4)(r1² - 2 r2²)
  double centroid = 0.0;        ///< e, from the back of either leg
  double inertia = 0.0;         ///< I_y = I_z, about the axes through the centroid parallel to the legs
  double product = 0.0;         ///< I_yz about the same axes; negative, as the legs lie along +y and +z
  double smallest_inertia = 0;  ///< I_v = I_y - |I_yz|, about the axis at 45 degrees
  double perimeter = 0.0;       ///< 4b - (2 - pi/2)(r1 + 2 r2)
};

/// Sums of rectangles and fillets about the outer corner, moved to the centroid by Steiner's theorem. By
/// symmetry the principal axes of an equal angle stand at 45 degrees to its legs.
[[nodiscard]] AngleProperties angle_properties(const AngleDimensions& angle);

/// The angle alone: its smallest radius of gyration is i_v = √(I_v / A).
[[nodiscard]] SectionProperties single_angle(const AngleDimensions& angle);

/// Two equal angles back to back with `gap` >= 0 between the backs, acting as one.
///
/// About the axis along the outstanding legs i_y = √(I_y / A), as for the angle alone; about the axis of
/// symmetry i_z = √(i_y² + (e + gap/2)²). The smaller of the two is taken, which is i_y whatever the gap is.
/// That the pair acts as one needs packing plates close enough for the code in force (EN 1993-1-1, 6.4.4,
/// from memory); this function cannot see them. The perimeter counts both faces of the gap.
[[nodiscard]] SectionProperties double_angle(const AngleDimensions& angle, double gap);

/// A = pi t (D - t), i = √(D² + d²) / 4 with d = D - 2t, perimeter pi D.
/// \param diameter  D, outside. \param wall  t, 0 < t <= D/2.
[[nodiscard]] SectionProperties circular_hollow(double diameter, double wall);

/// A square hollow section with corners rounded by 1.5 t outside and 1.0 t inside.
///
/// Those radii are the ones EN 10210-2 gives for calculating hot-finished sections (from memory); the corner
/// as rolled may have up to 3 t. A = 4t (B - t) - (4 - pi)(r_o² - r_i²).
/// \param side  B, over the outside. \param wall  t, 0 < t <= B/4.
[[nodiscard]] SectionProperties square_hollow(double side, double wall);

}  // namespace swaymark
