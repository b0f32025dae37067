#include "tests/apps/cases.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <utility>

namespace swaymark::test {

Analysis checked(Tower tower, Scope scope) { return analyse(std::move(tower), kStated, scope); }

Analysis checked(const std::string& text, Scope scope) { return checked(tower_of(text), scope); }

Analysis harbour_light(Scope scope) { return checked(tower_in("harbour_light.yaml"), scope); }

std::string lone_mass(std::vector<std::string> lines) {
  lines.insert(lines.begin(), {"materials: {steel: {E: 210 GPa, density: 0}}",
                               "masses: [{nodes: [c], mass: 150000 kg}]", "damping: 2 %"});
  return tower_with(lines);
}

double lone_frequency() {
  const double stiffness = 210e9 * 10e-4 / std::sqrt(2.0);
  return std::sqrt(stiffness / 150'000.0) / (2.0 * std::numbers::pi);
}

std::string swinging_bar() {
  return tower_with({"members: [{group: g, section: bar, material: steel, bars: [[a, c]]}]"});
}

Tower shaken_rod(int modes) {
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

std::vector<std::string> lines_of(const std::string& text) {
  std::vector<std::string> lines;
  for (std::size_t begin = 0; begin < text.size();) {
    const std::size_t end = std::min(text.find('\n', begin), text.size());
    lines.push_back(text.substr(begin, end - begin));
    begin = end + 1;
  }
  return lines;
}

bool has_line(const std::string& text, const std::vector<std::string>& words) {
  for (const std::string& line : lines_of(text)) {
    bool all = true;
    for (const std::string& word : words) all = all && line.find(word) != std::string::npos;
    if (all) return true;
  }
  return false;
}

std::string on_one_line(const std::string& text) {
  std::string result;
  for (const char c : text) {
    const char next = c == '\n' ? ' ' : c;
    if (next != ' ' || (!result.empty() && result.back() != ' ')) result += next;
  }
  return result;
}

}  // namespace swaymark::test
