#include "core/csv.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "core/text.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kMostBytes = std::size_t{64} << 20U;
constexpr std::size_t kMostCells = 6'000'000;                // a table of them takes some 300 MB of memory
constexpr std::string_view kByteOrderMark = "\xEF\xBB\xBF";  // spreadsheets write it before UTF-8
constexpr std::string_view kBlanks = " \t\r";                // the last, of a line end with two characters

std::string_view trimmed(std::string_view text) {
  const std::size_t first = text.find_first_not_of(kBlanks);
  if (first == std::string_view::npos) return {};
  return text.substr(first, text.find_last_not_of(kBlanks) - first + 1);
}

// Columns count characters, not bytes.
std::uint32_t characters_in(std::string_view text) {
  const auto starts = [](char c) { return (static_cast<unsigned char>(c) & 0xC0U) != 0x80U; };
  return static_cast<std::uint32_t>(std::count_if(text.begin(), text.end(), starts));
}

// One line into its cells.
class LineReader {
 public:
  LineReader(std::string_view line, std::uint32_t number, FaultList& faults)
      : line_(line), number_(number), faults_(faults) {}

  // Nothing if the line is faulty.
  std::optional<std::vector<CsvCell>> read() {
    std::vector<CsvCell> cells;
    for (;;) {
      skip_blanks();
      const bool quoted = at_ < line_.size() && line_[at_] == '"';
      CsvCell cell{{}, here()};
      if (quoted && !read_quoted(cell)) return std::nullopt;
      if (!quoted) cell.text = read_plain();
      cells.push_back(std::move(cell));
      if (at_ >= line_.size()) return cells;
      ++at_;  // the comma
    }
  }

 private:
  [[nodiscard]] Place here() const { return {number_, characters_in(line_.substr(0, at_)) + 1}; }

  void skip_blanks() { at_ = std::min(line_.find_first_not_of(kBlanks, at_), line_.size()); }

  std::string read_plain() {
    const std::size_t end = std::min(line_.find(',', at_), line_.size());
    const std::string_view text = trimmed(line_.substr(at_, end - at_));
    at_ = end;
    return std::string(text);
  }

  bool read_quoted(CsvCell& cell) {
    for (++at_; at_ < line_.size(); ++at_) {
      if (line_[at_] != '"') {
        cell.text += line_[at_];
      } else if (at_ + 1 < line_.size() && line_[at_ + 1] == '"') {
        cell.text += line_[at_++];
      } else {
        ++at_;
        skip_blanks();
        if (at_ >= line_.size() || line_[at_] == ',') return true;
        break;
      }
    }
    faults_.add(cell.place, wording::csv_quote());
    return false;
  }

  std::string_view line_;
  std::uint32_t number_;
  FaultList& faults_;
  std::size_t at_ = 0;
};

CsvColumn column_from(const CsvCell& cell) {
  const std::string_view text = cell.text;
  const std::size_t bracket = text.find('[');
  if (bracket == std::string_view::npos || !text.ends_with(']')) return {cell.text, {}, cell.place};
  const std::string_view unit = trimmed(text.substr(bracket + 1, text.size() - bracket - 2));
  return {std::string(trimmed(text.substr(0, bracket))), std::string(unit), cell.place};
}

// Adds nothing where the line is no header at all.
void read_header(const std::vector<CsvCell>& cells, CsvTable& table, FaultList& faults) {
  if (cells.size() == 1 && cells[0].text.find_first_of(";\t") != std::string::npos) {
    faults.add(cells[0].place, wording::csv_separator());
    return;
  }
  for (const CsvCell& cell : cells) {
    CsvColumn column = column_from(cell);
    if (const auto first = table.column(column.name)) {
      faults.add(cell.place, wording::name_twice("column", column.name, table.columns[*first].place));
    }
    table.columns.push_back(std::move(column));
  }
}

}  // namespace

std::optional<std::size_t> CsvTable::column(std::string_view name) const {
  for (std::size_t i = 0; i < columns.size(); ++i) {
    if (columns[i].name == name) return i;
  }
  return std::nullopt;
}

CsvTable parse_csv(std::string_view text, FaultList& faults) {
  CsvTable table;
  if (text.size() > kMostBytes) {
    faults.add({}, wording::csv_too_long(text.size(), kMostBytes));
    return table;
  }
  if (text.starts_with(kByteOrderMark)) text.remove_prefix(kByteOrderMark.size());
  if (const auto place = first_invalid_character(text)) {
    faults.add(*place, wording::invalid_character());
    return table;
  }
  std::uint32_t number = 0;
  for (std::size_t at = 0; at < text.size();) {
    const std::size_t end = std::min(text.find('\n', at), text.size());
    const std::string_view line = text.substr(at, end - at);
    at = end + 1;
    ++number;
    if (trimmed(line).empty() || trimmed(line).starts_with('#')) continue;
    auto cells = LineReader(line, number, faults).read();
    if (!cells) {
      if (table.columns.empty()) return table;
    } else if (table.columns.empty()) {
      read_header(*cells, table, faults);
      if (table.columns.empty()) return table;
    } else if (cells->size() != table.columns.size()) {
      faults.add({number, 1}, wording::csv_cells(cells->size(), table.columns.size()));
    } else if ((table.rows.size() + 1) * table.columns.size() > kMostCells) {
      faults.add({number, 1}, wording::csv_too_many_cells(kMostCells));
      return table;
    } else {
      table.rows.push_back(std::move(*cells));
    }
  }
  if (table.columns.empty()) faults.add({}, wording::csv_empty());
  return table;
}

std::optional<double> read_cell(const CsvColumn& column, const CsvCell& cell, Quantity quantity, Range range,
                                FaultList& faults) {
  YamlNode value;
  value.kind = YamlNode::Kind::scalar;
  value.place = cell.place;
  value.text = cell.text;
  const bool bare = read_number(cell.text).has_value();
  if (!column.unit.empty() && bare) value.text += " " + column.unit;
  if (!column.unit.empty() && !bare) {
    faults.add(cell.place, wording::csv_not_a_number(column.name, cell.text, column.unit));
    return std::nullopt;
  }
  return read_value(value, column.name, quantity, range, faults);
}

}  // namespace swaymark
