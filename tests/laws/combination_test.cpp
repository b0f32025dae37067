#include <numbers>

#include <Eigen/Geometry>

#include "modal/participation.hpp"
#include "spectrum/combine_modes.hpp"
#include "spectrum/peak.hpp"
#include "tests/laws/whole.hpp"

/// Combination rules on whole towers.
namespace swaymark::test {

namespace {

Analysis under(Tower tower, ModalRule rule, double damping = 0.02) {
  tower.seismic->modes = rule;
  tower.damping = {damping};
  return analysed(tower);
}

// Equal rods side by side, each of its own.
Tower equal_rods(int rods) {
  Tower tower = bare_tower(1);
  for (int i = 0; i < rods; ++i) {
    std::size_t before = add_node(tower, {0.0, 0.0, 0.0});
    fix(tower, before);
    for (int k = 1; k <= 3; ++k) {
      const std::size_t next = add_node(tower, {20.0 * k, 0.0, 0.0});
      add_bar(tower, before, next);
      before = next;
    }
  }
  return tower;
}

}  // namespace

TEST_CASE("CQC tends to SRSS as the damping vanishes") {
  Tower tower = lopsided_mast();
  shake(tower, {Axis::x, Axis::y});
  const auto srss = peaks_by_name(under(tower, ModalRule::srss));
  double before = std::numeric_limits<double>::infinity();
  for (const double damping : {0.05, 1e-2, 1e-3, 1e-6}) {
    const auto cqc = peaks_by_name(under(tower, ModalRule::cqc, damping));
    const double off = std::abs(cqc.at("base shear x") / srss.at("base shear x") - 1.0);
    CHECK(off < before);
    before = off;
  }
  check_same_peaks(peaks_by_name(under(tower, ModalRule::cqc, 1e-12)), srss);
}

TEST_CASE("the absolute sum is the most and SRSS without signs lies below it") {
  Tower tower = lopsided_mast();
  shake(tower, {Axis::x});
  const auto absolute = peaks_by_name(under(tower, ModalRule::absolute_sum));
  for (const ModalRule rule : {ModalRule::cqc, ModalRule::srss}) {
    for (const auto& [name, value] : peaks_by_name(under(tower, rule))) {
      if (name.rfind("gravity", 0) == 0) continue;
      INFO(name);
      CHECK(value <= absolute.at(name) * (1.0 + kSolved));
    }
  }
}

TEST_CASE("CQC of a repeated pair does not depend on how its shapes are turned and SRSS does") {
  const Tower tower = regular_mast({});
  const Model model = model_of(tower);
  const Modes pair = model.problem().lowest(2);
  REQUIRE(pair.count() == 2);
  const auto supports = support_dofs(tower, model.assembly);
  const Excitation excitation = excitation_along(tower, model.assembly, Axis::x);
  const Eigen::MatrixXd rho = correlation_matrix(pair.omega, Eigen::Vector2d(0.02, 0.02));
  const auto shear = [&](const Modes& modes, ModalRule rule) {
    const Eigen::VectorXd gamma = participation(modes.shapes, excitation.drive);
    const Responses peaks =
        modal_peaks(model.assembly, supports, modes, excitation, gamma, Eigen::Vector2d(1.0, 1.0));
    return std::pair(
        combine_modes(peaks.base_shear, Eigen::VectorXd::Zero(1), rule, rho)(0),
        combine_modes(peaks.bar_force, Eigen::VectorXd::Zero(peaks.bar_force.rows()), rule, rho));
  };
  // One shape in the direction of excitation: nothing to combine, every rule gives the true value.
  const Eigen::VectorXd gamma = participation(pair.shapes, excitation.drive);
  const double whole = gamma.squaredNorm();
  const double aligned = std::atan2(gamma(1), gamma(0));
  const auto reference = shear(pair, ModalRule::cqc);
  double least_srss = 1.0;
  for (int step = 0; step <= 16; ++step) {
    const double angle = step * std::numbers::pi / 8.0;
    Modes turned = pair;
    turned.shapes = pair.shapes * Eigen::Rotation2Dd(aligned + angle).toRotationMatrix();
    const auto cqc = shear(turned, ModalRule::cqc);
    CHECK_THAT(cqc.first, is_near(whole, kSolved));
    CHECK_THAT(cqc.second, matrix_near(reference.second, kSolved));
    // SRSS by hand: V = whole (cos^2, sin^2), so SRSS / whole = sqrt(cos^4 + sin^4).
    const double expected = std::sqrt(std::pow(std::cos(angle), 4) + std::pow(std::sin(angle), 4));
    const double srss = shear(turned, ModalRule::srss).first / whole;
    CHECK_THAT(srss, is_near(expected, kSolved));
    least_srss = std::min(least_srss, srss);
  }
  CHECK_THAT(least_srss, is_near(1.0 / std::numbers::sqrt2, kSolved));
}

TEST_CASE("equal rods side by side shake as one and their CQC base shears add up") {
  Tower one = equal_rods(1);
  Tower three = equal_rods(3);
  for (Tower* tower : {&one, &three}) {
    tower->modes = {};
    tower->modes.count = tower == &one ? 1 : 3;  // the first mode of every rod
    shake(*tower, {Axis::x});
    tower->seismic->missing_mass = false;
  }
  const double alone = along(under(one, ModalRule::cqc), Axis::x).base_shear;
  const double together = along(under(three, ModalRule::cqc), Axis::x).base_shear;
  CHECK(alone > 0.0);
  CHECK_THAT(together, is_near(3.0 * alone, kSolved));
  CHECK_THAT(along(under(three, ModalRule::absolute_sum), Axis::x).base_shear, is_near(together, kSolved));
}

TEST_CASE("repeated modes in phase give their absolute sum by CQC and less by SRSS") {
  // Two copies of one oscillator, each seen by its own shape: V_i = m Sa.
  const Eigen::RowVector2d peaks(5.0, 5.0);
  const Eigen::MatrixXd rho = correlation_matrix(Eigen::Vector2d(7.0, 7.0), Eigen::Vector2d(0.03, 0.03));
  const Eigen::VectorXd none = Eigen::VectorXd::Zero(1);
  CHECK_THAT(combine_modes(peaks, none, ModalRule::cqc, rho)(0), is_near(10.0, kRoundoff));
  CHECK_THAT(combine_modes(peaks, none, ModalRule::srss, rho)(0), is_near(std::sqrt(50.0), kRoundoff));
}

}  // namespace swaymark::test
