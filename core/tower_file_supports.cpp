#include "core/tower_file_supports.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <map>

#include <fmt/format.h>

#include "core/base_study.hpp"
#include "core/pad.hpp"
#include "core/wording_bases.hpp"

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
    const YamlNode* pad = view.find("pad");
    const auto stabilise = view.value("stabilise", Quantity::stiffness, Range::positive);
    const bool holds = view.has("fixed") || view.has("springs") || view.has("pad");
    if (!holds && !view.has("stabilise")) faults_.add(item.place, wording::holds_nothing());
    if (fixed != nullptr) read_fixed(*fixed, support);
    if (springs != nullptr) read_springs(*springs, support);
    for (const char* beside : {"fixed", "springs"}) {
      if (view.has("pad") && view.has(beside)) faults_.add(item.place, wording::pad_beside(beside));
    }
    if (pad != nullptr && !view.has("fixed") && !view.has("springs")) read_pad(*pad, support);
    view.refuse_unknown();
    if (nodes == nullptr) return;
    for (const std::size_t node : read_node_list(*nodes, nodes_, faults_)) {
      support.node = node;
      if (holds) hold(support);
      if (stabilise) stabilised(node, *stabilise, item.place);
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

  void stabilised(std::size_t node, double stiffness, Place place) {
    const auto [first, fresh] = stabilised_.emplace(node, place);
    if (fresh) {
      tower_.stabilisers.push_back({node, stiffness, place});
    } else {
      faults_.add(place, wording::stabilised_twice(tower_.nodes[node].name, first->second));
    }
  }

  void read_pad(const YamlNode& map, Support& support) {
    MapView view(map, "'pad'", faults_);
    if (!view.is_map()) return;
    const auto length = view.required_value("length", Quantity::length, Range::positive, "length: 2 m");
    const auto width = view.required_value("width", Quantity::length, Range::positive, "width: 2 m");
    const auto modulus =
        view.required_value("shear_modulus", Quantity::stress, Range::positive, "shear_modulus: 60 MPa");
    auto poisson = view.required_value("poisson", Quantity::fraction, Range::any, "poisson: 0.3");
    view.refuse_unknown();
    if (tower_.dimensions == 1) faults_.add(map.place, wording::pad_in_one_dimension());
    if (poisson && (*poisson < 0.0 || *poisson >= 0.5)) {
      faults_.add(view.find("poisson")->place, wording::poisson_out_of_range(*poisson));
      poisson.reset();
    }
    if (!length || !width || !modulus || !poisson) return;
    const double ratio = std::max(*length, *width) / std::min(*length, *width);
    if (ratio > kMostSlenderPad) {
      faults_.add(map.place, wording::pad_too_slender(ratio, kMostSlenderPad));
      return;
    }
    support.pad = Pad{*length, *width, *modulus, *poisson};
    const PadSprings springs = pad_springs(*support.pad);
    const std::array by_axis{springs.x, springs.y, springs.z};
    for (const Axis axis : tower_.axes()) {
      const auto a = static_cast<std::size_t>(axis);
      support.spring[a] = by_axis[a];
      if (by_axis[a] > 0.0 && std::isfinite(by_axis[a])) continue;
      faults_.add(map.place, wording::pad_without_stiffness());
      return;
    }
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
    if (support.pad) known.pad = support.pad;
  }

  void twice(const Support& support, const Support& first, Axis axis) {
    faults_.add(support.place,
                wording::held_twice(tower_.nodes[support.node].name, name_of(axis), first.place));
  }

  const NameTable& nodes_;
  Tower& tower_;
  FaultList& faults_;
  std::map<std::size_t, Place> stabilised_;
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

void read_base_study(MapView& file, Tower& tower) {
  const YamlNode* node = file.find("base_study");
  if (node == nullptr) return;
  FaultList& faults = file.faults();
  if (node->kind != YamlNode::Kind::sequence || node->items.size() != 2) {
    faults.add(node->place, wording::study_is_a_range(node->kind == YamlNode::Kind::sequence
                                                          ? fmt::format("{}", node->items.size())
                                                          : node->description()));
    return;
  }
  const auto from = read_value(node->items[0], "base_study", Quantity::stiffness, Range::positive, faults);
  const auto to = read_value(node->items[1], "base_study", Quantity::stiffness, Range::positive, faults);
  if (!from || !to) return;
  if (*to <= *from) faults.add(node->place, wording::study_reversed(*from, *to));
  // Supports that could not be read may be the ones that are fixed.
  if (!has_studied_support(tower) && faults.empty())
    faults.add(node->place, wording::study_of_nothing(name_of(studied_axis(tower))));
  tower.base_study = BaseStudyStatement{*from, *to, node->place};
}

}  // namespace swaymark
