#include "core/tower_file_members.hpp"

#include <algorithm>

namespace swaymark {

namespace {

void read_bars(const YamlNode& list, const NameTable& nodes, Tower& tower, FaultList& faults) {
  const auto* items = read_list(list, "bars", "[from, to] pairs", faults);
  if (items == nullptr) return;
  std::size_t number = 0;
  for (const YamlNode& item : *items) {
    ++number;
    if (item.kind != YamlNode::Kind::sequence || item.items.size() != 2) {
      faults.add(item.place, wording::bar_is_pair());
      continue;
    }
    const auto from = nodes.find(item.items[0], faults);
    const auto to = nodes.find(item.items[1], faults);
    if (from && to) tower.bars.push_back({tower.groups.size() - 1, *from, *to, number, item.place});
  }
}

// \param generated  how many groups the lattice made: the tower's first.
void read_group_name(const YamlNode& node, Group& group, std::size_t generated, const Tower& tower,
                     NameTable& groups, FaultList& faults) {
  const auto name = read_word(node, "group", faults);
  if (!name) return;
  group.name = *name;
  if (group.name == "all") faults.add(node.place, wording::name_reserved("group", group.name));
  if (const auto first = groups.place_of(group.name)) {
    const auto end = tower.groups.begin() + static_cast<std::ptrdiff_t>(generated);
    const bool taken =
        std::any_of(tower.groups.begin(), end, [&](const Group& known) { return known.name == group.name; });
    faults.add(node.place, taken ? wording::name_generated("group", group.name, *first)
                                 : wording::name_twice("group", group.name, *first));
  }
  groups.add(group.name, tower.groups.size(), node.place);
}

// \param bars_elsewhere  tables may give the bars.
void read_group(const YamlNode& item, const PartNames& parts, std::size_t generated, bool bars_elsewhere,
                Tower& tower, NameTable& groups, FaultList& faults) {
  MapView view(item, "a group of members", faults);
  if (!view.is_map()) return;
  Group group;
  group.place = item.place;
  if (const YamlNode* name = view.require("group", "group: legs")) {
    read_group_name(*name, group, generated, tower, groups, faults);
  }
  if (const YamlNode* section = view.require("section", "section: leg")) {
    group.section = parts.sections.find(*section, faults).value_or(0);
  }
  if (const YamlNode* material = view.require("material", "material: steel")) {
    group.material = parts.materials.find(*material, faults).value_or(0);
  }
  tower.groups.push_back(group);
  const YamlNode* bars = bars_elsewhere ? view.find("bars") : view.require("bars", "bars: [[1, 5], [2, 6]]");
  if (bars != nullptr) read_bars(*bars, parts.nodes, tower, faults);
  view.refuse_unknown();
}

}  // namespace

void read_members(MapView& file, const PartNames& parts, NameTable& groups, Tower& tower) {
  const std::string_view example = "members: [{group: legs, section: leg, material: steel, bars: [[1, 2]]}]";
  const YamlNode* members = file.has("lattice") ? file.find("members") : file.require("members", example);
  if (members == nullptr) return;
  const auto* items = read_list(*members, "members", "groups of bars", file.faults());
  if (items == nullptr) return;
  const std::size_t generated = tower.groups.size();
  const bool bars_elsewhere = file.has("bars_from") || file.has("segments_from");
  for (const YamlNode& item : *items)
    read_group(item, parts, generated, bars_elsewhere, tower, groups, file.faults());
}

}  // namespace swaymark
