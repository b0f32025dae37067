#pragma once

#include <array>
#include <optional>
#include <vector>

#include "core/statics.hpp"
#include "core/tower.hpp"
#include "modal/mode_search.hpp"
#include "spectrum/design_spectrum.hpp"

namespace swaymark {

/// One direction of excitation, its modes combined.
struct DirectionResult {
  Axis axis = Axis::x;
  std::string spectrum;
  Eigen::VectorXd acceleration;              ///< Sa of each mode [m/s2]
  double zero_period_acceleration = 0.0;     ///< [m/s2]
  Eigen::VectorXd modal_base_shear;          ///< n_modes [N]
  double base_shear = 0.0;                   ///< [N]
  std::optional<double> overturning_moment;  ///< [N m]
  bool moves = true;                         ///< false where no free mass moves along this axis
  double missing_mass_ratio = 0.0;           ///< share of the moving mass outside the modes kept
  Eigen::VectorXd bar_force;                 ///< n_bars [N], >= 0
  Eigen::VectorXd displacement;              ///< n_free [m], >= 0
  Eigen::VectorXd reaction;                  ///< n_support_dofs [N], >= 0
  std::vector<Index> below_table;            ///< modes whose period is shorter than the spectrum's first
  std::vector<Index> above_table;            ///< modes whose period is longer than its last
};

/// SRSS against CQC where both were computed: SRSS / CQC of one direction.
struct RuleRatio {
  Axis axis = Axis::x;
  double base_shear = 1.0;
  double least_bar = 1.0;  ///< over the bars that carry at least a hundredth of the largest force
  double most_bar = 1.0;
};

struct SeismicResult {
  SeismicStatement statement;
  std::vector<DirectionResult> directions;
  std::vector<SupportDof> supports;
  Eigen::VectorXd bar_gravity;              ///< n_bars [N], tension positive; zero without a vertical axis
  Eigen::VectorXd reaction_gravity;         ///< n_support_dofs [N]
  Eigen::VectorXd bar_force;                ///< n_bars [N], >= 0, directions combined
  Eigen::VectorXd displacement;             ///< n_free [m], >= 0
  Eigen::VectorXd reaction;                 ///< n_support_dofs [N], >= 0
  bool close_modes = false;                 ///< two modes kept lie closer than ten percent
  std::vector<RuleRatio> srss_against_cqc;  ///< where SRSS was asked for and close modes make it doubtful
};

/// The response-spectrum analysis that `tower.seismic` asks for.
/// \param set      the modes and their participation; column k belongs to the tower's k-th axis.
/// \param damping  n_modes, fraction of critical.
[[nodiscard]] SeismicResult seismic_analysis(const Tower& tower, const Assembly& assembly,
                                             const Eigenproblem& problem, const ModeSet& set,
                                             const Eigen::VectorXd& damping);

}  // namespace swaymark
