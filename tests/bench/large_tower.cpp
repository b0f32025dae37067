#include "tests/bench/large_tower.hpp"

#include <array>
#include <stdexcept>
#include <vector>

#include <fmt/format.h>

namespace swaymark::bench {

namespace {

constexpr double kWidth = 1.5;  // of a cube [m]

using Joint = std::array<int, 3>;
struct Pair {
  Joint from;
  Joint to;
};

std::vector<Pair> pairs_of(int cells, int levels, bool crossed) {
  std::vector<Pair> pairs;
  for (int z = 0; z <= levels; ++z) {
    for (int y = 0; y <= cells; ++y) {
      for (int x = 0; x <= cells; ++x) {
        const bool right = x < cells;
        const bool behind = y < cells;
        const bool above = z < levels;
        if (right) pairs.push_back({{x, y, z}, {x + 1, y, z}});
        if (behind) pairs.push_back({{x, y, z}, {x, y + 1, z}});
        if (above) pairs.push_back({{x, y, z}, {x, y, z + 1}});
        if (right && above) pairs.push_back({{x, y, z}, {x + 1, y, z + 1}});
        if (right && above && crossed) pairs.push_back({{x + 1, y, z}, {x, y, z + 1}});
        if (behind && above) pairs.push_back({{x, y, z}, {x, y + 1, z + 1}});
        if (right && behind && z > 0) pairs.push_back({{x, y, z}, {x + 1, y + 1, z}});
      }
    }
  }
  return pairs;
}

std::string name(const Joint& joint) { return fmt::format("{}.{}.{}", joint[0], joint[1], joint[2]); }

std::string place(const Joint& joint, double off) {
  return fmt::format("{:.4f},{:.4f},{:.4f}", kWidth * joint[0] + off, kWidth * joint[1], kWidth * joint[2]);
}

std::string head(Written how) {
  std::string text =
      "swaymark: 1\ntitle: Large tower\nmaterials: {steel: {E: 210 GPa, density: 7850 kg/m3}}\n"
      "sections: {bar: {area: 10 cm2}}\n";
  if (how == Written::tables) text += "nodes_from: nodes.csv\nbars_from: bars.csv\n";
  if (how == Written::segments) text += "segments_from: segments.csv\n";
  if (how == Written::crossing_segments)
    text += "segments_from: segments.csv\nmerge_within: 2 mm\nsplit_crossings: true\n";
  return text;
}

}  // namespace

const char* name_of(Written how) {
  switch (how) {
    case Written::nodes_and_bars:
      return "nodes and bars in YAML";
    case Written::tables:
      return "nodes_from, bars_from";
    case Written::segments:
      return "segments_from";
    case Written::crossing_segments:
      return "segments_from, crossings split";
  }
  return "";
}

FileSource WrittenTower::source() const {
  return [this](const std::string& path) -> std::string {
    if (path == "nodes.csv") return nodes;
    if (path == "bars.csv") return bars;
    if (path == "segments.csv") return segments;
    throw std::runtime_error("no file " + path);
  };
}

WrittenTower large_tower(Written how, int cells, int levels) {
  WrittenTower tower{head(how), "node,x [m],y [m],z [m]\n", "bar,from,to,group\n",
                     "x1 [m],y1 [m],z1 [m],x2 [m],y2 [m],z2 [m],group\n"};
  const bool in_yaml = how == Written::nodes_and_bars;
  if (in_yaml) tower.yaml += "nodes:\n";
  for (int z = 0; z <= levels; ++z) {
    for (int y = 0; y <= cells; ++y) {
      for (int x = 0; x <= cells; ++x) {
        const Joint joint{x, y, z};
        tower.nodes += fmt::format("{},{}\n", name(joint), place(joint, 0.0));
        if (in_yaml) tower.yaml += fmt::format("  {}: [{}]\n", name(joint), place(joint, 0.0));
      }
    }
  }
  tower.yaml += "members:\n  - group: g\n    section: bar\n    material: steel\n";
  if (in_yaml) tower.yaml += "    bars:\n";
  int number = 0;
  for (const Pair& pair : pairs_of(cells, levels, how == Written::crossing_segments)) {
    ++number;
    tower.bars += fmt::format("b{},{},{},g\n", number, name(pair.from), name(pair.to));
    tower.segments +=
        fmt::format("{},{},g\n", place(pair.from, 1e-4 * (number % 4)), place(pair.to, 1e-4 * (number % 7)));
    if (in_yaml) tower.yaml += fmt::format("      - [{}, {}]\n", name(pair.from), name(pair.to));
  }
  return tower;
}

}  // namespace swaymark::bench
