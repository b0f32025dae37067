#include "core/tower_file_masses.hpp"

#include <algorithm>
#include <array>
#include <cmath>

#include "core/ice.hpp"
#include "core/liquid.hpp"
#include "core/wording_masses.hpp"

namespace swaymark {

namespace {

// An entry says one way of carrying mass, and where: at nodes, or along the bars of a group.
void check_way(MapView& view) {
  FaultList& faults = view.faults();
  int ways = 0;
  for (const char* way : {"mass", "per_length", "allowance", "ice", "liquid"}) ways += view.has(way) ? 1 : 0;
  if (ways != 1) {
    faults.add(view.place(),
               wording::one_key_of("'mass', 'per_length', 'allowance', 'ice' and 'liquid'", view.owner()));
  }
  if (view.has("nodes") && view.has("group")) {
    faults.add(view.place(), wording::keys_exclude("nodes", "group", view.owner()));
  }
  if (view.has("mass") || view.has("liquid")) {
    if (!view.has("nodes"))
      faults.add(view.place(), wording::key_missing("nodes", "a mass at nodes", "nodes: [17, 18]"));
  } else if (!view.has("group") && ways == 1) {
    faults.add(view.place(), wording::key_missing("group", "a mass on bars", "group: all"));
  }
}

// The keys that stand beside `ice`; nothing where the thickness or the density cannot be read.
std::optional<IceMass> read_ice(MapView& view, const Tower& tower) {
  if (!view.has("ice")) return std::nullopt;
  FaultList& faults = view.faults();
  const auto thickness = view.value("ice", Quantity::length, Range::positive);
  const auto density =
      view.required_value("density", Quantity::density, Range::positive, "density: 900 kg/m3");
  IceMass ice;
  ice.from = view.value("from", Quantity::length, Range::any);
  ice.to = view.value("to", Quantity::length, Range::any);
  if (ice.from || ice.to) {
    const YamlNode& at = *view.find(ice.from ? "from" : "to");
    if (tower.dimensions == 1) faults.add(at.place, wording::heights_in_one_dimension());
    if (ice.from && ice.to && *ice.to <= *ice.from)
      faults.add(at.place, wording::heights_reversed(*ice.from, *ice.to));
  }
  if (!thickness || !density) return std::nullopt;
  ice.thickness = *thickness;
  ice.density = *density;
  return ice;
}

// Whether the ice finds bars to lie on, and their outlines.
void check_iced_bars(const IceMass& ice, const Tower& tower, FaultList& faults) {
  std::vector<std::string> without;
  bool any = false;
  for (const Bar& bar : tower.bars) {
    if (ice.group && bar.group != *ice.group) continue;
    if (iced_share(tower, ice, bar) <= 0.0) continue;
    any = true;
    const std::size_t section = bar.section.value_or(tower.groups[bar.group].section);
    if (section >= tower.sections.size()) continue;  // it has a fault of its own
    const Section& outline = tower.sections[section];
    if (outline.perimeter || std::find(without.begin(), without.end(), outline.name) != without.end())
      continue;
    without.push_back(outline.name);
  }
  if (!without.empty()) faults.add(ice.place, wording::perimeter_missing(without));
  const bool ranged = ice.from || ice.to;
  const bool reversed = ice.from && ice.to && *ice.to <= *ice.from;
  // Bars that could not be read may be the ones that lie there.
  if (any || !ranged || reversed || !faults.empty()) return;
  faults.add(ice.place, wording::ice_on_nothing(ice.group ? tower.groups[*ice.group].name : "all"));
}

// The map behind `liquid`, without its nodes; nothing where a measure cannot be read.
std::optional<Liquid> read_liquid(MapView& view, const Tower& tower) {
  const YamlNode* node = view.find("liquid");
  if (node == nullptr) return std::nullopt;
  FaultList& faults = view.faults();
  MapView tank(*node, "'liquid'", faults);
  if (!tank.is_map()) return std::nullopt;
  const auto radius = tank.required_value("radius", Quantity::length, Range::positive, "radius: 1.9 m");
  const auto depth = tank.required_value("depth", Quantity::length, Range::positive, "depth: 3.5 m");
  const auto density =
      tank.required_value("density", Quantity::density, Range::positive, "density: 1000 kg/m3");
  Liquid liquid;
  if (const YamlNode* flag = tank.find("rigid"))
    liquid.rigid = read_flag(*flag, "rigid", faults).value_or(false);
  tank.refuse_unknown();
  if (tower.dimensions == 1) faults.add(node->place, wording::liquid_in_one_dimension());
  if (!radius || !depth || !density || tower.dimensions == 1) return std::nullopt;
  liquid.radius = *radius;
  liquid.depth = *depth;
  liquid.density = *density;
  const LiquidSplit split = split_liquid(liquid);
  const bool weighs = split.mass > 0.0 && std::isfinite(split.mass);
  if (weighs && (liquid.rigid || (split.spring > 0.0 && std::isfinite(split.spring)))) return liquid;
  faults.add(node->place, wording::liquid_without_mass());
  return std::nullopt;
}

// What sloshes becomes a node of the tower, named by the label, in the middle of the nodes that carry it.
void add_liquid(Liquid liquid, const NameTable& node_names, Tower& tower, FaultList& faults) {
  if (!liquid.rigid) {
    const bool slosh_name = std::any_of(tower.liquids.begin(), tower.liquids.end(),
                                        [&](const Liquid& l) { return l.node && l.label == liquid.label; });
    if (liquid.label.empty()) {
      faults.add(liquid.place, wording::liquid_needs_label());
    } else if (slosh_name || node_names.place_of(liquid.label) || node_names.means_several(liquid.label)) {
      faults.add(liquid.place, wording::liquid_label_taken(liquid.label));
    }
    Node node;
    node.name = liquid.label;
    node.place = liquid.place;
    for (const std::size_t carrier : liquid.nodes) node.position += tower.nodes[carrier].position;
    node.position /= static_cast<double>(liquid.nodes.size());
    liquid.node = tower.nodes.size();
    tower.nodes.push_back(node);
  }
  tower.liquids.push_back(std::move(liquid));
}

void read_mass(const YamlNode& item, const NameTable& node_names, const NameTable& groups, Tower& tower,
               FaultList& faults) {
  MapView view(item, "a mass", faults);
  if (!view.is_map()) return;
  std::string label;
  if (const YamlNode* node = view.find("label")) label = read_word(*node, "label", faults).value_or("");
  const YamlNode* nodes = view.find("nodes");
  const YamlNode* group = view.find("group");
  const auto total = view.value("mass", Quantity::mass, Range::positive);
  const auto per_length = view.value("per_length", Quantity::mass_per_length, Range::positive);
  const auto share = view.value("allowance", Quantity::fraction, Range::share);
  auto ice = read_ice(view, tower);
  auto liquid = read_liquid(view, tower);
  check_way(view);
  view.refuse_unknown();
  if (nodes != nullptr) {
    auto list = read_node_list(*nodes, node_names, faults);
    if (liquid && !list.empty()) {
      liquid->nodes = list;
      liquid->label = label;
      liquid->place = item.place;
      add_liquid(std::move(*liquid), node_names, tower, faults);
    }
    if (total && !list.empty()) tower.node_masses.push_back({std::move(list), *total, label, item.place});
  }
  if (group == nullptr) return;
  std::optional<std::size_t> index;
  const bool all = group->kind == YamlNode::Kind::scalar && group->text == "all";
  if (!all) {
    index = groups.find(*group, faults);
    if (!index) return;
  }
  if (per_length) tower.line_masses.push_back({index, *per_length, label, item.place});
  if (share) tower.allowances.push_back({index, *share, label, item.place});
  if (!ice) return;
  ice->group = index;
  ice->label = label;
  ice->place = item.place;
  check_iced_bars(*ice, tower, faults);
  tower.ice.push_back(std::move(*ice));
}

}  // namespace

void check_ice(const Tower& tower, FaultList& faults) {
  for (const IceMass& ice : tower.ice) check_iced_bars(ice, tower, faults);
}

void drop_masses(Tower& tower) {
  // What sloshes stands behind all nodes of the tower's own.
  while (!tower.nodes.empty() && tower.sloshes(tower.nodes.size() - 1)) tower.nodes.pop_back();
  tower.node_masses.clear();
  tower.line_masses.clear();
  tower.allowances.clear();
  tower.ice.clear();
  tower.liquids.clear();
}

void read_masses(MapView& file, std::string_view key, const NameTable& nodes, const NameTable& groups,
                 Tower& tower) {
  const YamlNode* masses = file.find(key);
  if (masses == nullptr) return;
  const auto* items = read_list(*masses, key, "masses", file.faults());
  if (items == nullptr) return;
  for (const YamlNode& item : *items) read_mass(item, nodes, groups, tower, file.faults());
}

void read_mass_matrix(MapView& file, Tower& tower) {
  const YamlNode* node = file.find("mass_matrix");
  if (node == nullptr) return;
  constexpr std::array schemes{MassScheme::consistent, MassScheme::lumped, MassScheme::averaged};
  const auto choice = read_choice(*node, "mass_matrix", {"consistent", "lumped", "averaged"}, file.faults());
  if (choice) tower.mass_scheme = schemes[*choice];
}

}  // namespace swaymark
