#include "core/drawing.hpp"

#include <algorithm>
#include <map>

#include <fmt/format.h>

#include "core/merge_points.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

using Eigen::Vector3d;
constexpr std::size_t kNone = static_cast<std::size_t>(-1);

// Points are the nodes stated, then both ends of every segment.
std::vector<Vector3d> points_of(const Drawing& drawing) {
  std::vector<Vector3d> points;
  points.reserve(drawing.stated + 2 * drawing.segments.size());
  for (const Node& node : drawing.tower.nodes) points.push_back(node.position);
  for (const Segment& segment : drawing.segments)
    points.insert(points.end(), segment.ends.begin(), segment.ends.end());
  return points;
}

Place end_place(const Drawing& drawing, std::size_t point) {
  const std::size_t end = point - drawing.stated;
  return drawing.segments[end / 2].places[end % 2];
}

void measure_moves(Drawing& drawing, const std::vector<Vector3d>& points, const MergedPoints& merged,
                   const std::vector<std::size_t>& node_of) {
  SegmentReading& reading = drawing.reading;
  for (std::size_t p = drawing.stated; p < points.size(); ++p) {
    const double move = (points[p] - points[merged.first[p]]).norm();
    if (move > 0.0) ++reading.moved;
    if (move <= reading.largest_move) continue;
    reading.largest_move = move;
    reading.largest_move_node = node_of[p];
  }
}

// By the first point of a cluster that extends too far: its end farthest from there.
std::map<std::size_t, std::size_t> chains_of(const Drawing& drawing, const std::vector<Vector3d>& points,
                                             const MergedPoints& merged) {
  std::map<std::size_t, std::size_t> chains;
  for (std::size_t p = drawing.stated; p < points.size(); ++p) {
    const std::size_t first = merged.first[p];
    if (merged.extent[first] <= drawing.within) continue;
    const auto [farthest, fresh] = chains.emplace(first, p);
    if (fresh) continue;
    const Vector3d& node = points[first];
    if ((points[p] - node).norm() > (points[farthest->second] - node).norm()) farthest->second = p;
  }
  return chains;
}

void check_clusters(Drawing& drawing, const std::vector<Vector3d>& points, const MergedPoints& merged,
                    const std::vector<std::size_t>& node_of) {
  const double stated_within = drawing.reading.merge_within;
  auto chains = chains_of(drawing, points, merged);
  const auto& nodes = drawing.tower.nodes;
  for (std::size_t n = 0; n < drawing.stated; ++n) {
    const std::size_t first = merged.first[n];
    if (first == n || node_of[first] == kNone) continue;
    chains.erase(first);
    drawing.faults.add(nodes[n].place,
                       wording::ends_join_two_nodes(nodes[n].name, nodes[first].name, stated_within));
  }
  for (const auto& [first, p] : chains)
    drawing.table.faults.add(end_place(drawing, p),
                             wording::ends_form_a_chain(merged.extent[first], stated_within));
}

}  // namespace

std::size_t Drawing::add_node(const std::string& name, const Vector3d& position, Place place) {
  if (const auto known = names.place_of(name))
    faults.add(*known, wording::segment_node_taken(name, table.path()));
  names.add(name, tower.nodes.size(), place);
  tower.nodes.push_back({name, position, place});
  return tower.nodes.size() - 1;
}

std::vector<std::size_t> draw_nodes(Drawing& drawing) {
  const std::vector<Vector3d> points = points_of(drawing);
  const MergedPoints merged = merge_points(points, drawing.within);
  if (merged.crowded) {
    drawing.table.faults.add(end_place(drawing, std::max(*merged.crowded, drawing.stated)),
                             wording::merge_within_too_large(drawing.reading.merge_within));
    return {};
  }
  std::vector<std::size_t> node_of(points.size(), kNone);
  for (std::size_t p = drawing.stated; p < points.size(); ++p) {
    std::size_t& node = node_of[merged.first[p]];
    if (node == kNone) {
      const std::string name = fmt::format("n{}", ++drawing.reading.nodes);
      const bool named = merged.first[p] < drawing.stated;
      if (named) ++drawing.reading.named;
      node = named ? merged.first[p]
                   : drawing.add_node(name, points[p], drawing.table.in_tower(end_place(drawing, p)));
    }
    node_of[p] = node;
  }
  measure_moves(drawing, points, merged, node_of);
  check_clusters(drawing, points, merged, node_of);
  node_of.erase(node_of.begin(), node_of.begin() + static_cast<std::ptrdiff_t>(drawing.stated));
  return node_of;
}

}  // namespace swaymark
