#include "core/liquid.hpp"

#include <cmath>
#include <numbers>

#include "core/quantity.hpp"

namespace swaymark {

LiquidSplit split_liquid(const Liquid& liquid) {
  constexpr double root = 1.841;  // of J1', as published
  LiquidSplit split;
  split.mass = liquid.density * std::numbers::pi * liquid.radius * liquid.radius * liquid.depth;
  split.impulsive = split.mass;
  if (liquid.rigid) return split;
  const double x = root * liquid.depth / liquid.radius;
  const double shallow = x > 0.0 ? std::tanh(x) / x : 1.0;
  split.convective = split.mass * 2.0 * shallow / (root * root - 1.0);
  split.impulsive = split.mass - split.convective;
  const double omega_squared = root * kStandardGravity / liquid.radius * std::tanh(x);
  split.omega = std::sqrt(omega_squared);
  split.spring = split.convective * omega_squared;
  return split;
}

std::vector<Link> liquid_links(const Tower& tower, const DofMap& dofs) {
  std::vector<Link> links;
  for (const Liquid& liquid : tower.liquids) {
    if (!liquid.node) continue;
    const double spring = split_liquid(liquid).spring;
    for (std::size_t k = 0; k < dofs.axes().size(); ++k) {
      if (dofs.axes()[k] == Axis::z) continue;
      Link link{dofs.dof(*liquid.node, k), {}, spring};
      for (const std::size_t node : liquid.nodes) link.others.push_back(dofs.dof(node, k));
      links.push_back(std::move(link));
    }
  }
  return links;
}

double liquid_on_node(const Liquid& liquid, const LiquidSplit& split, Axis axis) {
  const double moved = liquid.node && axis != Axis::z ? split.impulsive : split.mass;
  return moved / static_cast<double>(liquid.nodes.size());
}

}  // namespace swaymark
