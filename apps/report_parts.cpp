#include "apps/report_parts.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace swaymark {

std::string counted(Index number, std::string_view what) {
  return fmt::format("{} {}{}", number, what, number == 1 ? "" : "s");
}

std::string mode_list(const std::vector<Index>& modes) {
  std::string text;
  for (std::size_t i = 0; i < modes.size(); ++i) {
    if (i > 0) text += i + 1 == modes.size() ? " and " : ", ";
    text += std::to_string(modes[i] + 1);
  }
  return text;
}

std::string band_name(const BandStatement& band) {
  if (band.harmonic <= 1) return band.label;
  return fmt::format("{}, harmonic {}", band.label, band.harmonic);
}

std::string bar_ends(const Tower& tower, std::size_t bar) {
  return fmt::format("{} to {}", tower.nodes[tower.bars[bar].from].name,
                     tower.nodes[tower.bars[bar].to].name);
}

std::size_t stated_nodes(const Tower& tower) {
  const auto sloshing = std::count_if(tower.liquids.begin(), tower.liquids.end(),
                                      [](const Liquid& liquid) { return liquid.node.has_value(); });
  return tower.nodes.size() - static_cast<std::size_t>(sloshing);
}

Extremes bar_extremes(double gravity, double seismic) {
  return {std::max(0.0, gravity + seismic), std::max(0.0, seismic - gravity)};
}

std::vector<NodeReaction> node_reactions(const Analysis& analysis) {
  const SeismicResult& seismic = *analysis.seismic;
  const bool gravity = has_gravity(analysis.assembly);
  std::vector<NodeReaction> list;
  for (std::size_t i = 0; i < seismic.supports.size(); ++i) {
    const SupportDof& support = seismic.supports[i];
    const auto row = static_cast<Index>(i);
    if (list.empty() || list.back().node != support.node) list.push_back({support.node, {}, {}, {}, {}});
    NodeReaction& node = list.back();
    const auto axis = static_cast<std::size_t>(support.axis);
    node.seismic[axis] = seismic.reaction(row);
    if (!gravity) continue;
    node.gravity[axis] = seismic.reaction_gravity(row);
    if (support.axis != Axis::z) continue;
    node.uplift = std::max(0.0, seismic.reaction(row) - seismic.reaction_gravity(row));
    node.push = seismic.reaction_gravity(row) + seismic.reaction(row);
  }
  return list;
}

Eigen::MatrixXd node_displacements(const Analysis& analysis) {
  const DofMap& dofs = analysis.assembly.dofs;
  Eigen::MatrixXd result = Eigen::MatrixXd::Zero(static_cast<Index>(analysis.tower.nodes.size()), 3);
  for (Index i = 0; i < dofs.free_count(); ++i) {
    const Index dof = dofs.free_dofs()[static_cast<std::size_t>(i)];
    result(static_cast<Index>(dofs.node_of(dof)), index_of(dofs.axis_of(dof))) =
        analysis.seismic->displacement(i);
  }
  return result;
}

}  // namespace swaymark
