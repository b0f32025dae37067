#include "core/validate.hpp"

#include <algorithm>
#include <unordered_map>
#include <utility>

#include "core/open_direction.hpp"
#include "core/point_grid.hpp"
#include "core/text.hpp"
#include "core/wording.hpp"
#include "core/wording_bases.hpp"

namespace swaymark {

namespace {

// Two nodes nearer than this [m] were meant to be one: no shop drills to a micron.
constexpr double kSamePlace = 1e-6;

void find_coincident_nodes(const Tower& tower, FaultList& faults) {
  PointGrid grid(kSamePlace);
  for (std::size_t i = 0; i < tower.nodes.size(); ++i) {
    const Node& node = tower.nodes[i];
    if (tower.sloshes(i)) continue;  // it stands in the middle of its tank, whatever else stands there
    std::size_t first = i;
    grid.around(node.position, [&](std::size_t other, const Eigen::Vector3d& position) {
      if ((position - node.position).norm() < kSamePlace) first = std::min(first, other);
    });
    if (first < i) {
      faults.add(node.place, wording::nodes_coincide(excerpt(node.name), excerpt(tower.nodes[first].name)));
    } else {
      grid.add(i, node.position);
    }
  }
}

using Pair = std::pair<std::size_t, std::size_t>;
struct PairHash {
  std::size_t operator()(const Pair& pair) const {
    return static_cast<std::size_t>(
        mixed({static_cast<std::int64_t>(pair.first), static_cast<std::int64_t>(pair.second), 0}));
  }
};

void find_faulty_bars(const Tower& tower, FaultList& faults) {
  std::unordered_map<Pair, std::size_t, PairHash> joined;
  joined.reserve(tower.bars.size());
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
    const auto [first, fresh] = joined.emplace(Pair(std::minmax(bar.from, bar.to)), i);
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
  check_stabilisers(tower, faults);
}

void check_stabilisers(const Tower& tower, FaultList& faults) {
  // Bars that could not be read may be what holds a node, or what leaves it free.
  if (tower.stabilisers.empty() || !faults.empty()) return;
  std::vector<bool> joined(tower.nodes.size(), false);
  for (const Bar& bar : tower.bars) joined[bar.from] = joined[bar.to] = true;
  const auto open = open_directions(tower);
  for (const Stabiliser& stabiliser : tower.stabilisers) {
    if (!joined[stabiliser.node]) {
      faults.add(stabiliser.place,
                 wording::stabilise_without_bars(excerpt(tower.nodes[stabiliser.node].name)));
    } else if (open[stabiliser.node].empty())
      faults.add(stabiliser.place, wording::nothing_to_stabilise(excerpt(tower.nodes[stabiliser.node].name)));
  }
}

}  // namespace swaymark
