#include <numbers>

#include "core/quantity.hpp"
#include "modal/participation.hpp"
#include "spectrum/peak.hpp"
#include "tests/laws/whole.hpp"

/// Forces and reactions balance, mode by mode and as a whole.
namespace swaymark::test {

namespace {

Tower on_springs(Tower tower) {
  Support& soft = tower.supports.front();
  soft.fixed = {false, true, false};
  soft.spring = {3e7, 0.0, 5e7};
  return tower;
}

// With a tank off the centre of its top, and ice.
Tower with_tank(Tower tower) {
  const std::size_t last = tower.nodes.size() - 1;
  stand_tank(tower, {last, last - 1, last - 2}, 0.8, 1.1);
  tower.sections.front().perimeter = 0.3;
  tower.ice.push_back({std::nullopt, 0.03, 900.0, 2.5, std::nullopt, "", {}});
  return tower;
}

// Sum of the reactions along an axis, by column.
Eigen::RowVectorXd sum_along(const std::vector<SupportDof>& supports, const Eigen::MatrixXd& reactions,
                             Axis axis) {
  Eigen::RowVectorXd sum = Eigen::RowVectorXd::Zero(reactions.cols());
  for (std::size_t i = 0; i < supports.size(); ++i) {
    if (supports[i].axis == axis) sum += reactions.row(static_cast<Index>(i));
  }
  return sum;
}

// Moment of the reactions that turns what moves along +axis, about a point, by column.
Eigen::RowVectorXd moment_of(const Tower& tower, const std::vector<SupportDof>& supports,
                             const Eigen::MatrixXd& reactions, Axis axis) {
  const Eigen::Vector3d centre = support_centroid(tower);
  Eigen::RowVectorXd sum = Eigen::RowVectorXd::Zero(reactions.cols());
  for (std::size_t i = 0; i < supports.size(); ++i) {
    const Eigen::Vector3d arm = tower.nodes[supports[i].node].position - centre;
    const auto row = reactions.row(static_cast<Index>(i));
    if (supports[i].axis == axis) sum += arm.z() * row;
    if (supports[i].axis == Axis::z) sum -= arm[index_of(axis)] * row;
  }
  return sum;
}

struct Peaks {
  Model model;
  std::vector<SupportDof> supports;
  Modes modes;
  Excitation excitation;
  Eigen::VectorXd gamma;

  Peaks(const Tower& tower, Axis axis)
      : model(model_of(tower)),
        supports(support_dofs(tower, model.assembly)),
        modes(model.problem().lowest(model.mass().rows())),
        excitation(excitation_along(tower, model.assembly, axis)),
        gamma(participation(modes.shapes, excitation.drive)) {}

  [[nodiscard]] Responses of(const Modes& some, const Eigen::VectorXd& acceleration) const {
    return modal_peaks(model.assembly, supports, some, excitation, gamma.head(some.count()), acceleration);
  }
};

const std::vector<MassScheme> kSchemes{MassScheme::consistent, MassScheme::lumped, MassScheme::averaged};

}  // namespace

TEST_CASE("reactions under gravity add up to the weight") {
  for (const MassScheme scheme : kSchemes) {
    for (Tower tower : {lopsided_mast(), on_springs(lopsided_mast()), with_tank(lopsided_mast())}) {
      tower.mass_scheme = scheme;
      shake(tower, {Axis::x});
      const Analysis analysis = analysed(tower);
      const SeismicResult& seismic = *analysis.seismic;
      const double weight = kStandardGravity * analysis.ledger.total();
      const auto sum = [&](Axis axis) {
        return sum_along(seismic.supports, seismic.reaction_gravity, axis)(0);
      };
      CHECK_THAT(sum(Axis::z), is_near(weight, kSolved));
      CHECK(std::abs(sum(Axis::x)) < kSolved * weight);
      CHECK(std::abs(sum(Axis::y)) < kSolved * weight);
    }
  }
}

TEST_CASE("modal reactions add up to the modal base shear and overturning moment mode by mode") {
  for (const MassScheme scheme : kSchemes) {
    for (Tower tower : {lopsided_mast(), on_springs(lopsided_mast()), with_tank(lopsided_mast())}) {
      tower.mass_scheme = scheme;
      for (const Axis axis : kAllAxes) {
        const Peaks peaks(tower, axis);
        const Index count = peaks.modes.count();
        const Eigen::VectorXd acceleration = Eigen::VectorXd::LinSpaced(count, 1.0, 3.0);
        const Responses each = peaks.of(peaks.modes, acceleration);
        INFO("axis " << name_of(axis));
        // V_n = M*_n Sa(T_n): UFC 3-310-03A (read).
        CHECK_THAT(each.base_shear.transpose().eval(),
                   matrix_near((peaks.gamma.array().square() * acceleration.array()).matrix(), kSolved));
        CHECK_THAT((-sum_along(peaks.supports, each.reaction, axis)).eval(),
                   matrix_near(each.base_shear, kSolved));
        if (axis == Axis::z) continue;
        CHECK_THAT((-moment_of(tower, peaks.supports, each.reaction, axis)).eval(),
                   matrix_near(each.overturning, kSolved));
      }
    }
  }
}

TEST_CASE("the missing mass is the same as every mode left out at the acceleration of period zero") {
  constexpr double zero_period = 1.3;  // invented [m/s2]
  for (const MassScheme scheme : kSchemes) {
    Tower tower = with_tank(on_springs(lopsided_mast()));
    tower.mass_scheme = scheme;
    for (const Axis axis : kAllAxes) {
      const Peaks peaks(tower, axis);
      const Eigenproblem problem = peaks.model.problem();
      const Eigen::VectorXd rigid = solve_mass(peaks.model.mass(), peaks.excitation.drive);
      const Responses all =
          peaks.of(peaks.modes, Eigen::VectorXd::Constant(peaks.modes.count(), zero_period));
      for (const Index kept : {0, 1, 4, 12}) {
        INFO("axis " << name_of(axis) << ", modes kept " << kept);
        const Index left = peaks.modes.count() - kept;
        Modes some = peaks.modes;
        some.omega.conservativeResize(kept);
        some.shapes.conservativeResize(Eigen::NoChange, kept);
        const Responses residual =
            missing_mass_peak(peaks.model.assembly, peaks.supports, problem.factor(), some, peaks.excitation,
                              peaks.gamma.head(kept), rigid, zero_period);
        const auto omitted = [&](const Eigen::MatrixXd& quantity) {
          return quantity.rightCols(left).rowwise().sum().eval();
        };
        CHECK_THAT(residual.bar_force, matrix_near(omitted(all.bar_force), kSolved));
        CHECK_THAT(residual.displacement, matrix_near(omitted(all.displacement), kSolved));
        CHECK_THAT(residual.reaction, matrix_near(omitted(all.reaction), kSolved));
        CHECK_THAT(residual.base_shear(0), is_near(all.base_shear.tail(left).sum(), kSolved));
        if (axis != Axis::z)
          CHECK_THAT(residual.overturning(0), is_near(all.overturning.tail(left).sum(), kSolved));
      }
    }
  }
}

TEST_CASE("the modal sum of a static load is the static solution") {
  // K^-1 p = sum of phi_j (phi_jT p) / omega_j^2 over all modes. Derived.
  std::mt19937 random(81);
  for (const int dimensions : {1, 2, 3}) {
    const Model model = model_of(random_truss(dimensions, 12, random));
    const Eigenproblem problem = model.problem();
    const Modes modes = problem.lowest(model.mass().rows());
    const Eigen::VectorXd load = Eigen::VectorXd::Random(model.mass().rows());
    const Eigen::VectorXd sum =
        modes.shapes * ((modes.shapes.transpose() * load).array() / modes.omega.array().square()).matrix();
    CHECK_THAT(sum, matrix_near(problem.factor().solve(load), kSolved));
  }
}

TEST_CASE("a translation strains no bar") {
  std::mt19937 random(82);
  for (const int dimensions : {1, 2, 3}) {
    Tower tower = random_truss(dimensions, 12, random);
    tower.supports.clear();  // free in space: K u = 0 for u = r
    const Assembly assembly = assemble(tower);
    for (const Axis axis : tower.axes()) {
      const Eigen::VectorXd r = rigid_translation(assembly.dofs, axis);
      const double scale = Eigen::VectorXd(assembly.stiffness.diagonal()).maxCoeff();
      CHECK((assembly.axial * r).cwiseAbs().maxCoeff() <= kRoundoff * scale);
      CHECK((assembly.stiffness * r).cwiseAbs().maxCoeff() <= kRoundoff * scale);
    }
  }
}

}  // namespace swaymark::test
