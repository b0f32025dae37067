#include "apps/report_mechanism.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/segment_notes.hpp"
#include "apps/table.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kMostMechanisms = 20;
constexpr std::size_t kMostLines = 6;  // nodes shown of one motion, and motions shown of one kind
constexpr std::size_t kColumns = 100;

std::string part_words(const Tower& tower, const FreeMotion::Part& part) {
  std::string parts;
  for (const Axis axis : tower.axes()) {
    const double value = part.direction[index_of(axis)];
    if (std::abs(value) < 1e-6) continue;
    parts += fmt::format("{}{} {}", parts.empty() ? "" : ", ", name_of(axis), figure(value, 3));
  }
  return fmt::format("node {}: {}", tower.nodes[part.node].name, parts);
}

// Of one motion every node a line; of several, the leading node of each.
std::string motion_lines(const Tower& tower, const Mechanism& mechanism) {
  const bool one = mechanism.count() == 1;
  const std::size_t all = one ? mechanism.motions.front().parts.size() : mechanism.count();
  std::string out;
  for (std::size_t i = 0; i < std::min(all, kMostLines); ++i) {
    const auto& parts = mechanism.motions[one ? 0 : i].parts;
    out += "       " + part_words(tower, parts[one ? i : 0]);
    if (!one && parts.size() > 1)
      out += fmt::format(", with {} other node{}", parts.size() - 1, parts.size() == 2 ? "" : "s");
    out += "\n";
  }
  if (all > kMostLines) {
    out += fmt::format("       and {} more {}; --json lists them all\n", all - kMostLines,
                       one ? "nodes" : "motions");
  }
  return out;
}

// Whether a node that the pattern leaves loose is free by itself or in a shape; a body on too few supports
// moves as one.
bool any_moves_alone(const MechanismReport& report, const LooseNodes& loose) {
  for (const Mechanism& mechanism : report.mechanisms) {
    for (const FreeMotion& motion : mechanism.motions) {
      if (motion.found_as == MotionClass::body) continue;
      const std::size_t node = motion.parts.front().node;
      if (std::find(loose.nodes.begin(), loose.nodes.end(), node) != loose.nodes.end()) return true;
    }
  }
  return false;
}

std::string arithmetic(const MechanismReport& report) {
  const MaxwellCount& count = report.maxwell;
  std::string line = fmt::format("  bars {} + restraints {} - degrees of freedom {} = {}", count.bars,
                                 count.restraints, count.dofs, count.surplus());
  if (report.complete) {
    const auto states = count.surplus() + static_cast<Index>(report.count());
    line += fmt::format(" = states of self-stress {} - free motions {}", states, report.count());
  }
  return line + "\n";
}

}  // namespace

std::string mechanism_text(const Analysis& analysis) {
  const MechanismReport& report = analysis.mechanisms;
  const auto& list = report.mechanisms;
  std::string out =
      fmt::format("{}: the tower can move without straining a bar, in {}{} way{}; hold it as said below\n",
                  analysis.provenance.file, report.complete ? "" : "more than ", report.count(),
                  report.count() == 1 ? "" : "s");
  out += arithmetic(report);
  for (std::size_t i = 0; i < std::min(list.size(), kMostMechanisms); ++i) {
    out += fmt::format("  {}. {}\n", i + 1, list[i].kind);
    out += wrapped(list[i].what, "     ", kColumns);
    out += motion_lines(analysis.tower, list[i]);
    for (const std::string& cure : list[i].cures) out += wrapped(cure, "     cure: ", kColumns);
  }
  if (list.size() > kMostMechanisms) out += fmt::format("  ... and {} more\n", list.size() - kMostMechanisms);
  for (const LooseNodes& loose : analysis.tower.lattice_leaves_loose) {
    if (!any_moves_alone(report, loose)) continue;  // held by what was written by hand
    out += wrapped(loose.what, "  the pattern: ", kColumns);
    for (const std::string& cure : loose.cures) out += wrapped(cure, "     cure: ", kColumns);
  }
  // A joint that was not drawn is a likely cause.
  for (const std::string& note : segment_notes(analysis.tower))
    out += wrapped(note, "  the drawing: ", kColumns);
  return out;
}

}  // namespace swaymark
