#pragma once

#include <string>
#include <vector>

#include "apps/analysis.hpp"

/// Words and figures that several report formats share.
namespace swaymark {

/// "1 mode", "3 modes"
[[nodiscard]] std::string counted(Index number, std::string_view what);

/// "1, 2 and 7"; modes counted from 1.
[[nodiscard]] std::string mode_list(const std::vector<Index>& modes);

/// "pump set", or "pump set, harmonic 2".
[[nodiscard]] std::string band_name(const BandStatement& band);

/// "5 to 9": the nodes a bar joins.
[[nodiscard]] std::string bar_ends(const Tower& tower, std::size_t bar);

/// How many nodes the tower file states; those of sloshing masses are none of them.
[[nodiscard]] std::size_t stated_nodes(const Tower& tower);

/// Largest tension and largest compression of gravity +/- seismic [N], each >= 0.
struct Extremes {
  double tension = 0.0;
  double compression = 0.0;
};
[[nodiscard]] Extremes bar_extremes(double gravity, double seismic);

/// What one supported node feels.
struct NodeReaction {
  std::size_t node = 0;
  std::array<std::optional<double>, 3> gravity;  ///< by axis [N], on the tower
  std::array<std::optional<double>, 3> seismic;  ///< by axis [N], >= 0
  std::optional<double> uplift;                  ///< [N] >= 0: seismic pull beyond gravity, where z is held
  std::optional<double> push;  ///< [N]: largest downward force on the ground, where z is held
};
[[nodiscard]] std::vector<NodeReaction> node_reactions(const Analysis& analysis);

/// Displacement of every node by axis [m], >= 0: n_nodes x 3.
[[nodiscard]] Eigen::MatrixXd node_displacements(const Analysis& analysis);

}  // namespace swaymark
