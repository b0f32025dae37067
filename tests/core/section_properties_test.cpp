#include "core/section_properties.hpp"

#include <cmath>
#include <complex>
#include <numbers>
#include <string>
#include <vector>

#include <catch2/catch.hpp>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

using std::numbers::pi;

constexpr double kMillimetre = 1e-3;

// Within half a unit of the last digit printed, which is all that a handbook says.
bool agrees(double value, const std::string& printed) {
  const std::size_t point = printed.find('.');
  const std::size_t decimals = point == std::string::npos ? 0 : printed.size() - point - 1;
  const double half = 0.5 * std::pow(10.0, -static_cast<double>(decimals));
  return std::abs(value - std::stod(printed)) <= half * (1.0 + kRoundoff);
}

AngleDimensions angle_of(double leg, double thickness, double root) {
  return {leg * kMillimetre, thickness * kMillimetre, root * kMillimetre, 0.5 * root * kMillimetre};
}

struct AngleRow {
  double leg, thickness, root;  // [mm]
  const char* area;             // [cm2]
  const char* centroid;         // e [cm]
  const char* inertia;          // I_y [cm4]
  const char* radius;           // i_y [cm]
  const char* smallest;         // i_v [cm]
};

// EN 10056-1 as printed in producers' tables; from memory.
const std::vector<AngleRow> kAngleRows{
    {40, 4, 6, "3.08", "1.12", "4.47", "1.21", "0.777"},
    {50, 5, 7, "4.80", "1.40", "11.0", "1.51", "0.97"},
    {60, 6, 8, "6.91", "1.69", "22.8", "1.82", "1.17"},
    {70, 7, 9, "9.40", "1.97", "42.3", "2.12", "1.36"},
    {80, 8, 10, "12.3", "2.26", "72.2", "2.43", "1.56"},
    {90, 8, 11, "13.9", "2.50", "104", "2.74", "1.76"},
    {100, 8, 12, "15.5", "2.74", "145", "3.06", "1.96"},
    {100, 10, 12, "19.2", "2.82", "177", "3.04", "1.95"},
    {100, 12, 12, "22.7", "2.90", "207", "3.02", "1.94"},
    {120, 10, 13, "23.2", "3.31", "313", "3.67", "2.36"},
    {120, 12, 13, "27.5", "3.40", "368", "3.65", "2.35"},
    {150, 10, 16, "29.3", "4.03", "624", "4.62", "2.97"},
    {150, 12, 16, "34.8", "4.12", "737", "4.60", "2.95"},
    {150, 15, 16, "43.0", "4.25", "898", "4.57", "2.93"},
    {200, 16, 18, "61.8", "5.52", "2340", "6.16", "3.94"},
    {200, 20, 18, "76.3", "5.68", "2850", "6.11", "3.92"},
    {200, 24, 18, "90.6", "5.84", "3330", "6.06", "3.90"},
};

struct HollowRow {
  double width, wall;  // [mm]
  const char* area;    // [cm2]
  const char* radius;  // [cm]
};

// EN 10210-2, tables of the standard; from memory.
const std::vector<HollowRow> kCircularRows{
    {21.3, 3.2, "1.82", "0.650"}, {33.7, 3.2, "3.07", "1.08"}, {42.4, 3.2, "3.94", "1.39"},
    {48.3, 4, "5.57", "1.57"},    {60.3, 4, "7.07", "2.00"},   {76.1, 4, "9.06", "2.55"},
    {88.9, 5, "13.2", "2.97"},    {114.3, 5, "17.2", "3.87"},  {114.3, 6.3, "21.4", "3.82"},
    {139.7, 5, "21.2", "4.77"},   {139.7, 8, "33.1", "4.66"},  {168.3, 6.3, "32.1", "5.73"},
    {168.3, 8, "40.3", "5.67"},   {193.7, 8, "46.7", "6.57"},  {219.1, 8, "53.1", "7.47"},
    {219.1, 10, "65.7", "7.40"},  {273, 10, "82.6", "9.31"},   {323.9, 10, "98.6", "11.1"},
};
const std::vector<HollowRow> kSquareRows{
    {40, 4, "5.59", "1.45"},   {50, 4, "7.19", "1.86"},  {60, 4, "8.79", "2.27"},   {60, 5, "10.7", "2.23"},
    {80, 5, "14.7", "3.05"},   {100, 5, "18.7", "3.86"}, {100, 8, "28.8", "3.73"},  {100, 10, "34.9", "3.64"},
    {120, 8, "35.2", "4.55"},  {150, 8, "44.8", "5.77"}, {150, 10, "54.9", "5.68"}, {200, 10, "74.9", "7.72"},
    {250, 10, "94.9", "9.77"}, {300, 10, "115", "11.8"},
};

void check_hollow(const HollowRow& row, const SectionProperties& section) {
  INFO(row.width << "x" << row.wall << ": area " << section.area * 1e4 << " for " << row.area << ", radius "
                 << section.radius * 1e2 << " for " << row.radius);
  CHECK(agrees(section.area * 1e4, row.area));
  CHECK(agrees(section.radius * 1e2, row.radius));
}

// An outline walked counter-clockwise as points of the complex plane.
using Outline = std::vector<std::complex<double>>;

// Chords in place of an arc are wrong by (angle/steps)^2/24 of its length: 1e-8 of a quarter circle.
constexpr int kArcSteps = 4000;
constexpr double kChords = 1e-7;

// A quarter of a circle about `centre` from the angle `from`, counter-clockwise if `turn` is 1, else -1.
void arc(Outline& outline, std::complex<double> centre, double radius, double from, double turn) {
  for (int i = 0; i <= kArcSteps; ++i) {
    outline.push_back(centre + std::polar(radius, from + turn * 0.5 * pi * i / kArcSteps));
  }
}

Outline outline_of(const AngleDimensions& a) {
  Outline outline{{0.0, 0.0}, {a.leg, 0.0}};
  arc(outline, {a.leg - a.toe, a.thickness - a.toe}, a.toe, 0.0, 1.0);
  arc(outline, {a.thickness + a.root, a.thickness + a.root}, a.root, -0.5 * pi, -1.0);
  arc(outline, {a.thickness - a.toe, a.leg - a.toe}, a.toe, 0.0, 1.0);
  outline.emplace_back(0.0, a.leg);
  return outline;
}

Outline rounded_square(double side, double r) {
  Outline outline;
  for (int corner = 0; corner < 4; ++corner) {
    const std::complex<double> turned = std::polar(1.0, 0.5 * pi * corner);
    arc(outline, turned * std::complex<double>(0.5 * side - r, 0.5 * side - r), r, 0.5 * pi * corner, 1.0);
  }
  return outline;
}

struct Integrals {
  double area = 0.0, y = 0.0, z = 0.0, yy = 0.0, zz = 0.0, yz = 0.0, length = 0.0;
};

// Green's theorem along every side of the polygon.
Integrals integrals_of(const Outline& outline) {
  Integrals sum;
  for (std::size_t i = 0; i < outline.size(); ++i) {
    const double y0 = outline[i].real();
    const double z0 = outline[i].imag();
    const auto& next = outline[(i + 1) % outline.size()];
    const double y1 = next.real();
    const double z1 = next.imag();
    const double cross = y0 * z1 - y1 * z0;
    sum.area += cross / 2.0;
    sum.y += cross * (y0 + y1) / 6.0;
    sum.z += cross * (z0 + z1) / 6.0;
    sum.yy += cross * (y0 * y0 + y0 * y1 + y1 * y1) / 12.0;
    sum.zz += cross * (z0 * z0 + z0 * z1 + z1 * z1) / 12.0;
    sum.yz += cross * (y0 * z1 + 2.0 * y0 * z0 + 2.0 * y1 * z1 + y1 * z0) / 24.0;
    sum.length += std::abs(next - outline[i]);
  }
  return sum;
}

}  // namespace

TEST_CASE("angles have the properties printed in handbooks") {
  for (const AngleRow& row : kAngleRows) {
    const AngleDimensions dimensions = angle_of(row.leg, row.thickness, row.root);
    const AngleProperties angle = angle_properties(dimensions);
    const SectionProperties single = single_angle(dimensions);
    // Handbooks print three digits; whole tens from 1000 cm4.
    const double inertia = angle.inertia * 1e8;
    INFO(row.leg << "x" << row.thickness << ": A " << angle.area * 1e4 << ", e " << angle.centroid * 1e2
                 << ", I " << inertia << ", i_v " << single.radius * 1e2);
    CHECK(agrees(angle.area * 1e4, row.area));
    CHECK(agrees(angle.centroid * 1e2, row.centroid));
    if (inertia < 1000.0) {
      CHECK(agrees(inertia, row.inertia));
    } else {
      CHECK(std::abs(inertia - std::stod(row.inertia)) <= 5.0);
    }
    CHECK(agrees(std::sqrt(angle.inertia / angle.area) * 1e2, row.radius));
    CHECK(agrees(single.radius * 1e2, row.smallest));
  }
}

TEST_CASE("circular hollow sections have the properties printed in handbooks") {
  for (const HollowRow& row : kCircularRows) {
    check_hollow(row, circular_hollow(row.width * kMillimetre, row.wall * kMillimetre));
  }
}

TEST_CASE("square hollow sections have the properties printed in handbooks") {
  for (const HollowRow& row : kSquareRows) {
    check_hollow(row, square_hollow(row.width * kMillimetre, row.wall * kMillimetre));
  }
}

TEST_CASE("sections have the surface printed in handbooks") {
  // [m2/m]; EN 10056-1 and EN 10210-2 as printed in producers' tables; from memory.
  CHECK(agrees(single_angle(angle_of(50, 5, 7)).perimeter, "0.194"));
  CHECK(agrees(single_angle(angle_of(80, 8, 10)).perimeter, "0.311"));
  CHECK(agrees(single_angle(angle_of(100, 10, 12)).perimeter, "0.390"));
  CHECK(agrees(single_angle(angle_of(150, 15, 16)).perimeter, "0.586"));
  CHECK(agrees(circular_hollow(168.3 * kMillimetre, 6.3 * kMillimetre).perimeter, "0.529"));
  CHECK(agrees(square_hollow(0.1, 0.005).perimeter, "0.387"));
  CHECK(agrees(square_hollow(0.2, 0.010).perimeter, "0.774"));
}

TEST_CASE("an angle is the integral over its rounded outline") {
  for (const AngleDimensions& angle :
       {angle_of(80, 8, 10), angle_of(45, 4.5, 7), AngleDimensions{0.2, 0.03, 0.04, 0.01}}) {
    const AngleProperties closed = angle_properties(angle);
    const Integrals sum = integrals_of(outline_of(angle));
    const double centroid = sum.y / sum.area;
    CHECK_THAT(closed.area, is_near(sum.area, kChords));
    CHECK_THAT(closed.centroid, is_near(centroid, kChords));
    CHECK_THAT(closed.centroid, is_near(sum.z / sum.area, kChords));
    CHECK_THAT(closed.inertia, is_near(sum.yy - sum.area * centroid * centroid, kChords));
    CHECK_THAT(closed.inertia, is_near(sum.zz - sum.area * centroid * centroid, kChords));
    CHECK_THAT(closed.product, is_near(sum.yz - sum.area * centroid * centroid, kChords));
    CHECK_THAT(closed.perimeter, is_near(sum.length, kChords));
  }
}

TEST_CASE("no axis through the centroid of an angle has a smaller inertia than the smallest") {
  const AngleProperties angle = angle_properties(angle_of(100, 10, 12));
  double smallest = angle.inertia;
  constexpr int steps = 3600;  // 45 degrees is one of them
  for (int i = 0; i < steps; ++i) {
    const double turn = pi * i / steps;
    smallest = std::min(smallest, angle.inertia - angle.product * std::sin(2.0 * turn));
    smallest = std::min(smallest, angle.inertia + angle.product * std::sin(2.0 * turn));
  }
  CHECK_THAT(angle.smallest_inertia, is_near(smallest, kRoundoff));
}

TEST_CASE("an angle without radii is two rectangles") {
  const AngleProperties angle = angle_properties({4.0, 1.0, 0.0, 0.0});
  CHECK_THAT(angle.area, is_near(7.0, kRoundoff));
  CHECK_THAT(angle.centroid, is_near((4.0 * 2.0 + 3.0 * 0.5) / 7.0, kRoundoff));  // by hand
  CHECK_THAT(angle.perimeter, is_near(16.0, kRoundoff));
}

TEST_CASE("a square hollow section is the integral over its rounded outlines") {
  const SectionProperties closed = square_hollow(0.1, 0.008);
  const Integrals outside = integrals_of(rounded_square(0.1, 0.012));
  const Integrals inside = integrals_of(rounded_square(0.084, 0.008));
  const double area = outside.area - inside.area;
  CHECK_THAT(closed.area, is_near(area, kChords));
  CHECK_THAT(closed.radius, is_near(std::sqrt((outside.yy - inside.yy) / area), kChords));
  CHECK_THAT(closed.perimeter, is_near(outside.length, kChords));
}

TEST_CASE("a square hollow section has the area by the formula of its standard") {
  // EN 10210-2 annex A, from memory: A = 2T (B + H - 2T) - (4 - pi)(ro2 - ri2)
  CHECK_THAT(square_hollow(0.1, 0.005).area,
             is_near(2 * 0.005 * 0.19 - (4 - pi) * (0.0075 * 0.0075 - 0.005 * 0.005), kRoundoff));
}

TEST_CASE("a tube comes near a ring as its wall thins and is a rod where it closes") {
  const SectionProperties thin = circular_hollow(1.0, 1e-6);
  CHECK_THAT(thin.area, is_near(pi * 1e-6, 2e-6));  // wrong by the share of the wall
  CHECK_THAT(thin.radius, is_near(0.5 / std::sqrt(2.0), 2e-6));
  const SectionProperties rod = circular_hollow(1.0, 0.5);
  CHECK_THAT(rod.area, is_near(pi / 4.0, kRoundoff));
  CHECK_THAT(rod.radius, is_near(0.25, kRoundoff));
  CHECK_THAT(rod.perimeter, is_near(pi, kRoundoff));
}

TEST_CASE("a section twice as large has four times the area and twice the radius and perimeter") {
  const auto twice = [](const SectionProperties& small, const SectionProperties& large) {
    CHECK_THAT(large.area, is_near(4.0 * small.area, kRoundoff));
    CHECK_THAT(large.radius, is_near(2.0 * small.radius, kRoundoff));
    CHECK_THAT(large.perimeter, is_near(2.0 * small.perimeter, kRoundoff));
  };
  twice(single_angle(angle_of(80, 8, 10)), single_angle(angle_of(160, 16, 20)));
  twice(double_angle(angle_of(80, 8, 10), 0.01), double_angle(angle_of(160, 16, 20), 0.02));
  twice(circular_hollow(0.1, 0.005), circular_hollow(0.2, 0.01));
  twice(square_hollow(0.1, 0.005), square_hollow(0.2, 0.01));
}

TEST_CASE("two angles back to back have twice the area and the radius of one about its leg") {
  const AngleDimensions angle = angle_of(80, 8, 10);
  const AngleProperties one = angle_properties(angle);
  const double along_leg = std::sqrt(one.inertia / one.area);
  for (const double gap : {0.0, 0.01, 0.2}) {
    const SectionProperties pair = double_angle(angle, gap);
    CHECK_THAT(pair.area, is_near(2.0 * one.area, kRoundoff));
    CHECK_THAT(pair.perimeter, is_near(2.0 * one.perimeter, kRoundoff));
    CHECK_THAT(pair.radius, is_near(along_leg, kRoundoff));
    CHECK(pair.radius > single_angle(angle).radius);
  }
}

}  // namespace swaymark::test
