#pragma once

#include <string>
#include <string_view>
#include <vector>

#include <fmt/format.h>

#include "tests/support/files.hpp"

/// A small tower file with one key a line, so that a test can put one line in the place of another and knows
/// where its faults stand.
namespace swaymark::test {

/// Two bars from the held nodes a and b to the free node c, in two dimensions; line 1 is the version.
inline const std::vector<std::string> kSmallTower{
    "swaymark: 1",
    "dimensions: 2",
    "materials: {steel: {E: 210 GPa, density: 7850 kg/m3}}",
    "sections: {bar: {area: 10 cm2}}",
    "nodes: {a: [0, 0], b: [2, 0], c: [1, 1]}",
    "members: [{group: g, section: bar, material: steel, bars: [[a, c], [b, c]]}]",
    "supports: [{nodes: [a, b], fixed: [x, z]}]",
};

/// The small tower with lines put in the place of those with the same key, or added after line 7.
inline std::string tower_with(const std::vector<std::string>& replacements) {
  std::vector<std::string> lines = kSmallTower;
  for (const std::string& line : replacements) {
    const std::string key = line.substr(0, line.find(':') + 1);
    bool replaced = false;
    for (std::string& known : lines) {
      if (!known.starts_with(key)) continue;
      known = line;
      replaced = true;
    }
    if (!replaced) lines.push_back(line);
  }
  return fmt::format("{}\n", fmt::join(lines, "\n"));
}

/// "line:column what" of every fault; empty if the text is read.
inline std::vector<std::string> refusals_of(std::string_view text) {
  std::vector<std::string> result;
  for (const Fault& fault : faults_of(text)) {
    result.push_back(fmt::format("{}:{} {}", fault.place.line, fault.place.column, fault.message.what));
  }
  return result;
}

/// The same of the small tower with one line replaced or added.
inline std::vector<std::string> refusals_with(const std::string& line) {
  return refusals_of(tower_with({line}));
}

using Refusals = std::vector<std::string>;

}  // namespace swaymark::test
