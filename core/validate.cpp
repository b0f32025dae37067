#include "core/validate.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <map>
#include <utility>
#include <vector>

#include "core/text.hpp"
#include "core/wording.hpp"

namespace swaymark {

namespace {

// Two nodes nearer than this [m] were meant to be one: no shop drills to a micron.
constexpr double kSamePlace = 1e-6;

using Cell = std::array<long long, 3>;

// The cells that the surroundings of a position reach into: one, or up to eight at their borders.
std::vector<Cell> cells_near(const Eigen::Vector3d& position) {
  constexpr double width = 4.0 * kSamePlace;
  const auto cell = [](double coordinate) { return static_cast<long long>(std::floor(coordinate / width)); };
  std::vector<Cell> cells{Cell{}};
  for (std::size_t axis = 0; axis < 3; ++axis) {
    const double coordinate = position[static_cast<Eigen::Index>(axis)];
    const long long low = cell(coordinate - kSamePlace);
    const long long high = cell(coordinate + kSamePlace);
    const std::size_t count = cells.size();
    for (std::size_t i = 0; i < count; ++i) {
      cells[i][axis] = low;
      if (high == low) continue;
      cells.push_back(cells[i]);
      cells.back()[axis] = high;
    }
  }
  return cells;
}

void find_coincident_nodes(const Tower& tower, FaultList& faults) {
  std::map<Cell, std::vector<std::size_t>> grid;  // each node in every cell it is near to
  for (std::size_t i = 0; i < tower.nodes.size(); ++i) {
    const Node& node = tower.nodes[i];
    if (tower.sloshes(i)) continue;  // it stands in the middle of its tank, whatever else stands there
    const auto cells = cells_near(node.position);
    const Node* first = nullptr;
    for (const Cell& cell : cells) {
      for (const std::size_t other : grid[cell]) {
        const bool same = (tower.nodes[other].position - node.position).norm() < kSamePlace;
        if (same && first == nullptr) first = &tower.nodes[other];
      }
    }
    if (first != nullptr) {
      faults.add(node.place, wording::nodes_coincide(excerpt(node.name), excerpt(first->name)));
      continue;
    }
    for (const Cell& cell : cells) grid[cell].push_back(i);
  }
}

void find_faulty_bars(const Tower& tower, FaultList& faults) {
  std::map<std::pair<std::size_t, std::size_t>, std::size_t> joined;
  for (std::size_t i = 0; i < tower.bars.size(); ++i) {
    const Bar& bar = tower.bars[i];
    const Node& from = tower.nodes[bar.from];
    const Node& to = tower.nodes[bar.to];
    if (bar.from == bar.to) {
      faults.add(bar.place, wording::bar_to_itself(tower.bar_name(i), excerpt(from.name)));
      continue;
    }
    if ((from.position - to.position).norm() < kSamePlace) {
      faults.add(bar.place,
                 wording::bar_without_length(tower.bar_name(i), excerpt(from.name), excerpt(to.name)));
    }
    const auto [first, fresh] = joined.emplace(std::minmax(bar.from, bar.to), i);
    if (!fresh) {
      faults.add(bar.place, wording::bar_twice(tower.bar_name(i), tower.bar_name(first->second),
                                               excerpt(from.name), excerpt(to.name)));
    }
  }
}

}  // namespace

void validate(const Tower& tower, FaultList& faults) {
  find_coincident_nodes(tower, faults);
  find_faulty_bars(tower, faults);
}

}  // namespace swaymark
