#include "tests/bench/bench_tower.hpp"

#include <string_view>
#include <vector>

#include <fmt/format.h>

namespace swaymark::bench {

namespace {

constexpr int kPanels = 11;
constexpr int kApex = 4 * (kPanels + 1) + 1;

int node(int level, int corner) { return 4 * level + corner % 4 + 1; }

// One of the three ways to write a value.
std::string_view written(Units units, std::string_view bare, std::string_view common,
                         std::string_view library) {
  if (units == Units::bare) return bare;
  return units == Units::common ? common : library;
}

std::string nodes() {
  std::string text = "nodes:\n";
  for (int level = 0; level <= kPanels; ++level) {
    const double half = 2.2 - 0.14 * level;
    for (int corner = 0; corner < 4; ++corner) {
      const double x = corner == 0 || corner == 3 ? -half : half;
      const double y = corner < 2 ? -half : half;
      text += fmt::format("  {}: [{:.2f}, {:.2f}, {:.1f}]\n", node(level, corner), x, y, 3.0 * level);
    }
  }
  return text + fmt::format("  {}: [0.0, 0.0, {:.1f}]\n", kApex, 3.0 * kPanels + 1.5);
}

std::string group(std::string_view name, std::string_view section,
                  const std::vector<std::pair<int, int>>& bars) {
  std::string text =
      fmt::format("  - group: {}\n    section: {}\n    material: steel\n    bars: [", name, section);
  for (std::size_t i = 0; i < bars.size(); ++i)
    text += fmt::format("{}[{}, {}]", i == 0 ? "" : ", ", bars[i].first, bars[i].second);
  return text + "]\n";
}

std::string members() {
  std::vector<std::pair<int, int>> legs;
  std::vector<std::pair<int, int>> diagonals;
  std::vector<std::pair<int, int>> horizontals;
  std::vector<std::pair<int, int>> plan;
  for (int level = 1; level <= kPanels; ++level) {
    for (int corner = 0; corner < 4; ++corner) {
      legs.emplace_back(node(level - 1, corner), node(level, corner));
      diagonals.emplace_back(node(level - 1, corner), node(level, corner + 1));
      diagonals.emplace_back(node(level - 1, corner + 1), node(level, corner));
      horizontals.emplace_back(node(level, corner), node(level, corner + 1));
    }
    plan.emplace_back(node(level, 0), node(level, 2));
    if (level <= 9) plan.emplace_back(node(level, 1), node(level, 3));
  }
  std::vector<std::pair<int, int>> cap;
  for (int corner = 0; corner < 4; ++corner) cap.emplace_back(node(kPanels, corner), kApex);
  return "members:\n" + group("legs", "leg", legs) + group("diagonals", "brace", diagonals) +
         group("horizontals", "strut", horizontals) + group("plan", "strut", plan) + group("cap", "leg", cap);
}

}  // namespace

const char* name_of(Units units) {
  switch (units) {
    case Units::bare:
      return "plain numbers";
    case Units::common:
      return "common units";
    case Units::library:
      return "units library";
  }
  return "";
}

std::string tower_text(Units units) {
  const auto w = [units](std::string_view bare, std::string_view common, std::string_view library) {
    return written(units, bare, common, library);
  };
  std::string text = "swaymark: 1\ntitle: Bench tower\n";
  text += fmt::format("materials:\n  steel: {{E: {}, density: {}}}\n", w("210e9", "210 GPa", "210 GPa"),
                      w("7850", "7850 kg/m3", "490 lb/ft3"));
  text += fmt::format("sections:\n  leg: {{area: {}}}\n  brace: {{area: {}}}\n  strut: {{area: {}}}\n",
                      w("0.00192", "19.2 cm2", "2.976 in2"), w("0.000691", "6.91 cm2", "6.91 cm2"),
                      w("0.000707", "707 mm2", "707 mm2"));
  text += nodes() + members();
  text += fmt::format(
      "supports:\n  - {{nodes: [1, 2, 3], fixed: [x, y, z]}}\n"
      "  - {{nodes: [4], fixed: [x, y], springs: {{z: {}}}}}\n",
      w("120e6", "120000 kN/m", "120000 kN/m"));
  text += fmt::format("masses:\n  - {{nodes: [{}], mass: {}}}\n  - {{group: legs, per_length: {}}}\n", kApex,
                      w("480", "480 kg", "1058 lb"), w("12", "12 kg/m", "12 kg/m"));
  text += fmt::format("damping: {}\n", w("0.02", "2 %", "2 %"));
  text += fmt::format("bands:\n  - {{label: rotor, from: {}, to: {}, margin: {}}}\n",
                      w("0.8", "0.8 Hz", "48 rpm"), w("1.4", "1.4 Hz", "84 rpm"), w("0.1", "10 %", "10 %"));
  text += fmt::format("spectra:\n  quay: {{damping: {}, points: [[{}, {}], [{}, {}], [{}, {}], [{}, {}]]}}\n",
                      w("0.05", "5 %", "5 %"), w("0.0", "0.0 s", "0.0 s"), w("0.981", "0.10 g", "0.10 g"),
                      w("0.15", "0.15 s", "150 ms"), w("2.452", "0.25 g", "0.25 g"),
                      w("0.6", "0.6 s", "0.6 s"), w("2.452", "0.25 g", "0.25 g"), w("2.0", "2.0 s", "2.0 s"),
                      w("0.735", "0.075 g", "0.075 g"));
  return text + "seismic:\n  spectrum: {x: quay, y: quay}\n";
}

}  // namespace swaymark::bench
