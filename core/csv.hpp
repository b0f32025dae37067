#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"
#include "core/tower_file_values.hpp"

/// Tables in CSV beside a tower file. Private to the reader.
///
/// The first line names the columns, each with its unit in brackets if it has one: `size,area [cm2]`. Commas
/// separate the cells; blanks around a cell do not count; a cell in double quotes may hold commas, and a
/// quote written twice (RFC 4180), but no end of line. Empty lines and lines that begin with # are passed
/// over.
namespace swaymark {

struct CsvCell {
  std::string text;
  Place place;
};

struct CsvColumn {
  std::string name;
  std::string unit;  ///< empty where the header gives none
  Place place;
};

struct CsvTable {
  std::vector<CsvColumn> columns;
  std::vector<std::vector<CsvCell>> rows;  ///< each with as many cells as there are columns

  [[nodiscard]] std::optional<std::size_t> column(std::string_view name) const;
};

/// Reads a table; rows with too few or too many cells become faults and are left out. The table has no
/// columns if the text cannot be read as one at all.
[[nodiscard]] CsvTable parse_csv(std::string_view text, FaultList& faults);

/// The value of a cell in SI: a bare number has the unit of its column; where the column has none, the cell
/// may carry its own.
[[nodiscard]] std::optional<double> read_cell(const CsvColumn& column, const CsvCell& cell, Quantity quantity,
                                              Range range, FaultList& faults);

}  // namespace swaymark
