#pragma once

#include <string>
#include <vector>

#include "core/assembly.hpp"

namespace swaymark {

/// Where mass comes from.
enum class MassOrigin { bars, allowance, linear, discrete, ice, liquid };

/// "bars", "allowance", "linear", "discrete", "ice", "liquid"
[[nodiscard]] std::string_view name_of(MassOrigin origin);

struct LedgerEntry {
  MassOrigin origin = MassOrigin::bars;
  std::string label;                                 ///< as stated; empty if none
  std::string group;                                 ///< the group of bars, "all", or empty
  double mass = 0.0;                                 ///< [kg]
  Eigen::Vector3d centre = Eigen::Vector3d::Zero();  ///< centre of mass [m]
};

/// The tower's mass by origin; the entries add up to the total, which is rT M r in every direction.
struct MassLedger {
  std::vector<LedgerEntry> entries;
  double bars = 0.0;     ///< the bars' own mass [kg]
  double carried = 0.0;  ///< everything else [kg]
  double at_supports =
      0.0;  ///< share of the bars and carried masses that the nodes with a fixed axis hold [kg]

  [[nodiscard]] double total() const { return bars + carried; }
};

[[nodiscard]] MassLedger mass_ledger(const Tower& tower, const Assembly& assembly);

}  // namespace swaymark
