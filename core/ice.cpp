#include "core/ice.hpp"

#include <algorithm>
#include <limits>
#include <numbers>

namespace swaymark {

namespace {

// A bar that rises by less than this much of its length is level [-].
constexpr double kLevel = 1e-9;

double lowest_height(const Tower& tower) {
  double lowest = std::numeric_limits<double>::infinity();
  for (const Node& node : tower.nodes) lowest = std::min(lowest, node.position.z());
  return lowest;
}

}  // namespace

double ice_per_length(const IceMass& ice, double perimeter) {
  const double t = ice.thickness;
  return ice.density * (perimeter * t + std::numbers::pi * t * t);
}

double iced_share(const Tower& tower, const IceMass& ice, const Bar& bar) {
  if (!ice.from && !ice.to) return 1.0;
  constexpr double open = std::numeric_limits<double>::infinity();
  const Eigen::Vector3d& a = tower.nodes[bar.from].position;
  const Eigen::Vector3d& b = tower.nodes[bar.to].position;
  const auto [low, high] = std::minmax(a.z(), b.z());
  const double to = ice.to.value_or(open);
  double from = ice.from.value_or(-open);
  if (high - low > kLevel * (b - a).norm()) {
    return std::max(0.0, std::min(high, to) - std::max(low, from)) / (high - low);
  }
  if (from == low && from <= lowest_height(tower)) from = -open;
  return from < low && low <= to ? 1.0 : 0.0;
}

double ice_on_bar(const Tower& tower, const IceMass& ice, const Bar& bar, double length) {
  if (ice.group && *ice.group != bar.group) return 0.0;
  const double share = iced_share(tower, ice, bar);
  if (share <= 0.0) return 0.0;
  return share * length * ice_per_length(ice, tower.section_of(bar).perimeter.value());
}

}  // namespace swaymark
