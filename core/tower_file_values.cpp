#include "core/tower_file_values.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark {

namespace {

const std::string* scalar(const YamlNode& node, std::string_view key, std::string_view wanted,
                          FaultList& faults) {
  if (node.kind == YamlNode::Kind::scalar) return &node.text;
  faults.add(node.place, wording::wrong_kind(key, wanted, node.description()));
  return nullptr;
}

std::optional<Message> out_of(Range range, std::string_view key, std::string_view text, double value) {
  switch (range) {
    case Range::any:
      break;
    case Range::positive:
      if (value <= 0.0) return wording::must_be_positive(key, text);
      break;
    case Range::not_negative:
      if (value < 0.0) return wording::must_not_be_negative(key, text);
      break;
    case Range::below_one:
      if (value < 0.0) return wording::must_not_be_negative(key, text);
      if (value >= 1.0) return wording::not_a_fraction(key, text, value);
      break;
    case Range::share:
      if (value <= 0.0) return wording::must_be_positive(key, text);
      if (value > 1.0) return wording::not_a_fraction(key, text, value);
      break;
  }
  return std::nullopt;
}

}  // namespace

std::optional<double> read_value(const YamlNode& node, std::string_view key, Quantity quantity, Range range,
                                 FaultList& faults) {
  const std::string* text = scalar(node, key, name_of(quantity), faults);
  if (text == nullptr) return std::nullopt;
  auto reading = read_quantity(*text, quantity);
  if (auto* message = std::get_if<Message>(&reading)) {
    message->what = fmt::format("'{}': {}", excerpt(key), message->what);
    faults.add(node.place, std::move(*message));
    return std::nullopt;
  }
  const double value = std::get<double>(reading);
  if (auto message = out_of(range, key, *text, value)) {
    faults.add(node.place, std::move(*message));
    return std::nullopt;
  }
  return value;
}

std::optional<int> read_whole_number(const YamlNode& node, std::string_view key, int limit,
                                     FaultList& faults) {
  const std::string* text = scalar(node, key, "a whole number", faults);
  if (text == nullptr) return std::nullopt;
  const auto value = read_number(*text);
  if (!value || *value < 1.0 || *value > limit || *value != std::floor(*value)) {
    faults.add(node.place, wording::not_a_whole_number(key, *text, limit));
    return std::nullopt;
  }
  return static_cast<int>(*value);
}

std::optional<bool> read_flag(const YamlNode& node, std::string_view key, FaultList& faults) {
  const auto choice = read_choice(node, key, {"true", "false"}, faults);
  if (!choice) return std::nullopt;
  return *choice == 0;
}

std::optional<std::string> read_word(const YamlNode& node, std::string_view key, FaultList& faults) {
  const std::string* text = scalar(node, key, "a word", faults);
  if (text == nullptr) return std::nullopt;
  if (text->empty()) {
    faults.add(node.place, wording::key_empty(key));
    return std::nullopt;
  }
  return *text;
}

std::optional<std::size_t> read_choice(const YamlNode& node, std::string_view key,
                                       const std::vector<std::string>& choices, FaultList& faults) {
  const std::string* text = scalar(node, key, alternatives(choices), faults);
  if (text == nullptr) return std::nullopt;
  const auto found = std::find(choices.begin(), choices.end(), *text);
  if (found == choices.end()) {
    faults.add(node.place, wording::not_a_choice(key, *text, choices));
    return std::nullopt;
  }
  return static_cast<std::size_t>(found - choices.begin());
}

const std::vector<YamlNode>* read_list(const YamlNode& node, std::string_view key, std::string_view wanted,
                                       FaultList& faults) {
  if (node.kind != YamlNode::Kind::sequence) {
    faults.add(node.place, wording::wrong_kind(key, fmt::format("a list of {}", wanted), node.description()));
    return nullptr;
  }
  if (node.items.empty()) {
    faults.add(node.place, wording::nothing_listed(key, wanted));
    return nullptr;
  }
  return &node.items;
}

void NameTable::add(const std::string& name, std::size_t index, Place place) {
  entries_.emplace(name, Entry{index, place});
}

void NameTable::add_several(const std::string& name, std::vector<std::size_t> indices) {
  several_.emplace(name, std::move(indices));
}

std::optional<Place> NameTable::place_of(const std::string& name) const {
  const auto found = entries_.find(name);
  if (found == entries_.end()) return std::nullopt;
  return found->second.place;
}

std::optional<std::size_t> NameTable::find(const YamlNode& node, FaultList& faults) const {
  const std::string* name = scalar(node, kind_, "a name", faults);
  return name == nullptr ? std::nullopt : find(*name, node.place, faults);
}

std::optional<std::size_t> NameTable::find(const std::string& name, Place at, FaultList& faults) const {
  const auto found = entries_.find(name);
  if (found != entries_.end()) return found->second.index;
  const auto several = several_.find(name);
  if (several != several_.end()) {
    faults.add(at, wording::name_means_several(kind_, name, several->second.size()));
    return std::nullopt;
  }
  if (open_) return std::nullopt;
  std::optional<std::string> close;
  constexpr std::size_t most_compared = 2000;  // past that a suggestion costs more than it helps
  if (entries_.size() <= most_compared && faults.size() < 100) {
    std::vector<std::string> names;
    for (const auto& [known, entry] : entries_) names.push_back(known);
    std::sort(names.begin(), names.end());
    close = nearest(name, names);
  }
  faults.add(at, wording::name_unknown(kind_, name, close));
  return std::nullopt;
}

std::vector<std::size_t> NameTable::find_all(const YamlNode& node, FaultList& faults) const {
  if (node.kind == YamlNode::Kind::scalar) {
    const auto several = several_.find(node.text);
    if (several != several_.end()) return several->second;
  }
  const auto one = find(node, faults);
  return one ? std::vector<std::size_t>{*one} : std::vector<std::size_t>{};
}

std::vector<std::size_t> read_node_list(const YamlNode& list, const NameTable& nodes, FaultList& faults) {
  if (list.kind == YamlNode::Kind::scalar) return nodes.find_all(list, faults);
  std::vector<std::size_t> result;
  const auto* items = read_list(list, "nodes", "node names", faults);
  if (items == nullptr) return result;
  std::unordered_map<std::size_t, Place> seen;
  for (const YamlNode& item : *items) {
    for (const std::size_t node : nodes.find_all(item, faults)) {
      const auto [first, fresh] = seen.emplace(node, item.place);
      if (fresh) {
        result.push_back(node);
      } else {
        faults.add(item.place, wording::name_twice("node", item.text, first->second));
        break;
      }
    }
  }
  return result;
}

std::vector<std::string> axis_names(const Tower& tower) {
  std::vector<std::string> names;
  for (const Axis axis : tower.axes()) names.emplace_back(name_of(axis));
  return names;
}

MapView::MapView(const YamlNode& node, std::string owner, FaultList& faults)
    : node_(node), owner_(std::move(owner)), faults_(faults), is_map_(node.kind == YamlNode::Kind::map) {
  if (!is_map_) faults_.add(node.place, wording::wants_map(owner_, node.description()));
}

const YamlNode* MapView::entry(std::string_view key) const {
  if (!is_map_) return nullptr;
  for (std::size_t i = 0; i + 1 < node_.items.size(); i += 2) {
    if (node_.items[i].kind == YamlNode::Kind::scalar && node_.items[i].text == key) return &node_.items[i];
  }
  return nullptr;
}

const YamlNode* MapView::find(std::string_view key) {
  if (std::find(known_.begin(), known_.end(), key) == known_.end()) known_.emplace_back(key);
  const YamlNode* found = entry(key);
  if (found == nullptr) return nullptr;
  const YamlNode* value = found + 1;
  if (value->kind == YamlNode::Kind::null) {
    faults_.add(found->place, wording::key_empty(key));
    return nullptr;
  }
  return value;
}

const YamlNode* MapView::require(std::string_view key, std::string_view example) {
  if (is_map_ && !has(key)) faults_.add(node_.place, wording::key_missing(key, owner_, example));
  return find(key);
}

bool MapView::has(std::string_view key) const { return entry(key) != nullptr; }

void MapView::refuse_later(std::string_view key, std::string_view what) {
  known_.emplace_back(key);
  if (const YamlNode* found = entry(key)) {
    faults_.add(found->place, wording::not_yet_supported(fmt::format("'{}': {}", key, what)));
  }
}

void MapView::refuse(std::string_view key, Message message) {
  const YamlNode* found = entry(key);
  if (found == nullptr) return;
  known_.emplace_back(key);
  faults_.add(found->place, std::move(message));
}

void MapView::refuse_unknown() {
  if (!is_map_) return;
  for (std::size_t i = 0; i + 1 < node_.items.size(); i += 2) {
    const YamlNode& key = node_.items[i];
    if (key.kind != YamlNode::Kind::scalar) continue;
    if (std::find(known_.begin(), known_.end(), key.text) != known_.end()) continue;
    faults_.add(key.place, wording::key_unknown(key.text, owner_, nearest(key.text, known_), known_));
  }
}

std::optional<double> MapView::value(std::string_view key, Quantity quantity, Range range) {
  const YamlNode* found = find(key);
  if (found == nullptr) return std::nullopt;
  return read_value(*found, key, quantity, range, faults_);
}

std::optional<double> MapView::required_value(std::string_view key, Quantity quantity, Range range,
                                              std::string_view example) {
  const YamlNode* found = require(key, example);
  if (found == nullptr) return std::nullopt;
  return read_value(*found, key, quantity, range, faults_);
}

void for_each_named(const YamlNode& node, std::string_view key, FaultList& faults,
                    const std::function<void(const std::string&, const YamlNode&, const YamlNode&)>& visit) {
  if (node.kind != YamlNode::Kind::map) {
    faults.add(node.place, wording::wrong_kind(key, "a map of names", node.description()));
    return;
  }
  for (std::size_t i = 0; i + 1 < node.items.size(); i += 2) {
    const YamlNode& name = node.items[i];
    const YamlNode& value = node.items[i + 1];
    if (name.kind != YamlNode::Kind::scalar) continue;  // reported with the keys
    if (value.kind == YamlNode::Kind::null) {
      faults.add(name.place, wording::key_empty(name.text));
      continue;
    }
    visit(name.text, name, value);
  }
}

}  // namespace swaymark
