#include "core/tower_file_tables.hpp"

#include <cmath>
#include <unordered_map>

#include <fmt/format.h>

#include "core/csv_columns.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

TableForm node_form(const Tower& tower) {
  TableForm form;
  form.owner =
      fmt::format("a table of nodes in {} dimension{}", tower.dimensions, tower.dimensions == 1 ? "" : "s");
  form.example = "node";
  form.columns.push_back({"node", {}});
  for (const std::string& axis : axis_names(tower)) {
    form.columns.push_back({axis, Quantity::length});
    form.example += fmt::format(",{} [m]", axis);
  }
  return form;
}

// The name of a row, or nothing with a fault.
const std::string* row_name(const CsvCell& cell, std::string_view kind, const NameTable& names,
                            TableFile& table, const FaultList& files) {
  if (cell.text.empty()) {
    table.faults.add(cell.place, wording::key_empty(kind));
    return nullptr;
  }
  const auto first = names.place_of(cell.text);
  if (!first) return &cell.text;
  table.faults.add(cell.place,
                   first->file == table.file
                       ? wording::name_twice(kind, cell.text, *first)
                       : wording::name_in_two_files(kind, cell.text, files.files()[first->file], *first));
  return nullptr;
}

struct AxisColumn {
  Axis axis;
  ValueColumn values;
};

void read_nodes(TableFile& table, const FaultList& files, NameTable& names, Tower& tower) {
  const WordColumn name(table.table, "node");
  std::vector<AxisColumn> axes;
  for (const Axis axis : tower.axes())
    axes.push_back({axis, ValueColumn(table.table, name_of(axis), Quantity::length, Range::any)});
  tower.nodes.reserve(tower.nodes.size() + table.table.rows.size());
  for (const auto& row : table.table.rows) {
    const std::string* word = row_name(name.in(row), "node", names, table, files);
    Eigen::Vector3d position = Eigen::Vector3d::Zero();
    bool complete = true;
    for (const AxisColumn& column : axes) {
      const auto value = column.values.in(row, table.faults);
      complete = complete && value;
      if (std::abs(value.value_or(0.0)) > kFarthest) {
        const Place place = column.values.place_in(row);
        table.faults.add(place, wording::too_far_away(fmt::format("{:.6g} m", *value)));
      }
      position[index_of(column.axis)] = value.value_or(0.0);
    }
    if (word == nullptr) continue;
    const std::size_t index = tower.nodes.size();
    const Place place = table.in_tower(name.in(row).place);
    names.add(*word, index, place);
    tower.nodes.push_back({*word, complete ? position : out_of_the_way(index), place});
  }
}

void read_bars(TableFile& table, const NameTable& nodes, const NameTable& groups, Tower& tower) {
  const WordColumn name(table.table, "bar");
  const WordColumn from(table.table, "from");
  const WordColumn to(table.table, "to");
  const WordColumn group(table.table, "group");
  std::vector<std::size_t> count = bars_by_group(tower);
  const auto found = [&](const NameTable& names, const CsvCell& cell, std::string_view column) {
    if (!cell.text.empty()) return names.find(cell.text, cell.place, table.faults);
    table.faults.add(cell.place, wording::key_empty(column));
    return std::optional<std::size_t>();
  };
  tower.bars.reserve(tower.bars.size() + table.table.rows.size());
  for (const auto& row : table.table.rows) {
    const CsvCell& word = name.in(row);
    if (word.text.empty()) table.faults.add(word.place, wording::key_empty("bar"));
    const auto a = found(nodes, from.in(row), "from");
    const auto b = found(nodes, to.in(row), "to");
    const auto g = found(groups, group.in(row), "group");
    if (!a || !b || !g || word.text.empty()) continue;
    tower.bars.push_back({*g, *a, *b, ++count[*g], table.in_tower(word.place), {}, {}, word.text});
  }
}

}  // namespace

void read_nodes_from(MapView& file, const FileSource& source, NameTable& nodes, Tower& tower) {
  if (!file.has("nodes_from")) return;
  FaultList& faults = file.faults();
  auto table = read_table(file, "nodes_from", tower.file, source, node_form(tower));
  if (table && table->usable) read_nodes(*table, faults, nodes, tower);
  if (!table || !table->faults.empty()) nodes.leave_open();
  if (table) faults.take(std::move(table->faults));
}

void read_bars_from(MapView& file, const FileSource& source, const NameTable& nodes, const NameTable& groups,
                    Tower& tower) {
  if (!file.has("bars_from")) return;
  const TableForm form{
      "a table of bars", "bar,from,to,group", {{"bar", {}}, {"from", {}}, {"to", {}}, {"group", {}}}};
  auto table = read_table(file, "bars_from", tower.file, source, form);
  if (table && table->usable) read_bars(*table, nodes, groups, tower);
  if (table) file.faults().take(std::move(table->faults));
}

std::vector<std::size_t> bars_by_group(const Tower& tower) {
  std::vector<std::size_t> count(tower.groups.size(), 0);
  for (const Bar& bar : tower.bars) ++count[bar.group];
  return count;
}

void check_bar_names(const Tower& tower, FaultList& faults) {
  std::unordered_map<std::string, std::size_t> seen;
  seen.reserve(tower.bars.size());
  for (std::size_t i = 0; i < tower.bars.size(); ++i) {
    const auto [found, fresh] = seen.emplace(tower.bar_name(i), i);
    if (fresh) continue;
    const Place place = tower.bars[i].place;
    const Place first = tower.bars[found->second].place;
    faults.add(place, first.file == place.file ? wording::name_twice("bar", found->first, first)
                                               : wording::name_in_two_files(
                                                     "bar", found->first, faults.files()[first.file], first));
  }
}

void check_groups_have_bars(const Tower& tower, FaultList& faults) {
  const std::vector<std::size_t> count = bars_by_group(tower);
  for (std::size_t i = 0; i < count.size(); ++i) {
    if (count[i] == 0) faults.add(tower.groups[i].place, wording::group_without_bars(tower.groups[i].name));
  }
}

}  // namespace swaymark
