#include "apps/analysis.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include <fmt/format.h>

#include "apps/notes.hpp"
#include "apps/segment_notes.hpp"
#include "apps/shared_work.hpp"
#include "apps/stabilisation.hpp"
#include "modal/damping.hpp"
#include "modal/mode_character.hpp"
#include "modal/participation.hpp"

namespace swaymark {

namespace {

constexpr double kTurn = 2.0 * std::numbers::pi;

ModeTarget target_of(const Analysis& analysis) {
  const Tower& tower = analysis.tower;
  ModeTarget target;
  if (tower.modes.count) target.count = *tower.modes.count;
  if (tower.modes.up_to) target.omega_up_to = kTurn * *tower.modes.up_to;
  target.mass_share = tower.modes.mass_share;
  target.share_directions = analysis.excited();
  if (analysis.scope == Scope::check && !tower.bands.empty()) {
    double reach = 0.0;
    for (const BandStatement& band : tower.bands) reach = std::max(reach, band_reach(band));
    target.omega_covered = kTurn * reach;
  }
  return target;
}

void require_usable(const ModeSet& set) {
  switch (set.modes.status) {
    case ModesStatus::complete:
    case ModesStatus::uncounted:
      break;
    case ModesStatus::incomplete:
      throw ComputationError({"modes are missing: the count from the factorisation and the solver disagree",
                              "look for stiffnesses or masses that differ by many powers of ten"});
    case ModesStatus::not_converged:
      throw ComputationError(
          {"the eigensolver did not converge", "ask for fewer modes, or look for very unequal stiffnesses"});
    case ModesStatus::not_positive_definite:
      throw ComputationError({"the stiffness matrix is singular to working precision",
                              "look for stiffnesses that differ by more than ten powers of ten"});
  }
  if (set.reached) return;
  throw ComputationError(
      {fmt::format("more modes are asked for than can be extracted ({} of {})", set.modes.count(),
                   set.available),
       "ask for fewer modes, a lower frequency or a smaller mass share, or shorten the bands"});
}

Eigen::MatrixXd motion_of(const DofMap& dofs, std::size_t nodes, const Eigen::VectorXd& shape) {
  Eigen::MatrixXd motion = Eigen::MatrixXd::Zero(static_cast<Index>(nodes), 3);
  for (Index i = 0; i < dofs.free_count(); ++i) {
    const Index dof = dofs.free_dofs()[static_cast<std::size_t>(i)];
    motion(static_cast<Index>(dofs.node_of(dof)), index_of(dofs.axis_of(dof))) = shape(i);
  }
  return motion;
}

// "liquid" where more than half of the motion is sloshing, "local at 7, 9" where few nodes of a larger tower
// hold nearly all of the motion; else the motion of the levels.
std::string character(const Tower& tower, NodeCloud cloud, const Eigen::MatrixXd& motion) {
  const Eigen::VectorXd energy = cloud.masses.array() * motion.rowwise().squaredNorm().array();
  double sloshing = 0.0;
  for (const Liquid& liquid : tower.liquids) {
    if (!liquid.node) continue;
    const auto node = static_cast<Index>(*liquid.node);
    sloshing += energy(node);
    cloud.masses(node) = 0.0;  // where it hangs back, the level it belongs to has not changed its shape
  }
  if (sloshing > 0.5 * energy.sum()) return "liquid";
  const auto nodes = energy_nodes(cloud, motion);
  const auto moving = (cloud.masses.array() > 0.0).count();
  if (moving >= 10 && nodes.size() <= 2) {
    std::string names;
    for (const Index node : nodes)
      names += (names.empty() ? "" : ", ") + tower.nodes[static_cast<std::size_t>(node)].name;
    return "local at " + names;
  }
  if (tower.dimensions == 1) return "along x";
  return character_of(character_shares(cloud, motion));
}

void describe_modes(Analysis& analysis) {
  const Tower& tower = analysis.tower;
  const DofMap& dofs = analysis.assembly.dofs;
  const Index modes = analysis.set.modes.count();
  analysis.frequency = analysis.set.modes.omega / kTurn;
  if (!tower.damping.empty()) analysis.damping = modal_damping(tower.damping, modes);
  analysis.mass_ratio = Eigen::MatrixXd::Zero(modes, 3);
  for (std::size_t k = 0; k < dofs.axes().size(); ++k) {
    const auto column = static_cast<Index>(k);
    const double moving = analysis.set.moving(column);
    if (moving <= 0.0) continue;
    analysis.mass_ratio.col(index_of(dofs.axes()[k])) =
        analysis.set.participation.col(column).array().square() / moving;
  }
  NodeCloud cloud;
  cloud.positions.resize(static_cast<Index>(tower.nodes.size()), 3);
  cloud.masses.resize(static_cast<Index>(tower.nodes.size()));
  const Eigen::VectorXd weights = analysis.assembly.mass_all * rigid_translation(dofs, Axis::x);
  for (std::size_t node = 0; node < tower.nodes.size(); ++node) {
    cloud.positions.row(static_cast<Index>(node)) = tower.nodes[node].position.transpose();
    cloud.masses(static_cast<Index>(node)) = weights(dofs.dof(node, 0));
  }
  for (Index j = 0; j < modes; ++j) {
    const Eigen::MatrixXd motion = motion_of(dofs, tower.nodes.size(), analysis.set.modes.shapes.col(j));
    analysis.character.push_back(character(tower, cloud, motion));
  }
}

// Figures beyond the range of numbers must not pass as results.
void require_finite(const Analysis& analysis) {
  const Modes& modes = analysis.set.modes;
  bool finite = modes.omega.allFinite() && modes.shapes.allFinite() && modes.residual.allFinite() &&
                analysis.set.participation.allFinite() && analysis.set.moving.allFinite() &&
                (modes.omega.array() > 0.0).all();
  if (analysis.seismic) {
    const SeismicResult& s = *analysis.seismic;
    finite = finite && s.bar_gravity.allFinite() && s.reaction_gravity.allFinite() &&
             s.bar_force.allFinite() && s.displacement.allFinite() && s.reaction.allFinite();
    for (const DirectionResult& d : s.directions) {
      finite = finite && d.acceleration.allFinite() && d.modal_base_shear.allFinite() &&
               std::isfinite(d.base_shear) && std::isfinite(d.overturning_moment.value_or(0.0));
    }
  }
  if (!finite)
    throw ComputationError({"results are beyond the range of numbers",
                            "look for values that are larger or smaller than any structure's"});
}

// The whole analysis; `shared` may be nothing.
Analysis analysis_of(Tower tower, Provenance provenance, Scope scope, SharedWork* shared) {
  Assembly assembly = assemble(tower);
  MassLedger ledger = mass_ledger(tower, assembly);
  MechanismReport mechanisms =
      shared != nullptr ? shared->mechanisms(tower, assembly) : find_mechanisms(tower, assembly);
  Analysis analysis{scope,
                    std::move(tower),
                    std::move(provenance),
                    std::move(assembly),
                    std::move(ledger),
                    std::move(mechanisms),
                    {},
                    {},
                    {},
                    {},
                    {},
                    {},
                    {},
                    {},
                    {},
                    {}};
  if (analysis.mechanisms.any()) {
    analysis.notes = segment_notes(analysis.tower);
    return analysis;
  }
  const SparseMatrix& stiffness = analysis.assembly.stiffness;
  const SparseMatrix& mass = analysis.assembly.mass;
  if (mass.rows() == 0)
    throw ComputationError({"nothing is free to move", "leave at least one axis of one node free"});
  const Eigen::MatrixXd drive = inertia_vectors(analysis.assembly);
  const Eigenproblem problem = shared != nullptr
                                   ? Eigenproblem(stiffness, mass, shared->factor(analysis.assembly))
                                   : Eigenproblem(stiffness, mass);
  if (problem.mode_count() == 0) {
    throw ComputationError({"nothing that is free to move has mass",
                            "give the material a density, or carry a mass at a free node"});
  }
  analysis.set = find_modes(problem, stiffness, mass, drive, target_of(analysis));
  require_usable(analysis.set);
  describe_modes(analysis);
  if (scope == Scope::check) {
    for (const BandStatement& band : analysis.tower.bands) {
      analysis.bands.push_back(examine_band(band, analysis.frequency, analysis.mass_ratio));
    }
    if (analysis.tower.seismic) {
      analysis.seismic =
          seismic_analysis(analysis.tower, analysis.assembly, problem, analysis.set, analysis.damping);
    }
    if (analysis.tower.base_study)
      analysis.base_study = study_base(analysis.tower, analysis.assembly, problem);
  }
  require_finite(analysis);
  analysis.verdicts = verdicts_of(analysis);
  analysis.notes = notes_of(analysis);
  if (!analysis.tower.stabilisers.empty())
    analysis.notes.push_back(stabilisation_note(study_stabilisation(analysis, problem)));
  return analysis;
}

}  // namespace

std::vector<Index> Analysis::excited() const {
  std::vector<Index> shaken;
  std::vector<Index> horizontal;
  const auto axes = tower.axes();
  for (std::size_t k = 0; k < axes.size(); ++k) {
    if (tower.seismic && tower.seismic->spectrum[static_cast<std::size_t>(axes[k])])
      shaken.push_back(static_cast<Index>(k));
    if (axes[k] != Axis::z) horizontal.push_back(static_cast<Index>(k));
  }
  return shaken.empty() ? horizontal : shaken;
}

Analysis analyse(Tower tower, Provenance provenance, Scope scope) {
  return analysis_of(std::move(tower), std::move(provenance), scope, nullptr);
}

Analysis analyse(Tower tower, Provenance provenance, Scope scope, SharedWork& shared) {
  return analysis_of(std::move(tower), std::move(provenance), scope, &shared);
}

}  // namespace swaymark
