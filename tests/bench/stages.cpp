// Times the stages of a check within one process, after a first turn that fills caches and opens the units
// library.
//
//   bench_stages [rounds]

#include <cstdio>
#include <cstdlib>
#include <ctime>
#include <functional>
#include <numbers>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "apps/analysis.hpp"
#include "apps/report_text.hpp"
#include "core/tower_file.hpp"
#include "modal/damping.hpp"
#include "spectrum/band.hpp"
#include "spectrum/seismic.hpp"
#include "tests/bench/bench_tower.hpp"
#include "tests/bench/samples.hpp"

namespace swaymark::bench {

namespace {

struct Stage {
  std::string name;
  std::function<void()> work;
  Samples times = {};
};

// What the analysis asks of the modes of the bench tower: 90 % in x and y, and all up to the band's reach.
ModeTarget target_of(const Tower& tower) {
  ModeTarget target;
  target.mass_share = tower.modes.mass_share;
  target.share_directions = {0, 1};
  target.omega_covered = 2.0 * std::numbers::pi * band_reach(tower.bands.front());
  return target;
}

double processor_time() {
  timespec now{};
  clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &now);
  return 1e3 * static_cast<double>(now.tv_sec) + 1e-6 * static_cast<double>(now.tv_nsec);
}

void measure(std::vector<Stage>& stages, int rounds) {
  for (int round = -1; round < rounds; ++round) {
    for (Stage& stage : stages) {
      const double start = processor_time();
      stage.work();
      const double time = processor_time() - start;
      if (round >= 0) stage.times.add(time);
    }
  }
}

void report(const std::vector<Stage>& stages, int rounds) {
  fmt::print("{} rounds of processor time [ms]\n{:<32}{:>9}{:>9}{:>9}\n", rounds, "", "median", "least",
             "most");
  for (const Stage& stage : stages) {
    fmt::print("{:<32}{:>9.3f}{:>9.3f}{:>9.3f}\n", stage.name, stage.times.median(), stage.times.least(),
               stage.times.most());
  }
}

void run(int rounds) {
  std::vector<Stage> stages;
  for (const Units units : {Units::bare, Units::common, Units::library}) {
    stages.push_back({fmt::format("read_tower, {}", name_of(units)),
                      [text = tower_text(units)] { (void)read_tower(text, "bench.yaml"); }});
  }
  const Tower tower = read_tower(tower_text(Units::bare), "bench.yaml");
  const Assembly assembly = assemble(tower);
  const Eigen::MatrixXd drive = inertia_vectors(assembly);
  const Eigenproblem problem(assembly.stiffness, assembly.mass);
  const auto modes = [&] {
    return find_modes(problem, assembly.stiffness, assembly.mass, drive, target_of(tower));
  };
  const ModeSet set = modes();
  const Eigen::VectorXd damping = modal_damping(tower.damping, set.modes.count());
  const Analysis analysis = analyse(tower, {}, Scope::check);
  stages.push_back({"assemble", [&] { (void)assemble(tower); }});
  stages.push_back({"find_mechanisms", [&] { (void)find_mechanisms(tower, assembly); }});
  stages.push_back({"factorise", [&] { (void)Eigenproblem(assembly.stiffness, assembly.mass); }});
  stages.push_back({"find_modes", [&] { (void)modes(); }});
  const Index count = set.modes.count();
  stages.push_back({"  as many modes, dense", [&] { (void)problem.lowest(count, EigenMethod::dense); }});
  stages.push_back(
      {"  as many modes, shift-invert", [&] { (void)problem.lowest(count, EigenMethod::shift_invert); }});
  stages.push_back(
      {"seismic_analysis", [&] { (void)seismic_analysis(tower, assembly, problem, set, damping); }});
  stages.push_back({"analyse, all of these and notes", [&] { (void)analyse(tower, {}, Scope::check); }});
  stages.push_back({"text_report", [&] { (void)text_report(analysis, {}); }});
  fmt::print("{} bars, {} free degrees of freedom, {} modes kept\n", tower.bars.size(),
             assembly.dofs.free_count(), set.modes.count());
  measure(stages, rounds);
  report(stages, rounds);
}

}  // namespace

}  // namespace swaymark::bench

int main(int argc, char** argv) {
  try {
    swaymark::bench::run(argc > 1 ? std::stoi(argv[1]) : 50);
    return EXIT_SUCCESS;
  } catch (const std::exception& error) {
    fmt::print(stderr, "{}\n", error.what());
    return EXIT_FAILURE;
  }
}
