#include "apps/report_mechanism.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/table.hpp"

namespace swaymark {

namespace {

std::string motion_words(const Tower& tower, const Mechanism::Motion& motion) {
  std::string parts;
  for (const Axis axis : tower.axes()) {
    const double value = motion.direction[index_of(axis)];
    if (std::abs(value) < 1e-6) continue;
    parts += fmt::format("{}{} {}", parts.empty() ? "" : ", ", name_of(axis), figure(value, 3));
  }
  return fmt::format("node {}: {}", tower.nodes[motion.node].name, parts);
}

}  // namespace

std::string mechanism_text(const Analysis& analysis) {
  constexpr std::size_t most_mechanisms = 20;
  constexpr std::size_t most_nodes = 6;
  const auto& list = analysis.mechanisms.mechanisms;
  std::string out =
      fmt::format("{}: the tower can move without straining a bar, in {}{} way{}; hold it as said below\n",
                  analysis.provenance.file, analysis.mechanisms.complete ? "" : "at least ", list.size(),
                  list.size() == 1 ? "" : "s");
  const auto held = analysis.assembly.dofs.fixed_count();
  out += fmt::format("  {} bars + {} fixed and {} sprung degrees of freedom against {} in all\n",
                     analysis.tower.bars.size(), held, (analysis.assembly.springs.array() > 0.0).count(),
                     analysis.assembly.dofs.dof_count());
  for (std::size_t i = 0; i < std::min(list.size(), most_mechanisms); ++i) {
    const Mechanism& mechanism = list[i];
    out += fmt::format("  {}. {}\n", i + 1, mechanism.kind);
    for (std::size_t n = 0; n < std::min(mechanism.motion.size(), most_nodes); ++n) {
      out += "       " + motion_words(analysis.tower, mechanism.motion[n]) + "\n";
    }
    if (mechanism.motion.size() > most_nodes)
      out += fmt::format("       and {} more nodes\n", mechanism.motion.size() - most_nodes);
    for (const std::string& cure : mechanism.cures) out += wrapped(cure, "     cure: ", 100);
  }
  for (const LooseNodes& loose : analysis.tower.lattice_leaves_loose) {
    out += wrapped(loose.what, "  the pattern: ", 100);
    for (const std::string& cure : loose.cures) out += wrapped(cure, "     cure: ", 100);
  }
  if (list.size() > most_mechanisms) out += fmt::format("  ... and {} more\n", list.size() - most_mechanisms);
  return out;
}

}  // namespace swaymark
