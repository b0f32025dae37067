#include "core/tower_file_supports.hpp"

#include <map>

namespace swaymark {

namespace {

class SupportReader {
 public:
  SupportReader(const NameTable& nodes, Tower& tower, FaultList& faults)
      : nodes_(nodes), tower_(tower), faults_(faults) {}

  void read(const YamlNode& item) {
    MapView view(item, "a support", faults_);
    if (!view.is_map()) return;
    Support support;
    support.place = item.place;
    const YamlNode* nodes = view.require("nodes", "nodes: [1, 2, 3, 4]");
    const YamlNode* fixed = view.find("fixed");
    const YamlNode* springs = view.find("springs");
    view.refuse_later("pad", "springs from a pad and its soil are");
    if (!view.has("fixed") && !view.has("springs") && !view.has("pad")) {
      faults_.add(item.place, wording::holds_nothing());
    }
    if (fixed != nullptr) read_fixed(*fixed, support);
    if (springs != nullptr) read_springs(*springs, support);
    view.refuse_unknown();
    if (nodes == nullptr) return;
    for (const std::size_t node : read_node_list(*nodes, nodes_, faults_)) {
      support.node = node;
      hold(support);
    }
  }

 private:
  void read_fixed(const YamlNode& list, Support& support) {
    const auto* items = read_list(list, "fixed", "axes", faults_);
    if (items == nullptr) return;
    for (const YamlNode& item : *items) {
      bool known = false;
      for (const Axis axis : tower_.axes()) {
        if (item.text != name_of(axis)) continue;
        known = true;
        support.fixed[static_cast<std::size_t>(axis)] = true;
      }
      if (!known) faults_.add(item.place, wording::axis_unknown(item.description(), axis_names(tower_)));
    }
  }

  void read_springs(const YamlNode& map, Support& support) {
    MapView view(map, "'springs'", faults_);
    for (const Axis axis : tower_.axes()) {
      const auto stiffness = view.value(name_of(axis), Quantity::stiffness, Range::positive);
      if (stiffness) support.spring[static_cast<std::size_t>(axis)] = *stiffness;
    }
    view.refuse_unknown();
  }

  // Joins what several entries say of one node; an axis may be held once.
  void hold(const Support& support) {
    const auto [found, fresh] = held_.emplace(support.node, tower_.supports.size());
    if (fresh) {
      tower_.supports.push_back(support);
      for (const Axis axis : tower_.axes()) {
        const auto a = static_cast<std::size_t>(axis);
        if (support.fixed[a] && support.spring[a] > 0.0) twice(support, support, axis);
      }
      return;
    }
    Support& known = tower_.supports[found->second];
    for (const Axis axis : tower_.axes()) {
      const auto a = static_cast<std::size_t>(axis);
      const bool holds = support.fixed[a] || support.spring[a] > 0.0;
      const bool held = known.fixed[a] || known.spring[a] > 0.0;
      if (holds && held) twice(support, known, axis);
      known.fixed[a] = known.fixed[a] || support.fixed[a];
      known.spring[a] += support.spring[a];
    }
  }

  void twice(const Support& support, const Support& first, Axis axis) {
    faults_.add(support.place,
                wording::held_twice(tower_.nodes[support.node].name, name_of(axis), first.place));
  }

  const NameTable& nodes_;
  Tower& tower_;
  FaultList& faults_;
  std::map<std::size_t, std::size_t> held_;  // node to its place in the tower's supports
};

}  // namespace

void read_supports(MapView& file, const NameTable& nodes, Tower& tower) {
  const YamlNode* supports = file.find("supports");
  if (supports == nullptr) return;
  const auto* items = read_list(*supports, "supports", "supports", file.faults());
  if (items == nullptr) return;
  SupportReader reader(nodes, tower, file.faults());
  for (const YamlNode& item : *items) reader.read(item);
}

}  // namespace swaymark
