#include "spectrum/combine_modes.hpp"

#include <complex>
#include <limits>
#include <numbers>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// Half a unit of the last decimal printed by a source.
constexpr double kThreeDecimals = 0.5e-3;
constexpr double kFourDecimals = 0.5e-4;

double combine(const Eigen::RowVectorXd& peaks, double residual, ModalRule rule,
               const Eigen::MatrixXd& correlation) {
  return combine_modes(peaks, Eigen::VectorXd::Constant(1, residual), rule, correlation)(0);
}

// Correlation of the displacements of two oscillators under white noise, by quadrature of their transfer
// functions over all frequencies: tan(t/2) makes the integrand smooth and periodic, where equal steps
// converge as fast as any rule.
double white_noise_correlation(double omega_i, double omega_j, double damping_i, double damping_j) {
  constexpr int steps = 20000;
  const auto transfer = [](double omega, double own, double damping) {
    return 1.0 / std::complex<double>(own * own - omega * omega, 2.0 * damping * own * omega);
  };
  double ii = 0.0;
  double jj = 0.0;
  double ij = 0.0;
  for (int step = 0; step < steps; ++step) {
    const double t = 2.0 * std::numbers::pi * (step + 0.5) / steps - std::numbers::pi;
    const double omega = omega_i * std::tan(t / 2.0);
    const double width = 1.0 / std::pow(std::cos(t / 2.0), 2);
    const auto hi = transfer(omega, omega_i, damping_i);
    const auto hj = transfer(omega, omega_j, damping_j);
    ii += width * std::norm(hi);
    jj += width * std::norm(hj);
    ij += width * (hi * std::conj(hj)).real();
  }
  return ij / std::sqrt(ii * jj);
}

}  // namespace

TEST_CASE("the CQC correlation has the values its formula gives at 5 percent") {
  // Derived from the formula; 0.4730 and 0.1656 are quoted by other texts as well.
  const std::vector<std::pair<double, double>> rows{
      {0.98, 0.9607}, {0.95, 0.7914}, {0.92, 0.5892}, {0.90, 0.4730}, {0.85, 0.2733},
      {0.80, 0.1656}, {0.75, 0.1060}, {0.70, 0.0710}, {0.60, 0.0350}, {0.50, 0.0185}};
  for (const auto& [ratio, correlation] : rows) {
    INFO("frequency ratio " << ratio);
    CHECK_THAT(cqc_correlation(1.0, ratio, 0.05, 0.05), is_near(correlation, 0.0, kFourDecimals));
  }
}

TEST_CASE("the CQC correlation has the values its formula gives at 2 percent") {
  // Derived from the formula.
  const std::vector<std::pair<double, double>> rows{{0.98, 0.7967}, {0.95, 0.3780}, {0.92, 0.1868},
                                                    {0.90, 0.1257}, {0.85, 0.0568}, {0.80, 0.0308},
                                                    {0.70, 0.0121}, {0.50, 0.0030}};
  for (const auto& [ratio, correlation] : rows) {
    INFO("frequency ratio " << ratio);
    CHECK_THAT(cqc_correlation(1.0, ratio, 0.02, 0.02), is_near(correlation, 0.0, kFourDecimals));
  }
}

TEST_CASE("the CQC correlations of a four-storey building are those published") {
  // E. L. Wilson, Three-Dimensional Static and Dynamic Analysis of Structures, ch. 15 (from memory).
  Eigen::VectorXd omega(5);
  omega << 13.869, 13.931, 43.995, 44.189, 54.418;
  const Eigen::MatrixXd rho = correlation_matrix(omega, Eigen::VectorXd::Constant(5, 0.05));
  CHECK_THAT(rho(0, 1), is_near(0.998, 0.0, kThreeDecimals));
  CHECK_THAT(rho(0, 2), is_near(0.006, 0.0, kThreeDecimals));
  CHECK_THAT(rho(2, 3), is_near(0.998, 0.0, kThreeDecimals));
  CHECK_THAT(rho(2, 4), is_near(0.180, 0.0, kThreeDecimals));
  CHECK_THAT(rho(3, 4), is_near(0.186, 0.0, kThreeDecimals));
}

TEST_CASE("the CQC correlation is that of two oscillators under white noise") {
  for (const double ratio : {0.5, 0.8, 0.95, 1.0, 1.3}) {
    for (const auto& [zi, zj] : {std::pair{0.05, 0.05}, {0.02, 0.10}, {0.3, 0.01}}) {
      INFO("ratio " << ratio << " damping " << zi << " and " << zj);
      CHECK_THAT(cqc_correlation(3.0, 3.0 * ratio, zi, zj),
                 is_near(white_noise_correlation(3.0, 3.0 * ratio, zi, zj), kSolved));
    }
  }
}

TEST_CASE("swapping two modes leaves their CQC correlation as it is") {
  for (const double ratio : {0.1, 0.7, 0.99, 1.0, 1.2, 8.0}) {
    CHECK_THAT(cqc_correlation(5.0, 5.0 * ratio, 0.02, 0.11),
               is_near(cqc_correlation(5.0 * ratio, 5.0, 0.11, 0.02), kRoundoff));
  }
}

TEST_CASE("the CQC correlation is one for equal frequency and equal damping") {
  for (const double damping : {0.0, 1e-9, 0.01, 0.05, 0.7})
    CHECK_THAT(cqc_correlation(7.3, 7.3, damping, damping), is_near(1.0, kRoundoff));
}

TEST_CASE("the CQC correlation is below one for equal frequency and different damping") {
  const double rho = cqc_correlation(7.3, 7.3, 0.02, 0.10);
  CHECK(rho < 1.0);
  // r = 1: 8 sqrt(z1 z2) (z1 + z2) / [8 z1 z2 + 4 (z1^2 + z2^2)] = 2 sqrt(z1 z2) / (z1 + z2)
  CHECK_THAT(rho, is_near(2.0 * std::sqrt(0.002) / 0.12, kRoundoff));
}

TEST_CASE("the CQC correlation vanishes with damping for unequal frequencies") {
  CHECK(cqc_correlation(1.0, 1.1, 0.0, 0.0) == 0.0);
  CHECK(cqc_correlation(1.0, 1.1, 0.0, 0.05) == 0.0);
  CHECK(cqc_correlation(1.0, 1.1, 1e-6, 1e-6) < 1e-9);
}

TEST_CASE("the CQC correlation of one damped and one undamped mode is zero even at one frequency") {
  CHECK(cqc_correlation(1.0, 1.0, 0.0, 0.05) == 0.0);
  CHECK(cqc_correlation(1.0, 1.0, 0.05, 0.0) == 0.0);
}

TEST_CASE("the CQC correlation depends on the ratio of the frequencies alone") {
  CHECK_THAT(cqc_correlation(1.0, 0.8, 0.05, 0.03),
             is_near(cqc_correlation(250.0, 200.0, 0.05, 0.03), kRoundoff));
}

TEST_CASE("the correlation matrix is symmetric with ones on its diagonal and uses the damping of each mode") {
  const Eigen::Vector3d omega(3.0, 3.2, 9.0);
  const Eigen::Vector3d damping(0.02, 0.05, 0.10);
  const Eigen::MatrixXd rho = correlation_matrix(omega, damping);
  CHECK(rho == rho.transpose());
  CHECK(rho.diagonal() == Eigen::Vector3d::Ones());
  CHECK_THAT(rho(0, 1), is_near(cqc_correlation(3.0, 3.2, 0.02, 0.05), kRoundoff));
  CHECK_THAT(rho(0, 2), is_near(cqc_correlation(3.0, 9.0, 0.02, 0.10), kRoundoff));
  CHECK_THAT(rho(1, 2), is_near(cqc_correlation(3.2, 9.0, 0.05, 0.10), kRoundoff));
}

TEST_CASE("modal peaks of 3 and -4 with a residual of 12 combine by hand under every rule") {
  Eigen::MatrixXd half(2, 2);
  half << 1.0, 0.5, 0.5, 1.0;
  const Eigen::RowVector2d peaks(3.0, -4.0);
  for (const double residual : {12.0, -12.0}) {
    CHECK_THAT(combine(peaks, residual, ModalRule::srss, half), is_near(13.0, kRoundoff));
    CHECK_THAT(combine(peaks, residual, ModalRule::absolute_sum, half), is_near(19.0, kRoundoff));
    // 9 + 16 - 2 0.5 12 + 144
    CHECK_THAT(combine(peaks, residual, ModalRule::cqc, half), is_near(std::sqrt(157.0), kRoundoff));
  }
  CHECK_THAT(combine(peaks, 0.0, ModalRule::srss, half), is_near(5.0, kRoundoff));
  CHECK_THAT(combine(peaks, 0.0, ModalRule::absolute_sum, half), is_near(7.0, kRoundoff));
  CHECK_THAT(combine(peaks, 0.0, ModalRule::cqc, half), is_near(std::sqrt(13.0), kRoundoff));
}

TEST_CASE("CQC keeps the signs of modal peaks and SRSS does not") {
  Eigen::MatrixXd half(2, 2);
  half << 1.0, 0.5, 0.5, 1.0;
  CHECK_THAT(combine(Eigen::RowVector2d(3.0, 4.0), 0.0, ModalRule::cqc, half),
             is_near(std::sqrt(37.0), kRoundoff));
  CHECK_THAT(combine(Eigen::RowVector2d(3.0, 4.0), 0.0, ModalRule::srss, half), is_near(5.0, kRoundoff));
}

TEST_CASE("CQC without correlation is SRSS and with full correlation the sum") {
  const Eigen::RowVector3d peaks(3.0, -1.0, 7.0);
  const Eigen::MatrixXd none = Eigen::MatrixXd::Identity(3, 3);
  const Eigen::MatrixXd full = Eigen::MatrixXd::Ones(3, 3);
  CHECK_THAT(combine(peaks, 2.0, ModalRule::cqc, none),
             is_near(combine(peaks, 2.0, ModalRule::srss, none), kRoundoff));
  CHECK_THAT(combine(peaks, 0.0, ModalRule::cqc, full), is_near(9.0, kRoundoff));
}

TEST_CASE("peaks that cancel combine to nothing and not to an error of rounding") {
  // The square is zero to rounding of one sign or the other, its root to the square root of rounding.
  const double tolerance = 4.0 * std::sqrt(std::numeric_limits<double>::epsilon());
  const Eigen::MatrixXd full = Eigen::MatrixXd::Ones(3, 3);
  for (int i = 1; i <= 300; ++i) {
    const double a = 0.1 * i;
    const double b = 0.7 / i;
    const Eigen::RowVector3d peaks(a, -(a + b), b);
    INFO("peaks " << peaks);
    CHECK_THAT(combine(peaks, 0.0, ModalRule::cqc, full), is_near(0.0, 0.0, tolerance * a));
  }
}

TEST_CASE("every response is combined by itself") {
  Eigen::MatrixXd peaks(3, 2);
  peaks << 3.0, 4.0, -5.0, 12.0, 0.0, 0.0;
  const Eigen::VectorXd combined =
      combine_modes(peaks, Eigen::Vector3d(0.0, 0.0, -2.0), ModalRule::srss, Eigen::MatrixXd::Identity(2, 2));
  CHECK_THAT(Eigen::MatrixXd(combined), matrix_near(Eigen::Vector3d(5.0, 13.0, 2.0), kRoundoff));
}

TEST_CASE("the base shears of a five-storey chain combine to the published values") {
  // A. K. Chopra, Dynamics of Structures, ch. 13 (quoted, from memory): kip and s, damping 5 %.
  Eigen::RowVectorXd shear(5);
  shear << 60.469, 24.533, 9.867, 2.943, 0.595;
  Eigen::VectorXd period(5);
  period << 2.0, 0.6852, 0.4346, 0.3383, 0.2966;
  const Eigen::MatrixXd rho =
      correlation_matrix(2.0 * std::numbers::pi * period.cwiseInverse(), Eigen::VectorXd::Constant(5, 0.05));
  CHECK_THAT(rho(0, 1), is_near(0.007, 0.0, kThreeDecimals));
  CHECK_THAT(rho(1, 2), is_near(0.044, 0.0, kThreeDecimals));
  CHECK_THAT(rho(2, 3), is_near(0.136, 0.0, kThreeDecimals));
  CHECK_THAT(rho(3, 4), is_near(0.365, 0.0, kThreeDecimals));
  // The shears are printed to half a thousandth each, and so are the sums: twice that for a combination.
  CHECK_THAT(combine(shear, 0.0, ModalRule::absolute_sum, rho), is_near(98.407, 0.0, 2.0 * kThreeDecimals));
  CHECK_THAT(combine(shear, 0.0, ModalRule::srss, rho), is_near(66.066, 0.0, 2.0 * kThreeDecimals));
  CHECK_THAT(combine(shear, 0.0, ModalRule::cqc, rho), is_near(66.507, 0.0, 2.0 * kThreeDecimals));
}

TEST_CASE(
    "CQC does not depend on how a repeated pair is turned while SRSS may lose up to a factor of root two") {
  // Each mode gives (response of its shape) times (participation); both turn with the shapes. Derived.
  const Eigen::Vector2d response(2.0, 0.0);
  const Eigen::Vector2d gamma(1.0, 0.0);
  const Eigen::MatrixXd rho = correlation_matrix(Eigen::Vector2d(5.0, 5.0), Eigen::Vector2d(0.02, 0.02));
  double least = 2.0;
  for (int degrees = 0; degrees <= 90; degrees += 15) {
    const double angle = degrees * std::numbers::pi / 180.0;
    Eigen::Matrix2d turn;
    turn << std::cos(angle), -std::sin(angle), std::sin(angle), std::cos(angle);
    const Eigen::RowVector2d peaks = (turn * response).cwiseProduct(turn * gamma).transpose();
    CHECK_THAT(combine(peaks, 0.0, ModalRule::cqc, rho), is_near(2.0, kRoundoff));
    least = std::min(least, combine(peaks, 0.0, ModalRule::srss, rho));
  }
  CHECK_THAT(least, is_near(std::sqrt(2.0), kRoundoff));
}

TEST_CASE("modes are close at ten percent and no more beyond it") {
  // (f_j - f_i) / f_i <= 0.1: US NRC RG 1.92 rev. 1 (from memory). 10 and 11 are exact in binary.
  CHECK(has_close_modes(Eigen::Vector2d(10.0, 11.0)));
  CHECK_FALSE(has_close_modes(Eigen::Vector2d(10.0, std::nextafter(11.0, 12.0))));
  CHECK(has_close_modes(Eigen::Vector2d(10.0, 10.0)));
}

TEST_CASE("any pair of neighbours can be the close one") {
  CHECK(has_close_modes(Eigen::Vector4d(1.0, 2.0, 4.0, 4.1)));
  CHECK(has_close_modes(Eigen::Vector4d(1.0, 1.05, 4.0, 8.0)));
  CHECK_FALSE(has_close_modes(Eigen::Vector4d(1.0, 2.0, 4.0, 8.0)));
}

TEST_CASE("a single mode and no mode at all are not close to anything") {
  CHECK_FALSE(has_close_modes(Eigen::VectorXd::Constant(1, 5.0)));
  CHECK_FALSE(has_close_modes(Eigen::VectorXd(0)));
}

}  // namespace swaymark::test
