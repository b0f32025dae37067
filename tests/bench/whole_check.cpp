// Times the shipped program as a user runs it: `swaymark check` of one tower written in three kinds of units,
// and `swaymark --version` for what starting a process costs. The runs alternate, so that a busy moment of
// the machine touches all of them.
//
//   bench_whole_check [rounds]

#include <array>
#include <chrono>
#include <cstdio>
#include <cstdlib>
#include <stdexcept>
#include <string>
#include <vector>

#include <fcntl.h>
#include <fmt/format.h>
#include <spawn.h>
#include <sys/resource.h>
#include <sys/wait.h>

#include "tests/bench/bench_tower.hpp"
#include "tests/bench/samples.hpp"
#include "tests/support/files.hpp"

extern char** environ;

namespace swaymark::bench {

namespace {

// Aims for a machine of two cores, given with the job [ms].
constexpr double kAim = 30.0;
constexpr double kAimWithLibrary = 40.0;

struct Case {
  std::string name;
  std::vector<std::string> arguments;
  double aim = 0.0;  ///< [ms]; 0: none
  Samples wall;
  Samples processor;
};

double in_milliseconds(const timeval& time) {
  return 1e3 * static_cast<double>(time.tv_sec) + 1e-3 * static_cast<double>(time.tv_usec);
}

// Runs the program once with its output thrown away.
void run(Case& which) {
  std::vector<char*> arguments;
  for (std::string& argument : which.arguments) arguments.push_back(argument.data());
  arguments.push_back(nullptr);
  posix_spawn_file_actions_t actions;
  posix_spawn_file_actions_init(&actions);
  posix_spawn_file_actions_addopen(&actions, 1, "/dev/null", O_WRONLY, 0);
  const auto start = std::chrono::steady_clock::now();
  pid_t child = 0;
  const int trouble = posix_spawn(&child, arguments[0], &actions, nullptr, arguments.data(), environ);
  posix_spawn_file_actions_destroy(&actions);
  if (trouble != 0) throw std::runtime_error("cannot start " + which.arguments[0]);
  int status = 0;
  rusage used{};
  wait4(child, &status, 0, &used);
  const std::chrono::duration<double, std::milli> wall = std::chrono::steady_clock::now() - start;
  // 1: a check is not met, which is a result like any other.
  if (!WIFEXITED(status) || WEXITSTATUS(status) > 1)
    throw std::runtime_error(fmt::format("{} ended with status {}", which.name, WEXITSTATUS(status)));
  which.wall.add(wall.count());
  which.processor.add(in_milliseconds(used.ru_utime) + in_milliseconds(used.ru_stime));
}

std::vector<Case> cases(const test::ScratchFolder& folder) {
  std::vector<Case> list{{"--version", {SWAYMARK_PROGRAM, "--version"}, 0.0, {}, {}}};
  for (const Units units : {Units::bare, Units::common, Units::library}) {
    const std::string file = folder.write(fmt::format("tower{}.yaml", list.size()), tower_text(units));
    const double aim = units == Units::library ? kAimWithLibrary : kAim;
    list.push_back({name_of(units), {SWAYMARK_PROGRAM, "check", file}, aim, {}, {}});
  }
  return list;
}

void report(const std::vector<Case>& list, int rounds) {
  fmt::print("{} runs each, alternating [ms]\n", rounds);
  fmt::print("{:<16}{:>9}{:>9}{:>9}{:>11}{:>12}\n", "", "median", "least", "most", "x version", "processor");
  const double empty = list.front().wall.median();
  for (const Case& each : list) {
    const double median = each.wall.median();
    fmt::print("{:<16}{:>9.2f}{:>9.2f}{:>9.2f}{:>11.2f}{:>12.2f}", each.name, median, each.wall.least(),
               each.wall.most(), median / empty, each.processor.median());
    if (each.aim > 0.0) fmt::print("   under {:.0f} ms: {}", each.aim, median < each.aim ? "yes" : "no");
    fmt::print("\n");
  }
}

}  // namespace

}  // namespace swaymark::bench

int main(int argc, char** argv) {
  using namespace swaymark;
  try {
    const int rounds = argc > 1 ? std::stoi(argv[1]) : 50;
    const test::ScratchFolder folder;
    auto list = bench::cases(folder);
    for (auto& each : list) bench::run(each);  // fills the caches of the file system
    for (auto& each : list) each.wall = each.processor = {};
    for (int round = 0; round < rounds; ++round) {
      for (auto& each : list) bench::run(each);
    }
    bench::report(list, rounds);
    return EXIT_SUCCESS;
  } catch (const std::exception& error) {
    fmt::print(stderr, "{}\n", error.what());
    return EXIT_FAILURE;
  }
}
