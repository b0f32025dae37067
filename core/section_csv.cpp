#include "core/section_csv.hpp"

#include "core/csv_columns.hpp"

namespace swaymark {

namespace {

const TableForm& form() {
  static const TableForm the_form{"a table of sections",
                                  "size,area [cm2],radius [cm],perimeter [m]",
                                  {{"size", {}},
                                   {"area", Quantity::area},
                                   {"radius", Quantity::length, false},
                                   {"perimeter", Quantity::length, false}}};
  return the_form;
}

}  // namespace

void read_section_csv(std::string_view text, FaultList& faults, SectionTable& table) {
  const CsvTable csv = parse_csv(text, faults);
  if (csv.columns.empty() || !check_columns(csv, form(), faults)) return;
  const WordColumn name(csv, "size");
  const ValueColumn area(csv, "area", Quantity::area, Range::positive);
  const ValueColumn radius(csv, "radius", Quantity::length, Range::positive);
  const ValueColumn perimeter(csv, "perimeter", Quantity::length, Range::positive);
  for (const auto& row : csv.rows) {
    SectionSize size;
    size.name = name.in(row).text;
    size.radius = radius.in_or_empty(row, faults);
    size.perimeter = perimeter.in_or_empty(row, faults);
    // Where the area is faulty the name is known all the same: no second fault where it is used.
    size.area = area.in(row, faults).value_or(1.0);
    if (size.name.empty()) {
      faults.add(name.in(row).place, wording::key_empty("size"));
    } else if (!table.add(size)) {
      faults.add(name.in(row).place, wording::size_listed_already(size.name));
    }
  }
}

}  // namespace swaymark
