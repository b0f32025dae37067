#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "core/csv.hpp"
#include "core/file_source.hpp"

/// Tables whose columns are known by name, and how a key of the tower file names one. Private to the reader.
namespace swaymark {

/// A column that a table may have: of words, or of values of one quantity.
struct ColumnRule {
  std::string name;
  std::optional<Quantity> quantity;
  bool required = true;
};

/// A kind of table.
struct TableForm {
  std::string owner;    ///< for messages: "a table of nodes"
  std::string example;  ///< a header
  std::vector<ColumnRule> columns;
};

/// Adds a fault for every column that the form does not know, that is missing, that is named twice, or whose
/// unit does not measure its quantity. \return whether there was none, so that the rows can be read.
bool check_columns(const CsvTable& table, const TableForm& form, FaultList& faults);

/// A column of words.
class WordColumn {
 public:
  /// The table has the column, and outlives this.
  WordColumn(const CsvTable& table, std::string_view name);
  [[nodiscard]] const CsvCell& in(const std::vector<CsvCell>& row) const { return row[index_]; }

 private:
  std::size_t index_;
};

/// A column of values; where the table lacks it, each is absent without a fault.
class ValueColumn {
 public:
  /// The table outlives this. Its unit was checked.
  ValueColumn(const CsvTable& table, std::string_view name, Quantity quantity, Range range);
  /// In SI, or a fault.
  [[nodiscard]] std::optional<double> in(const std::vector<CsvCell>& row, FaultList& faults) const;
  /// As in(); an empty cell says that the value is not known.
  [[nodiscard]] std::optional<double> in_or_empty(const std::vector<CsvCell>& row, FaultList& faults) const;
  /// Where the value stands.
  [[nodiscard]] Place place_in(const std::vector<CsvCell>& row) const;

 private:
  const CsvTable& table_;
  std::optional<std::size_t> index_;
  Quantity quantity_;
  Range range_;
  double to_si_ = 1.0;  // of a bare number
};

/// A table in a file beside the tower file, with the faults found in it so far.
struct TableFile {
  explicit TableFile(std::string path) : faults(std::move(path)) {}
  CsvTable table;
  FaultList faults;
  std::uint32_t file = 0;  ///< Place::file of what is read from it
  bool usable = false;     ///< its rows can be read

  [[nodiscard]] const std::string& path() const { return faults.files().front(); }
  /// The place of a cell as the tower keeps it.
  [[nodiscard]] Place in_tower(Place place) const { return {place.line, place.column, file}; }
};

/// The table that stands behind a key of `view`, a map of the file `tower_file`; nothing, with a fault, where
/// it cannot be had, and nothing where the key is absent. A table without rows is a fault. Hand the faults
/// over to those of `view` with FaultList::take once the rows are read.
[[nodiscard]] std::optional<TableFile> read_table(MapView& view, std::string_view key,
                                                  const std::string& tower_file, const FileSource& source,
                                                  const TableForm& form);

}  // namespace swaymark
