#include "apps/table.hpp"

#include <algorithm>
#include <array>
#include <sstream>
#include <string_view>

namespace swaymark {

namespace {

std::string padded(const std::string& cell, std::size_t width, Table::Align align) {
  const std::string blanks(width - std::min(width, columns_of(cell)), ' ');
  return align == Table::Align::left ? cell + blanks : blanks + cell;
}

// Whether a word is the unit of a figure before it, with or without a punctuation mark behind.
bool is_unit(std::string word) {
  while (!word.empty() && std::string_view(".,;:)").find(word.back()) != std::string_view::npos)
    word.pop_back();
  static constexpr std::array<std::string_view, 10> units{"%", "Hz", "kN", "kNm",  "kg",
                                                          "m", "s",  "g",  "MN/m", "kg/m3"};
  return std::find(units.begin(), units.end(), word) != units.end();
}

// The words of a text; a figure and its unit are one, so that no line begins with a unit.
std::vector<std::string> unbroken_words(const std::string& text) {
  std::istringstream stream(text);
  std::vector<std::string> words;
  for (std::string word; stream >> word;) {
    const bool after_figure = !words.empty() && words.back().back() >= '0' && words.back().back() <= '9';
    if (after_figure && is_unit(word)) {
      words.back() += " " + word;
    } else {
      words.push_back(word);
    }
  }
  return words;
}

}  // namespace

std::size_t columns_of(const std::string& text) {
  return static_cast<std::size_t>(std::count_if(
      text.begin(), text.end(), [](char c) { return (static_cast<unsigned char>(c) & 0xC0U) != 0x80U; }));
}

std::string Table::text() const {
  std::size_t head_lines = 0;
  std::vector<std::size_t> widths;
  for (std::size_t c = 0; c < columns_.size(); ++c) {
    std::size_t width = 0;
    for (const auto& line : columns_[c].head) width = std::max(width, columns_of(line));
    for (const auto& row : rows_) width = std::max(width, columns_of(row[c]));
    widths.push_back(width);
    head_lines = std::max(head_lines, columns_[c].head.size());
  }
  std::string result;
  const auto add_line = [&](const auto& cell_of) {
    std::string line;
    for (std::size_t c = 0; c < columns_.size(); ++c)
      line += "  " + padded(cell_of(c), widths[c], columns_[c].align);
    line.erase(line.find_last_not_of(' ') + 1);
    result += line + "\n";
  };
  for (std::size_t l = 0; l < head_lines; ++l) {
    add_line([&](std::size_t c) {
      const auto& head = columns_[c].head;
      // A short heading stands on the last line, next to the figures.
      const std::size_t missing = head_lines - head.size();
      return l < missing ? std::string() : head[l - missing];
    });
  }
  for (const auto& row : rows_) {
    add_line([&](std::size_t c) { return row[c]; });
  }
  return result;
}

std::string section_head(const std::string& words) { return "\n" + words + "\n"; }

std::string wrapped(const std::string& text, const std::string& lead, std::size_t width) {
  const std::vector<std::string> words = unbroken_words(text);
  std::string result;
  std::string line = lead;
  bool fresh = true;
  for (const std::string& word : words) {
    if (!fresh && columns_of(line) + 1 + columns_of(word) > width) {
      result += line + "\n";
      line = std::string(columns_of(lead), ' ');
      fresh = true;
    }
    if (!fresh) line += ' ';
    line += word;
    fresh = false;
  }
  return result + line + "\n";
}

}  // namespace swaymark
