#include <algorithm>
#include <numeric>
#include <random>

#include <Eigen/Geometry>

#include "modal/participation.hpp"
#include "spectrum/combine_modes.hpp"
#include "spectrum/peak.hpp"
#include "tests/laws/whole.hpp"

/// What must not matter does not: the unit of stiffness, the heading of the tower, the order of the file.
namespace swaymark::test {

namespace {

Tower headed(Tower tower, double angle) {
  const Eigen::Matrix3d turn = Eigen::AngleAxisd(angle, Eigen::Vector3d::UnitZ()).toRotationMatrix();
  for (Node& node : tower.nodes) node.position = turn * node.position;
  return tower;
}

// A frequency [Hz] a little above the eighth mode or one of the next, clear of all modes.
double in_a_gap(Tower tower) {
  ask_for_all_modes(tower);
  const Eigen::VectorXd frequency = analysed(tower).frequency;
  Index mode = 8;
  while (frequency(mode) < 1.01 * frequency(mode - 1)) ++mode;
  return 0.5 * (frequency(mode - 1) + frequency(mode));
}

const std::vector<double> kHeadings{0.2, 0.785, 1.0, 1.57, 2.6, 4.0};

// The same tower in another order, with some bars stated the other way round; names stay.
Tower renumbered(const Tower& tower, std::mt19937& random) {
  std::vector<std::size_t> order(tower.nodes.size());
  std::iota(order.begin(), order.end(), std::size_t{0});
  std::shuffle(order.begin(), order.end(), random);
  std::vector<std::size_t> place(order.size());
  for (std::size_t i = 0; i < order.size(); ++i) place[order[i]] = i;
  Tower other = tower;
  for (std::size_t i = 0; i < order.size(); ++i) other.nodes[i] = tower.nodes[order[i]];
  for (Bar& bar : other.bars) {
    bar.from = place[bar.from];
    bar.to = place[bar.to];
    if (random() % 2 == 0) std::swap(bar.from, bar.to);
  }
  std::shuffle(other.bars.begin(), other.bars.end(), random);
  for (Support& support : other.supports) support.node = place[support.node];
  std::shuffle(other.supports.begin(), other.supports.end(), random);
  for (NodeMass& mass : other.node_masses) {
    for (std::size_t& node : mass.nodes) node = place[node];
  }
  return other;
}

}  // namespace

TEST_CASE("four times the modulus doubles every frequency") {
  for (Tower tower : {lopsided_mast(), regular_mast({}), rod(9, 10.0, MassScheme::averaged)}) {
    ask_for_all_modes(tower);
    const Eigen::VectorXd before = analysed(tower).frequency;
    for (Material& material : tower.materials) material.youngs_modulus *= 4.0;
    const Eigen::VectorXd after = analysed(tower).frequency;
    REQUIRE(after.size() == before.size());
    for (Index j = 0; j < before.size(); ++j) CHECK_THAT(after(j), is_near(2.0 * before(j), kSolved));
  }
}

TEST_CASE("four times every mass halves every frequency") {
  Tower tower = lopsided_mast();
  ask_for_all_modes(tower);
  const Eigen::VectorXd before = analysed(tower).frequency;
  for (Material& material : tower.materials) material.density *= 4.0;
  for (NodeMass& mass : tower.node_masses) mass.total *= 4.0;
  const Eigen::VectorXd after = analysed(tower).frequency;
  for (Index j = 0; j < before.size(); ++j) CHECK_THAT(after(j), is_near(0.5 * before(j), kSolved));
}

TEST_CASE("the heading of a tower changes no frequency and no effective mass x plus y") {
  for (Tower tower : {lopsided_mast(), regular_mast({})}) {
    ask_for_all_modes(tower);
    const Analysis north = analysed(tower);
    const Eigen::MatrixXd mass = north.set.participation.array().square();
    for (const double heading : kHeadings) {
      INFO("heading " << heading);
      const Analysis other = analysed(headed(tower, heading));
      REQUIRE(other.mode_count() == north.mode_count());
      const Eigen::MatrixXd turned = other.set.participation.array().square();
      const double whole = mass.sum();
      for (Index j = 0; j < north.mode_count(); ++j) {
        INFO("mode " << j + 1);
        CHECK_THAT(other.frequency(j), is_near(north.frequency(j), kSolved));
        // Shares within a repeated mode are a matter of choice; they count together.
        Index begin = j;
        Index end = j + 1;
        while (begin > 0 && north.frequency(begin - 1) > north.frequency(j) * (1.0 - 1e-7)) --begin;
        while (end < north.mode_count() && north.frequency(end) < north.frequency(j) * (1.0 + 1e-7)) ++end;
        CHECK_THAT(turned.block(begin, 0, end - begin, 2).sum(),
                   is_near(mass.block(begin, 0, end - begin, 2).sum(), kSolved, kSolved * whole));
      }
    }
  }
}

TEST_CASE("equal spectra along x and y give the same bar forces at every heading") {
  // Sum of Rxi Rxj + Ryi Ryj does not depend on the axes.
  for (Tower tower : {lopsided_mast(), regular_mast({})}) {
    shake(tower, {Axis::x, Axis::y});
    // A share of the mass along x and y would be met by another number of modes at another heading.
    tower.modes = {};
    tower.modes.up_to = in_a_gap(tower);
    const Analysis north = analysed(tower);
    CHECK(north.mode_count() < north.assembly.dofs.free_count());
    for (const double heading : kHeadings) {
      INFO("heading " << heading);
      const Analysis other = analysed(headed(tower, heading));
      CHECK(other.mode_count() == north.mode_count());
      CHECK_THAT(other.seismic->bar_force, matrix_near(north.seismic->bar_force, kSolved));
    }
  }
}

TEST_CASE("CQC peaks under an excitation that turns with the tower do not change") {
  Tower tower = lopsided_mast();
  shake(tower, {Axis::x});
  ask_for_all_modes(tower);
  const Analysis north = analysed(tower);
  const DirectionResult& expected = along(north, Axis::x);
  for (const double heading : kHeadings) {
    INFO("heading " << heading);
    const Tower turned = headed(tower, heading);
    const Model model = model_of(turned);
    const Modes modes = model.problem().lowest(model.mass().rows());
    Excitation excitation = excitation_along(turned, model.assembly, Axis::x);
    const Excitation square = excitation_along(turned, model.assembly, Axis::y);
    excitation.drive = std::cos(heading) * excitation.drive + std::sin(heading) * square.drive;
    excitation.tilt = std::cos(heading) * excitation.tilt + std::sin(heading) * square.tilt;
    const Eigen::VectorXd gamma = participation(modes.shapes, excitation.drive);
    const auto supports = support_dofs(turned, model.assembly);
    const Responses peaks =
        modal_peaks(model.assembly, supports, modes, excitation, gamma, expected.acceleration);
    const Eigen::MatrixXd rho =
        correlation_matrix(modes.omega, Eigen::VectorXd::Constant(modes.count(), 0.02));
    const auto combined = [&](const Eigen::MatrixXd& quantity) {
      return combine_modes(quantity, Eigen::VectorXd::Zero(quantity.rows()), ModalRule::cqc, rho);
    };
    CHECK_THAT(combined(peaks.bar_force), matrix_near(expected.bar_force, kSolved));
    CHECK_THAT(combined(peaks.base_shear)(0), is_near(expected.base_shear, kSolved));
    CHECK_THAT(combined(peaks.overturning)(0), is_near(*expected.overturning_moment, kSolved));
  }
}

TEST_CASE("renumbering nodes and reversing bars changes no result") {
  std::mt19937 random(71);
  for (Tower tower : {lopsided_mast(), regular_mast({})}) {
    shake(tower, {Axis::x, Axis::y, Axis::z});
    const Analysis first = analysed(tower);
    for (int i = 0; i < 4; ++i) {
      const Analysis second = analysed(renumbered(tower, random));
      REQUIRE(second.mode_count() == first.mode_count());
      CHECK_THAT(second.frequency, matrix_near(first.frequency, kSolved));
      check_same_peaks(peaks_by_name(second), peaks_by_name(first));
    }
  }
}

}  // namespace swaymark::test
