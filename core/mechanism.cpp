#include "core/mechanism.hpp"

#include <algorithm>
#include <map>
#include <utility>

#include <fmt/format.h>

#include "core/cure.hpp"
#include "core/motion_kind.hpp"
#include "core/text.hpp"

namespace swaymark {

namespace {

// How a single node that its bars leave free is told.
struct NodeWords {
  std::string_view kind;
  std::string_view one;
  std::string_view many;
  std::string_view square_to;
  std::string_view square_to_each;
};

constexpr NodeWords words_of(MotionKind kind) {
  switch (kind) {
    case MotionKind::line_node:
      return {"node square to a line", "node", "nodes", "square to its bars, which are in one line",
              "square to their bars, which are in one line"};
    case MotionKind::mid_node:
      return {"node square to a face", "mid node of K-bracing", "mid nodes of K-bracing",
              "square to its face", "square to their faces"};
    case MotionKind::crossing_node:
      return {"node square to a face", "node where diagonals cross", "nodes where diagonals cross",
              "square to its face", "square to their faces"};
    default:
      return {"node square to a face", "node", "nodes", "square to its bars, which are in one plane",
              "square to their bars, which are in one plane"};
  }
}

class Report {
 public:
  Report(const Tower& tower, FreeMotions motions)
      : tower_(tower), kinds_(tower), cures_(tower, motions), motions_(std::move(motions)) {}

  std::vector<Mechanism> run() {
    for (FreeMotion& motion : motions_.list) {
      Mechanism& group = groups_[key_of(motion)];
      group.motions.push_back(std::move(motion));
    }
    std::vector<Mechanism> result;
    for (auto& [key, group] : groups_) {
      std::stable_sort(group.motions.begin(), group.motions.end(),
                       [](const FreeMotion& a, const FreeMotion& b) {
                         return a.parts.front().node < b.parts.front().node;
                       });
      describe(group, key.first);
      result.push_back(std::move(group));
    }
    return result;
  }

 private:
  // What belongs together, in the order of the report: a kind, and of bodies on too few supports each by
  // itself.
  using Key = std::pair<MotionKind, std::size_t>;

  [[nodiscard]] Key key_of(const FreeMotion& motion) const {
    const MotionKind kind = kinds_.of(motion);
    return {kind, kind == MotionKind::on_too_few_supports ? body_of(motion.parts.front().node).front() : 0};
  }

  [[nodiscard]] std::string name(std::size_t n) const { return excerpt(tower_.nodes[n].name); }

  // "a", "a, b and c" or "a, b ... z"
  [[nodiscard]] std::string names(std::vector<std::size_t> nodes) const {
    std::sort(nodes.begin(), nodes.end());
    nodes.erase(std::unique(nodes.begin(), nodes.end()), nodes.end());
    if (nodes.size() == 1) return name(nodes[0]);
    if (nodes.size() == 2) return fmt::format("{} and {}", name(nodes[0]), name(nodes[1]));
    if (nodes.size() == 3)
      return fmt::format("{}, {} and {}", name(nodes[0]), name(nodes[1]), name(nodes[2]));
    return fmt::format("{}, {} ... {}", name(nodes[0]), name(nodes[1]), name(nodes.back()));
  }

  [[nodiscard]] static std::vector<std::size_t> nodes_of(const FreeMotion& motion) {
    std::vector<std::size_t> nodes;
    for (const auto& part : motion.parts) nodes.push_back(part.node);
    return nodes;
  }

  [[nodiscard]] static std::vector<std::size_t> leading_nodes(const Mechanism& group) {
    std::vector<std::size_t> nodes;
    for (const FreeMotion& motion : group.motions) nodes.push_back(motion.parts.front().node);
    return nodes;
  }

  void describe(Mechanism& group, MotionKind kind) const {
    switch (kind) {
      case MotionKind::loose_node:
        return describe_loose(group);
      case MotionKind::on_too_few_supports:
        return describe_body(group);
      case MotionKind::mid_node:
      case MotionKind::crossing_node:
      case MotionKind::face_node:
      case MotionKind::line_node:
        return describe_nodes(group, words_of(kind));
      default:
        describe_shapes(group, kind);
    }
  }

  void describe_loose(Mechanism& group) const {
    std::vector<std::size_t> nodes = leading_nodes(group);
    std::sort(nodes.begin(), nodes.end());
    nodes.erase(std::unique(nodes.begin(), nodes.end()), nodes.end());
    const bool one = nodes.size() == 1;
    group.kind = "loose node";
    group.what = fmt::format("{} without a bar: {}", one ? "a node" : fmt::format("{} nodes", nodes.size()),
                             names(nodes));
    group.cures = {one ? "join the node to the tower by bars, or remove it"
                       : "join each of them to the tower by bars, or remove it"};
  }

  void describe_nodes(Mechanism& group, const NodeWords& words) const {
    group.kind = words.kind;
    const FreeMotion& first = group.motions.front();
    if (group.count() == 1) {
      group.what = fmt::format("{} {}, {}, along {}", words.one, name(first.parts.front().node),
                               words.square_to, direction_words(first.parts.front().direction));
    } else {
      std::vector<std::size_t> nodes = leading_nodes(group);
      std::sort(nodes.begin(), nodes.end());
      const auto distinct = std::unique(nodes.begin(), nodes.end()) - nodes.begin();
      group.what = fmt::format(
          "{} {}, {}{}: {}", distinct, distinct == 1 ? words.one : words.many,
          distinct == 1 ? words.square_to : words.square_to_each,
          group.count() > static_cast<std::size_t>(distinct) ? ", in two directions" : "", names(nodes));
    }
    add_cures(group);
    group.cures.push_back(
        fmt::format("or, where {} no load, 'supports: [{{nodes: [{}], stabilise: 10 MN/m}}]'",
                    group.count() == 1 ? "it carries" : "they carry",
                    group.count() == 1 ? name(first.parts.front().node) : "..."));
  }

  void describe_body(Mechanism& group) const {
    const std::vector<std::size_t> body = body_of(group.motions.front().parts.front().node);
    std::size_t with_bars = 0;
    for (std::size_t node = 0; node < tower_.nodes.size(); ++node) with_bars += kinds_.has_bars(node) ? 1 : 0;
    const bool whole = body.size() == with_bars;
    group.kind = whole ? "tower on too few supports" : "part on too few supports";
    const std::string ways = fmt::format("{} way{}", group.count(), group.count() == 1 ? "" : "s");
    group.what = whole ? fmt::format("the whole tower moves as a body, in {}", ways)
                       : fmt::format("{} nodes that no bar joins to the rest move as a body, in {}: {}",
                                     body.size(), ways, names(body));
    group.cures = cures_.supports(group.motions);
    if (!whole) group.cures.emplace_back("or join this part to the rest by bars");
  }

  // The nodes that bars join to this one, itself included, in their order.
  [[nodiscard]] std::vector<std::size_t> body_of(std::size_t start) const {
    std::vector<std::vector<std::size_t>> next(tower_.nodes.size());
    for (const Bar& bar : tower_.bars) {
      next[bar.from].push_back(bar.to);
      next[bar.to].push_back(bar.from);
    }
    std::vector<bool> seen(tower_.nodes.size(), false);
    std::vector<std::size_t> body{start};
    seen[start] = true;
    for (std::size_t i = 0; i < body.size(); ++i) {
      for (const std::size_t other : next[body[i]]) {
        if (!seen[other]) body.push_back(other);
        seen[other] = true;
      }
    }
    std::sort(body.begin(), body.end());
    return body;
  }

  void describe_shapes(Mechanism& group, MotionKind kind) const {
    const FreeMotion& first = group.motions.front();
    const std::string nodes = names(nodes_of(first));
    const std::size_t count = group.count();
    const std::string example = count == 1 ? nodes : fmt::format("for example {}", nodes);
    const auto text = [&](std::string_view one, std::string_view many) {
      return fmt::format("{}: {}", count == 1 ? std::string(one) : fmt::format("{} {}", count, many),
                         example);
    };
    switch (kind) {
      case MotionKind::plan_distortion:
        group.kind = "plan distortion of a level";
        group.what = text("a level distorts in plan", "levels distort in plan");
        break;
      case MotionKind::sway:
        group.kind = "sway of a panel";
        group.what =
            text("all from one level upwards moves as a body", "ways in which levels move as a body");
        break;
      case MotionKind::part_as_body:
        group.kind = "part of the tower moves as a body";
        group.what = text("nodes that move together", "parts that move as bodies");
        break;
      default:
        group.kind = "part of the tower changes its shape";
        group.what = text("nodes that move between bars that keep their lengths",
                          "ways in which nodes move between bars that keep their lengths");
    }
    add_cures(group);
  }

  void add_cures(Mechanism& group) const {
    const FreeMotion& first = group.motions.front();
    const std::string_view each = group.count() > 1 ? "for each of them, for example: " : "";
    for (const std::string& bar : cures_.bars(first))
      group.cures.push_back(fmt::format("{}{}{}", group.cures.empty() ? "" : "or ", each, bar));
    const std::string support = cures_.supports({first}).front();
    group.cures.push_back(fmt::format("{}{}{}", group.cures.empty() ? "" : "or ", each, support));
  }

  const Tower& tower_;
  MotionKinds kinds_;
  Cures cures_;
  FreeMotions motions_;
  std::map<Key, Mechanism> groups_;
};

}  // namespace

std::size_t MechanismReport::count() const {
  std::size_t result = 0;
  for (const Mechanism& mechanism : mechanisms) result += mechanism.count();
  return result;
}

MechanismReport find_mechanisms(const Tower& tower, const Assembly& assembly) {
  MechanismReport report;
  FreeMotions motions = find_free_motions(tower, assembly);
  report.complete = motions.complete;
  report.maxwell = {static_cast<Index>(tower.bars.size()),
                    assembly.dofs.fixed_count() + (assembly.springs.array() > 0.0).count() +
                        static_cast<Index>(assembly.links.size() + assembly.stabilisers.size()),
                    assembly.dofs.dof_count()};
  // States of self-stress cannot be fewer than none: what is missing was not found.
  if (report.maxwell.surplus() + static_cast<Index>(motions.list.size()) < 0) report.complete = false;
  if (motions.list.empty()) return report;
  report.mechanisms = Report(tower, std::move(motions)).run();
  return report;
}

}  // namespace swaymark
