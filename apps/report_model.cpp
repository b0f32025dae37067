#include "apps/report_model.hpp"

#include <algorithm>
#include <map>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_base.hpp"
#include "apps/report_parts.hpp"
#include "apps/table.hpp"
#include "core/quantity.hpp"

namespace swaymark {

namespace {

using Align = Table::Align;

std::string extent_words(const Tower& tower) {
  std::string words;
  for (const Axis axis : tower.axes()) {
    double low = tower.nodes.front().position[index_of(axis)];
    double high = low;
    for (const Node& node : tower.nodes) {
      low = std::min(low, node.position[index_of(axis)]);
      high = std::max(high, node.position[index_of(axis)]);
    }
    words += fmt::format("{}{} {} to {} m", words.empty() ? "" : ", ", name_of(axis), figure(low, 2),
                         figure(high, 2));
  }
  return words;
}

// Bars of one group, section and material, in the order they first appear.
struct Kind {
  std::size_t group = 0;
  const Section* section = nullptr;
  const Material* material = nullptr;
  std::size_t bars = 0;
  double length = 0.0;  // [m]
};

std::vector<Kind> kinds_of(const Analysis& a) {
  std::vector<Kind> kinds;
  for (std::size_t b = 0; b < a.tower.bars.size(); ++b) {
    const Bar& bar = a.tower.bars[b];
    const Section* section = &a.tower.section_of(bar);
    const Material* material = &a.tower.material_of(bar);
    auto kind = std::find_if(kinds.begin(), kinds.end(), [&](const Kind& k) {
      return k.group == bar.group && k.section == section && k.material == material;
    });
    if (kind == kinds.end()) kind = kinds.insert(kinds.end(), {bar.group, section, material});
    ++kind->bars;
    kind->length += a.assembly.bars[b].length;
  }
  return kinds;
}

std::string bars_table(const Analysis& a) {
  Table table({{{"group"}, Align::left},
               {{"bars"}, Align::right},
               {{"length", "[m]"}, Align::right},
               {{"section"}, Align::left},
               {{"area", "[cm2]"}, Align::right},
               {{"material"}, Align::left},
               {{"E", "[GPa]"}, Align::right},
               {{"density", "[kg/m3]"}, Align::right}});
  for (const Kind& kind : kinds_of(a)) {
    table.add({a.tower.groups[kind.group].name, std::to_string(kind.bars), figure(kind.length, 2),
               kind.section->name,
               fmt::format("{:.4g}", 1e4 * kind.section->area * a.tower.groups[kind.group].area_factor),
               kind.material->name, fmt::format("{:.4g}", 1e-9 * kind.material->youngs_modulus),
               fmt::format("{:.4g}", kind.material->density)});
  }
  return table.text();
}

// "fixed x y z" or "fixed z; spring x 50 MN/m"
std::string held_words(const Tower& tower, const Support& support) {
  std::string fixed;
  std::string springs;
  for (const Axis axis : tower.axes()) {
    const auto k = static_cast<std::size_t>(axis);
    if (support.fixed[k]) fixed += fmt::format(" {}", name_of(axis));
    if (!support.fixed[k] && support.spring[k] > 0.0)
      springs += fmt::format("{}{} {:.4g} MN/m", springs.empty() ? " " : ", ", name_of(axis),
                             1e-6 * support.spring[k]);
  }
  std::string words = fixed.empty() ? "" : "fixed" + fixed;
  if (!springs.empty()) words += (words.empty() ? "springs" : "; springs") + springs;
  if (support.pad) words += " from " + pad_words(*support.pad);
  return words;
}

std::string supports_text(const Tower& tower) {
  constexpr std::size_t most_named = 12;
  std::vector<std::pair<std::string, std::vector<std::string>>> kinds;
  for (const Support& support : tower.supports) {
    const std::string words = held_words(tower, support);
    auto kind = std::find_if(kinds.begin(), kinds.end(), [&](const auto& k) { return k.first == words; });
    if (kind == kinds.end()) kind = kinds.insert(kinds.end(), {words, {}});
    kind->second.push_back(tower.nodes[support.node].name);
  }
  std::string text;
  for (auto& [words, nodes] : kinds) {
    const std::size_t more = nodes.size() > most_named ? nodes.size() - most_named : 0;
    nodes.resize(nodes.size() - more);
    std::string line = fmt::format("Support at {}: {}", fmt::join(nodes, ", "), words);
    if (more > 0) line = fmt::format("Support at {} and {} more: {}", fmt::join(nodes, ", "), more, words);
    text += wrapped(line, "  ", kTextWidth);
  }
  return text;
}

std::string spectrum_text(const SpectrumStatement& spectrum, bool used) {
  constexpr std::size_t most_points = 12;
  std::string points;
  for (std::size_t i = 0; i < std::min(spectrum.points.size(), most_points); ++i) {
    points += fmt::format("{}{:.4g} s {:.4g} g", points.empty() ? "" : ", ", spectrum.points[i].first,
                          spectrum.points[i].second / kStandardGravity);
  }
  if (spectrum.points.size() > most_points)
    points += fmt::format(" ... {} points in all", spectrum.points.size());
  return wrapped(
      fmt::format("Spectrum {}{}{}, {} interpolation: {}", spectrum.name, used ? "" : " (not used)",
                  spectrum.damping ? fmt::format(", {:.3g} % damping", 100.0 * *spectrum.damping) : "",
                  spectrum.interpolation == Interpolation::linear ? "linear" : "log-log", points),
      "  ", kTextWidth);
}

}  // namespace

std::string model_section(const Analysis& a) {
  const Tower& tower = a.tower;
  std::string out = section_head("MODEL");
  out += wrapped(fmt::format("{} dimension{}, {} nodes, {} bars, {} free degrees of freedom, {} mass matrix",
                             tower.dimensions, tower.dimensions == 1 ? "" : "s", stated_nodes(tower),
                             tower.bars.size(), a.assembly.dofs.free_count(), name_of(tower.mass_scheme)),
                 "  ", kTextWidth);
  out += wrapped("Extent: " + extent_words(tower), "  ", kTextWidth);
  out += supports_text(tower);
  out += liquids_text(tower);
  if (a.scope == Scope::check) {
    for (std::size_t s = 0; s < tower.spectra.size(); ++s) {
      const bool used =
          tower.seismic && std::find(tower.seismic->spectrum.begin(), tower.seismic->spectrum.end(), s) !=
                               tower.seismic->spectrum.end();
      out += spectrum_text(tower.spectra[s], used);
    }
  }
  return out + bars_table(a);
}

}  // namespace swaymark
