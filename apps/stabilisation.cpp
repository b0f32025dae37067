#include "apps/stabilisation.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "core/statics.hpp"

namespace swaymark {

namespace {

constexpr double kTurn = 2.0 * std::numbers::pi;
constexpr std::size_t kFollowed = 3;
constexpr double kWhole = 0.01;  // of the moving mass: a mode that moves the tower, and no loose node alone
constexpr double kIndependent = 1e-3;   // a tenth of what a check of frequencies asks for
constexpr double kAlike = 0.5;          // of a shape: below it no mode there is the one that is followed
constexpr double kMostCarried = 0.005;  // of the weight: more is no loose node that carries nothing
constexpr double kReach = 1.5;          // of the highest followed frequency: modes are looked for up to there
constexpr double kRepeated = 1e-4;      // relative distance of frequencies whose shapes are one subspace

std::vector<Index> followed_modes(const Analysis& analysis) {
  std::vector<Index> modes;
  for (Index j = 0; j < analysis.mode_count() && modes.size() < kFollowed; ++j) {
    const bool sloshes = analysis.character[static_cast<std::size_t>(j)] == "liquid";
    if (!sloshes && analysis.mass_ratio.row(j).maxCoeff() >= kWhole) modes.push_back(j);
  }
  for (Index j = 0; j < analysis.mode_count() && modes.empty(); ++j) modes.push_back(j);
  return modes;
}

// How much of the subspace of a mode, and of the modes at its frequency, each column of `shapes` has.
Eigen::VectorXd likeness(const Analysis& analysis, Index mode, const Eigen::MatrixXd& shapes) {
  const Eigen::MatrixXd weighted = analysis.assembly.mass * shapes;
  Eigen::VectorXd sum = Eigen::VectorXd::Zero(shapes.cols());
  for (Index j = 0; j < analysis.mode_count(); ++j) {
    if (std::abs(analysis.frequency(j) / analysis.frequency(mode) - 1.0) > kRepeated) continue;
    sum += (weighted.transpose() * analysis.set.modes.shapes.col(j)).cwiseAbs2();
  }
  return sum;
}

Modes modes_up_to(const Eigenproblem& problem, double frequency) {
  const double omega = kTurn * frequency;
  const auto below = problem.below(omega * omega);
  const Index wanted =
      std::clamp<Index>(below ? below->below : problem.most_modes(), 1, problem.most_modes());
  Modes modes = problem.lowest(wanted);
  if (!modes.usable() || modes.count() == 0)
    throw ComputationError({"no modes are found with other stabilising springs",
                            "state a 'stabilise' nearer to the stiffness of the tower's bars"});
  return modes;
}

std::string range_words(double from, double to) {
  const auto words = [](double stiffness) {
    return stiffness >= 1e6 ? fmt::format("{:.3g} MN/m", 1e-6 * stiffness)
                            : fmt::format("{:.3g} kN/m", 1e-3 * stiffness);
  };
  return from == to ? words(from) : fmt::format("{} to {}", words(from), words(to));
}

}  // namespace

double Stabilisation::Row::largest_change() const {
  return std::max(std::abs(frequency[0] / frequency[1] - 1.0), std::abs(frequency[2] / frequency[1] - 1.0));
}

bool Stabilisation::independent() const {
  return std::all_of(rows.begin(), rows.end(),
                     [](const Row& row) { return row.found && row.largest_change() <= kIndependent; });
}

Stabilisation study_stabilisation(const Analysis& analysis, const Eigenproblem& problem) {
  Stabilisation study;
  const auto& stated = analysis.tower.stabilisers;
  study.springs = analysis.assembly.stabilisers.size();
  const auto [softest, stiffest] = std::minmax_element(
      stated.begin(), stated.end(), [](const auto& a, const auto& b) { return a.stiffness < b.stiffness; });
  study.softest = softest->stiffness;
  study.stiffest = stiffest->stiffness;
  for (const Index mode : followed_modes(analysis))
    study.rows.push_back({mode, true, {0.0, analysis.frequency(mode), 0.0}});
  const double highest = analysis.frequency(study.rows.back().mode);
  for (const std::size_t end : {std::size_t{0}, std::size_t{2}}) {
    Tower tower = analysis.tower;
    for (Stabiliser& stabiliser : tower.stabilisers) stabiliser.stiffness *= Stabilisation::kFactors[end];
    const Assembly variant = assemble(tower);
    const Modes modes = modes_up_to(Eigenproblem(variant.stiffness, variant.mass), kReach * highest);
    for (auto& row : study.rows) {
      Index best = 0;
      const double like = likeness(analysis, row.mode, modes.shapes).maxCoeff(&best);
      row.found = row.found && like >= kAlike;
      row.frequency[end] = modes.omega(best) / kTurn;
    }
  }
  if (has_gravity(analysis.assembly)) {
    const Eigen::VectorXd weight = weights(analysis.assembly);
    const Eigen::VectorXd sag =
        analysis.assembly.dofs.expand(problem.factor().solve(analysis.assembly.dofs.free_part(weight)));
    double carried = 0.0;
    for (const NeighbourSpring& spring : analysis.assembly.stabilisers) {
      double elongation = 0.0;
      for (const auto& [dof, value] : spring.elongation) elongation += value * sag(dof);
      carried += std::abs(spring.stiffness * elongation);
    }
    if (weight.cwiseAbs().sum() > 0.0) study.share_of_weight = carried / weight.cwiseAbs().sum();
  }
  return study;
}

std::string stabilisation_note(const Stabilisation& study) {
  double largest = 0.0;
  std::string figures;
  for (const auto& row : study.rows) {
    largest = std::max(largest, row.largest_change());
    figures +=
        fmt::format("{}mode {}: {}, {}, {} Hz", figures.empty() ? "" : "; ", row.mode + 1,
                    figure(row.frequency[0], 3), figure(row.frequency[1], 3), figure(row.frequency[2], 3));
  }
  const std::string from =
      range_words(Stabilisation::kFactors[0] * study.softest, Stabilisation::kFactors[0] * study.stiffest);
  const std::string to =
      range_words(Stabilisation::kFactors[2] * study.softest, Stabilisation::kFactors[2] * study.stiffest);
  std::string note = fmt::format(
      "{}{} stabilising spring{} of {}: over three decades of stiffness, {} to {}, the first "
      "frequencies {} "
      "({}; largest change {:.2g} %)",
      study.independent() && study.share_of_weight <= kMostCarried ? "" : "WARNING: ", study.springs,
      study.springs == 1 ? "" : "s", range_words(study.softest, study.stiffest), from, to,
      study.independent() ? "do not depend on them" : "DEPEND on them, so hold these nodes by bars", figures,
      100.0 * largest);
  constexpr double rounding = 1e-6;
  if (study.share_of_weight > rounding)
    note += fmt::format("; their forces under dead load add up to {:.2g} % of the weight",
                        100.0 * study.share_of_weight);
  return note;
}

}  // namespace swaymark
