#include "apps/plausibility.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "core/liquid.hpp"
#include "core/quantity.hpp"

namespace swaymark {

namespace {

using Notes = std::vector<std::string>;

bool within(double value, double low, double high) { return value >= low && value <= high; }

// The tower's height [m]; zero where it has no vertical axis.
double height_of(const Tower& tower) {
  if (tower.dimensions == 1 || tower.nodes.empty()) return 0.0;
  const auto below = [](const Node& a, const Node& b) { return a.position.z() < b.position.z(); };
  const auto [low, high] = std::minmax_element(tower.nodes.begin(), tower.nodes.end(), below);
  return high->position.z() - low->position.z();
}

void about_densities(const Tower& tower, Notes& notes) {
  for (const Material& material : tower.materials) {
    if (material.density == 0.0) continue;  // stated on purpose: the bars carry no mass of their own
    const bool steel = within(material.youngs_modulus, 180e9, 230e9);
    if (steel && !within(material.density, 7000.0, 8500.0)) {
      notes.push_back(
          fmt::format("Plausible? Material '{}' has the modulus of steel but {:.4g} kg/m3; steel has 7850.",
                      material.name, material.density));
    } else if (!within(material.density, 1500.0, 23'000.0)) {
      notes.push_back(fmt::format("Plausible? Material '{}' has {:.4g} kg/m3, which is no metal's.",
                                  material.name, material.density));
    }
  }
}

// What a bare number in the wrong unit looks like: 210 for 210 GPa, 990 rpm as 990 Hz, 0.08 for 0.08 g.
void about_units(const Tower& tower, Notes& notes) {
  for (const Material& material : tower.materials) {
    if (material.youngs_modulus >= 1e9) continue;
    notes.push_back(fmt::format("Plausible? Material '{}' has E = {:.4g} Pa; a bare number is in Pa.",
                                material.name, material.youngs_modulus));
  }
  for (const BandStatement& band : tower.bands) {
    if (band.to <= 200.0) continue;
    notes.push_back(fmt::format("Plausible? Band '{}' reaches {:.4g} Hz; a bare number is in Hz, not rpm.",
                                band.label, band.to));
  }
  for (const SpectrumStatement& spectrum : tower.spectra) {
    double largest = 0.0;
    for (const auto& [period, acceleration] : spectrum.points) largest = std::max(largest, acceleration);
    if (within(largest, 0.02 * kStandardGravity, 5.0 * kStandardGravity)) continue;
    notes.push_back(
        fmt::format("Plausible? Spectrum '{}' has at most {:.4g} g; a bare number is in m/s2, not g.",
                    spectrum.name, largest / kStandardGravity));
  }
}

void about_lengths(const Analysis& analysis, double height, Notes& notes) {
  const auto& bars = analysis.assembly.bars;
  if (height <= 0.0 || bars.empty()) return;
  const auto longest = std::max_element(
      bars.begin(), bars.end(), [](const BarElement& a, const BarElement& b) { return a.length < b.length; });
  if (longest->length <= 1.5 * height) return;
  notes.push_back(fmt::format("Plausible? Bar {} is {:.4g} m long, the tower {:.4g} m high.",
                              analysis.tower.bar_name(static_cast<std::size_t>(longest - bars.begin())),
                              longest->length, height));
}

// The model is regular, but its lowest modes rest on what may be a slip of the pen.
void about_soft_bars(const Analysis& analysis, Notes& notes) {
  constexpr double soft = 1e-4;  // of the middle bar; sections of one tower lie within a hundred
  const auto& bars = analysis.assembly.bars;
  if (bars.size() < 2) return;
  std::vector<double> stiffness;
  for (const BarElement& bar : bars) stiffness.push_back(bar.axial_stiffness);
  const auto middle = stiffness.begin() + static_cast<std::ptrdiff_t>(stiffness.size() / 2);
  std::nth_element(stiffness.begin(), middle, stiffness.end());
  const auto softest = std::min_element(
      bars.begin(), bars.end(),
      [](const BarElement& a, const BarElement& b) { return a.axial_stiffness < b.axial_stiffness; });
  if (softest->axial_stiffness >= soft * *middle) return;
  const auto count = std::count_if(
      bars.begin(), bars.end(), [&](const BarElement& bar) { return bar.axial_stiffness < soft * *middle; });
  notes.push_back(
      fmt::format("Plausible? Bar {} is {:.2g} times softer than most{}: the tower stands, but nearly as if "
                  "it were not there.",
                  analysis.tower.bar_name(static_cast<std::size_t>(softest - bars.begin())),
                  *middle / softest->axial_stiffness,
                  count > 1 ? fmt::format(", and {} more are alike", count - 1) : ""));
}

void about_masses(const Analysis& analysis, double height, Notes& notes) {
  const MassLedger& ledger = analysis.ledger;
  for (const LedgerEntry& entry : ledger.entries) {
    if (entry.origin != MassOrigin::discrete || ledger.bars <= 0.0) continue;
    if (std::abs(entry.mass / ledger.bars - 1.0) > 0.01) continue;
    notes.push_back(
        fmt::format("Plausible? The mass{} of {:.4g} kg equals that of the bars, which their density "
                    "gives already: is it counted twice?",
                    entry.label.empty() ? "" : " '" + entry.label + "'", entry.mass));
  }
  if (ledger.bars > 0.0 && ledger.carried > 20.0 * ledger.bars) {
    notes.push_back(fmt::format("Plausible? The tower carries {:.3g} times the mass of its bars.",
                                ledger.carried / ledger.bars));
  }
  if (height > 0.0 && !within(ledger.total() / height, 2.0, 50'000.0)) {
    notes.push_back(fmt::format("Plausible? {:.4g} kg on a height of {:.4g} m is far from common.",
                                ledger.total(), height));
  }
}

std::string with_label(std::string_view what, const std::string& label) {
  return label.empty() ? std::string(what) : fmt::format("{} '{}'", what, label);
}

void about_ice(const Tower& tower, Notes& notes) {
  for (const IceMass& ice : tower.ice) {
    if (!within(ice.thickness, 0.002, 0.150)) {
      notes.push_back(fmt::format("Plausible? {} is {:.4g} mm thick; a bare number is in m.",
                                  with_label("Ice", ice.label), 1e3 * ice.thickness));
    }
    if (!within(ice.density, 200.0, 920.0)) {
      notes.push_back(fmt::format("Plausible? {} has {:.4g} kg/m3; rime has 200 to 900 and glaze 900.",
                                  with_label("Ice", ice.label), ice.density));
    }
  }
}

void about_liquids(const Tower& tower, Notes& notes) {
  for (const Liquid& liquid : tower.liquids) {
    const std::string name = with_label("Liquid", liquid.label);
    if (!within(liquid.density, 500.0, 2000.0))
      notes.push_back(fmt::format("Plausible? {} has {:.4g} kg/m3; water has 1000.", name, liquid.density));
    const double mass = split_liquid(liquid).mass;
    for (const NodeMass& other : tower.node_masses) {
      if (std::abs(other.total / mass - 1.0) > 0.01) continue;
      notes.push_back(fmt::format("Plausible? {} weighs as much as {} of {:.4g} kg: is it counted twice?",
                                  name, with_label("the mass", other.label), other.total));
    }
  }
}

void about_soil(const Tower& tower, Notes& notes) {
  for (const Support& support : tower.supports) {
    if (!support.pad || within(support.pad->shear_modulus, 1e6, 10e9)) continue;
    notes.push_back(
        fmt::format("Plausible? The soil under node '{}' has G = {:.4g} Pa; a bare number is in Pa.",
                    tower.nodes[support.node].name, support.pad->shear_modulus));
    return;
  }
}

void about_frequency(const Analysis& analysis, double height, Notes& notes) {
  if (height <= 0.0 || analysis.mode_count() == 0) return;
  const double low = 10.0 / height;
  const double high = 300.0 / height;
  Index first = 0;  // of the tower itself: liquids slosh below it
  while (analysis.character[static_cast<std::size_t>(first)] == "liquid") {
    if (++first == analysis.mode_count()) return;
  }
  if (within(analysis.frequency(first), low, high)) return;
  notes.push_back(
      fmt::format("Plausible? f{} = {:.4g} Hz; lattice towers {:.4g} m high mostly have {:.2g} to {:.2g} Hz.",
                  first + 1, analysis.frequency(first), height, low, high));
}

}  // namespace

std::vector<std::string> plausibility_notes(const Analysis& analysis) {
  Notes notes;
  const double height = height_of(analysis.tower);
  about_densities(analysis.tower, notes);
  about_units(analysis.tower, notes);
  about_lengths(analysis, height, notes);
  about_soft_bars(analysis, notes);
  about_masses(analysis, height, notes);
  about_ice(analysis.tower, notes);
  about_liquids(analysis.tower, notes);
  about_soil(analysis.tower, notes);
  about_frequency(analysis, height, notes);
  return notes;
}

}  // namespace swaymark
