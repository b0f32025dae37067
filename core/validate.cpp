#include "core/validate.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <map>
#include <numeric>
#include <utility>

#include "core/text.hpp"
#include "core/wording.hpp"

namespace swaymark {

namespace {

// Two nodes nearer than this [m] were meant to be one: no shop drills to a micron.
constexpr double kSamePlace = 1e-6;

using Cell = std::array<long long, 3>;

Cell cell_of(const Eigen::Vector3d& position) {
  return {std::llround(position.x() / kSamePlace), std::llround(position.y() / kSamePlace),
          std::llround(position.z() / kSamePlace)};
}

void find_coincident_nodes(const Tower& tower, FaultList& faults) {
  std::vector<std::size_t> order(tower.nodes.size());
  std::iota(order.begin(), order.end(), std::size_t{0});
  const auto cell = [&](std::size_t node) { return cell_of(tower.nodes[node].position); };
  std::stable_sort(order.begin(), order.end(),
                   [&](std::size_t a, std::size_t b) { return cell(a) < cell(b); });
  std::size_t first = 0;
  for (std::size_t i = 1; i < order.size(); ++i) {
    if (cell(order[i]) != cell(order[first])) {
      first = i;
      continue;
    }
    const Node& node = tower.nodes[order[i]];
    faults.add(node.place,
               wording::nodes_coincide(excerpt(node.name), excerpt(tower.nodes[order[first]].name)));
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
