#include "core/base_study.hpp"

#include <algorithm>
#include <cmath>

namespace swaymark {

namespace {

constexpr std::size_t kSteps = 6;

std::size_t place_of(const Tower& tower) { return static_cast<std::size_t>(studied_axis(tower)); }

}  // namespace

Axis studied_axis(const Tower& tower) { return tower.dimensions == 1 ? Axis::x : Axis::z; }

bool has_studied_support(const Tower& tower) {
  const std::size_t axis = place_of(tower);
  return std::any_of(tower.supports.begin(), tower.supports.end(),
                     [&](const Support& support) { return support.fixed[axis]; });
}

std::vector<double> studied_stiffnesses(const BaseStudyStatement& study) {
  std::vector<double> values;
  for (std::size_t i = 0; i < kSteps; ++i) {
    const double share = static_cast<double>(i) / static_cast<double>(kSteps);
    values.push_back(study.from * std::pow(study.to / study.from, share));
  }
  values.push_back(study.to);
  return values;
}

Tower on_leg_springs(Tower tower, double stiffness) {
  const std::size_t axis = place_of(tower);
  for (Support& support : tower.supports) {
    if (!support.fixed[axis]) continue;
    support.fixed[axis] = false;
    support.spring[axis] = stiffness;
  }
  return tower;
}

}  // namespace swaymark
