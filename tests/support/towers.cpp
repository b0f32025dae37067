#include "tests/support/towers.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace swaymark::test {

namespace {

Section section_of(const std::string& name, double area) {
  Section section;
  section.name = name;
  section.area = area;
  return section;
}

}  // namespace

Tower bare_tower(int dimensions, double area) {
  Tower tower;
  tower.file = "made by a test";
  tower.dimensions = dimensions;
  tower.materials.push_back({"steel", 210e9, 7850.0, {}, {}});
  tower.sections.push_back(section_of("bar", area));
  tower.groups.push_back({"bars", 0, 0, {}});
  tower.modes.mass_share = 0.9;
  return tower;
}

std::size_t add_node(Tower& tower, const Eigen::Vector3d& position) {
  tower.nodes.push_back({std::to_string(tower.nodes.size() + 1), position, {}});
  return tower.nodes.size() - 1;
}

void add_bar(Tower& tower, std::size_t from, std::size_t to) {
  const std::size_t group = tower.groups.size() - 1;
  std::size_t number = 1;
  for (const Bar& bar : tower.bars) {
    if (bar.group == group) ++number;
  }
  tower.bars.push_back({group, from, to, number, {}});
}

void fix(Tower& tower, std::size_t node) {
  Support support;
  support.node = node;
  for (const Axis axis : tower.axes()) support.fixed[static_cast<std::size_t>(axis)] = true;
  tower.supports.push_back(support);
}

void carry(Tower& tower, std::size_t node, double mass) {
  tower.node_masses.push_back({{node}, mass, "", {}});
}

void stand_tank(Tower& tower, const std::vector<std::size_t>& nodes, double radius, double depth,
                bool rigid) {
  Liquid liquid;
  liquid.nodes = nodes;
  liquid.radius = radius;
  liquid.depth = depth;
  liquid.density = 1000.0;
  liquid.rigid = rigid;
  liquid.label = "water";
  if (!rigid) {
    Eigen::Vector3d middle = Eigen::Vector3d::Zero();
    for (const std::size_t node : nodes) middle += tower.nodes[node].position;
    liquid.node = tower.nodes.size();
    tower.nodes.push_back({liquid.label, middle / static_cast<double>(nodes.size()), {}});
  }
  tower.liquids.push_back(std::move(liquid));
}

Tower rod(int elements, double length, MassScheme scheme) {
  Tower tower = bare_tower(1);
  tower.mass_scheme = scheme;
  for (int i = 0; i <= elements; ++i) add_node(tower, {length * i / elements, 0.0, 0.0});
  for (std::size_t i = 0; i + 1 < tower.nodes.size(); ++i) add_bar(tower, i, i + 1);
  fix(tower, 0);
  return tower;
}

Tower portal(double lean) {
  Tower tower = bare_tower(2);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  fix(tower, add_node(tower, {4.0, 0.0, 0.0}));
  add_node(tower, {3.0 * lean, 0.0, 3.0});
  add_node(tower, {4.0 - 3.0 * lean, 0.0, 3.0});
  add_bar(tower, 0, 2);
  add_bar(tower, 1, 3);
  add_bar(tower, 2, 3);
  return tower;
}

Tower regular_mast(const Mast& mast) {
  Tower tower = bare_tower(3);
  const auto legs = static_cast<std::size_t>(mast.legs);
  std::vector<std::size_t> below;
  for (int level = 0; level <= mast.panels; ++level) {
    const double share = static_cast<double>(level) / mast.panels;
    const double radius = mast.radius + share * (mast.top_radius - mast.radius);
    std::vector<std::size_t> ring;
    for (std::size_t k = 0; k < legs; ++k) {
      const double angle = mast.turn + 2.0 * std::numbers::pi * static_cast<double>(k) / mast.legs;
      ring.push_back(
          add_node(tower, {radius * std::cos(angle), radius * std::sin(angle), level * mast.panel_height}));
    }
    if (level == 0) {
      for (const std::size_t node : ring) fix(tower, node);
    } else {
      for (std::size_t k = 0; k < legs; ++k) {
        const std::size_t next = (k + 1) % legs;
        add_bar(tower, below[k], ring[k]);
        add_bar(tower, below[k], ring[next]);
        add_bar(tower, below[next], ring[k]);
        add_bar(tower, ring[k], ring[next]);
      }
      // A hub held by the ring and, against lifting, by the ring below.
      if (legs > 3) {
        const std::size_t hub = add_node(tower, {0.0, 0.0, level * mast.panel_height});
        for (std::size_t k = 0; k < legs; ++k) {
          add_bar(tower, hub, ring[k]);
          add_bar(tower, hub, below[k]);
        }
      }
    }
    below = ring;
  }
  NodeMass top;
  top.nodes = below;
  top.total = mast.top_mass;
  if (mast.top_mass > 0.0) tower.node_masses.push_back(top);
  return tower;
}

Tower random_truss(int dimensions, int free_nodes, std::mt19937& random) {
  std::uniform_real_distribution<double> unit(0.0, 1.0);
  Tower tower = bare_tower(dimensions);
  tower.groups.clear();
  tower.sections.clear();
  const auto ties = static_cast<std::size_t>(dimensions) + 1;
  for (std::size_t i = 0; i < ties + static_cast<std::size_t>(free_nodes); ++i) {
    Eigen::Vector3d position = Eigen::Vector3d::Zero();
    for (const Axis axis : tower.axes()) position[index_of(axis)] = 10.0 * unit(random);
    const std::size_t node = add_node(tower, position);
    if (i < ties) {
      fix(tower, node);
      continue;
    }
    tower.sections.push_back(section_of("s" + std::to_string(i), 1e-4 + 4e-3 * unit(random)));
    tower.groups.push_back({"g" + std::to_string(i), tower.sections.size() - 1, 0, {}});
    std::vector<std::size_t> earlier;
    while (earlier.size() < ties) {
      const std::size_t other = std::uniform_int_distribution<std::size_t>(0, node - 1)(random);
      if (std::find(earlier.begin(), earlier.end(), other) != earlier.end()) continue;
      earlier.push_back(other);
      add_bar(tower, other, node);
    }
    if (unit(random) < 0.3) carry(tower, node, 500.0 * unit(random));
  }
  return tower;
}

}  // namespace swaymark::test
