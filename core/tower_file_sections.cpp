#include "core/tower_file_sections.hpp"

#include <array>
#include <cmath>
#include <numbers>

#include <fmt/format.h>

#include "core/section_csv.hpp"
#include "core/text.hpp"
#include "core/wording_masses.hpp"

namespace swaymark {

namespace {

void take_properties(Section& section, const SectionProperties& properties) {
  section.area = properties.area;
  section.radius = properties.radius;
  section.perimeter = properties.perimeter;
}

void read_tube(const YamlNode& value, Section& section, FaultList& faults) {
  if (value.kind != YamlNode::Kind::sequence || value.items.size() != 2) {
    faults.add(value.place,
               wording::wrong_kind("tube", "[outside diameter, wall thickness]", value.description()));
    return;
  }
  const auto diameter = read_value(value.items[0], "diameter", Quantity::length, Range::positive, faults);
  const auto wall = read_value(value.items[1], "wall", Quantity::length, Range::positive, faults);
  if (!diameter || !wall) return;
  if (2.0 * *wall > *diameter) {
    faults.add(value.place, wording::tube_wall(*diameter, *wall));
    return;
  }
  take_properties(section, circular_hollow(*diameter, *wall));
}

// The gap of a pair; nothing for a single section.
std::optional<double> read_gap(MapView& view) {
  FaultList& faults = view.faults();
  const YamlNode* flag = view.find("double");
  const bool doubled = flag != nullptr && read_flag(*flag, "double", faults).value_or(false);
  if (doubled) {
    return view.required_value("gap", Quantity::length, Range::not_negative, "gap: 10 mm").value_or(0.0);
  }
  if (const YamlNode* gap = view.find("gap")) faults.add(gap->place, wording::gap_needs_double());
  return std::nullopt;
}

void read_size(const YamlNode& value, std::optional<double> gap, const SectionTable& sizes, Section& section,
               FaultList& faults) {
  const auto word = read_word(value, "size", faults);
  if (!word) return;
  const SectionSize* size = sizes.find(*word);
  if (size == nullptr) {
    if (!sizes.is_open()) faults.add(value.place, sizes.unknown(*word));
    return;
  }
  section.size = size->name;
  section.area = size->area;
  section.radius = size->radius;
  section.perimeter = size->perimeter;
  if (!gap) return;
  if (!size->angle) {
    faults.add(value.place, wording::double_needs_angle());
    return;
  }
  take_properties(section, double_angle(*size->angle, *gap));
  section.size = fmt::format("2{}", size->name);
}

// Of a section given by its area; the others know their outline.
void read_perimeter(MapView& view, std::optional<double> area, Section& section) {
  const YamlNode* node = view.find("perimeter");
  if (node == nullptr) return;
  for (const std::string_view way : {"tube", "size"}) {
    if (!view.has(way)) continue;
    view.faults().add(node->place, wording::keys_exclude("perimeter", way, view.owner()));
    return;
  }
  section.perimeter = view.value("perimeter", Quantity::length, Range::positive);
  if (!section.perimeter || !area) return;
  const double least = 2.0 * std::sqrt(std::numbers::pi * *area);
  constexpr double digits = 1e-3;  // both values may be rounded
  if (*section.perimeter < (1.0 - digits) * least)
    view.faults().add(node->place, wording::perimeter_too_short(*section.perimeter, least));
}

// Of the ways to say what a section is, exactly one.
void check_ways(const MapView& view, Place place) {
  constexpr std::array<std::string_view, 3> ways{"area", "tube", "size"};
  std::string_view first;
  for (const std::string_view way : ways) {
    if (!view.has(way)) continue;
    if (!first.empty()) view.faults().add(place, wording::keys_exclude(first, way, view.owner()));
    if (first.empty()) first = way;
  }
  if (view.is_map() && first.empty()) {
    view.faults().add(place, wording::one_key_of("'area', 'tube' or 'size'", view.owner()));
  }
}

}  // namespace

SectionTable read_section_sizes(MapView& file, const std::string& tower_file, const FileSource& source) {
  SectionTable sizes = SectionTable::built_in();
  if (!file.has("sections_from")) return sizes;
  std::optional<OtherFile> other;
  if (const YamlNode* node = file.find("sections_from")) {
    const auto name = read_word(*node, "sections_from", file.faults());
    if (name) other = fetch(tower_file, *name, source, node->place, file.faults());
  }
  FaultList faults(other ? other->path : std::string());
  if (other) read_section_csv(other->text, faults, sizes);
  if (!other || !faults.empty()) sizes.leave_open();
  file.faults().take(std::move(faults));
  return sizes;
}

Section read_section(const std::string& name, const YamlNode& at, const YamlNode& value,
                     const SectionTable& sizes, FaultList& faults) {
  MapView view(value, fmt::format("section '{}'", excerpt(name)), faults);
  Section section;
  section.name = name;
  section.place = at.place;
  const std::size_t faults_before = faults.size();
  check_ways(view, at.place);
  const auto area = view.value("area", Quantity::area, Range::positive);
  section.area = area.value_or(1.0);
  read_perimeter(view, area, section);
  section.radius = view.value("radius", Quantity::length, Range::positive);
  if (const YamlNode* curve = view.find("curve")) {
    const std::vector<std::string> curves{"a0", "a", "b", "c", "d"};
    if (const auto choice = read_choice(*curve, "curve", curves, faults)) section.curve = curves[*choice];
  }
  if (const YamlNode* tube = view.find("tube")) {
    if (view.has("radius")) faults.add(at.place, wording::keys_exclude("radius", "tube", view.owner()));
    read_tube(*tube, section, faults);
  }
  const auto gap = read_gap(view);
  if (gap && !view.has("size")) faults.add(at.place, wording::double_needs_angle());
  if (const YamlNode* size = view.find("size")) {
    if (view.has("radius")) faults.add(at.place, wording::radius_beside_size(view.owner()));
    read_size(*size, gap, sizes, section, faults);
  }
  view.refuse_unknown();
  // A section with a fault is none without an outline, which ice would complain about.
  if (faults.size() > faults_before && !section.perimeter) section.perimeter = 0.0;
  return section;
}

}  // namespace swaymark
