#pragma once

#include "core/tower.hpp"

/// Ice of one radial thickness all around the bars.
///
/// On a convex outline of perimeter p, ice of thickness t has the area p t + pi t2: bands along the sides and
/// sectors around the corners that make one full circle. For a circle of diameter d this is pi t (t + d), the
/// glaze of ISO 12494 (from memory). For an angle it follows all of its outline and so counts the hollow
/// between the legs in full.
namespace swaymark {

/// [kg/m] on an outline of the perimeter [m].
[[nodiscard]] double ice_per_length(const IceMass& ice, double perimeter);

/// The share of a bar's length that lies within the heights of the ice, 0 to 1.
///
/// A level bar lies within a range that begins below it and ends at or above it, so that of two ranges that
/// meet at its height one has it; a range from the lowest node on has the bars there, too.
[[nodiscard]] double iced_share(const Tower& tower, const IceMass& ice, const Bar& bar);

/// The ice on one bar [kg]; zero where the bar is not of its group. The bar carries it evenly over its whole
/// length, whichever part of it lies within the range: exact in total, off by at most half of a bar's length
/// in height. \pre the bar's section has a perimeter, unless its share is zero.
[[nodiscard]] double ice_on_bar(const Tower& tower, const IceMass& ice, const Bar& bar, double length);

}  // namespace swaymark
