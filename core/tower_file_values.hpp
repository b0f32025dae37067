#pragma once

#include <functional>
#include <optional>
#include <string>
#include <string_view>
#include <unordered_map>
#include <vector>

#include "core/error.hpp"
#include "core/quantity.hpp"
#include "core/tower.hpp"
#include "core/wording.hpp"
#include "core/yaml_document.hpp"

/// How single values and maps of a tower file are read: each function returns the value, or adds a fault with
/// its place and returns nothing. Private to the tower-file reader.
namespace swaymark {

/// Which numbers a key may have.
enum class Range { any, positive, not_negative, below_one, share };

[[nodiscard]] std::optional<double> read_value(const YamlNode& node, std::string_view key, Quantity quantity,
                                               Range range, FaultList& faults);
[[nodiscard]] std::optional<int> read_whole_number(const YamlNode& node, std::string_view key, int limit,
                                                   FaultList& faults);
[[nodiscard]] std::optional<bool> read_flag(const YamlNode& node, std::string_view key, FaultList& faults);
[[nodiscard]] std::optional<std::string> read_word(const YamlNode& node, std::string_view key,
                                                   FaultList& faults);
/// The index of the word among the choices.
[[nodiscard]] std::optional<std::size_t> read_choice(const YamlNode& node, std::string_view key,
                                                     const std::vector<std::string>& choices,
                                                     FaultList& faults);
/// The items of a list with at least one item.
[[nodiscard]] const std::vector<YamlNode>* read_list(const YamlNode& node, std::string_view key,
                                                     std::string_view wanted, FaultList& faults);

/// Named things of one kind and the index each has.
class NameTable {
 public:
  explicit NameTable(std::string kind) : kind_(std::move(kind)) {}
  void add(const std::string& name, std::size_t index, Place place);
  /// A name for several things that have names of their own: `top`.
  void add_several(const std::string& name, std::vector<std::size_t> indices);
  /// Names are missing that could not be read; an unknown one may be one of them, and is no fault.
  void leave_open() { open_ = true; }
  [[nodiscard]] bool means_several(const std::string& name) const { return several_.contains(name); }
  [[nodiscard]] std::optional<Place> place_of(const std::string& name) const;
  /// The index of the name that stands at `node`, or a fault that names the nearest one known.
  [[nodiscard]] std::optional<std::size_t> find(const YamlNode& node, FaultList& faults) const;
  [[nodiscard]] std::optional<std::size_t> find(const std::string& name, Place at, FaultList& faults) const;
  /// As find, for names that may stand for several.
  [[nodiscard]] std::vector<std::size_t> find_all(const YamlNode& node, FaultList& faults) const;

 private:
  struct Entry {
    std::size_t index;
    Place place;
  };
  std::string kind_;
  std::unordered_map<std::string, Entry> entries_;
  std::unordered_map<std::string, std::vector<std::size_t>> several_;
  bool open_ = false;
};

/// The nodes a list names, or one name in its place, each once.
[[nodiscard]] std::vector<std::size_t> read_node_list(const YamlNode& list, const NameTable& nodes,
                                                      FaultList& faults);

/// The names of the axes the tower has, for messages and choices.
[[nodiscard]] std::vector<std::string> axis_names(const Tower& tower);

/// A map of the file as a set of keys. Every key asked for becomes a known one; `refuse_unknown` reports the
/// rest.
class MapView {
 public:
  /// `owner` names the map in messages: "a band", "section 'leg'". Adds a fault if `node` is no map.
  MapView(const YamlNode& node, std::string owner, FaultList& faults);

  [[nodiscard]] bool is_map() const { return is_map_; }
  [[nodiscard]] const std::string& owner() const { return owner_; }
  [[nodiscard]] Place place() const { return node_.place; }
  [[nodiscard]] FaultList& faults() const { return faults_; }

  /// The value of the key, or nullptr. A key with nothing behind it is a fault and counts as absent.
  [[nodiscard]] const YamlNode* find(std::string_view key);
  /// As find, with a fault that shows `example` where the key is absent.
  [[nodiscard]] const YamlNode* require(std::string_view key, std::string_view example);
  /// Whether the key stands in the map, with or without a value behind it.
  [[nodiscard]] bool has(std::string_view key) const;
  /// Keys of the format that this version does not read; `what` ends in "is" or "are".
  void refuse_later(std::string_view key, std::string_view what);
  /// Adds the fault at the key if it stands in the map; elsewhere it is none of the known ones.
  void refuse(std::string_view key, Message message);
  /// The keys asked for so far.
  [[nodiscard]] const std::vector<std::string>& known() const { return known_; }
  void refuse_unknown();

  [[nodiscard]] std::optional<double> value(std::string_view key, Quantity quantity, Range range);
  [[nodiscard]] std::optional<double> required_value(std::string_view key, Quantity quantity, Range range,
                                                     std::string_view example);

 private:
  [[nodiscard]] const YamlNode* entry(std::string_view key) const;

  const YamlNode& node_;
  std::string owner_;
  FaultList& faults_;
  bool is_map_;
  std::vector<std::string> known_;
};

/// Calls `visit(name, key node, value node)` for every entry of a map of named things.
void for_each_named(const YamlNode& node, std::string_view key, FaultList& faults,
                    const std::function<void(const std::string&, const YamlNode&, const YamlNode&)>& visit);

}  // namespace swaymark
