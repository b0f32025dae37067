#include "core/tower_file.hpp"

#include "core/tower_file_damping.hpp"
#include "core/tower_file_lattice.hpp"
#include "core/tower_file_masses.hpp"
#include "core/tower_file_members.hpp"
#include "core/tower_file_parts.hpp"
#include "core/tower_file_requests.hpp"
#include "core/tower_file_scenarios.hpp"
#include "core/tower_file_segments.hpp"
#include "core/tower_file_supports.hpp"
#include "core/tower_file_tables.hpp"
#include "core/tower_file_values.hpp"
#include "core/validate.hpp"

namespace swaymark {

namespace {

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

void read_stiffening(MapView& file) {
  const YamlNode* node = file.find("stiffening");
  if (node == nullptr) return;
  if (node->kind == YamlNode::Kind::scalar && node->text == "gravity") {
    file.faults().add(node->place, wording::not_yet_supported("'stiffening: gravity' is"));
  } else {
    static_cast<void>(read_choice(*node, "stiffening", {"none", "gravity"}, file.faults()));
  }
}

void refuse_later_keys(MapView& file) {
  file.refuse_later("member_bending", "bending of members is");
  file.refuse_later("uncertainty", "intervals of frequency are");
}

// Tables of bars, and what can be said of groups and names once all bars are known.
void read_bars_elsewhere(MapView& file, const FileSource& source, PartNames& parts, const NameTable& groups,
                         Tower& tower) {
  read_bars_from(file, source, parts.nodes, groups, tower);
  read_segments(file, source, parts, groups, tower);
  if (!file.has("bars_from") && !file.has("segments_from")) return;
  check_bar_names(tower, file.faults());
  if (file.faults().empty()) check_groups_have_bars(tower, file.faults());
}

}  // namespace

Tower read_tower(std::string_view text, const std::string& name, const FileSource& source) {
  return read_tower_file(text, name, source).tower;
}

TowerFile read_tower_file(std::string_view text, const std::string& name, const FileSource& source) {
  FaultList faults(name);
  const YamlNode root = parse_yaml(text, name, faults);
  TowerFile result;
  Tower& tower = result.tower;
  tower.file = name;
  if (root.kind != YamlNode::Kind::map) throw InputError({{name, {1, 1}, wording::not_a_tower()}});
  MapView file(root, "a tower file", faults);
  read_version(file, name);
  read_head(file, tower);
  refuse_later_keys(file);
  const bool nodes_elsewhere = file.has("lattice") || file.has("nodes_from") || file.has("segments_from");
  if (!nodes_elsewhere) static_cast<void>(file.require("nodes", "nodes: {1: [0, 0, 0], 2: [0, 0, 3 m]}"));
  PartNames parts = read_parts(file, tower, source);
  read_nodes_from(file, source, parts.nodes, tower);
  NameTable groups("group");
  read_lattice(file, parts, groups, tower);
  read_members(file, parts, groups, tower);
  read_bars_elsewhere(file, source, parts, groups, tower);
  read_supports(file, parts.nodes, tower);
  read_base_study(file, tower);
  read_masses(file, "masses", parts.nodes, groups, tower);
  read_mass_matrix(file, tower);
  read_damping(file, tower);
  read_stiffening(file);
  read_modes(file, tower);
  read_bands(file, tower);
  NameTable spectra("spectrum");
  read_spectra(file, source, tower, spectra);
  read_seismic(file, tower, spectra, file.has("damping"));
  refuse_scenario_keys(file);
  tower.files = faults.files();
  result.scenarios = read_scenarios(file, {parts, groups, spectra}, tower);
  file.refuse_unknown();
  validate(tower, faults);
  faults.throw_if_any();
  return result;
}

}  // namespace swaymark
