#include "apps/segment_notes.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "apps/figure.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kMostPlaces = 12;

std::string counted(std::size_t count, std::string_view one, std::string_view several) {
  return fmt::format("{} {}", count, count == 1 ? one : several);
}

std::string place_words(const Tower& tower, const Eigen::Vector3d& position) {
  std::string words;
  for (const Axis axis : tower.axes())
    words += fmt::format("{}{}", words.empty() ? "" : ", ", figure(position[index_of(axis)], 3));
  return fmt::format("({}) m", words);
}

// "diagonals-1 and diagonals-2 at (0.000, -1.000, 2.000) m, node c1"
std::string crossing_words(const Tower& tower, const SegmentCrossing& crossing) {
  std::string words = crossing.first;
  if (crossing.at_end) words = fmt::format("the end of {} on {}", crossing.first, crossing.second);
  if (!crossing.at_end && !crossing.second.empty()) words += " and " + crossing.second;
  words += " at " + place_words(tower, crossing.position);
  if (crossing.node) words += ", node " + tower.nodes[*crossing.node].name;
  return words;
}

std::string merged_note(const Tower& tower, const SegmentReading& reading) {
  std::string note = fmt::format(
      "{}: the ends of {} are {}; ends within merge_within ({:.4g} mm{}) of each other are one, where the "
      "first "
      "of them is drawn",
      reading.file, counted(reading.segments, "segment", "segments"), counted(reading.nodes, "node", "nodes"),
      1e3 * reading.merge_within, reading.merge_within_stated ? "" : ", the default");
  if (reading.named > 0)
    note += fmt::format(", or where a node was written there ({} of them)", reading.named);
  if (reading.moved == 0) return note + ". No end moved.";
  return note + fmt::format(". {} moved, by {:.3g} mm at most (node {}).",
                            counted(reading.moved, "end", "ends"), 1e3 * reading.largest_move,
                            tower.nodes[reading.largest_move_node].name);
}

std::string crossings_note(const Tower& tower, const SegmentReading& reading) {
  const auto& list = reading.crossings;
  // Diagonals that pass each other are common; an end that is drawn onto a bar is meant to be joined to it.
  const bool loose_end = !reading.split && std::any_of(list.begin(), list.end(),
                                                       [](const auto& c) { return c.node.has_value(); });
  const bool one = list.size() == 1;
  const std::string outcome =
      reading.split ? fmt::format("became {}, and the segments were split there", one ? "a node" : "nodes")
                    : fmt::format("{} not joined, as 'split_crossings: true' would do", one ? "is" : "are");
  std::string note = fmt::format("{}{}: {} of segments that share no node {}: ", loose_end ? "WARNING: " : "",
                                 reading.file, counted(list.size(), "crossing", "crossings"), outcome);
  for (std::size_t i = 0; i < std::min(list.size(), kMostPlaces); ++i)
    note += fmt::format("{}{}", i == 0 ? "" : "; ", crossing_words(tower, list[i]));
  if (list.size() > kMostPlaces) note += fmt::format("; and {} more", list.size() - kMostPlaces);
  return note + ".";
}

}  // namespace

std::vector<std::string> segment_notes(const Tower& tower) {
  if (!tower.segments) return {};
  std::vector<std::string> notes{merged_note(tower, *tower.segments)};
  if (!tower.segments->crossings.empty()) notes.push_back(crossings_note(tower, *tower.segments));
  return notes;
}

}  // namespace swaymark
