#include "core/section_csv.hpp"

#include <algorithm>

#include "core/csv.hpp"
#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr std::string_view kOwner = "a table of sections";
constexpr std::string_view kExample = "size,area [cm2],radius [cm],perimeter [m]";

// One column of values; not there if the header lacks it or its unit cannot be read.
class ValueColumn {
 public:
  ValueColumn(const CsvTable& table, std::string_view name, Quantity quantity, FaultList& faults)
      : table_(table), index_(table.column(name)), quantity_(quantity), faults_(faults) {
    if (!index_ || column().unit.empty()) return;
    auto one = read_quantity("1 " + column().unit, quantity);
    if (auto* message = std::get_if<Message>(&one)) {
      faults.add(column().place, std::move(*message));
      index_.reset();
    }
  }

  [[nodiscard]] std::optional<double> in(const std::vector<CsvCell>& row) const {
    if (!index_) return std::nullopt;
    return read_cell(column(), row[*index_], quantity_, Range::positive, faults_);
  }
  // An empty cell says that the value is not known.
  [[nodiscard]] std::optional<double> in_or_empty(const std::vector<CsvCell>& row) const {
    if (!index_ || row[*index_].text.empty()) return std::nullopt;
    return in(row);
  }

 private:
  [[nodiscard]] const CsvColumn& column() const { return table_.columns[*index_]; }

  const CsvTable& table_;
  std::optional<std::size_t> index_;
  Quantity quantity_;
  FaultList& faults_;
};

// Whether the rows can be read.
bool check_header(const CsvTable& table, FaultList& faults) {
  const std::vector<std::string> known{"size", "area", "radius", "perimeter"};
  for (const CsvColumn& column : table.columns) {
    if (std::find(known.begin(), known.end(), column.name) != known.end()) continue;
    faults.add(column.place, wording::key_unknown(column.name, kOwner, nearest(column.name, known), known));
  }
  const Place header{table.columns.front().place.line, 1};
  for (const char* needed : {"size", "area"}) {
    if (!table.column(needed)) faults.add(header, wording::key_missing(needed, kOwner, kExample));
  }
  const auto size = table.column("size");
  if (!size) return false;
  if (!table.columns[*size].unit.empty()) {
    faults.add(table.columns[*size].place, wording::csv_word_without_unit("size"));
  }
  return true;
}

}  // namespace

void read_section_csv(std::string_view text, FaultList& faults, SectionTable& table) {
  const CsvTable csv = parse_csv(text, faults);
  if (csv.columns.empty() || !check_header(csv, faults)) return;
  const std::size_t name = csv.column("size").value_or(0);
  const ValueColumn area(csv, "area", Quantity::area, faults);
  const ValueColumn radius(csv, "radius", Quantity::length, faults);
  const ValueColumn perimeter(csv, "perimeter", Quantity::length, faults);
  for (const auto& row : csv.rows) {
    SectionSize size;
    size.name = row[name].text;
    size.radius = radius.in_or_empty(row);
    size.perimeter = perimeter.in_or_empty(row);
    // Where the area is faulty the name is known all the same: no second fault where it is used.
    size.area = area.in(row).value_or(1.0);
    if (size.name.empty()) {
      faults.add(row[name].place, wording::key_empty("size"));
    } else if (!table.add(size)) {
      faults.add(row[name].place, wording::size_listed_already(size.name));
    }
  }
}

}  // namespace swaymark
