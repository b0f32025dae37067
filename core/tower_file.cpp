#include "core/tower_file.hpp"

#include <cmath>
#include <map>
#include <numbers>

#include <fmt/format.h>

#include "core/text.hpp"
#include "core/tower_file_requests.hpp"
#include "core/tower_file_values.hpp"
#include "core/validate.hpp"

namespace swaymark {

namespace {

constexpr double kFarthest = 1e6;  // [m]

// Reads the structure: what it is made of, where it stands and what it carries.
class StructureReader {
 public:
  StructureReader(MapView& file, Tower& tower) : file_(file), faults_(file.faults()), tower_(tower) {}

  void read() {
    read_named("materials", materials_, [this](auto&&... entry) { material(entry...); });
    read_named("sections", sections_, [this](auto&&... entry) { section(entry...); });
    read_named("nodes", nodes_, [this](auto&&... entry) { node(entry...); });
    read_members();
    read_supports();
    read_masses();
    read_mass_matrix();
    read_damping();
    read_stiffening();
  }

 private:
  // Names that are written twice were reported with the keys: the first one stands.
  template <typename Visit>
  void read_named(std::string_view key, NameTable& names, Visit visit) {
    const YamlNode* map = file_.find(key);
    if (map == nullptr) return;
    for_each_named(*map, key, faults_,
                   [&](const std::string& name, const YamlNode& at, const YamlNode& value) {
                     if (!names.place_of(name)) visit(name, at, value);
                   });
  }

  void material(const std::string& name, const YamlNode& at, const YamlNode& value) {
    materials_.add(name, tower_.materials.size(), at.place);
    MapView view(value, fmt::format("material '{}'", excerpt(name)), faults_);
    Material material;
    material.name = name;
    material.place = at.place;
    material.youngs_modulus =
        view.required_value("E", Quantity::stress, Range::positive, "E: 210 GPa").value_or(1.0);
    material.density =
        view.required_value("density", Quantity::density, Range::not_negative, "density: 7850 kg/m3")
            .value_or(0.0);
    material.yield = view.value("yield", Quantity::stress, Range::positive);
    view.refuse_unknown();
    tower_.materials.push_back(std::move(material));
  }

  void section(const std::string& name, const YamlNode& at, const YamlNode& value) {
    sections_.add(name, tower_.sections.size(), at.place);
    MapView view(value, fmt::format("section '{}'", excerpt(name)), faults_);
    Section section;
    section.name = name;
    section.place = at.place;
    const bool by_area = view.has("area");
    const bool by_tube = view.has("tube");
    view.refuse_later("size", "sections by size are");
    view.refuse_later("double", "double sections are");
    if (by_area && by_tube) faults_.add(at.place, wording::keys_exclude("area", "tube", view.owner()));
    section.area = view.value("area", Quantity::area, Range::positive).value_or(1.0);
    section.radius = view.value("radius", Quantity::length, Range::positive);
    if (const YamlNode* curve = view.find("curve")) {
      const std::vector<std::string> curves{"a0", "a", "b", "c", "d"};
      if (const auto choice = read_choice(*curve, "curve", curves, faults_)) section.curve = curves[*choice];
    }
    if (const YamlNode* tube = view.find("tube")) {
      if (view.has("radius")) faults_.add(at.place, wording::keys_exclude("radius", "tube", view.owner()));
      read_tube(*tube, section);
    }
    if (view.is_map() && !by_area && !by_tube && !view.has("size")) {
      faults_.add(at.place, wording::one_key_of("'area' or 'tube'", view.owner()));
    }
    view.refuse_unknown();
    tower_.sections.push_back(std::move(section));
  }

  void read_tube(const YamlNode& value, Section& section) {
    if (value.kind != YamlNode::Kind::sequence || value.items.size() != 2) {
      faults_.add(value.place,
                  wording::wrong_kind("tube", "[outside diameter, wall thickness]", value.description()));
      return;
    }
    const auto diameter = read_value(value.items[0], "diameter", Quantity::length, Range::positive, faults_);
    const auto wall = read_value(value.items[1], "wall", Quantity::length, Range::positive, faults_);
    if (!diameter || !wall) return;
    if (2.0 * *wall > *diameter) {
      faults_.add(value.place, wording::tube_wall(*diameter, *wall));
      return;
    }
    const double inside = *diameter - 2.0 * *wall;
    section.area = std::numbers::pi * *wall * (*diameter - *wall);
    section.radius = 0.25 * std::hypot(*diameter, inside);
  }

  void node(const std::string& name, const YamlNode& at, const YamlNode& value) {
    nodes_.add(name, tower_.nodes.size(), at.place);
    Node node;
    node.name = name;
    node.place = at.place;
    const auto axes = tower_.axes();
    if (value.kind != YamlNode::Kind::sequence) {
      faults_.add(value.place, wording::wrong_kind(name, fmt::format("[{}]", fmt::join(axis_names(), ", ")),
                                                   value.description()));
    } else if (value.items.size() != axes.size()) {
      faults_.add(value.place, wording::coordinates_count(name, value.items.size(), axis_names()));
    } else {
      for (std::size_t i = 0; i < axes.size(); ++i) {
        const YamlNode& item = value.items[i];
        const auto coordinate = read_value(item, name_of(axes[i]), Quantity::length, Range::any, faults_);
        if (coordinate && std::abs(*coordinate) > kFarthest)
          faults_.add(item.place, wording::too_far_away(item.text));
        // A node whose place is unknown must not look as if it stood at another's.
        node.position[index_of(axes[i])] =
            coordinate.value_or(kFarthest + static_cast<double>(tower_.nodes.size()));
      }
      tower_.nodes.push_back(std::move(node));
      return;
    }
    node.position[0] = kFarthest + static_cast<double>(tower_.nodes.size());
    tower_.nodes.push_back(std::move(node));
  }

  std::vector<std::string> axis_names() const {
    std::vector<std::string> names;
    for (const Axis axis : tower_.axes()) names.emplace_back(name_of(axis));
    return names;
  }

  void read_members() {
    const YamlNode* members =
        file_.require("members", "members: [{group: legs, section: leg, material: steel, bars: [[1, 2]]}]");
    if (members == nullptr) return;
    const auto* items = read_list(*members, "members", "groups of bars", faults_);
    if (items == nullptr) return;
    for (const YamlNode& item : *items) read_group(item);
  }

  void read_group(const YamlNode& item) {
    MapView view(item, "a group of members", faults_);
    if (!view.is_map()) return;
    Group group;
    group.place = item.place;
    if (const YamlNode* name = view.require("group", "group: legs")) {
      group.name = read_word(*name, "group", faults_).value_or("");
      if (group.name == "all") faults_.add(name->place, wording::name_reserved("group", group.name));
      if (const auto first = groups_.place_of(group.name)) {
        faults_.add(name->place, wording::name_twice("group", group.name, *first));
      }
      groups_.add(group.name, tower_.groups.size(), name->place);
    }
    if (const YamlNode* section = view.require("section", "section: leg")) {
      group.section = sections_.find(*section, faults_).value_or(0);
    }
    if (const YamlNode* material = view.require("material", "material: steel")) {
      group.material = materials_.find(*material, faults_).value_or(0);
    }
    tower_.groups.push_back(group);
    if (const YamlNode* bars = view.require("bars", "bars: [[1, 5], [2, 6]]")) read_bars(*bars);
    view.refuse_unknown();
  }

  void read_bars(const YamlNode& list) {
    const auto* items = read_list(list, "bars", "[from, to] pairs", faults_);
    if (items == nullptr) return;
    std::size_t number = 0;
    for (const YamlNode& item : *items) {
      ++number;
      if (item.kind != YamlNode::Kind::sequence || item.items.size() != 2) {
        faults_.add(item.place, wording::bar_is_pair());
        continue;
      }
      const auto from = nodes_.find(item.items[0], faults_);
      const auto to = nodes_.find(item.items[1], faults_);
      if (from && to) tower_.bars.push_back({tower_.groups.size() - 1, *from, *to, number, item.place});
    }
  }

  std::vector<std::size_t> node_list(const YamlNode& list) {
    std::vector<std::size_t> nodes;
    const auto* items = read_list(list, "nodes", "node names", faults_);
    if (items == nullptr) return nodes;
    std::map<std::size_t, Place> seen;
    for (const YamlNode& item : *items) {
      const auto node = nodes_.find(item, faults_);
      if (!node) continue;
      const auto [first, fresh] = seen.emplace(*node, item.place);
      if (fresh) {
        nodes.push_back(*node);
      } else {
        faults_.add(item.place, wording::name_twice("node", item.text, first->second));
      }
    }
    return nodes;
  }

  void read_supports() {
    const YamlNode* supports = file_.find("supports");
    if (supports == nullptr) return;
    const auto* items = read_list(*supports, "supports", "supports", faults_);
    if (items == nullptr) return;
    for (const YamlNode& item : *items) read_support(item);
  }

  void read_support(const YamlNode& item) {
    MapView view(item, "a support", faults_);
    if (!view.is_map()) return;
    Support support;
    support.place = item.place;
    const YamlNode* nodes = view.require("nodes", "nodes: [1, 2, 3, 4]");
    const YamlNode* fixed = view.find("fixed");
    const YamlNode* springs = view.find("springs");
    if (!view.has("fixed") && !view.has("springs")) faults_.add(item.place, wording::holds_nothing());
    if (fixed != nullptr) read_fixed(*fixed, support);
    if (springs != nullptr) read_springs(*springs, support);
    view.refuse_later("pad", "springs from a pad and its soil are");
    view.refuse_unknown();
    if (nodes == nullptr) return;
    for (const std::size_t node : node_list(*nodes)) {
      support.node = node;
      hold(support);
    }
  }

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
      if (!known) faults_.add(item.place, wording::axis_unknown(item.text, axis_names()));
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

  void read_masses() {
    const YamlNode* masses = file_.find("masses");
    if (masses == nullptr) return;
    const auto* items = read_list(*masses, "masses", "masses", faults_);
    if (items == nullptr) return;
    for (const YamlNode& item : *items) read_mass(item);
  }

  void read_mass(const YamlNode& item) {
    MapView view(item, "a mass", faults_);
    if (!view.is_map()) return;
    std::string label;
    if (const YamlNode* node = view.find("label")) label = read_word(*node, "label", faults_).value_or("");
    const YamlNode* nodes = view.find("nodes");
    const YamlNode* group = view.find("group");
    const auto total = view.value("mass", Quantity::mass, Range::positive);
    const auto per_length = view.value("per_length", Quantity::mass_per_length, Range::positive);
    const auto share = view.value("allowance", Quantity::fraction, Range::share);
    view.refuse_later("ice", "ice on the bars is");
    if (view.has("ice")) static_cast<void>(view.find("density"));
    view.refuse_later("liquid", "liquids are");
    const int ways = (view.has("mass") ? 1 : 0) + (view.has("per_length") ? 1 : 0) +
                     (view.has("allowance") ? 1 : 0) + (view.has("ice") || view.has("liquid") ? 1 : 0);
    if (ways != 1)
      faults_.add(item.place, wording::one_key_of("'mass', 'per_length' and 'allowance'", view.owner()));
    if (view.has("nodes") && view.has("group"))
      faults_.add(item.place, wording::keys_exclude("nodes", "group", view.owner()));
    if (view.has("mass")) {
      if (!view.has("nodes"))
        faults_.add(item.place, wording::key_missing("nodes", "a mass at nodes", "nodes: [17, 18]"));
    } else if (!view.has("group") && ways == 1) {
      faults_.add(item.place, wording::key_missing("group", "a mass on bars", "group: all"));
    }
    view.refuse_unknown();
    if (nodes != nullptr) {
      auto list = node_list(*nodes);
      if (total && !list.empty()) tower_.node_masses.push_back({std::move(list), *total, label, item.place});
    }
    if (group == nullptr) return;
    std::optional<std::size_t> index;
    const bool all = group->kind == YamlNode::Kind::scalar && group->text == "all";
    if (!all) {
      index = groups_.find(*group, faults_);
      if (!index) return;
    }
    if (per_length) tower_.line_masses.push_back({index, *per_length, label, item.place});
    if (share) tower_.allowances.push_back({index, *share, label, item.place});
  }

  void read_mass_matrix() {
    const YamlNode* node = file_.find("mass_matrix");
    if (node == nullptr) return;
    constexpr std::array schemes{MassScheme::consistent, MassScheme::lumped, MassScheme::averaged};
    const auto choice = read_choice(*node, "mass_matrix", {"consistent", "lumped", "averaged"}, faults_);
    if (choice) tower_.mass_scheme = schemes[*choice];
  }

  void read_damping() {
    const YamlNode* node = file_.find("damping");
    if (node == nullptr) return;
    const std::vector<YamlNode> single{*node};
    const auto* items = &single;
    if (node->kind == YamlNode::Kind::sequence)
      items = read_list(*node, "damping", "damping ratios", faults_);
    if (items == nullptr) return;
    for (const YamlNode& item : *items) {
      const auto ratio = read_value(item, "damping", Quantity::fraction, Range::below_one, faults_);
      if (ratio) tower_.damping.push_back(*ratio);
    }
  }

  void read_stiffening() {
    const YamlNode* node = file_.find("stiffening");
    if (node == nullptr) return;
    if (node->kind == YamlNode::Kind::scalar && node->text == "gravity") {
      faults_.add(node->place, wording::not_yet_supported("'stiffening: gravity' is"));
    } else {
      static_cast<void>(read_choice(*node, "stiffening", {"none", "gravity"}, faults_));
    }
  }

  MapView& file_;
  FaultList& faults_;
  Tower& tower_;
  NameTable materials_{"material"};
  NameTable sections_{"section"};
  NameTable nodes_{"node"};
  NameTable groups_{"group"};
  std::map<std::size_t, std::size_t> held_;  // node to its place in the tower's supports
};

// A file of another version is refused at once: its keys may mean something else.
void read_version(MapView& file, const std::string& name) {
  const auto refuse = [&](Place place, Message message) {
    throw InputError({{name, place, std::move(message)}});
  };
  if (!file.has("swaymark")) refuse(file.place(), wording::version_missing());
  const YamlNode* version = file.find("swaymark");
  if (version == nullptr) refuse(file.place(), wording::version_missing());
  if (version->kind != YamlNode::Kind::scalar || version->text != "1") {
    refuse(version->place,
           wording::version_not_ours(version->kind == YamlNode::Kind::scalar ? version->text
                                                                             : version->description()));
  }
}

void read_head(MapView& file, Tower& tower) {
  if (const YamlNode* title = file.find("title")) {
    tower.title = read_word(*title, "title", file.faults()).value_or("");
  }
  if (const YamlNode* dimensions = file.find("dimensions")) {
    tower.dimensions = read_whole_number(*dimensions, "dimensions", 3, file.faults()).value_or(3);
  }
}

void refuse_later_keys(MapView& file) {
  file.refuse_later("lattice", "towers written by panels are");
  file.refuse_later("nodes_from", "nodes from a CSV file are");
  file.refuse_later("bars_from", "bars from a CSV file are");
  file.refuse_later("segments_from", "bars from line segments are");
  file.refuse_later("split_crossings", "bars from line segments are");
  file.refuse_later("scenarios", "scenarios are");
  file.refuse_later("base_study", "the study of base stiffness is");
  file.refuse_later("stabilise", "springs at loose nodes are");
  file.refuse_later("member_bending", "bending of members is");
  file.refuse_later("uncertainty", "intervals of frequency are");
  file.refuse_later("liquid", "liquids are");
}

}  // namespace

Tower read_tower(std::string_view text, const std::string& name) {
  FaultList faults(name);
  const YamlNode root = parse_yaml(text, name, faults);
  Tower tower;
  tower.file = name;
  if (root.kind != YamlNode::Kind::map) throw InputError({{name, {1, 1}, wording::not_a_tower()}});
  MapView file(root, "a tower file", faults);
  read_version(file, name);
  read_head(file, tower);
  refuse_later_keys(file);
  const bool nodes_elsewhere = file.has("lattice") || file.has("nodes_from") || file.has("segments_from");
  if (!nodes_elsewhere) static_cast<void>(file.require("nodes", "nodes: {1: [0, 0, 0], 2: [0, 0, 3 m]}"));
  StructureReader(file, tower).read();
  read_modes(file, tower);
  read_bands(file, tower);
  NameTable spectra("spectrum");
  read_spectra(file, tower, spectra);
  read_seismic(file, tower, spectra);
  file.refuse_unknown();
  validate(tower, faults);
  faults.throw_if_any();
  return tower;
}

}  // namespace swaymark
