#pragma once

#include <optional>
#include <string>
#include <vector>

#include "apps/base_study.hpp"
#include "apps/provenance.hpp"
#include "apps/verdicts.hpp"
#include "core/mass_ledger.hpp"
#include "core/mechanism.hpp"
#include "core/tower.hpp"
#include "modal/mode_search.hpp"
#include "spectrum/band.hpp"
#include "spectrum/seismic.hpp"

namespace swaymark {

/// How far an analysis goes.
enum class Scope {
  modes,  ///< frequencies, participation, effective mass
  check,  ///< all that the tower file asks for
};

/// Everything a report is written from.
struct Analysis {
  Scope scope = Scope::check;
  Tower tower;
  Provenance provenance;
  Assembly assembly;
  MassLedger ledger;
  MechanismReport mechanisms;  ///< where there are any, nothing below was computed

  ModeSet set;                 ///< participation and moving mass: column k belongs to the tower's k-th axis
  Eigen::VectorXd frequency;   ///< n_modes [Hz]
  Eigen::VectorXd damping;     ///< n_modes; empty where the tower states none
  Eigen::MatrixXd mass_ratio;  ///< n_modes x 3: effective over moving mass
  std::vector<std::string> character;  ///< n_modes
  std::vector<BandResult> bands;       ///< as tower.bands
  std::optional<SeismicResult> seismic;
  std::optional<BaseStudy> base_study;

  std::vector<Verdict> verdicts;
  std::vector<std::string> notes;

  [[nodiscard]] Index mode_count() const { return frequency.size(); }
  /// The directions whose mass share is asked for: those with a spectrum; without any, the horizontal ones.
  /// As places among the tower's axes.
  [[nodiscard]] std::vector<Index> excited() const;
};

/// Runs the analysis. A tower that can move comes back with its mechanisms and without modes.
/// \throws ComputationError where nothing can be computed for another reason.
[[nodiscard]] Analysis analyse(Tower tower, Provenance provenance, Scope scope);

class SharedWork;
/// The same for one of several states of a tower, with what they share.
[[nodiscard]] Analysis analyse(Tower tower, Provenance provenance, Scope scope, SharedWork& shared);

}  // namespace swaymark
