#include <cmath>
#include <numbers>

#include "spectrum/combine_modes.hpp"
#include "tests/reference/cases.hpp"

/// The uniform five-storey chain: Chopra, Dynamics of Structures, 2nd ed. 2001, 12.11, 13.2.6 and 13.8.
namespace swaymark::test {

namespace {

// SRSS, CQC and absolute sum from the published modal base shears agree within these
// (data/reference/README.md).
constexpr double kBaseShear = 1e-5;
constexpr double kTopShear = 3e-5;

struct Chain {
  Json data = reference_data("chain5_chopra");
  Analysis analysis = analysed(reference_tower(data));
  Eigen::VectorXd omega = 2.0 * std::numbers::pi * analysis.frequency;

  [[nodiscard]] Eigen::RowVectorXd modal_base_shear() const {
    const auto values =
        data.at("base_excitation").at("published_modal_base_shear_N").get<std::vector<double>>();
    return Eigen::Map<const Eigen::RowVectorXd>(values.data(), static_cast<Index>(values.size()));
  }
  [[nodiscard]] Eigen::MatrixXd correlation() const {
    const auto damping = data.at("base_excitation").at("damping").get<double>();
    return correlation_matrix(omega, Eigen::VectorXd::Constant(omega.size(), damping));
  }
};

double combined(const Eigen::RowVectorXd& peaks, ModalRule rule, const Eigen::MatrixXd& rho) {
  return combine_modes(peaks, Eigen::VectorXd::Zero(1), rule, rho)(0);
}

void check_row(const Json& published, const Eigen::VectorXd& found, double tolerance, int& checks) {
  for (std::size_t j = 0; j < published.size(); ++j) {
    if (published[j].is_null()) continue;
    INFO("entry " << j + 1);
    CHECK_THAT(found(static_cast<Index>(j)), is_near(published[j].get<double>(), 0.0, tolerance));
    ++checks;
  }
}

Eigen::VectorXd running_sum(const Eigen::VectorXd& terms) {
  Eigen::VectorXd sums = terms;
  for (Index j = 1; j < sums.size(); ++j) sums(j) += sums(j - 1);
  return sums;
}

}  // namespace

TEST_CASE("the five-storey chain has the frequencies and effective masses of its closed form") {
  // omega = 2 sqrt(k/m) sin(theta/2), M*/m = cot^2(theta/2) / (2N + 1), theta = (2n - 1) pi / (2N + 1).
  // Derived.
  const Chain chain;
  const auto mass = chain.data.at("base_excitation").at("m_kg").get<double>();
  const double k = chain.analysis.assembly.bars.front().axial_stiffness;
  REQUIRE(chain.omega.size() == 5);
  for (int n = 1; n <= 5; ++n) {
    INFO("mode " << n);
    const double half = (2.0 * n - 1.0) * std::numbers::pi / 22.0;
    CHECK_THAT(chain.omega(n - 1), is_near(2.0 * std::sqrt(k / mass) * std::sin(half), kSolved));
    CHECK_THAT(std::pow(chain.analysis.set.participation(n - 1, 0), 2) / mass,
               is_near(1.0 / (11.0 * std::pow(std::tan(half), 2)), kSolved));
  }
}

TEST_CASE("the five-storey chain has its published periods and effective masses") {
  const Chain chain;
  INFO(source_of(chain.data));
  constexpr double half_a_digit = 0.5e-3;
  const auto mass = chain.data.at("base_excitation").at("m_kg").get<double>();
  const Eigen::VectorXd effective = chain.analysis.set.participation.col(0).array().square() / mass;
  int checks = 0;
  check_row(chain.data.at("published_effective_masses_over_m_3_decimals"), effective, half_a_digit, checks);
  CHECK(checks == 5);
  // T = 2.0 .6852 .4346 .3383 .2966 s and 87.95 8.72 2.42 .75 .16 % of the mass (from memory, reproduced).
  const std::vector<double> periods{2.0, 0.6852, 0.4346, 0.3383, 0.2966};
  const std::vector<double> percent{87.95, 8.72, 2.42, 0.75, 0.16};
  const auto tolerance = chain.data.at("frequency_tolerance").get<double>();
  for (std::size_t j = 0; j < periods.size(); ++j) {
    const auto mode = static_cast<Index>(j);
    CHECK_THAT(1.0 / chain.analysis.frequency(mode), is_near(periods[j], tolerance));
    CHECK_THAT(100.0 * chain.analysis.mass_ratio(mode, 0), is_near(percent[j], 0.0, 0.5e-2));
  }
}

TEST_CASE("published modal base shears combine to the published SRSS and CQC and absolute sum") {
  const Chain chain;
  INFO(source_of(chain.data));
  const Json& published = chain.data.at("base_excitation");
  const Eigen::RowVectorXd peaks = chain.modal_base_shear();
  const Eigen::MatrixXd rho = chain.correlation();
  CHECK_THAT(combined(peaks, ModalRule::srss, rho),
             is_near(published.at("published_SRSS_N").get<double>(), kBaseShear));
  CHECK_THAT(combined(peaks, ModalRule::cqc, rho),
             is_near(published.at("published_CQC_N").get<double>(), kBaseShear));
  CHECK_THAT(combined(peaks, ModalRule::absolute_sum, rho),
             is_near(published.at("published_ABSSUM_N").get<double>(), kBaseShear));
}

TEST_CASE("the shear of the top storey combines to the published CQC value") {
  const Chain chain;
  INFO(source_of(chain.data));
  // Force of the top bar in mode n: V_n s_5n / M*_n with s_5n = Gamma_n m phi_5n.
  const Eigen::VectorXd gamma = chain.analysis.set.participation.col(0);
  const Eigen::MatrixXd& shapes = chain.analysis.set.modes.shapes;
  const auto mass = chain.data.at("base_excitation").at("m_kg").get<double>();
  const Eigen::RowVectorXd share = mass * shapes.row(4).array() / gamma.transpose().array();
  const Eigen::RowVectorXd top = chain.modal_base_shear().array() * share.array();
  CHECK_THAT(
      combined(top, ModalRule::cqc, chain.correlation()),
      is_near(chain.data.at("base_excitation").at("published_top_shear_CQC_N").get<double>(), kTopShear));
}

TEST_CASE("the correlations of the chain are those published") {
  // rho_12 .007, rho_23 .044, rho_34 .136, rho_45 .365 at 5 % (quoted / from memory, Chopra).
  constexpr double half_a_digit = 0.5e-3;
  const Chain chain;
  const Eigen::MatrixXd rho = chain.correlation();
  const std::vector<double> published{0.007, 0.044, 0.136, 0.365};
  for (std::size_t i = 0; i < published.size(); ++i) {
    const auto mode = static_cast<Index>(i);
    CHECK_THAT(rho(mode, mode + 1), is_near(published[i], 0.0, half_a_digit));
  }
}

TEST_CASE("modal contributions to roof displacement and base shear are those published") {
  const Chain chain;
  INFO(source_of(chain.data));
  const Json& factors = chain.data.at("modal_contribution_factors");
  const auto tolerance = factors.at("tolerance_abs").get<double>();
  const Modes& modes = chain.analysis.set.modes;
  const Eigen::VectorXd ones = Eigen::VectorXd::Ones(5);
  int checks = 0;
  for (const Json& pattern : factors.at("cases")) {
    const auto values = pattern.at("load_pattern").get<std::vector<double>>();
    const Eigen::VectorXd load = Eigen::Map<const Eigen::VectorXd>(values.data(), 5);
    // s_n = M phi_n (phi_nT s): the part of the load that drives mode n; K^-1 s_n = phi_n phi_nT s / omega^2.
    const Eigen::VectorXd drive = modes.shapes.transpose() * load;
    const Eigen::VectorXd roof =
        modes.shapes.row(4).transpose().array() * drive.array() / modes.omega.array().square();
    const Eigen::VectorXd shear =
        (ones.transpose() * chain.analysis.assembly.mass * modes.shapes).transpose().array() * drive.array();
    const Eigen::VectorXd roof_share = roof / roof.sum();
    const Eigen::VectorXd shear_share = shear / load.sum();
    check_row(pattern.at("published_u_n"), roof_share, tolerance, checks);
    check_row(pattern.at("published_u_cum"), running_sum(roof_share), tolerance, checks);
    check_row(pattern.at("published_V_n"), shear_share, tolerance, checks);
    check_row(pattern.at("published_V_cum"), running_sum(shear_share), tolerance, checks);
  }
  CHECK(checks == 35);  // of forty entries five could not be read
}

}  // namespace swaymark::test
