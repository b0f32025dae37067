#include "core/tower_file_scenarios.hpp"

#include <algorithm>
#include <array>
#include <set>

#include "core/tower_file_damping.hpp"
#include "core/tower_file_masses.hpp"
#include "core/tower_file_requests.hpp"
#include "core/tower_file_supports.hpp"
#include "core/validate.hpp"
#include "core/wording_scenarios.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kMostScenarios = 200;

// What a scenario may state besides its label.
constexpr std::array<std::string_view, 11> kScenarioKeys{
    "more_masses", "group_sections", "area_factor", "stiffness_factor", "masses", "supports", "mass_matrix",
    "damping",     "modes",          "bands",       "seismic"};

bool is_scenario_key(const std::string& key) {
  return std::find(kScenarioKeys.begin(), kScenarioKeys.end(), key) != kScenarioKeys.end();
}

bool is_none(const YamlNode* node) {
  return node != nullptr && node->kind == YamlNode::Kind::scalar && node->text == "none";
}

class ScenarioReader {
 public:
  ScenarioReader(MapView& file, const ScenarioNames& names, const Tower& stated)
      : file_(file), names_(names), stated_(stated), faults_(file.faults()) {}

  void read(const YamlNode& item, std::vector<Scenario>& scenarios) {
    MapView view(item, "a scenario", faults_);
    if (!view.is_map()) return;
    Scenario scenario{read_label(view), stated_keys(item), stated_, item.place};
    Tower& tower = scenario.tower;
    tower.base_study.reset();  // of the tower as stated alone
    read_group_sections(view, tower);
    read_masses_of(view, tower);
    if (view.has("supports")) {
      tower.supports.clear();
      tower.stabilisers.clear();
      read_supports(view, names_.parts.nodes, tower);
      check_stabilisers(tower, faults_);
    }
    read_factor(view, "area_factor", &Group::area_factor, tower);
    read_factor(view, "stiffness_factor", &Group::stiffness_factor, tower);
    read_mass_matrix(view, tower);
    read_requests(view, tower);
    for (const std::string& key : file_.known()) {
      if (!is_scenario_key(key))
        view.refuse(key,
                    wording::key_same_in_all_scenarios(key, {kScenarioKeys.begin(), kScenarioKeys.end()}));
    }
    view.refuse_unknown();
    if (item.items.size() == 2 && view.has("label"))
      faults_.add(item.place, wording::scenario_changes_nothing(scenario.label));
    scenarios.push_back(std::move(scenario));
  }

 private:
  std::string read_label(MapView& view) {
    const YamlNode* node = view.require("label", "label: iced");
    if (node == nullptr) return {};
    const std::string label = read_word(*node, "label", faults_).value_or("");
    if (label == kAsStated) faults_.add(node->place, wording::name_reserved("scenario", label));
    if (const auto first = labels_.place_of(label))
      faults_.add(node->place, wording::name_twice("scenario", label, *first));
    if (!label.empty()) labels_.add(label, 0, node->place);
    return label;
  }

  static std::vector<std::string> stated_keys(const YamlNode& item) {
    std::vector<std::string> keys;
    for (std::size_t i = 0; i + 1 < item.items.size(); i += 2) {
      if (is_scenario_key(item.items[i].text)) keys.push_back(item.items[i].text);
    }
    return keys;
  }

  void read_masses_of(MapView& view, Tower& tower) {
    if (view.has("masses") && view.has("more_masses"))
      faults_.add(view.place(), wording::keys_exclude("masses", "more_masses", view.owner()));
    if (view.has("masses")) drop_masses(tower);
    if (view.has("group_sections")) check_ice(tower, faults_);
    if (!is_none(view.find("masses"))) read_masses(view, "masses", names_.parts.nodes, names_.groups, tower);
    read_masses(view, "more_masses", names_.parts.nodes, names_.groups, tower);
  }

  void read_requests(MapView& view, Tower& tower) {
    if (view.has("damping")) {
      tower.damping.clear();
      read_damping(view, tower);
    }
    if (view.has("modes")) {
      tower.modes = {};
      read_modes(view, tower);
    }
    if (view.has("bands")) {
      tower.bands.clear();
      if (!is_none(view.find("bands"))) read_bands(view, tower);
    }
    if (view.has("seismic")) {
      tower.seismic.reset();
      if (!is_none(view.find("seismic")))
        read_seismic(view, tower, names_.spectra, view.has("damping") || file_.has("damping"));
    }
    for (const char* key : {"damping", "modes", "bands", "seismic", "supports"})
      static_cast<void>(view.has(key) ? nullptr : view.find(key));  // known, though absent
  }

  // {group: section} for all of its bars, or {group: {section: section}} for those that have the first.
  void read_group_sections(MapView& view, Tower& tower) {
    const YamlNode* map = view.find("group_sections");
    if (map == nullptr) return;
    if (map->kind == YamlNode::Kind::map && map->items.empty())
      faults_.add(map->place, wording::nothing_listed("group_sections", "groups and their sections"));
    for_each_named(*map, "group_sections", faults_,
                   [&](const std::string& name, const YamlNode& at, const YamlNode& value) {
                     const auto group = names_.groups.find(at, faults_);
                     if (value.kind == YamlNode::Kind::map) {
                       read_exchange(name, group, value, tower);
                       return;
                     }
                     const auto section = names_.parts.sections.find(value, faults_);
                     if (!group || !section) return;
                     tower.groups[*group].section = *section;
                     for (Bar& bar : tower.bars) {
                       if (bar.group == *group) bar.section.reset();
                     }
                   });
  }

  void read_exchange(const std::string& name, std::optional<std::size_t> group, const YamlNode& map,
                     Tower& tower) {
    if (map.items.empty())
      faults_.add(map.place, wording::nothing_listed(name, "sections and what replaces them"));
    for_each_named(map, name, faults_,
                   [&](const std::string& before, const YamlNode& at, const YamlNode& value) {
                     const auto from = names_.parts.sections.find(at, faults_);
                     const auto to = names_.parts.sections.find(value, faults_);
                     if (group && from && to) exchange(*group, *from, *to, before, at.place, tower);
                   });
  }

  // Looks at the tower as stated, so that sections can be swapped.
  void exchange(std::size_t group, std::size_t from, std::size_t to, const std::string& name, Place place,
                Tower& tower) {
    bool found = false;
    std::set<std::string> used;
    for (std::size_t b = 0; b < stated_.bars.size(); ++b) {
      const Bar& bar = stated_.bars[b];
      if (bar.group != group) continue;
      const std::size_t section = bar.section.value_or(stated_.groups[group].section);
      if (section < stated_.sections.size()) used.insert(stated_.sections[section].name);
      if (section != from) continue;
      found = true;
      tower.bars[b].section = to;
    }
    if (found) return;
    faults_.add(place,
                wording::section_not_in_group(stated_.groups[group].name, name, {used.begin(), used.end()}));
  }

  // One factor for all groups, or a map by group.
  void read_factor(MapView& view, std::string_view key, double Group::*factor, Tower& tower) {
    const YamlNode* node = view.find(key);
    if (node == nullptr) return;
    if (node->kind != YamlNode::Kind::map) {
      const auto value = read_value(*node, key, Quantity::fraction, Range::share, faults_);
      for (Group& group : tower.groups) group.*factor = value.value_or(1.0);
      return;
    }
    if (node->items.empty())
      faults_.add(node->place, wording::nothing_listed(key, "groups and their factors"));
    for_each_named(*node, key, faults_, [&](const std::string&, const YamlNode& at, const YamlNode& value) {
      const auto group = names_.groups.find(at, faults_);
      const auto read = read_value(value, key, Quantity::fraction, Range::share, faults_);
      if (group && read) tower.groups[*group].*factor = *read;
    });
  }

  MapView& file_;
  const ScenarioNames& names_;
  const Tower& stated_;
  FaultList& faults_;
  NameTable labels_{"scenario"};
};

}  // namespace

void refuse_scenario_keys(MapView& file) {
  for (const char* key : {"more_masses", "group_sections", "area_factor", "stiffness_factor"})
    file.refuse(key, wording::key_of_a_scenario(key));
}

std::vector<Scenario> read_scenarios(MapView& file, const ScenarioNames& names, const Tower& tower) {
  std::vector<Scenario> scenarios;
  const YamlNode* node = file.find("scenarios");
  if (node == nullptr) return scenarios;
  const auto* items = read_list(*node, "scenarios", "scenarios", file.faults());
  if (items == nullptr) return scenarios;
  if (items->size() > kMostScenarios) {
    file.faults().add(node->place, wording::too_many_scenarios(items->size(), kMostScenarios));
    return scenarios;
  }
  ScenarioReader reader(file, names, tower);
  for (const YamlNode& item : *items) reader.read(item, scenarios);
  return scenarios;
}

}  // namespace swaymark
