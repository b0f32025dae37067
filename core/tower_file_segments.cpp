#include "core/tower_file_segments.hpp"

#include <algorithm>
#include <array>
#include <limits>
#include <map>

#include <fmt/format.h>

#include "core/crossings.hpp"
#include "core/csv_columns.hpp"
#include "core/merge_points.hpp"
#include "core/point_grid.hpp"
#include "core/tower_file_tables.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

using Eigen::Vector3d;

constexpr double kMergeWithin =
    1e-3;  // [m]: drawings are made to the millimetre (common practice, no source)
constexpr double kLeastWithin = 1e-6;  // [m]: nodes nearer than this are refused as one
constexpr double kSlack = 1e-6;        // of the tolerance: a distance of just 1 mm is within 1 mm

struct Segment {
  std::array<Vector3d, 2> ends{Vector3d::Zero(), Vector3d::Zero()};
  std::array<Place, 2> places;  // in the table
  std::size_t group = 0;
};

TableForm form_in(const Tower& tower) {
  TableForm form;
  form.owner = fmt::format("a table of segments in {} dimension{}", tower.dimensions,
                           tower.dimensions == 1 ? "" : "s");
  for (const int end : {1, 2}) {
    for (const std::string& axis : axis_names(tower)) {
      form.columns.push_back({fmt::format("{}{}", axis, end), Quantity::length});
      form.example += fmt::format("{}{} [m],", axis, end);
    }
  }
  form.columns.push_back({"group", {}});
  form.example += "group";
  return form;
}

// Rows whose values cannot be read are faults and left out.
std::vector<Segment> read_rows(TableFile& table, const NameTable& groups, const Tower& tower) {
  std::array<std::vector<ValueColumn>, 2> columns;
  for (const std::size_t end : {0U, 1U}) {
    for (const std::string& axis : axis_names(tower))
      columns[end].emplace_back(table.table, fmt::format("{}{}", axis, end + 1), Quantity::length,
                                Range::any);
  }
  const auto axes = tower.axes();
  const WordColumn group(table.table, "group");
  std::vector<Segment> segments;
  segments.reserve(table.table.rows.size());
  for (const auto& row : table.table.rows) {
    Segment segment;
    const std::size_t before = table.faults.size();
    for (const std::size_t end : {0U, 1U}) {
      for (std::size_t k = 0; k < axes.size(); ++k) {
        const ValueColumn& column = columns[end][k];
        const double value = column.in(row, table.faults).value_or(0.0);
        if (std::abs(value) > kFarthest)
          table.faults.add(column.place_in(row), wording::too_far_away(fmt::format("{:.6g} m", value)));
        segment.ends[end][index_of(axes[k])] = value;
      }
      segment.places[end] = columns[end].front().place_in(row);
    }
    const CsvCell& word = group.in(row);
    if (word.text.empty()) table.faults.add(word.place, wording::key_empty("group"));
    if (!word.text.empty()) segment.group = groups.find(word.text, word.place, table.faults).value_or(0);
    if (table.faults.size() == before) segments.push_back(segment);
  }
  return segments;
}

// Turns segments into nodes and bars of the tower.
class Drawing {
 public:
  Drawing(TableFile& table, const std::vector<Segment>& segments, NameTable& names, Tower& tower,
          FaultList& faults)
      : table_(table),
        segments_(segments),
        names_(names),
        tower_(tower),
        faults_(faults),
        stated_(tower.nodes.size()),
        first_bar_(tower.bars.size()) {}

  void build(SegmentReading reading) {
    reading_ = std::move(reading);
    reading_.file = table_.path();
    reading_.segments = segments_.size();
    within_ = reading_.merge_within * (1.0 + kSlack);
    const std::size_t before = faults_.size();
    if (!make_nodes()) return;
    make_bars();
    if (!table_.faults.empty() || faults_.size() > before) return;
    meet();
    if (table_.faults.empty()) refuse_loose_nodes();
    tower_.segments = std::move(reading_);
  }

 private:
  [[nodiscard]] const Vector3d& end(std::size_t point) const {
    return segments_[(point - stated_) / 2].ends[(point - stated_) % 2];
  }
  [[nodiscard]] Place end_place(std::size_t point) const {
    return segments_[(point - stated_) / 2].places[(point - stated_) % 2];
  }

  // Points are the nodes stated elsewhere, then both ends of every segment.
  bool make_nodes() {
    std::vector<Vector3d> points;
    points.reserve(stated_ + 2 * segments_.size());
    for (const Node& node : tower_.nodes) points.push_back(node.position);
    for (const Segment& segment : segments_)
      points.insert(points.end(), segment.ends.begin(), segment.ends.end());
    const MergedPoints merged = merge_points(points, within_);
    if (!merged.complete) {
      table_.faults.add({}, wording::merge_within_too_large(reading_.merge_within));
      return false;
    }
    node_of_.assign(points.size(), kNone);
    for (std::size_t p = stated_; p < points.size(); ++p) {
      const std::size_t first = merged.first[p];
      if (node_of_[first] == kNone) node_of_[first] = make_node(first, p);
      node_of_[p] = node_of_[first];
    }
    check_clusters(points, merged);
    return true;
  }

  // The node of a cluster that begins with point `first` and, among the ends, with `p`.
  std::size_t make_node(std::size_t first, std::size_t p) {
    const std::string name = fmt::format("n{}", ++reading_.nodes);
    if (first < stated_) ++reading_.named;
    if (first < stated_) return first;
    return add_node(name, end(p), table_.in_tower(end_place(p)));
  }

  std::size_t add_node(const std::string& name, const Vector3d& position, Place place) {
    if (const auto known = names_.place_of(name))
      faults_.add(*known, wording::segment_node_taken(name, table_.path()));
    names_.add(name, tower_.nodes.size(), place);
    tower_.nodes.push_back({name, position, place});
    return tower_.nodes.size() - 1;
  }

  void check_clusters(const std::vector<Vector3d>& points, const MergedPoints& merged) {
    std::map<std::size_t, std::size_t> chains;  // first point of a cluster that is none, farthest end
    for (std::size_t p = stated_; p < points.size(); ++p) {
      const std::size_t first = merged.first[p];
      const Vector3d& node = points[first];
      const double move = (points[p] - node).norm();
      if (points[p] != node) ++reading_.moved;
      if (move > reading_.largest_move) {
        reading_.largest_move = move;
        reading_.largest_move_node = node_of_[p];
      }
      if (merged.extent[first] <= within_) continue;
      const auto [farthest, fresh] = chains.emplace(first, p);
      if (!fresh && move > (points[farthest->second] - node).norm()) farthest->second = p;
    }
    for (std::size_t n = 0; n < stated_; ++n) {
      const std::size_t first = merged.first[n];
      if (first == n || node_of_[first] == kNone) continue;
      chains.erase(first);
      faults_.add(tower_.nodes[n].place,
                  wording::ends_join_two_nodes(tower_.nodes[n].name, tower_.nodes[first].name,
                                               reading_.merge_within));
    }
    for (const auto& [first, p] : chains)
      table_.faults.add(end_place(p),
                        wording::ends_form_a_chain(merged.extent[first], reading_.merge_within));
  }

  void make_bars() {
    std::vector<std::size_t> count = bars_by_group(tower_);
    tower_.bars.reserve(tower_.bars.size() + segments_.size());
    for (std::size_t s = 0; s < segments_.size(); ++s) {
      const Segment& segment = segments_[s];
      const std::size_t from = node_of_[stated_ + 2 * s];
      const std::size_t to = node_of_[stated_ + 2 * s + 1];
      if (from == to) {
        const double length = (segment.ends[1] - segment.ends[0]).norm();
        table_.faults.add(segment.places[0], wording::segment_too_short(length, reading_.merge_within));
        continue;
      }
      const Place place = table_.in_tower(segment.places[0]);
      tower_.bars.push_back({segment.group, from, to, ++count[segment.group], place});
    }
  }

  void meet() {
    std::vector<Vector3d> points;
    points.reserve(tower_.nodes.size());
    for (const Node& node : tower_.nodes) points.push_back(node.position);
    std::vector<Stick> sticks;
    sticks.reserve(segments_.size());
    for (std::size_t b = first_bar_; b < tower_.bars.size(); ++b)
      sticks.push_back({tower_.bars[b].from, tower_.bars[b].to});
    const Meetings meetings = find_meetings(points, sticks, within_);
    if (!meetings.complete) table_.faults.add({}, wording::too_dense_for_crossings());
    for (const Meeting& meeting : meetings.list) take(meeting);
    if (reading_.split && table_.faults.empty()) split(meetings.list);
  }

  [[nodiscard]] std::string bar_name(std::size_t stick) const { return tower_.bar_name(first_bar_ + stick); }

  void take(const Meeting& m) {
    const std::size_t late = std::max(m.first, m.second);
    const std::size_t early = std::min(m.first, m.second);
    const Place place = segments_[late].places[0];  // every segment is a bar, or this is not reached
    if (m.kind == MeetingKind::overlap) {
      table_.faults.add(place, wording::segments_overlap(bar_name(late), bar_name(early), m.length));
    } else if (m.kind == MeetingKind::nearly_ends) {
      table_.faults.add(
          place, wording::ends_nearly_meet(bar_name(late), bar_name(early), m.length, reading_.merge_within));
    } else {
      SegmentCrossing crossing;
      crossing.first = bar_name(m.first);
      if (m.kind != MeetingKind::node_on) crossing.second = bar_name(m.second);
      crossing.position = m.position;
      if (m.kind != MeetingKind::crossing) crossing.node = m.node;
      crossing.at_end = m.kind == MeetingKind::end_on;
      reading_.crossings.push_back(std::move(crossing));
    }
  }

  struct Cut {
    std::size_t node;
    double at;  // along the bar [m]
  };
  using Cuts = std::map<std::size_t, std::vector<Cut>>;  // by stick

  void split(const std::vector<Meeting>& meetings) {
    PointGrid grid(within_);
    for (std::size_t n = 0; n < tower_.nodes.size(); ++n) grid.add(n, tower_.nodes[n].position);
    Cuts cuts;
    std::size_t made = 0;
    for (std::size_t i = 0; i < meetings.size(); ++i) {
      const Meeting& m = meetings[i];
      std::size_t node = m.node;
      if (m.kind == MeetingKind::crossing) {
        node = node_near(grid, m.position);
        if (node == kNone) {
          node = add_node(fmt::format("c{}", ++made), m.position, tower_.bars[first_bar_ + m.first].place);
          grid.add(node, m.position);
        }
        reading_.crossings[i].node = node;
        cut(cuts, m.first, node);
      }
      cut(cuts, m.kind == MeetingKind::node_on ? m.first : m.second, node);
    }
    replace_bars(cuts);
  }

  // The node within the tolerance of a place; the earliest if there are several.
  [[nodiscard]] std::size_t node_near(const PointGrid& grid, const Vector3d& place) const {
    std::size_t node = kNone;
    grid.around(place, [&](std::size_t other, const Vector3d& position) {
      if ((position - place).norm() <= within_) node = std::min(node, other);
    });
    return node;
  }

  void cut(Cuts& cuts, std::size_t stick, std::size_t node) const {
    const Bar& bar = tower_.bars[first_bar_ + stick];
    if (node == bar.from || node == bar.to) return;
    std::vector<Cut>& list = cuts[stick];
    if (std::any_of(list.begin(), list.end(), [&](const Cut& known) { return known.node == node; })) return;
    const Vector3d& start = tower_.nodes[bar.from].position;
    const Vector3d way = tower_.nodes[bar.to].position - start;
    list.push_back({node, (tower_.nodes[node].position - start).dot(way.normalized())});
  }

  void replace_bars(Cuts& cuts) {
    const auto first = tower_.bars.begin() + static_cast<std::ptrdiff_t>(first_bar_);
    const std::vector<Bar> whole(first, tower_.bars.end());
    tower_.bars.erase(first, tower_.bars.end());
    for (std::size_t s = 0; s < whole.size(); ++s) {
      const auto found = cuts.find(s);
      if (found == cuts.end()) {
        tower_.bars.push_back(whole[s]);
        continue;
      }
      std::vector<Cut>& list = found->second;
      std::sort(list.begin(), list.end(), [](const Cut& a, const Cut& b) { return a.at < b.at; });
      list.push_back({whole[s].to, 0.0});
      Bar piece = whole[s];
      for (std::size_t i = 0; i < list.size(); ++i) {
        piece.name = fmt::format("{}-{}.{}", tower_.groups[piece.group].name, piece.number, i + 1);
        piece.to = list[i].node;
        tower_.bars.push_back(piece);
        piece.from = piece.to;
      }
    }
  }

  // A node written by hand beside a drawing is to name an end point; one that no bar joins was meant to.
  void refuse_loose_nodes() {
    constexpr std::size_t most_told = 100;  // each costs a look at every end point
    std::vector<bool> joined(tower_.nodes.size(), false);
    for (const Bar& bar : tower_.bars) joined[bar.from] = joined[bar.to] = true;
    std::map<std::size_t, std::string> passed;
    for (const SegmentCrossing& crossing : reading_.crossings) {
      if (crossing.second.empty()) passed.emplace(*crossing.node, crossing.first);
    }
    std::size_t told = 0;
    for (std::size_t n = 0; n < stated_ && told < most_told; ++n) {
      if (joined[n]) continue;
      ++told;
      const Node& node = tower_.nodes[n];
      const auto on = passed.find(n);
      faults_.add(node.place, on != passed.end()
                                  ? wording::node_on_segment(node.name, on->second)
                                  : wording::node_off_segments(node.name, distance_to_ends(node.position),
                                                               reading_.merge_within));
    }
  }

  [[nodiscard]] double distance_to_ends(const Vector3d& place) const {
    double least = std::numeric_limits<double>::infinity();
    for (const Segment& segment : segments_) {
      for (const Vector3d& end : segment.ends) least = std::min(least, (end - place).norm());
    }
    return least;
  }

  static constexpr std::size_t kNone = static_cast<std::size_t>(-1);

  TableFile& table_;
  const std::vector<Segment>& segments_;
  NameTable& names_;
  Tower& tower_;
  FaultList& faults_;  // of the tower file
  std::size_t stated_;
  std::size_t first_bar_;
  double within_ = 0.0;
  SegmentReading reading_;
  std::vector<std::size_t> node_of_;  // by point
};

SegmentReading read_options(MapView& file) {
  SegmentReading reading;
  reading.merge_within = kMergeWithin;
  if (const YamlNode* node = file.find("merge_within")) {
    const auto value = read_value(*node, "merge_within", Quantity::length, Range::any, file.faults());
    if (value && *value < kLeastWithin)
      file.faults().add(node->place, wording::merge_within_too_small(node->text, kLeastWithin));
    if (value && *value >= kLeastWithin) reading.merge_within = *value;
    reading.merge_within_stated = true;
  }
  if (const YamlNode* node = file.find("split_crossings"))
    reading.split = read_flag(*node, "split_crossings", file.faults()).value_or(false);
  return reading;
}

}  // namespace

void read_segments(MapView& file, const FileSource& source, PartNames& parts, const NameTable& groups,
                   Tower& tower) {
  FaultList& faults = file.faults();
  const std::size_t before = faults.size();
  const SegmentReading options = read_options(file);
  if (!file.has("segments_from")) {
    for (const char* key : {"merge_within", "split_crossings"}) {
      if (const YamlNode* node = file.find(key)) faults.add(node->place, wording::key_needs_segments(key));
    }
    return;
  }
  auto table = read_table(file, "segments_from", tower.file, source, form_in(tower));
  if (table && table->usable) {
    const std::vector<Segment> segments = read_rows(*table, groups, tower);
    if (table->faults.empty()) Drawing(*table, segments, parts.nodes, tower, faults).build(options);
  }
  if (table) faults.take(std::move(table->faults));
  if (faults.size() > before || !table) parts.nodes.leave_open();
}

}  // namespace swaymark
