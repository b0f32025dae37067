// Times reading a tower of some 300 000 bars, written in several ways.
//
//   bench_reading [rounds [folder]]
//
// With a folder, the files are written there as well, to be run by hand.

#include <chrono>
#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <fstream>

#include <fmt/format.h>
#include <sys/resource.h>

#include "core/tower_file.hpp"
#include "tests/bench/large_tower.hpp"
#include "tests/bench/samples.hpp"

namespace swaymark::bench {

namespace {

constexpr int kCells = 30;
constexpr int kLevels = 55;

void write(const std::filesystem::path& folder, const WrittenTower& tower) {
  std::filesystem::create_directories(folder);
  std::ofstream(folder / "tower.yaml") << tower.yaml;
  std::ofstream(folder / "nodes.csv") << tower.nodes;
  std::ofstream(folder / "bars.csv") << tower.bars;
  std::ofstream(folder / "segments.csv") << tower.segments;
}

double memory_in_megabytes() {
  rusage used{};
  getrusage(RUSAGE_SELF, &used);
  return static_cast<double>(used.ru_maxrss) / 1024.0;
}

void run(int rounds, const std::string& folder) {
  fmt::print("{:<32}{:>9}{:>9}{:>9}{:>9}{:>9}{:>11}\n", "[s]", "bars", "nodes", "median", "least", "most",
             "peak [MB]");
  for (const Written how :
       {Written::tables, Written::segments, Written::crossing_segments, Written::nodes_and_bars}) {
    const WrittenTower written = large_tower(how, kCells, kLevels);
    if (!folder.empty())
      write(std::filesystem::path(folder) / std::to_string(static_cast<int>(how)), written);
    Samples times;
    std::size_t bars = 0;
    std::size_t nodes = 0;
    for (int round = 0; round < rounds; ++round) {
      const auto start = std::chrono::steady_clock::now();
      const Tower tower = read_tower(written.yaml, "tower.yaml", written.source());
      const std::chrono::duration<double> time = std::chrono::steady_clock::now() - start;
      times.add(time.count());
      bars = tower.bars.size();
      nodes = tower.nodes.size();
    }
    fmt::print("{:<32}{:>9}{:>9}{:>9.2f}{:>9.2f}{:>9.2f}{:>11.0f}\n", name_of(how), bars, nodes,
               times.median(), times.least(), times.most(), memory_in_megabytes());
  }
}

}  // namespace

}  // namespace swaymark::bench

int main(int argc, char** argv) {
  try {
    swaymark::bench::run(argc > 1 ? std::stoi(argv[1]) : 5, argc > 2 ? argv[2] : "");
    return EXIT_SUCCESS;
  } catch (const std::exception& error) {
    fmt::print(stderr, "{}\n", error.what());
    return EXIT_FAILURE;
  }
}
