#include "core/tower_file_parts.hpp"

#include <cmath>
#include <numbers>

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr double kFarthest = 1e6;  // [m]

// Names that are written twice were reported with the keys: the first one stands.
template <typename Visit>
void read_named(MapView& file, std::string_view key, NameTable& names, Visit visit) {
  const YamlNode* map = file.find(key);
  if (map == nullptr) return;
  for_each_named(*map, key, file.faults(),
                 [&](const std::string& name, const YamlNode& at, const YamlNode& value) {
                   if (!names.place_of(name)) visit(name, at, value);
                 });
}

Material read_material(const std::string& name, const YamlNode& at, const YamlNode& value,
                       FaultList& faults) {
  MapView view(value, fmt::format("material '{}'", excerpt(name)), faults);
  Material material;
  material.name = name;
  material.place = at.place;
  material.youngs_modulus =
      view.required_value("E", Quantity::stress, Range::positive, "E: 210 GPa").value_or(1.0);
  material.density =
      view.required_value("density", Quantity::density, Range::not_negative, "density: 7850 kg/m3")
          .value_or(0.0);
  material.yield = view.value("yield", Quantity::stress, Range::positive);
  view.refuse_unknown();
  return material;
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
  const double inside = *diameter - 2.0 * *wall;
  section.area = std::numbers::pi * *wall * (*diameter - *wall);
  section.radius = 0.25 * std::hypot(*diameter, inside);
}

Section read_section(const std::string& name, const YamlNode& at, const YamlNode& value, FaultList& faults) {
  MapView view(value, fmt::format("section '{}'", excerpt(name)), faults);
  Section section;
  section.name = name;
  section.place = at.place;
  const bool by_area = view.has("area");
  const bool by_tube = view.has("tube");
  view.refuse_later("size", "sections by size are");
  view.refuse_later("double", "double sections are");
  if (by_area && by_tube) faults.add(at.place, wording::keys_exclude("area", "tube", view.owner()));
  section.area = view.value("area", Quantity::area, Range::positive).value_or(1.0);
  section.radius = view.value("radius", Quantity::length, Range::positive);
  if (const YamlNode* curve = view.find("curve")) {
    const std::vector<std::string> curves{"a0", "a", "b", "c", "d"};
    if (const auto choice = read_choice(*curve, "curve", curves, faults)) section.curve = curves[*choice];
  }
  if (const YamlNode* tube = view.find("tube")) {
    if (view.has("radius")) faults.add(at.place, wording::keys_exclude("radius", "tube", view.owner()));
    read_tube(*tube, section, faults);
  }
  if (view.is_map() && !by_area && !by_tube && !view.has("size")) {
    faults.add(at.place, wording::one_key_of("'area' or 'tube'", view.owner()));
  }
  view.refuse_unknown();
  return section;
}

// Nothing unless every coordinate could be read.
std::optional<Eigen::Vector3d> read_position(const std::string& name, const YamlNode& value,
                                             const Tower& tower, FaultList& faults) {
  const auto names = axis_names(tower);
  if (value.kind != YamlNode::Kind::sequence) {
    const std::string wanted = fmt::format("[{}]", fmt::join(names, ", "));
    faults.add(value.place, wording::wrong_kind(name, wanted, value.description()));
    return std::nullopt;
  }
  if (value.items.size() != names.size()) {
    faults.add(value.place, wording::coordinates_count(name, value.items.size(), names));
    return std::nullopt;
  }
  Eigen::Vector3d position = Eigen::Vector3d::Zero();
  bool complete = true;
  for (std::size_t i = 0; i < names.size(); ++i) {
    const YamlNode& item = value.items[i];
    const auto coordinate = read_value(item, names[i], Quantity::length, Range::any, faults);
    if (coordinate && std::abs(*coordinate) > kFarthest) {
      faults.add(item.place, wording::too_far_away(item.text));
    }
    complete = complete && coordinate;
    position[index_of(tower.axes()[i])] = coordinate.value_or(0.0);
  }
  if (!complete) return std::nullopt;
  return position;
}

// Where the node of that index waits while its place is unknown: alone, so that it coincides with no other.
Eigen::Vector3d out_of_the_way(std::size_t index) {
  return {2.0 * kFarthest + static_cast<double>(index), 0.0, 0.0};
}

}  // namespace

PartNames read_parts(MapView& file, Tower& tower) {
  PartNames names;
  FaultList& faults = file.faults();
  read_named(file, "materials", names.materials, [&](const auto& name, const auto& at, const auto& value) {
    names.materials.add(name, tower.materials.size(), at.place);
    tower.materials.push_back(read_material(name, at, value, faults));
  });
  read_named(file, "sections", names.sections, [&](const auto& name, const auto& at, const auto& value) {
    names.sections.add(name, tower.sections.size(), at.place);
    tower.sections.push_back(read_section(name, at, value, faults));
  });
  read_named(file, "nodes", names.nodes, [&](const auto& name, const auto& at, const auto& value) {
    const std::size_t index = tower.nodes.size();
    names.nodes.add(name, index, at.place);
    const auto position = read_position(name, value, tower, faults);
    tower.nodes.push_back({name, position.value_or(out_of_the_way(index)), at.place});
  });
  return names;
}

}  // namespace swaymark
