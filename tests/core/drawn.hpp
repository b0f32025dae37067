#pragma once

#include <string>

#include "tests/core/tower_text.hpp"
#include "tests/support/beside.hpp"

/// Small towers drawn by line segments.
namespace swaymark::test {

/// The small tower written by nodes and bars.
inline const std::string kSmallWritten = tower_with({});

/// A tower in a plane whose nodes a and b are written and held, and all else drawn in lines.csv. `more` are
/// lines behind it, `members` is the line of its groups.
inline std::string drawing_text(
    const std::string& more,
    const std::string& members = "members: [{group: g, section: bar, material: steel}]\n") {
  return "swaymark: 1\ndimensions: 2\n"
         "materials: {steel: {E: 210 GPa, density: 7850 kg/m3}}\n"
         "sections: {bar: {area: 10 cm2}}\n"
         "nodes: {a: [0, 0], b: [2, 0]}\n" +
         members +
         "segments_from: lines.csv\n"
         "supports: [{nodes: [a], fixed: [x, z]}]\n" +
         more;
}

/// The same without nodes and supports.
inline std::string bare_drawing(const std::string& more = "") {
  return "swaymark: 1\ndimensions: 2\n"
         "materials: {steel: {E: 210 GPa, density: 7850 kg/m3}}\n"
         "sections: {bar: {area: 10 cm2}}\n"
         "members: [{group: g, section: bar, material: steel}]\n"
         "segments_from: lines.csv\n" +
         more;
}

inline Tower drawn_tower(const std::string& lines, const std::string& more = "") {
  return tower_beside(drawing_text(more), {{"lines.csv", lines}});
}
inline std::string drawing_refusal(const std::string& lines, const std::string& more = "") {
  return refusal_beside(drawing_text(more), {{"lines.csv", lines}});
}
inline Tower bare_drawn(const std::string& lines, const std::string& more = "") {
  return tower_beside(bare_drawing(more), {{"lines.csv", lines}});
}
inline std::string bare_refusal(const std::string& lines, const std::string& more = "") {
  return refusal_beside(bare_drawing(more), {{"lines.csv", lines}});
}

}  // namespace swaymark::test
