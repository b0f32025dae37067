#include "core/tower_file_members.hpp"

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

void read_group_name(const YamlNode& node, Group& group, std::size_t index, NameTable& groups,
                     FaultList& faults) {
  const auto name = read_word(node, "group", faults);
  if (!name) return;
  group.name = *name;
  if (group.name == "all") faults.add(node.place, wording::name_reserved("group", group.name));
  if (const auto first = groups.place_of(group.name)) {
    faults.add(node.place, wording::name_twice("group", group.name, *first));
  }
  groups.add(group.name, index, node.place);
}

void read_group(const YamlNode& item, const PartNames& parts, Tower& tower, NameTable& groups,
                FaultList& faults) {
  MapView view(item, "a group of members", faults);
  if (!view.is_map()) return;
  Group group;
  group.place = item.place;
  if (const YamlNode* name = view.require("group", "group: legs")) {
    read_group_name(*name, group, tower.groups.size(), groups, faults);
  }
  if (const YamlNode* section = view.require("section", "section: leg")) {
    group.section = parts.sections.find(*section, faults).value_or(0);
  }
  if (const YamlNode* material = view.require("material", "material: steel")) {
    group.material = parts.materials.find(*material, faults).value_or(0);
  }
  tower.groups.push_back(group);
  if (const YamlNode* bars = view.require("bars", "bars: [[1, 5], [2, 6]]")) {
    read_bars(*bars, parts.nodes, tower, faults);
  }
  view.refuse_unknown();
}

}  // namespace

NameTable read_members(MapView& file, const PartNames& parts, Tower& tower) {
  NameTable groups("group");
  const YamlNode* members =
      file.require("members", "members: [{group: legs, section: leg, material: steel, bars: [[1, 2]]}]");
  if (members == nullptr) return groups;
  const auto* items = read_list(*members, "members", "groups of bars", file.faults());
  if (items == nullptr) return groups;
  for (const YamlNode& item : *items) read_group(item, parts, tower, groups, file.faults());
  return groups;
}

}  // namespace swaymark
