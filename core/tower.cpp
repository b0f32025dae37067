#include "core/tower.hpp"

#include <algorithm>

#include <fmt/format.h>

namespace swaymark {

std::string Tower::bar_name(std::size_t bar) const {
  if (!bars[bar].name.empty()) return bars[bar].name;
  return fmt::format("{}-{}", groups[bars[bar].group].name, bars[bar].number);
}

const Section& Tower::section_of(const Bar& bar) const {
  return sections[bar.section.value_or(groups[bar.group].section)];
}

const Material& Tower::material_of(const Bar& bar) const {
  return materials[bar.material.value_or(groups[bar.group].material)];
}

bool Tower::sloshes(std::size_t node) const {
  return std::any_of(liquids.begin(), liquids.end(),
                     [&](const Liquid& liquid) { return liquid.node == node; });
}

double Tower::area_of(const Bar& bar) const { return section_of(bar).area * groups[bar.group].area_factor; }

double Tower::extent() const {
  if (nodes.empty()) return 0.0;
  Eigen::Vector3d low = nodes.front().position;
  Eigen::Vector3d high = low;
  for (const Node& node : nodes) {
    low = low.cwiseMin(node.position);
    high = high.cwiseMax(node.position);
  }
  return (high - low).norm();
}

std::string_view name_of(MassScheme scheme) {
  switch (scheme) {
    case MassScheme::consistent:
      return "consistent";
    case MassScheme::lumped:
      return "lumped";
    case MassScheme::averaged:
      return "averaged";
  }
  return "";
}

std::string_view name_of(ModalRule rule) {
  switch (rule) {
    case ModalRule::cqc:
      return "CQC";
    case ModalRule::srss:
      return "SRSS";
    case ModalRule::absolute_sum:
      return "absolute sum";
  }
  return "";
}

std::string_view name_of(DirectionalRule rule) {
  switch (rule) {
    case DirectionalRule::srss:
      return "SRSS";
    case DirectionalRule::percent_30:
      return "100-30";
    case DirectionalRule::percent_40:
      return "100-40";
  }
  return "";
}

std::string_view name_of(BandDirection direction) {
  switch (direction) {
    case BandDirection::x:
      return "x";
    case BandDirection::y:
      return "y";
    case BandDirection::z:
      return "z";
    case BandDirection::horizontal:
      return "horizontal";
    case BandDirection::any:
      return "any";
  }
  return "";
}

}  // namespace swaymark
