#include "core/tower_file_parts.hpp"

#include <cmath>

#include <fmt/format.h>

#include "core/text.hpp"
#include "core/tower_file_sections.hpp"

namespace swaymark {

namespace {

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

}  // namespace

Eigen::Vector3d out_of_the_way(std::size_t index) {
  return {2.0 * kFarthest + static_cast<double>(index), 0.0, 0.0};
}

PartNames read_parts(MapView& file, Tower& tower, const FileSource& source) {
  PartNames names;
  FaultList& faults = file.faults();
  read_named(file, "materials", names.materials, [&](const auto& name, const auto& at, const auto& value) {
    names.materials.add(name, tower.materials.size(), at.place);
    tower.materials.push_back(read_material(name, at, value, faults));
  });
  const SectionTable sizes = read_section_sizes(file, tower.file, source);
  read_named(file, "sections", names.sections, [&](const auto& name, const auto& at, const auto& value) {
    names.sections.add(name, tower.sections.size(), at.place);
    tower.sections.push_back(read_section(name, at, value, sizes, faults));
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
