#include "core/tower_file_segments.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>
#include <unordered_map>

#include <fmt/format.h>

#include "core/drawing_bars.hpp"
#include "core/wording_tables.hpp"

namespace swaymark {

namespace {

using Eigen::Vector3d;

constexpr double kMergeWithin =
    1e-3;  // [m]: drawings are made to the millimetre (common practice, no source)
constexpr double kLeastWithin = 1e-6;  // [m]: nodes nearer than this are refused as one
constexpr double kSlack = 1e-6;        // of the tolerance: a distance of just 1 mm is within 1 mm

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

double distance_to_ends(const std::vector<Segment>& segments, const Vector3d& place) {
  double least = std::numeric_limits<double>::infinity();
  for (const Segment& segment : segments) {
    for (const Vector3d& end : segment.ends) least = std::min(least, (end - place).norm());
  }
  return least;
}

// A node written by hand beside a drawing is to name an end point; one that no bar joins was meant to.
void refuse_loose_nodes(const Drawing& drawing) {
  constexpr std::size_t most_told = 100;  // each costs a look at every end point
  const Tower& tower = drawing.tower;
  std::vector<bool> joined(tower.nodes.size(), false);
  for (const Bar& bar : tower.bars) joined[bar.from] = joined[bar.to] = true;
  std::unordered_map<std::size_t, std::string> passed;
  for (const SegmentCrossing& crossing : drawing.reading.crossings) {
    if (crossing.second.empty()) passed.emplace(*crossing.node, crossing.first);
  }
  std::size_t told = 0;
  for (std::size_t n = 0; n < drawing.stated && told < most_told; ++n) {
    if (joined[n]) continue;
    ++told;
    const Node& node = tower.nodes[n];
    const auto on = passed.find(n);
    drawing.faults.add(node.place, on != passed.end()
                                       ? wording::node_on_segment(node.name, on->second)
                                       : wording::node_off_segments(
                                             node.name, distance_to_ends(drawing.segments, node.position),
                                             drawing.reading.merge_within));
  }
}

void draw(TableFile& table, const std::vector<Segment>& segments, const SegmentReading& options,
          NameTable& names, Tower& tower, FaultList& faults) {
  Drawing drawing{table,
                  segments,
                  names,
                  tower,
                  faults,
                  tower.nodes.size(),
                  tower.bars.size(),
                  options.merge_within * (1.0 + kSlack),
                  options};
  drawing.reading.file = table.path();
  drawing.reading.segments = segments.size();
  const std::size_t before = faults.size();
  const std::vector<std::size_t> node_of = draw_nodes(drawing);
  if (!table.faults.empty() || faults.size() > before) return;
  draw_bars(drawing, node_of);
  if (table.faults.empty() && faults.size() == before) refuse_loose_nodes(drawing);
  tower.segments = std::move(drawing.reading);
}

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
    if (table->faults.empty()) draw(*table, segments, options, parts.nodes, tower, faults);
  }
  if (table) faults.take(std::move(table->faults));
  if (faults.size() > before || !table) parts.nodes.leave_open();
}

}  // namespace swaymark
