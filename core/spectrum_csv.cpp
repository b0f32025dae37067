#include "core/spectrum_csv.hpp"

#include <algorithm>

#include "core/csv_columns.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

struct Point {
  double period = 0.0;        // [s]
  double acceleration = 0.0;  // [m/s2]
  const CsvCell* cell = nullptr;
};

const TableForm& form() {
  static const TableForm the_form{"a table of spectrum points",
                                  "period [s],acceleration [g]",
                                  {{"period", Quantity::time, false},
                                   {"frequency", Quantity::frequency, false},
                                   {"acceleration", Quantity::acceleration}}};
  return the_form;
}

bool check_abscissa(TableFile& table) {
  const auto period = table.table.column("period");
  const auto frequency = table.table.column("frequency");
  if (period && frequency) {
    const auto later = std::max(*period, *frequency);
    table.faults.add(table.table.columns[later].place, wording::frequency_and_period());
  } else if (!period && !frequency) {
    table.faults.add({table.table.columns.front().place.line, 1}, wording::neither_frequency_nor_period());
  }
  return period.has_value() != frequency.has_value();
}

std::vector<Point> read_rows(TableFile& table, bool logarithms) {
  const bool by_frequency = table.table.column("frequency").has_value();
  const ValueColumn abscissa =
      by_frequency ? ValueColumn(table.table, "frequency", Quantity::frequency, Range::positive)
                   : ValueColumn(table.table, "period", Quantity::time, Range::not_negative);
  const ValueColumn ordinate(table.table, "acceleration", Quantity::acceleration, Range::not_negative);
  const std::size_t column = *table.table.column(by_frequency ? "frequency" : "period");
  std::vector<Point> points;
  for (const auto& row : table.table.rows) {
    const auto along = abscissa.in(row, table.faults);
    const auto value = ordinate.in(row, table.faults);
    if (!along || !value) continue;
    if (logarithms && (*along == 0.0 || *value == 0.0)) {
      const Place place = *along == 0.0 ? abscissa.place_in(row) : ordinate.place_in(row);
      table.faults.add(place, wording::log_needs_positive());
    }
    points.push_back({by_frequency ? 1.0 / *along : *along, *value, &row[column]});
  }
  if (by_frequency)
    std::stable_sort(points.begin(), points.end(),
                     [](const Point& a, const Point& b) { return a.period < b.period; });
  return points;
}

void check_order(const std::vector<Point>& points, bool by_frequency, FaultList& faults) {
  for (std::size_t i = 1; i < points.size(); ++i) {
    const Point& before = points[i - 1];
    const Point& here = points[i];
    if (here.period > before.period) continue;
    faults.add(here.cell->place, by_frequency ? wording::frequency_twice(here.cell->text, before.cell->place)
                                              : wording::periods_must_rise(before.period, here.period));
  }
}

}  // namespace

void read_points_from(MapView& view, const std::string& tower_file, const FileSource& source,
                      SpectrumStatement& spectrum) {
  auto table = read_table(view, "points_from", tower_file, source, form());
  if (!table) return;
  if (table->usable && check_abscissa(*table)) {
    const auto points = read_rows(*table, spectrum.interpolation == Interpolation::log_log);
    check_order(points, table->table.column("frequency").has_value(), table->faults);
    for (const Point& point : points) spectrum.points.emplace_back(point.period, point.acceleration);
    if (points.size() < 2 && table->faults.empty())
      table->faults.add({table->table.columns.front().place.line, 1}, wording::points_need_two());
  }
  view.faults().take(std::move(table->faults));
}

}  // namespace swaymark
