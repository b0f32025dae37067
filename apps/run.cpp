#include "apps/run.hpp"

#include <algorithm>
#include <csignal>
#include <cstdio>
#include <cstdlib>
#include <exception>
#include <filesystem>
#include <new>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <unistd.h>

#include "apps/command_line.hpp"
#include "apps/exit_status.hpp"
#include "apps/output_file.hpp"
#include "apps/report_csv.hpp"
#include "apps/report_json.hpp"
#include "apps/report_mechanism.hpp"
#include "apps/report_scenarios.hpp"
#include "apps/report_text.hpp"
#include "apps/scenario_figures.hpp"
#include "core/tower_file.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kMostBytes = std::size_t{64} << 20U;

void to_standard_error(std::string_view text) { std::fwrite(text.data(), 1, text.size(), stderr); }

bool wants_colour(ColourChoice choice) {
  if (choice != ColourChoice::automatic) return choice == ColourChoice::always;
  const auto variable = [](const char* name) {
    const char* value = std::getenv(name);
    return std::string_view(value != nullptr ? value : "");
  };
  return isatty(STDOUT_FILENO) != 0 && variable("NO_COLOR").empty() && variable("TERM") != "dumb";
}

// A state that cannot be computed weighs more than a check that is not met.
int status_of(const Study& study) {
  const auto states = study.states();
  if (std::find(states.begin(), states.end(), nullptr) != states.end()) return kNotComputable;
  const bool all_met =
      std::all_of(states.begin(), states.end(), [](const Analysis* state) { return unmet(*state) == 0; });
  return all_met ? kAllMet : kNotMet;
}

// The files that a run reads. Results in the place of one of them would cost the engineer the input.
class Inputs {
 public:
  /// "-" is standard input as the tower file.
  std::string read_tower_file(const std::string& path) {
    files_.push_back(path == "-" ? "/dev/stdin" : path);
    return read_file(path, kMostBytes);
  }
  /// A file that the tower file names; "-" is a file of that name there, never standard input.
  std::string read_other_file(const std::string& path) {
    files_.push_back(path == "-" ? "./-" : path);
    return read_file(files_.back(), kMostBytes);
  }
  /// \throws FileError if the target is one of the files read.
  void require_apart(const std::string& target) const {
    std::error_code ignored;
    if (!std::filesystem::is_regular_file(target, ignored)) return;
    for (const std::string& file : files_) {
      if (std::filesystem::equivalent(target, file, ignored))
        throw FileError(
            fmt::format("{}: is an input of this run itself; name another file for the results", target));
    }
  }

 private:
  std::vector<std::string> files_;
};

void write_results(const Command& command, const Study& study, const Inputs& inputs) {
  OutputFiles files;
  const auto stage = [&](const std::string& target, std::string text) {
    inputs.require_apart(target);
    files.stage(target, std::move(text));
  };
  const auto states = study.states();
  const bool any_modes =
      std::any_of(states.begin(), states.end(), [](const auto* state) { return state != nullptr; });
  const bool json_to_output = command.json && *command.json == "-";
  const std::string json = command.json ? json_report(study, command.shapes) : std::string();
  if (command.json && !json_to_output) stage(*command.json, json);
  if (command.csv && any_modes) {
    files.stage_folder(*command.csv);
    for (NamedText& sheet : csv_report(study, command.shapes))
      stage(*command.csv + "/" + sheet.name, std::move(sheet.text));
  }
  files.commit();
  if (json_to_output) {
    write_standard_output(json);
  } else if (any_modes) {
    write_standard_output(text_report(study, {wants_colour(command.colour)}));
  }
}

int run_command(const Command& command) {
  Inputs inputs;
  const std::string name = command.tower == "-" ? "standard input" : command.tower;
  const std::string bytes = inputs.read_tower_file(command.tower);
  TowerFile file =
      read_tower_file(bytes, name, [&](const std::string& path) { return inputs.read_other_file(path); });
  const Study study = study_of(std::move(file), provenance_of(name, bytes), command.scope);
  if (study.stated.mechanisms.any()) to_standard_error(mechanism_text(study.stated));
  to_standard_error(scenario_failures(study));
  write_results(command, study, inputs);
  return status_of(study);
}

void report_faults(const InputError& error) {
  constexpr std::size_t most = 100;
  const auto& faults = error.faults();
  for (std::size_t i = 0; i < std::min(faults.size(), most); ++i)
    to_standard_error(to_string(faults[i]) + "\n");
  if (faults.size() > most)
    to_standard_error(
        fmt::format("... and {} more faults in {}\n", faults.size() - most, faults.front().file));
}

}  // namespace

int run(int argc, const char* const* argv) {
  // A reader that goes away is then a failed write like any other, and what was staged is removed again.
  static_cast<void>(std::signal(SIGPIPE, SIG_IGN));
  try {
    const Parsed parsed = parse_command_line(argc, argv);
    if (!parsed.error.empty()) to_standard_error(parsed.error + "\n");
    if (!parsed.output.empty()) write_standard_output(parsed.output);
    return parsed.command ? run_command(*parsed.command) : parsed.status;
  } catch (const InputError& error) {
    report_faults(error);
    return kRefused;
  } catch (const ComputationError& error) {
    to_standard_error(fmt::format("swaymark: {}\n", error.what()));
    return kNotComputable;
  } catch (const FileError& error) {
    to_standard_error(fmt::format("{}\n", error.what()));
    return kFileTrouble;
  } catch (const std::bad_alloc&) {
    to_standard_error("swaymark: out of memory; use a machine with more memory, or a smaller model\n");
    return kNotComputable;
  } catch (const std::exception& error) {
    to_standard_error(
        fmt::format("swaymark: an error of the program itself: {}; please report it with the tower file\n",
                    error.what()));
    return kOurFault;
  }
}

}  // namespace swaymark
