#pragma once

#include <string>
#include <vector>

namespace swaymark {

/// A plain-text table: columns as wide as their widest cell, words to the left and figures to the right.
class Table {
 public:
  enum class Align { left, right };
  struct Column {
    std::vector<std::string> head;  ///< lines of the heading
    Align align = Align::right;
  };

  explicit Table(std::vector<Column> columns) : columns_(std::move(columns)) {}
  void add(std::vector<std::string> cells) { rows_.push_back(std::move(cells)); }
  [[nodiscard]] bool empty() const { return rows_.empty(); }
  /// The rows, each indented by two blanks.
  [[nodiscard]] std::string text() const;

 private:
  std::vector<Column> columns_;
  std::vector<std::vector<std::string>> rows_;
};

/// Width [columns] of running text in reports.
inline constexpr std::size_t kTextWidth = 88;

/// A heading after an empty line.
[[nodiscard]] std::string section_head(const std::string& words);

/// `text` broken at blanks into lines of at most `width` columns; the first begins with `lead`, the others
/// with as many blanks.
[[nodiscard]] std::string wrapped(const std::string& text, const std::string& lead, std::size_t width);

/// Columns a text takes on a terminal: one for each character of its UTF-8.
[[nodiscard]] std::size_t columns_of(const std::string& text);

}  // namespace swaymark
