// Whatever a table holds, reading it as nodes, bars, segments, points and sections ends with a tower or with
// faults that can be shown.
#include <array>
#include <cstdlib>
#include <iostream>
#include <numeric>
#include <string>

#include "core/tower_file.hpp"
#include "tests/fuzz/fuzz_main.hpp"

namespace {

constexpr std::string_view kHead =
    "swaymark: 1\nmaterials: {steel: {E: 1, density: 1}}\nsections: {bar: {area: 1}}\n"
    "members: [{group: g, section: bar, material: steel}]\n";

constexpr std::array<std::string_view, 7> kUses{
    "nodes: {a: [0, 0, 0]}\nnodes_from: t\n",
    "nodes: {a: [0, 0, 0], b: [2, 0, 0], c: [1, 0, 1]}\nbars_from: t\n",
    "segments_from: t\n",
    "segments_from: t\nsplit_crossings: true\nmerge_within: 0.3 m\n",
    "dimensions: 2\nnodes: {a: [0, 0], b: [2, 0]}\nsegments_from: t\nsplit_crossings: true\n",
    "nodes: {a: [0, 0, 0]}\nspectra: {s: {points_from: t}}\n",
    "nodes: {a: [0, 0, 0]}\nsections_from: t\n",
};

void read_with(std::string_view use, std::string_view table) {
  try {
    const swaymark::Tower tower =
        swaymark::read_tower(std::string(kHead) + std::string(use), "fuzz.yaml",
                             [&](const std::string& /*path*/) { return std::string(table); });
    for (const swaymark::Bar& bar : tower.bars) {
      if (bar.from >= tower.nodes.size() || bar.to >= tower.nodes.size() || bar.from == bar.to) std::abort();
    }
  } catch (const swaymark::InputError& error) {
    if (error.faults().empty()) std::abort();
    for (const swaymark::Fault& fault : error.faults()) {
      if (fault.message.what.empty() || fault.message.cure.empty()) std::abort();
    }
  } catch (const std::exception& error) {
    std::cerr << "not an input error: " << error.what() << "\nfor the table\n" << table << '\n';
    std::abort();
  }
}

}  // namespace

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
  const std::string_view table(reinterpret_cast<const char*>(data), size);
  // Every use of every table would take long: the uses that its columns fit, and one that its bytes choose.
  const bool segments = table.find("x1") != std::string_view::npos;
  const bool bars = table.find("from") != std::string_view::npos;
  if (segments) read_with(kUses[3], table);
  if (bars) read_with(kUses[1], table);
  const auto sum = std::accumulate(data, data + size, std::size_t{0});
  read_with(kUses[sum % kUses.size()], table);
  return 0;
}
