#include "spectrum/peak.hpp"

#include "modal/participation.hpp"
#include "tests/spectrum/shaken.hpp"

namespace swaymark::test {

namespace {

// A mast with bars that have mass, a carried mass at a support, and feet on springs of three kinds.
Tower mast_on_springs() {
  Mast mast;
  mast.panels = 3;
  mast.turn = 0.3;
  Tower tower = regular_mast(mast);
  carry(tower, 0, 350.0);
  carry(tower, 7, 90.0);  // away from the axis of symmetry
  tower.supports[1].fixed[0] = false;
  tower.supports[1].spring[0] = 4e7;
  tower.supports[2].fixed[2] = false;
  tower.supports[2].spring[2] = 9e7;
  tower.supports[3].fixed = {false, false, false};
  tower.supports[3].spring = {2e7, 3e7, 5e7};
  return tower;
}

struct Peaks {
  std::vector<SupportDof> supports;
  Excitation excitation;
  Eigen::VectorXd gamma;
  Eigen::VectorXd acceleration;
  Responses modal;
};

// The peaks of a tower along its k-th axis under ordinates that differ from mode to mode.
Peaks peaks_of(const Vibrating& v, std::size_t k) {
  Peaks p;
  p.supports = support_dofs(v.tower, v.assembly);
  p.excitation = excitation_along(v.tower, v.assembly, v.assembly.dofs.axes()[k]);
  p.gamma = v.set.participation.col(static_cast<Index>(k));
  p.acceleration = Eigen::VectorXd::LinSpaced(v.set.modes.count(), 2.0, 5.0);
  p.modal = modal_peaks(v.assembly, p.supports, v.set.modes, p.excitation, p.gamma, p.acceleration);
  return p;
}

// Sum over the supports of each reaction times a factor of its own.
template <typename Factor>
Eigen::RowVectorXd sum_of(const std::vector<SupportDof>& supports, const Eigen::MatrixXd& reaction,
                          const Factor& factor) {
  Eigen::RowVectorXd sum = Eigen::RowVectorXd::Zero(reaction.cols());
  for (std::size_t i = 0; i < supports.size(); ++i)
    sum += factor(supports[i]) * reaction.row(static_cast<Index>(i));
  return sum;
}

Eigen::RowVectorXd sum_along(const std::vector<SupportDof>& supports, const Eigen::MatrixXd& reaction,
                             Axis axis) {
  return sum_of(supports, reaction, [axis](const SupportDof& s) { return s.axis == axis ? 1.0 : 0.0; });
}

// Largest entry of a difference against the largest of what was expected.
double far_from(const Eigen::MatrixXd& value, const Eigen::MatrixXd& expected) {
  return (value - expected).cwiseAbs().maxCoeff() / expected.cwiseAbs().maxCoeff();
}

}  // namespace

TEST_CASE("the modal displacement is phi Gamma Sa over omega squared") {
  const Vibrating v(mast_on_springs());
  const Peaks p = peaks_of(v, 0);
  const Modes& modes = v.set.modes;
  for (Index j = 0; j < modes.count(); ++j) {
    const Eigen::VectorXd expected =
        modes.shapes.col(j) * (p.gamma(j) * p.acceleration(j) / std::pow(modes.omega(j), 2));
    CHECK_THAT(p.modal.displacement.col(j).eval(), matrix_near(expected, kRoundoff));
  }
}

TEST_CASE("the modal base shear is the effective mass times the spectral acceleration") {
  // V_n = M*_n Sa(T_n): UFC 3-310-03A (read).
  const Vibrating v(mast_on_springs());
  for (const std::size_t k : {0U, 1U, 2U}) {
    const Peaks p = peaks_of(v, k);
    const Eigen::MatrixXd expected = p.gamma.array().square() * p.acceleration.array();
    CHECK_THAT(Eigen::MatrixXd(p.modal.base_shear.transpose()), matrix_near(expected, kRoundoff));
  }
}

TEST_CASE("modal bar forces are the axial stiffness times the elongation") {
  const Vibrating v(mast_on_springs());
  const Peaks p = peaks_of(v, 1);
  const Eigen::MatrixXd all = v.assembly.dofs.expand(p.modal.displacement);
  Eigen::MatrixXd expected(static_cast<Index>(v.assembly.bars.size()), all.cols());
  for (std::size_t b = 0; b < v.assembly.bars.size(); ++b) {
    const BarElement& bar = v.assembly.bars[b];
    const Eigen::MatrixXd stretch = all.middleRows(v.assembly.dofs.dof(bar.to, 0), 3) -
                                    all.middleRows(v.assembly.dofs.dof(bar.from, 0), 3);
    expected.row(static_cast<Index>(b)) = bar.axial_stiffness * bar.direction.transpose() * stretch;
  }
  CHECK_THAT(p.modal.bar_force, matrix_near(expected, kSolved));
}

TEST_CASE("reactions and springs balance the inertia of every mode along every axis") {
  // The excited axis gives the base shear; the others what the same motion sets free along them:
  // Gamma_k Gamma_x Sa, derived.
  const Vibrating v(mast_on_springs());
  for (const std::size_t excited : {0U, 1U, 2U}) {
    const Peaks p = peaks_of(v, excited);
    const double largest = p.modal.base_shear.cwiseAbs().maxCoeff();
    for (const std::size_t k : {0U, 1U, 2U}) {
      const Eigen::RowVectorXd sum = sum_along(p.supports, p.modal.reaction, v.assembly.dofs.axes()[k]);
      const Eigen::RowVectorXd inertia =
          (v.set.participation.col(static_cast<Index>(k)).array() * p.gamma.array() * p.acceleration.array())
              .matrix()
              .transpose();
      INFO("excited along " << excited << " and summed along " << k);
      CHECK((sum + inertia).cwiseAbs().maxCoeff() <= kSolved * largest);
    }
  }
}

TEST_CASE("the moment of the reactions about the supports' centroid is the overturning moment") {
  const Vibrating v(mast_on_springs());
  const Eigen::Vector3d centre = support_centroid(v.tower);
  for (const std::size_t k : {0U, 1U}) {
    const Peaks p = peaks_of(v, k);
    const Axis along = v.assembly.dofs.axes()[k];
    const Eigen::RowVectorXd moment = sum_of(p.supports, p.modal.reaction, [&](const SupportDof& s) {
      const Eigen::Vector3d arm = v.tower.nodes[s.node].position - centre;
      if (s.axis == along) return arm.z();
      return s.axis == Axis::z ? -arm[index_of(along)] : 0.0;
    });
    CHECK(far_from(-moment, p.modal.overturning) <= kSolved);
  }
}

TEST_CASE("a mass at height h overturns with m h Sa about the feet at whatever level they are") {
  for (const double level : {0.0, 6.0}) {
    TwoLegs legs;
    legs.foot_level = level;
    const Vibrating v(legs.tower());
    const Peaks p = peaks_of(v, 0);
    // Two modes, sway and lift; only sway is driven along x.
    const Eigen::RowVectorXd shear = p.modal.base_shear;
    for (Index j = 0; j < 2; ++j) {
      const double expected = std::abs(p.gamma(j)) > 1.0 ? legs.m * p.acceleration(j) : 0.0;
      CHECK_THAT(shear(j), is_near(expected, kSolved, kSolved));
      CHECK_THAT(p.modal.overturning(j), is_near(legs.h * expected, kSolved, kSolved));
    }
    CHECK_THAT(p.gamma.squaredNorm(), is_near(legs.m, kSolved));
  }
}

TEST_CASE("overturning is taken about the lowest level of supports") {
  // A third support above the feet holds the mass as well; the moment of the inertia force stays m h Sa.
  const TwoLegs legs;
  Tower tower = legs.tower();
  fix(tower, add_node(tower, {3.0, 0.0, 5.0}));
  add_bar(tower, 3, 2);
  const Vibrating v(tower);
  const Peaks p = peaks_of(v, 0);
  // Both modes now move along x and z; the moment is that of both inertia forces about (0, 0).
  const Modes& modes = v.set.modes;
  for (Index j = 0; j < 2; ++j) {
    const double along_x = legs.m * modes.shapes(0, j) * p.gamma(j) * p.acceleration(j);
    CHECK_THAT(p.modal.overturning(j), is_near(legs.h * along_x, kSolved));
  }
}

TEST_CASE("an excitation drives with b and tilts about the supports only where there is a vertical axis") {
  const Vibrating three(mast_on_springs());
  const Excitation x = excitation_along(three.tower, three.assembly, Axis::x);
  CHECK(x.axis == Axis::x);
  CHECK_THAT(Eigen::MatrixXd(x.drive), matrix_near(inertia_vectors(three.assembly).col(0), kRoundoff));
  CHECK(x.tilt.size() == x.drive.size());
  CHECK(excitation_along(three.tower, three.assembly, Axis::z).tilt.size() == 0);
  const Vibrating one(TwoStoreys{}.tower());
  CHECK(excitation_along(one.tower, one.assembly, Axis::x).tilt.size() == 0);
  CHECK(peaks_of(one, 0).modal.overturning.size() == 0);
}

TEST_CASE("a bar with mass hands the inertia of its foot straight to the support") {
  // One bar, consistent, one free end: M_ff = m/3, M_sf = m/6, b = m/2, effective mass b^2 / M_ff = 3/4 m.
  Tower tower = rod(1, 2.0, MassScheme::consistent);
  const double m = 7850.0 * 1e-3 * 2.0;
  const double k = 210e9 * 1e-3 / 2.0;
  const Vibrating v(tower);
  const Peaks p = peaks_of(v, 0);
  const double sa = p.acceleration(0);
  CHECK_THAT(p.modal.base_shear(0), is_near(0.75 * m * sa, kRoundoff));
  CHECK_THAT(p.modal.reaction(0, 0), is_near(-0.75 * m * sa, kRoundoff));
  // The bar itself feels b Sa = m/2 Sa only.
  CHECK_THAT(p.modal.bar_force(0, 0), is_near(0.5 * m * sa, kRoundoff));
  CHECK_THAT(p.modal.displacement(0, 0), is_near(0.5 * m * sa / k, kRoundoff));
}

TEST_CASE("the missing mass answers as all modes left out would at the zero-period acceleration") {
  // Holds for every response quantity: derived from the completeness of the modes.
  constexpr double zero_period = 1.7;
  const Vibrating all(mast_on_springs());
  Tower tower = mast_on_springs();
  tower.modes.count = 4;
  const Vibrating kept(tower);
  REQUIRE(kept.set.modes.count() == 4);
  const Index left_out = all.set.modes.count() - 4;
  for (const std::size_t k : {0U, 1U, 2U}) {
    Peaks full = peaks_of(all, k);
    full.acceleration.setConstant(zero_period);
    const Responses modes = modal_peaks(all.assembly, full.supports, all.set.modes, full.excitation,
                                        full.gamma, full.acceleration);
    const Peaks few = peaks_of(kept, k);
    const Responses missing =
        missing_mass_peak(kept.assembly, few.supports, kept.problem.factor(), kept.set.modes, few.excitation,
                          few.gamma, solve_mass(kept.assembly.mass, few.excitation.drive), zero_period);
    const auto sum = [&](const Eigen::MatrixXd& m) -> Eigen::MatrixXd {
      return m.rightCols(left_out).rowwise().sum();
    };
    INFO("along axis " << k);
    CHECK_THAT(missing.displacement, matrix_near(sum(modes.displacement), kSolved));
    CHECK_THAT(missing.bar_force, matrix_near(sum(modes.bar_force), kSolved));
    CHECK_THAT(missing.reaction, matrix_near(sum(modes.reaction), kSolved));
    CHECK_THAT(Eigen::MatrixXd(missing.base_shear), matrix_near(sum(modes.base_shear), kSolved));
    REQUIRE(missing.overturning.size() == (k == 2 ? 0 : 1));
    if (k != 2)
      CHECK_THAT(Eigen::MatrixXd(missing.overturning), matrix_near(sum(modes.overturning), kSolved));
  }
}

TEST_CASE("nothing is missing when every mode is kept") {
  const Vibrating v(mast_on_springs());
  const Peaks p = peaks_of(v, 0);
  const Responses missing =
      missing_mass_peak(v.assembly, p.supports, v.problem.factor(), v.set.modes, p.excitation, p.gamma,
                        solve_mass(v.assembly.mass, p.excitation.drive), 1.0);
  const double moving = v.set.moving(0);
  CHECK_THAT(missing.base_shear(0), is_near(0.0, 0.0, kSolved * moving));
  CHECK(missing.bar_force.cwiseAbs().maxCoeff() <= kSolved * moving);
}

TEST_CASE("a chain of five equal storeys with two modes kept misses a thirtieth of its mass") {
  // 0.0333 of the mass: derived, five-storey chain with modes 1 and 2 kept.
  constexpr double printed = 0.5e-4;
  Tower tower = massless(1);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  for (std::size_t storey = 1; storey <= 5; ++storey) {
    carry(tower, add_node(tower, {static_cast<double>(storey), 0.0, 0.0}), 1000.0);
    add_bar(tower, storey - 1, storey);
  }
  tower.modes.count = 2;
  const Vibrating v(tower);
  const Peaks p = peaks_of(v, 0);
  const Responses missing =
      missing_mass_peak(v.assembly, p.supports, v.problem.factor(), v.set.modes, p.excitation, p.gamma,
                        solve_mass(v.assembly.mass, p.excitation.drive), 1.0);
  CHECK_THAT(missing.base_shear(0) / 5000.0, is_near(0.0333, 0.0, printed));
  // Closed form: M*_n / m = cot^2(theta/2) / (2N+1), theta = (2n-1) pi / (2N+1).
  double kept = 0.0;
  for (const int n : {1, 2}) {
    const double half_angle = 0.25 * kTurn * (2 * n - 1) / 11.0;
    kept += 1000.0 / (11.0 * std::pow(std::tan(half_angle), 2));
  }
  CHECK_THAT(missing.base_shear(0), is_near(5000.0 - kept, kSolved));
  CHECK_THAT(-missing.reaction(0, 0), is_near(5000.0 - kept, kSolved));
}

}  // namespace swaymark::test
