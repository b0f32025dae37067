#include "apps/command_line.hpp"

#include <algorithm>
#include <vector>

#include <CLI/CLI.hpp>
#include <fmt/format.h>

#include "apps/exit_status.hpp"
#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr const char* kHelp = R"(Usage: swaymark check TOWER.yaml [options]
       swaymark modes TOWER.yaml [options]

Modal analysis and response-spectrum checks of truss towers.

  swaymark check tower.yaml                       the whole report
  swaymark check tower.yaml --json results.json   and the figures for other programs
  swaymark modes tower.yaml --csv out --shapes    frequencies, and shapes as tables

Commands
  check TOWER.yaml   all that the tower file asks for: modes, excitation bands, seismic response
  modes TOWER.yaml   frequencies, participation and effective mass only
  help [COMMAND]     this text

Options
  --json FILE        write the results as JSON; '-' is standard output, in place of the report
  --csv FOLDER       write the results as CSV files into the folder
  --shapes           add the mode shapes to JSON and CSV
  --color WHEN       auto (default), always or never; NO_COLOR is honoured
  --no-color         as --color never
  -h, --help         this text
  --version          the program's version

TOWER.yaml may be '-' for standard input.

Exit status
  0  all checks are met               4  the computation cannot be done
  1  a check is not met               5  a file cannot be read or written
  2  the command line is wrong       70  an error of the program itself
  3  the tower file is refused
)";

Parsed usage_error(const std::string& what) {
  return {std::nullopt, "", fmt::format("swaymark: {}; 'swaymark --help' shows the commands", what), kUsage};
}

Parsed help() { return {std::nullopt, kHelp, "", kAllMet}; }

std::optional<Parsed> known_later(const std::string& command) {
  if (command != "compare" && command != "new") return std::nullopt;
  return usage_error(fmt::format("the command '{}' is not yet supported", command));
}

void add_options(CLI::App& app, Command& command, std::string& colour, bool& no_colour) {
  app.set_help_flag();  // one help text for all: see kHelp
  app.add_option("tower", command.tower)->required();
  app.add_option("--json", command.json);
  app.add_option("--csv", command.csv);
  app.add_flag("--shapes", command.shapes);
  app.add_option("--color", colour);
  app.add_flag("--no-color", no_colour);
}

// CLI11 says what is wrong; where an option is unknown, the nearest one is named as well.
std::string reason_of(const CLI::ParseError& error, const std::vector<std::string>& arguments) {
  static const std::vector<std::string> options{"--json",     "--csv",  "--shapes", "--color",
                                                "--no-color", "--help", "--version"};
  if (error.get_name() == "ExtrasError") {
    for (const std::string& argument : arguments) {
      if (!argument.starts_with('-') || argument.size() < 2) continue;
      const std::string name = argument.substr(0, argument.find('='));
      if (std::find(options.begin(), options.end(), name) != options.end()) continue;
      const auto close = nearest(name, options);
      return close ? fmt::format("unknown option '{}', did you mean '{}'?", name, *close)
                   : fmt::format("unknown option '{}'", name);
    }
    return "more than one tower file is named";
  }
  if (error.get_name() == "RequiredError") return "no tower file is named";
  if (error.get_name() == "ArgumentMismatch")
    return fmt::format("an option lacks its value ({})", error.what());
  return error.what();
}

Parsed parse_arguments(Command command, std::vector<std::string> arguments) {
  CLI::App app;
  std::string colour = "auto";
  bool no_colour = false;
  add_options(app, command, colour, no_colour);
  std::vector<std::string> reversed(arguments.rbegin(), arguments.rend());
  try {
    app.parse(reversed);
  } catch (const CLI::ParseError& error) {
    return usage_error(reason_of(error, arguments));
  }
  if (colour == "always") command.colour = ColourChoice::always;
  if (colour == "never" || no_colour) command.colour = ColourChoice::never;
  if (colour != "auto" && colour != "always" && colour != "never")
    return usage_error("--color is auto, always or never");
  if (command.csv && *command.csv == "-") return usage_error("--csv wants a folder, which '-' is not");
  if ((command.csv && command.csv->empty()) || (command.json && command.json->empty()))
    return usage_error("a file name is empty");
  if (command.shapes && !command.csv && !command.json)
    return usage_error("--shapes goes with --json or --csv");
  return {command, "", "", kAllMet};
}

}  // namespace

Parsed parse_command_line(int argc, const char* const* argv) {
  std::vector<std::string> arguments(argv + std::min(argc, 1), argv + argc);
  if (arguments.empty()) return help();
  const auto options_end = std::find(arguments.begin(), arguments.end(), "--");
  const auto given = [&](const char* word) {
    return std::find(arguments.begin(), options_end, word) != options_end;
  };
  if (given("--help") || given("-h") || arguments.front() == "help") return help();
  if (given("--version")) return {std::nullopt, "swaymark " + program_version() + "\n", "", kAllMet};
  Command command;
  const std::string word = arguments.front();
  if (word == "modes") {
    command.scope = Scope::modes;
  } else if (word != "check") {
    if (auto later = known_later(word)) return *later;
    const auto close = nearest(word, {"check", "modes", "help"});
    return usage_error(fmt::format("unknown command '{}'{}", excerpt(word),
                                   close ? fmt::format(", did you mean '{}'?", *close) : ""));
  }
  return parse_arguments(command, {arguments.begin() + 1, arguments.end()});
}

}  // namespace swaymark
