#include "core/section_properties.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace swaymark {

namespace {

using std::numbers::pi;

double square(double x) { return x * x; }
double cube(double x) { return x * x * x; }

// Integrals over an area: 1, y, z, y2, z2 and yz.
struct Moments {
  double area = 0.0;
  double y = 0.0;
  double z = 0.0;
  double yy = 0.0;
  double zz = 0.0;
  double yz = 0.0;

  void add(const Moments& part, double sign) {
    area += sign * part.area;
    y += sign * part.y;
    z += sign * part.z;
    yy += sign * part.yy;
    zz += sign * part.zz;
    yz += sign * part.yz;
  }
};

Moments rectangle(double y0, double z0, double y1, double z1) {
  const double width = y1 - y0;
  const double height = z1 - z0;
  Moments m;
  m.area = width * height;
  m.y = 0.5 * (square(y1) - square(y0)) * height;
  m.z = 0.5 * (square(z1) - square(z0)) * width;
  m.yy = (cube(y1) - cube(y0)) / 3.0 * height;
  m.zz = (cube(z1) - cube(z0)) / 3.0 * width;
  m.yz = 0.25 * (square(y1) - square(y0)) * (square(z1) - square(z0));
  return m;
}

// The fillet whose corner stands at (y, z) and whose sides run along the given signs of the axes.
Moments fillet(double r, double y, double z, double along_y, double along_z) {
  const double area = square(r) * (1.0 - pi / 4.0);
  const double first = cube(r) * (5.0 / 6.0 - pi / 4.0);
  const double second = square(square(r)) * (1.0 - 5.0 * pi / 16.0);
  const double product = square(square(r)) * (19.0 / 24.0 - pi / 4.0);
  Moments m;
  m.area = area;
  m.y = y * area + along_y * first;
  m.z = z * area + along_z * first;
  m.yy = square(y) * area + 2.0 * y * along_y * first + second;
  m.zz = square(z) * area + 2.0 * z * along_z * first + second;
  m.yz = y * z * area + (y * along_z + z * along_y) * first + along_y * along_z * product;
  return m;
}

// A square about its centre with all corners rounded.
Moments rounded_square(double side, double r) {
  const double half = 0.5 * side;
  Moments m = rectangle(-half, -half, half, half);
  for (const double y : {-1.0, 1.0}) {
    for (const double z : {-1.0, 1.0}) m.add(fillet(r, y * half, z * half, -y, -z), -1.0);
  }
  return m;
}

// What rounding one edge takes off the outline: two sides of length r become a quarter of a circle.
double rounding(double r) { return (2.0 - pi / 2.0) * r; }

}  // namespace

AngleProperties angle_properties(const AngleDimensions& angle) {
  const double b = angle.leg;
  const double t = angle.thickness;
  Moments m = rectangle(0.0, 0.0, b, t);
  m.add(rectangle(0.0, t, t, b), 1.0);
  m.add(fillet(angle.root, t, t, 1.0, 1.0), 1.0);
  m.add(fillet(angle.toe, b, t, -1.0, -1.0), -1.0);
  m.add(fillet(angle.toe, t, b, -1.0, -1.0), -1.0);
  AngleProperties result;
  result.area = m.area;
  result.centroid = m.y / m.area;
  result.inertia = m.yy - m.area * square(result.centroid);
  result.product = m.yz - m.area * square(result.centroid);
  result.smallest_inertia = result.inertia - std::abs(result.product);
  result.perimeter = 4.0 * b - rounding(angle.root) - 2.0 * rounding(angle.toe);
  return result;
}

SectionProperties single_angle(const AngleDimensions& angle) {
  const AngleProperties one = angle_properties(angle);
  return {one.area, std::sqrt(one.smallest_inertia / one.area), one.perimeter};
}

SectionProperties double_angle(const AngleDimensions& angle, double gap) {
  const AngleProperties one = angle_properties(angle);
  const double along_outstanding = std::sqrt(one.inertia / one.area);
  const double along_symmetry = std::hypot(along_outstanding, one.centroid + 0.5 * gap);
  return {2.0 * one.area, std::min(along_outstanding, along_symmetry), 2.0 * one.perimeter};
}

SectionProperties circular_hollow(double diameter, double wall) {
  const double inside = diameter - 2.0 * wall;
  return {pi * wall * (diameter - wall), 0.25 * std::hypot(diameter, inside), pi * diameter};
}

SectionProperties square_hollow(double side, double wall) {
  constexpr double outer = 1.5;  // times the wall; see the header
  constexpr double inner = 1.0;
  Moments m = rounded_square(side, outer * wall);
  m.add(rounded_square(side - 2.0 * wall, inner * wall), -1.0);
  return {m.area, std::sqrt(m.yy / m.area), 4.0 * side - 4.0 * rounding(outer * wall)};
}

}  // namespace swaymark
