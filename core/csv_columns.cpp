#include "core/csv_columns.hpp"

#include <algorithm>
#include <cmath>

#include "core/text.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

const ColumnRule* rule_of(const TableForm& form, std::string_view name) {
  const auto found = std::find_if(form.columns.begin(), form.columns.end(),
                                  [&](const ColumnRule& rule) { return rule.name == name; });
  return found == form.columns.end() ? nullptr : &*found;
}

void check_unit(const CsvColumn& column, const ColumnRule& rule, FaultList& faults) {
  if (column.unit.empty()) return;
  if (!rule.quantity) {
    faults.add(column.place, wording::csv_word_without_unit(column.name));
    return;
  }
  auto one = read_quantity("1 " + column.unit, *rule.quantity);
  if (auto* message = std::get_if<Message>(&one)) faults.add(column.place, std::move(*message));
}

}  // namespace

bool check_columns(const CsvTable& table, const TableForm& form, FaultList& faults) {
  const std::size_t before = faults.size();
  std::vector<std::string> known;
  for (const ColumnRule& rule : form.columns) known.push_back(rule.name);
  for (std::size_t i = 0; i < table.columns.size(); ++i) {
    const CsvColumn& column = table.columns[i];
    if (table.column(column.name) != i) continue;  // named twice: reported where the table was read
    if (const ColumnRule* rule = rule_of(form, column.name)) {
      check_unit(column, *rule, faults);
    } else {
      faults.add(column.place,
                 wording::key_unknown(column.name, form.owner, nearest(column.name, known), known));
    }
  }
  const Place header{table.columns.front().place.line, 1};
  for (const ColumnRule& rule : form.columns) {
    if (rule.required && !table.column(rule.name))
      faults.add(header, wording::key_missing(rule.name, form.owner, form.example));
  }
  return faults.size() == before;
}

WordColumn::WordColumn(const CsvTable& table, std::string_view name)
    : index_(table.column(name).value_or(0)) {}

ValueColumn::ValueColumn(const CsvTable& table, std::string_view name, Quantity quantity, Range range)
    : table_(table), index_(table.column(name)), quantity_(quantity), range_(range) {
  if (!index_ || table.columns[*index_].unit.empty()) return;
  const auto one = read_quantity("1 " + table.columns[*index_].unit, quantity);
  if (const double* factor = std::get_if<double>(&one)) to_si_ = *factor;
}

std::optional<double> ValueColumn::in(const std::vector<CsvCell>& row, FaultList& faults) const {
  if (!index_) return std::nullopt;
  const CsvCell& cell = row[*index_];
  if (range_ == Range::any) {  // a short cut for the many coordinates of a large tower
    const auto number = read_number(cell.text);
    const double value = number.value_or(0.0) * to_si_;
    if (number && std::isfinite(value) && (value != 0.0 || *number == 0.0)) return value;
  }
  return read_cell(table_.columns[*index_], cell, quantity_, range_, faults);
}

std::optional<double> ValueColumn::in_or_empty(const std::vector<CsvCell>& row, FaultList& faults) const {
  if (!index_ || row[*index_].text.empty()) return std::nullopt;
  return in(row, faults);
}

Place ValueColumn::place_in(const std::vector<CsvCell>& row) const {
  return index_ ? row[*index_].place : Place{};
}

std::optional<TableFile> read_table(MapView& view, std::string_view key, const std::string& tower_file,
                                    const FileSource& source, const TableForm& form) {
  const YamlNode* node = view.find(key);
  if (node == nullptr) return std::nullopt;
  const auto name = read_word(*node, key, view.faults());
  if (!name) return std::nullopt;
  auto other = fetch(tower_file, *name, source, node->place, view.faults());
  if (!other) return std::nullopt;
  TableFile result(other->path);
  result.file = view.faults().add_file(other->path);
  result.table = parse_csv(other->text, result.faults);
  if (result.table.columns.empty()) return result;
  const bool complete = result.faults.empty();
  result.usable = check_columns(result.table, form, result.faults);
  if (complete && result.usable && result.table.rows.empty())
    result.faults.add({result.table.columns.front().place.line, 1}, wording::table_without_rows(form.owner));
  return result;
}

}  // namespace swaymark
