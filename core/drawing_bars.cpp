#include "core/drawing_bars.hpp"

#include <algorithm>
#include <tuple>

#include <fmt/format.h>

#include "core/crossings.hpp"
#include "core/point_grid.hpp"
#include "core/tower_file_tables.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

using Eigen::Vector3d;
constexpr std::size_t kNone = static_cast<std::size_t>(-1);

void make_bars(Drawing& drawing, const std::vector<std::size_t>& node_of) {
  Tower& tower = drawing.tower;
  std::vector<std::size_t> count = bars_by_group(tower);
  tower.bars.reserve(tower.bars.size() + drawing.segments.size());
  for (std::size_t s = 0; s < drawing.segments.size(); ++s) {
    const Segment& segment = drawing.segments[s];
    const std::size_t from = node_of[2 * s];
    const std::size_t to = node_of[2 * s + 1];
    if (from == to) {
      const double length = (segment.ends[1] - segment.ends[0]).norm();
      drawing.table.faults.add(segment.places[0],
                               wording::segment_too_short(length, drawing.reading.merge_within));
      continue;
    }
    const Place place = drawing.table.in_tower(segment.places[0]);
    tower.bars.push_back({segment.group, from, to, ++count[segment.group], place});
  }
}

std::string bar_name(const Drawing& drawing, std::size_t stick) {
  return drawing.tower.bar_name(drawing.first_bar + stick);
}

Meetings meetings_of(const Drawing& drawing) {
  const Tower& tower = drawing.tower;
  std::vector<Vector3d> points;
  points.reserve(tower.nodes.size());
  for (const Node& node : tower.nodes) points.push_back(node.position);
  std::vector<Stick> sticks;
  sticks.reserve(drawing.segments.size());
  for (std::size_t b = drawing.first_bar; b < tower.bars.size(); ++b)
    sticks.push_back({tower.bars[b].from, tower.bars[b].to});
  return find_meetings(points, sticks, drawing.within);
}

// A fault, or a crossing to be told of.
void take(Drawing& drawing, const Meeting& m) {
  const std::size_t late = std::max(m.first, m.second);
  const std::size_t early = std::min(m.first, m.second);
  const std::string name = bar_name(drawing, late);
  const std::string first = bar_name(drawing, early);
  const Place place = drawing.segments[late].places[0];
  if (m.kind == MeetingKind::overlap) {
    drawing.table.faults.add(place, wording::segments_overlap(name, first, m.length));
  } else if (m.kind == MeetingKind::nearly_ends) {
    drawing.table.faults.add(place,
                             wording::ends_nearly_meet(name, first, m.length, drawing.reading.merge_within));
  } else {
    SegmentCrossing crossing;
    crossing.first = bar_name(drawing, m.first);
    if (m.kind != MeetingKind::node_on) crossing.second = bar_name(drawing, m.second);
    crossing.position = m.position;
    if (m.kind != MeetingKind::crossing) crossing.node = m.node;
    crossing.at_end = m.kind == MeetingKind::end_on;
    drawing.reading.crossings.push_back(std::move(crossing));
  }
}

// Where bars are cut, and the nodes there.
class Cuts {
 public:
  explicit Cuts(Drawing& drawing) : drawing_(drawing), grid_(drawing.within) {
    const auto& nodes = drawing.tower.nodes;
    for (std::size_t n = 0; n < nodes.size(); ++n) grid_.add(n, nodes[n].position);
  }

  // \return the node that stands there then.
  std::size_t add(const Meeting& m) {
    if (m.kind != MeetingKind::crossing) {
      cut(m.kind == MeetingKind::node_on ? m.first : m.second, m.node);
      return m.node;
    }
    std::size_t node = node_near(m.position);
    if (node == kNone) {
      const Place place = drawing_.tower.bars[drawing_.first_bar + m.first].place;
      node = drawing_.add_node(fmt::format("c{}", ++made_), m.position, place);
      grid_.add(node, m.position);
    }
    cut(m.first, node);
    cut(m.second, node);
    return node;
  }

  void replace_bars() {
    const auto key = [](const Cut& cut) { return std::tie(cut.stick, cut.at, cut.node); };
    std::sort(cuts_.begin(), cuts_.end(), [&](const Cut& a, const Cut& b) { return key(a) < key(b); });
    cuts_.erase(
        std::unique(cuts_.begin(), cuts_.end(), [&](const Cut& a, const Cut& b) { return key(a) == key(b); }),
        cuts_.end());
    std::vector<Bar>& bars = drawing_.tower.bars;
    const auto first = bars.begin() + static_cast<std::ptrdiff_t>(drawing_.first_bar);
    const std::vector<Bar> whole(first, bars.end());
    bars.erase(first, bars.end());
    bars.reserve(bars.size() + whole.size() + cuts_.size());
    auto cut = cuts_.cbegin();
    for (std::size_t s = 0; s < whole.size(); ++s) {
      if (cut == cuts_.cend() || cut->stick != s) {
        bars.push_back(whole[s]);
        continue;
      }
      Bar piece = whole[s];
      std::size_t count = 0;
      for (; cut != cuts_.cend() && cut->stick == s; ++cut) add_piece(piece, cut->node, ++count);
      add_piece(piece, whole[s].to, ++count);
    }
  }

 private:
  struct Cut {
    std::size_t stick;
    double at;  // along the bar [m]
    std::size_t node;
  };

  // The earliest node within the tolerance of a place.
  [[nodiscard]] std::size_t node_near(const Vector3d& place) const {
    std::size_t node = kNone;
    grid_.around(place, [&](std::size_t other, const Vector3d& position) {
      if ((position - place).norm() <= drawing_.within) node = std::min(node, other);
    });
    return node;
  }

  void cut(std::size_t stick, std::size_t node) {
    const Bar& bar = drawing_.tower.bars[drawing_.first_bar + stick];
    if (node == bar.from || node == bar.to) return;
    const auto& nodes = drawing_.tower.nodes;
    const Vector3d& start = nodes[bar.from].position;
    const Vector3d way = nodes[bar.to].position - start;
    cuts_.push_back({stick, (nodes[node].position - start).dot(way.normalized()), node});
  }

  // The next piece begins where this one ends.
  void add_piece(Bar& piece, std::size_t to, std::size_t count) {
    piece.name = fmt::format("{}-{}.{}", drawing_.tower.groups[piece.group].name, piece.number, count);
    piece.to = to;
    drawing_.tower.bars.push_back(piece);
    piece.from = to;
  }

  Drawing& drawing_;
  PointGrid grid_;
  std::vector<Cut> cuts_;
  std::size_t made_ = 0;
};

}  // namespace

void draw_bars(Drawing& drawing, const std::vector<std::size_t>& node_of) {
  FaultList& faults = drawing.table.faults;
  make_bars(drawing, node_of);
  if (!faults.empty()) return;
  const Meetings meetings = meetings_of(drawing);
  if (!meetings.complete) faults.add(drawing.segments.front().places[0], wording::too_dense_for_crossings());
  for (const Meeting& meeting : meetings.list) take(drawing, meeting);
  if (!drawing.reading.split || !faults.empty()) return;
  Cuts cuts(drawing);
  for (std::size_t i = 0; i < meetings.list.size(); ++i)
    drawing.reading.crossings[i].node = cuts.add(meetings.list[i]);
  cuts.replace_bars();
}

}  // namespace swaymark
