#include "apps/base_study.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include <Eigen/Eigenvalues>
#include <fmt/format.h>

#include "core/base_study.hpp"

namespace swaymark {

namespace {

constexpr double kTurn = 2.0 * std::numbers::pi;
constexpr Index kFirst = 3;

// The degrees of freedom that give way in the study.
std::vector<Index> studied_dofs(const Tower& tower, const DofMap& dofs) {
  std::vector<Index> list;
  const Axis axis = studied_axis(tower);
  for (Index dof = 0; dof < dofs.dof_count(); ++dof) {
    if (dofs.axis_of(dof) == axis && dofs.fixed(dof) >= 0 && !tower.sloshes(dofs.node_of(dof)))
      list.push_back(dof);
  }
  return list;
}

// The first frequencies [Hz]; sloshing comes first, and is not what is asked about.
std::vector<double> first_frequencies(const Eigenproblem& problem, const Assembly& assembly,
                                      const std::string& supports) {
  const Index wanted = std::min(kFirst + static_cast<Index>(assembly.links.size()), problem.mode_count());
  const Modes modes = problem.lowest(std::min(wanted, problem.most_modes()));
  if (!modes.usable() || modes.count() == 0) {
    throw ComputationError({fmt::format("no modes are found for the base study with {}", supports),
                            "give 'base_study' a range nearer to the stiffness of the tower's legs"});
  }
  std::vector<double> frequencies;
  for (Index j = 0; j < std::min(wanted, modes.count()); ++j) frequencies.push_back(modes.omega(j) / kTurn);
  return frequencies;
}

}  // namespace

double mass_on_support(const Tower& tower, const Assembly& assembly, const Factorisation& stiffness) {
  const std::vector<Index> raised = studied_dofs(tower, assembly.dofs);
  const auto count = static_cast<Index>(raised.size());
  Eigen::MatrixXd pull(assembly.stiffness.rows(), count);
  const SparseMatrix from_supports = assembly.support_stiffness.transpose();
  for (Index s = 0; s < count; ++s) {
    pull.col(s) = -from_supports.col(assembly.dofs.fixed(raised[static_cast<std::size_t>(s)]));
  }
  Eigen::MatrixXd shapes = assembly.dofs.expand(stiffness.solve(pull));
  for (Index s = 0; s < count; ++s) shapes(raised[static_cast<std::size_t>(s)], s) = 1.0;
  const Eigen::MatrixXd mass = shapes.transpose() * (assembly.mass_all * shapes);
  return Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd>(mass, Eigen::EigenvaluesOnly)
      .eigenvalues()
      .maxCoeff();
}

BaseStudy study_base(const Tower& tower, const Assembly& assembly, const Eigenproblem& problem) {
  BaseStudy study;
  study.axis = studied_axis(tower);
  study.supports = studied_dofs(tower, assembly.dofs).size();
  const double mass = mass_on_support(tower, assembly, problem.factor());
  const std::vector<double> rigid = first_frequencies(problem, assembly, "rigid supports");
  for (const double stiffness : studied_stiffnesses(*tower.base_study)) {
    const Assembly variant = assemble(on_leg_springs(tower, stiffness));
    const Eigenproblem soft(variant.stiffness, variant.mass);
    const double base = std::sqrt(stiffness / mass) / kTurn;
    study.rows.push_back({stiffness,
                          first_frequencies(soft, variant, fmt::format("springs of {:.4g} N/m", stiffness)),
                          1.0 / std::hypot(1.0 / rigid.front(), 1.0 / base)});
  }
  study.rows.push_back({std::nullopt, rigid, std::nullopt});
  return study;
}

}  // namespace swaymark
