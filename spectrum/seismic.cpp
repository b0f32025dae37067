#include "spectrum/seismic.hpp"

#include <algorithm>
#include <numbers>

#include "modal/participation.hpp"
#include "spectrum/combine_directions.hpp"
#include "spectrum/combine_modes.hpp"
#include "spectrum/peak.hpp"

namespace swaymark {

namespace {

// The modal peaks of one direction and how they are to be combined.
struct Combination {
  const Responses& peaks;
  const Responses& residual;
  const Eigen::MatrixXd& correlation;

  [[nodiscard]] Eigen::VectorXd of(const Eigen::MatrixXd Responses::*quantity, ModalRule rule) const {
    return combine_modes(peaks.*quantity, residual.*quantity, rule, correlation);
  }
  [[nodiscard]] double of(const Eigen::RowVectorXd Responses::*quantity, ModalRule rule) const {
    return combine_modes(peaks.*quantity, residual.*quantity, rule, correlation)(0);
  }
};

DirectionResult ordinates(const DesignSpectrum& spectrum, Axis axis, const Modes& modes,
                          const Eigen::VectorXd& damping) {
  DirectionResult result;
  result.axis = axis;
  result.spectrum = spectrum.name();
  result.zero_period_acceleration = spectrum.zero_period_acceleration();
  result.acceleration.resize(modes.count());
  for (Index j = 0; j < modes.count(); ++j) {
    const double period = 2.0 * std::numbers::pi / modes.omega(j);
    result.acceleration(j) = spectrum.acceleration(period, damping(j));
    if (spectrum.covers(period)) continue;
    const bool below = period < spectrum.statement().points.front().first;
    (below ? result.below_table : result.above_table).push_back(j);
  }
  return result;
}

RuleRatio ratio_of_rules(const Combination& combine, Axis axis) {
  RuleRatio ratio;
  ratio.axis = axis;
  const double cqc = combine.of(&Responses::base_shear, ModalRule::cqc);
  if (cqc > 0.0) ratio.base_shear = combine.of(&Responses::base_shear, ModalRule::srss) / cqc;
  const Eigen::VectorXd bars_cqc = combine.of(&Responses::bar_force, ModalRule::cqc);
  const Eigen::VectorXd bars_srss = combine.of(&Responses::bar_force, ModalRule::srss);
  const double least_force = 0.01 * bars_cqc.maxCoeff();
  bool first = true;
  for (Index bar = 0; bar < bars_cqc.size(); ++bar) {
    if (bars_cqc(bar) <= least_force) continue;
    const double here = bars_srss(bar) / bars_cqc(bar);
    ratio.least_bar = first ? here : std::min(ratio.least_bar, here);
    ratio.most_bar = first ? here : std::max(ratio.most_bar, here);
    first = false;
  }
  return ratio;
}

Responses none_of(const Responses& like) {
  Responses none;
  none.displacement = Eigen::MatrixXd::Zero(like.displacement.rows(), 1);
  none.bar_force = Eigen::MatrixXd::Zero(like.bar_force.rows(), 1);
  none.reaction = Eigen::MatrixXd::Zero(like.reaction.rows(), 1);
  none.base_shear = Eigen::RowVectorXd::Zero(1);
  if (like.overturning.size() > 0) none.overturning = Eigen::RowVectorXd::Zero(1);
  return none;
}

void add_gravity(const Assembly& assembly, const Factorisation& stiffness, SeismicResult& result) {
  const auto supports = static_cast<Index>(result.supports.size());
  result.bar_gravity = Eigen::VectorXd::Zero(static_cast<Index>(assembly.bars.size()));
  result.reaction_gravity = Eigen::VectorXd::Zero(supports);
  if (!has_gravity(assembly)) return;
  const Eigen::VectorXd weight = weights(assembly);
  const Eigen::VectorXd displacement = stiffness.solve(assembly.dofs.free_part(weight));
  Eigen::VectorXd on_supports(assembly.dofs.fixed_count());
  for (Index i = 0; i < on_supports.size(); ++i) {
    on_supports(i) = -weight(assembly.dofs.fixed_dofs()[static_cast<std::size_t>(i)]);
  }
  result.bar_gravity = assembly.axial * displacement;
  result.reaction_gravity = reactions(result.supports, assembly, displacement, on_supports);
}

Eigen::VectorXd over_directions(const SeismicResult& result, Eigen::VectorXd DirectionResult::*quantity) {
  std::vector<Eigen::VectorXd> each;
  for (const DirectionResult& direction : result.directions) each.push_back(direction.*quantity);
  return combine_directions(each, result.statement.directions);
}

}  // namespace

SeismicResult seismic_analysis(const Tower& tower, const Assembly& assembly, const Eigenproblem& problem,
                               const ModeSet& set, const Eigen::VectorXd& damping) {
  SeismicResult result;
  result.statement = *tower.seismic;
  result.supports = support_dofs(tower, assembly);
  result.close_modes = has_close_modes(set.modes.omega);
  const SeismicStatement& asked = result.statement;
  const Eigen::MatrixXd correlation = correlation_matrix(set.modes.omega, damping);
  const auto& axes = assembly.dofs.axes();
  for (std::size_t k = 0; k < axes.size(); ++k) {
    const auto index = asked.spectrum[static_cast<std::size_t>(axes[k])];
    if (!index) continue;
    const DesignSpectrum spectrum(tower.spectra[*index], asked.factor);
    DirectionResult direction = ordinates(spectrum, axes[k], set.modes, damping);
    const Excitation excitation = excitation_along(tower, assembly, axes[k]);
    const Eigen::VectorXd gamma = set.participation.col(static_cast<Index>(k));
    const Responses peaks =
        modal_peaks(assembly, result.supports, set.modes, excitation, gamma, direction.acceleration);
    const Responses residual =
        asked.missing_mass ? missing_mass_peak(assembly, result.supports, problem.factor(), set.modes,
                                               excitation, gamma, solve_mass(assembly.mass, excitation.drive),
                                               direction.zero_period_acceleration)
                           : none_of(peaks);
    const Combination combine{peaks, residual, correlation};
    direction.modal_base_shear = peaks.base_shear.transpose();
    direction.base_shear = combine.of(&Responses::base_shear, asked.modes);
    if (peaks.overturning.size() > 0)
      direction.overturning_moment = combine.of(&Responses::overturning, asked.modes);
    direction.bar_force = combine.of(&Responses::bar_force, asked.modes);
    direction.displacement = combine.of(&Responses::displacement, asked.modes);
    direction.reaction = combine.of(&Responses::reaction, asked.modes);
    const double moving = set.moving(static_cast<Index>(k));
    direction.moves = moving > 0.0;
    if (direction.moves) direction.missing_mass_ratio = std::max(0.0, 1.0 - gamma.squaredNorm() / moving);
    if (asked.modes == ModalRule::srss && result.close_modes) {
      result.srss_against_cqc.push_back(ratio_of_rules(combine, axes[k]));
    }
    result.directions.push_back(std::move(direction));
  }
  add_gravity(assembly, problem.factor(), result);
  result.bar_force = over_directions(result, &DirectionResult::bar_force);
  result.displacement = over_directions(result, &DirectionResult::displacement);
  result.reaction = over_directions(result, &DirectionResult::reaction);
  return result;
}

}  // namespace swaymark
