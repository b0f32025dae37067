#pragma once

#include <cmath>
#include <numbers>
#include <string>
#include <utility>
#include <vector>

#include "apps/analysis.hpp"
#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

/// Analyses for the tests of reports, of towers small enough to be known by hand.
namespace swaymark::test {

/// A provenance that does not change from day to day.
inline const Provenance kStated{"1.2.3", "tower.yaml", std::string(64, 'a'), "2024-02-29"};

inline Analysis checked(Tower tower, Scope scope = Scope::check) {
  return analyse(std::move(tower), kStated, scope);
}

inline Analysis checked(const std::string& text, Scope scope = Scope::check) {
  return checked(tower_of(text), scope);
}

inline Analysis harbour_light(Scope scope = Scope::check) {
  return checked(tower_in("harbour_light.yaml"), scope);
}

/// The two weightless bars of the small tower with 150 t at their free node c: sideways and upright each of
/// stiffness EA/L, as both bars stand at 45 degrees; one repeated mode.
inline std::string lone_mass(std::vector<std::string> lines = {}) {
  lines.insert(lines.begin(), {"materials: {steel: {E: 210 GPa, density: 0}}",
                               "masses: [{nodes: [c], mass: 150000 kg}]", "damping: 2 %"});
  return tower_with(lines);
}

/// sqrt(K/m) / 2 pi of the lone mass [Hz], from E, A and L as the file states them.
inline double lone_frequency() {
  const double stiffness = 210e9 * 10e-4 / std::sqrt(2.0);
  return std::sqrt(stiffness / 150'000.0) / (2.0 * std::numbers::pi);
}

/// A spectrum of 0.2 g at every period, and its use along x.
inline const std::string kFlatSpectrum = "spectra: {flat: {points: [[0.01 s, 0.2 g], [10 s, 0.2 g]]}}";
inline const std::string kAlongX = "seismic: {spectrum: {x: flat}}";

/// The small tower without the bar that would hold it against turning about node a.
inline std::string swinging_bar() {
  return tower_with({"members: [{group: g, section: bar, material: steel, bars: [[a, c]]}]"});
}

/// A rod along x of eight elements with one mode asked for, shaken along x by 1 m/s2.
inline Tower shaken_rod(int modes) {
  Tower tower = rod(8, 8.0, MassScheme::consistent);
  tower.modes = {};
  tower.modes.count = modes;
  tower.damping = {0.02};
  SpectrumStatement flat;
  flat.name = "flat";
  flat.points = {{0.0, 1.0}, {10.0, 1.0}};
  tower.spectra = {flat};
  tower.seismic.emplace();
  tower.seismic->spectrum[0] = 0;
  return tower;
}

/// The lines of a text, without their ends.
inline std::vector<std::string> lines_of(const std::string& text) {
  std::vector<std::string> lines;
  for (std::size_t begin = 0; begin < text.size();) {
    const std::size_t end = std::min(text.find('\n', begin), text.size());
    lines.push_back(text.substr(begin, end - begin));
    begin = end + 1;
  }
  return lines;
}

/// Whether one of the lines holds all of the words.
inline bool has_line(const std::string& text, const std::vector<std::string>& words) {
  for (const std::string& line : lines_of(text)) {
    bool all = true;
    for (const std::string& word : words) all = all && line.find(word) != std::string::npos;
    if (all) return true;
  }
  return false;
}

/// The text on one line, its blanks single, so that a phrase is found wherever lines are broken.
inline std::string on_one_line(const std::string& text) {
  std::string result;
  for (const char c : text) {
    const char next = c == '\n' ? ' ' : c;
    if (next != ' ' || (!result.empty() && result.back() != ' ')) result += next;
  }
  return result;
}

}  // namespace swaymark::test
