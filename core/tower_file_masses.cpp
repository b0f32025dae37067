#include "core/tower_file_masses.hpp"

#include <array>

namespace swaymark {

namespace {

// An entry says one way of carrying mass, and where: at nodes, or along the bars of a group.
void check_way(MapView& view) {
  FaultList& faults = view.faults();
  const int ways = (view.has("mass") ? 1 : 0) + (view.has("per_length") ? 1 : 0) +
                   (view.has("allowance") ? 1 : 0) + (view.has("ice") || view.has("liquid") ? 1 : 0);
  if (ways != 1) {
    faults.add(view.place(), wording::one_key_of("'mass', 'per_length' and 'allowance'", view.owner()));
  }
  if (view.has("nodes") && view.has("group")) {
    faults.add(view.place(), wording::keys_exclude("nodes", "group", view.owner()));
  }
  if (view.has("mass")) {
    if (!view.has("nodes"))
      faults.add(view.place(), wording::key_missing("nodes", "a mass at nodes", "nodes: [17, 18]"));
  } else if (!view.has("group") && ways == 1) {
    faults.add(view.place(), wording::key_missing("group", "a mass on bars", "group: all"));
  }
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
  view.refuse_later("ice", "ice on the bars is");
  if (view.has("ice")) static_cast<void>(view.find("density"));
  view.refuse_later("liquid", "liquids are");
  check_way(view);
  view.refuse_unknown();
  if (nodes != nullptr) {
    auto list = read_node_list(*nodes, node_names, faults);
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
}

}  // namespace

void read_masses(MapView& file, const NameTable& nodes, const NameTable& groups, Tower& tower) {
  const YamlNode* masses = file.find("masses");
  if (masses == nullptr) return;
  const auto* items = read_list(*masses, "masses", "masses", file.faults());
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
