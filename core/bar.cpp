#include "core/bar.hpp"

#include "core/ice.hpp"

namespace swaymark {

MassShares mass_shares(MassScheme scheme) {
  switch (scheme) {
    case MassScheme::consistent:
      return {1.0 / 3.0, 1.0 / 6.0};
    case MassScheme::lumped:
      return {1.0 / 2.0, 0.0};
    case MassScheme::averaged:
      return {5.0 / 12.0, 1.0 / 12.0};
  }
  return {};
}

std::vector<BarElement> bar_elements(const Tower& tower) {
  std::vector<double> per_length(tower.groups.size(), 0.0);
  std::vector<double> share(tower.groups.size(), 0.0);
  const auto spread = [](std::vector<double>& values, std::optional<std::size_t> group, double value) {
    for (std::size_t g = 0; g < values.size(); ++g) {
      if (!group || *group == g) values[g] += value;
    }
  };
  for (const LineMass& mass : tower.line_masses) spread(per_length, mass.group, mass.per_length);
  for (const Allowance& allowance : tower.allowances) spread(share, allowance.group, allowance.share);

  std::vector<BarElement> elements;
  elements.reserve(tower.bars.size());
  for (const Bar& bar : tower.bars) {
    const Material& material = tower.material_of(bar);
    const double area = tower.area_of(bar);
    const double modulus = material.youngs_modulus * tower.groups[bar.group].stiffness_factor;
    const Eigen::Vector3d span = tower.nodes[bar.to].position - tower.nodes[bar.from].position;
    BarElement element;
    element.from = bar.from;
    element.to = bar.to;
    element.length = span.norm();
    element.direction = span / element.length;
    element.axial_stiffness = modulus * area / element.length;
    element.own_mass = material.density * area * element.length;
    element.carried_mass = share[bar.group] * element.own_mass + per_length[bar.group] * element.length;
    for (const IceMass& ice : tower.ice) element.carried_mass += ice_on_bar(tower, ice, bar, element.length);
    elements.push_back(element);
  }
  return elements;
}

}  // namespace swaymark
