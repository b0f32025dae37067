#pragma once

#include <array>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "core/tower.hpp"

/// A tower written by panels: from a handful of numbers to nodes and bars. Geometry alone.
///
/// Axes: z up, the base at z = 0, the axis of the tower at x = y = 0. Corners are counted from 1
/// anticlockwise as seen from above, and face i stands between corners i and i + 1; face 1 looks towards -y.
///
///   square    4 --- 3      triangle     3
///             |     |
///             1 --- 2                1 --- 2
///
/// Level 0 is the base, level n the top of the n-th panel. Nodes: `L<level>.<corner>`, and `L<level>.m<face>`
/// in the middle of a horizontal where diagonals meet it.
namespace swaymark {

enum class LatticePlan { square, triangle };

/// How each face of a panel is braced, seen from outside (words of EN 1993-3-1).
enum class Bracing {
  x,            ///< two diagonals, not joined where they cross
  single,       ///< one, leaning the same way in every panel
  alternating,  ///< one, leaning the other way from panel to panel
  k,            ///< both bottom corners to the middle of the top horizontal
  k_down,       ///< both top corners to the middle of the bottom horizontal
};

enum class PlanPattern {
  diagonal,  ///< corner 1 to corner 3
  crossed,   ///< both diagonals, not joined where they cross
  diamond,   ///< mid node to mid node around the level
};

struct PlanBracing {
  std::size_t section = 0;
  PlanPattern pattern = PlanPattern::diagonal;
  Place place;
};

/// One panel, or several of the same height on top of each other that taper evenly.
struct LatticePanel {
  double height = 0.0;     ///< of each [m] > 0
  double width = 0.0;      ///< between legs at the top of the last [m] > 0
  std::size_t repeat = 1;  ///< >= 1
  Bracing bracing = Bracing::x;
  std::size_t legs = 0;                     ///< a section, as all below
  std::size_t diagonals = 0;                //
  std::optional<std::size_t> horizontals;   ///< at the top of each
  std::optional<PlanBracing> plan_bracing;  ///< at the top of each
  std::size_t material = 0;
  Place place;
  Place bracing_place;
};

struct LatticeStatement {
  LatticePlan plan = LatticePlan::square;
  double width = 0.0;                           ///< between legs at the base [m] > 0
  std::vector<LatticePanel> panels;             ///< from the base up
  std::optional<std::size_t> base_horizontals;  ///< a section; material of the lowest panel

  [[nodiscard]] std::size_t corners() const { return plan == LatticePlan::square ? 4 : 3; }
};

enum class LatticeMember { legs, diagonals, horizontals, plan_bracing };
inline constexpr std::array kLatticeMembers{LatticeMember::legs, LatticeMember::diagonals,
                                            LatticeMember::horizontals, LatticeMember::plan_bracing};
/// The group its bars are in: `legs`, `diagonals`, `horizontals`, `plan bracing`.
[[nodiscard]] std::string_view name_of(LatticeMember member);
[[nodiscard]] std::string_view name_of(Bracing bracing);

struct LatticeBar {
  LatticeMember member = LatticeMember::legs;
  std::size_t from = 0;  ///< indices into the lattice's nodes
  std::size_t to = 0;
  std::size_t section = 0;
  std::size_t material = 0;
  Place place;
};

/// A level, and the panel under it where there is one.
struct LatticeLevel {
  double height = 0.0;  ///< above the base [m]
  double width = 0.0;   ///< [m]
  const LatticePanel* panel = nullptr;
  std::vector<std::size_t> corners;    ///< nodes, by corner
  std::vector<std::size_t> mid_nodes;  ///< nodes, by face; empty where no diagonals meet a horizontal
};

struct Lattice {
  std::vector<Node> nodes;
  std::vector<LatticeBar> bars;  ///< legs, diagonals, horizontals, plan bracing; each from the base up
  std::vector<LatticeLevel> levels;
};

/// The levels of the lattice, without nodes: base, then the top of every panel. The panels are the
/// statement's, which must outlive them.
[[nodiscard]] std::vector<LatticeLevel> lattice_levels(const LatticeStatement& statement);

/// Whether diagonals meet the middle of the horizontals of a level.
[[nodiscard]] bool has_mid_nodes(const std::vector<LatticeLevel>& levels, std::size_t level);

/// Nodes and bars. Patterns that need a horizontal or a mid node must have one: the reader sees to it.
[[nodiscard]] Lattice build_lattice(const LatticeStatement& statement);

}  // namespace swaymark
