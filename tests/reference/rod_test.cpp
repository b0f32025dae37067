#include <cmath>
#include <numbers>

#include "tests/reference/cases.hpp"
#include "tests/support/towers.hpp"

/// The fixed-free rod of N equal elements of length h against closed forms, with c = sqrt(E / rho):
///   lumped      omega = 2 (c/h) sin(theta/2),    theta = (2j - 1) pi / (2N)
///   consistent  omega = (c/h) sqrt(6 (1 - cos theta) / (2 + cos theta))
///   exact       omega = (2j - 1) pi c / (2L)
/// Discrete dispersion relations of linear bar elements, e.g. Hughes, The Finite Element Method, ch. 9
/// (formula from memory); derived.
namespace swaymark::test {

namespace {

constexpr double kLength = 10.0;
constexpr double kPi = std::numbers::pi;
const double kSpeed = std::sqrt(210e9 / 7850.0);

Analysis all_modes_of_rod(int elements, MassScheme scheme) {
  Tower tower = rod(elements, kLength, scheme);
  tower.modes = {};
  tower.modes.count = elements;
  return analysed(tower);
}

double exact(int mode) { return (2.0 * mode - 1.0) * kPi * kSpeed / (2.0 * kLength); }

double error_of_first(int elements, MassScheme scheme) {
  return 2.0 * kPi * all_modes_of_rod(elements, scheme).frequency(0) / exact(1) - 1.0;
}

}  // namespace

TEST_CASE("rods of one to thirty-two elements have the closed-form frequencies") {
  for (int n = 1; n <= 32; ++n) {
    const double h = kLength / n;
    const Eigen::VectorXd lumped = 2.0 * kPi * all_modes_of_rod(n, MassScheme::lumped).frequency;
    const Eigen::VectorXd consistent = 2.0 * kPi * all_modes_of_rod(n, MassScheme::consistent).frequency;
    REQUIRE(lumped.size() == n);
    REQUIRE(consistent.size() == n);
    for (int j = 1; j <= n; ++j) {
      INFO(n << " elements, mode " << j);
      const double theta = (2.0 * j - 1.0) * kPi / (2.0 * n);
      CHECK_THAT(lumped(j - 1), is_near(2.0 * kSpeed / h * std::sin(0.5 * theta), kSolved));
      CHECK_THAT(
          consistent(j - 1),
          is_near(kSpeed / h * std::sqrt(6.0 * (1.0 - std::cos(theta)) / (2.0 + std::cos(theta))), kSolved));
    }
  }
}

TEST_CASE("lumped rods are too soft and consistent rods too stiff") {
  for (const int n : {1, 2, 5, 16}) {
    CHECK(error_of_first(n, MassScheme::lumped) < 0.0);
    CHECK(error_of_first(n, MassScheme::consistent) > 0.0);
  }
}

TEST_CASE("halving the elements divides the error by four and that of the averaged mass by sixteen") {
  // Orders h^2 and h^4; the next term of the series keeps the measured order within this of the limit.
  constexpr double order_tolerance = 0.02;
  for (const int n : {4, 8, 16}) {
    INFO(n << " elements");
    const auto order = [&](MassScheme scheme) {
      return std::log2(error_of_first(n, scheme) / error_of_first(2 * n, scheme));
    };
    CHECK_THAT(order(MassScheme::lumped), is_near(2.0, 0.0, order_tolerance));
    CHECK_THAT(order(MassScheme::consistent), is_near(2.0, 0.0, order_tolerance));
    CHECK_THAT(order(MassScheme::averaged), is_near(4.0, 0.0, order_tolerance));
  }
}

TEST_CASE("effective masses of a fine rod tend to those of the continuum") {
  // 8 / (pi^2 (2n - 1)^2) of the whole mass: 81.06 9.01 3.24 1.65 percent. Derived.
  const double whole = 7850.0 * 1e-3 * kLength;
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    double before = 0.0;
    for (const int n : {16, 32, 64}) {
      const Analysis analysis = all_modes_of_rod(n, scheme);
      double worst = 0.0;
      for (int j = 1; j <= 4; ++j) {
        const double limit = 8.0 / std::pow(kPi * (2.0 * j - 1.0), 2);
        worst = std::max(worst,
                         std::abs(std::pow(analysis.set.participation(j - 1, 0), 2) / whole / limit - 1.0));
      }
      INFO(n << " elements, " << name_of(scheme) << ", worst " << worst);
      if (before > 0.0) CHECK(worst < 0.3 * before);  // order h^2 or better: a quarter each time
      before = worst;
    }
    CHECK(before < 0.01);
  }
}

}  // namespace swaymark::test
