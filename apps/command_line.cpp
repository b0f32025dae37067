#include "apps/command_line.hpp"

#include <algorithm>
#include <vector>

#include <CLI/CLI.hpp>
#include <fmt/format.h>

#include "apps/exit_status.hpp"
#include "apps/starter.hpp"
#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr const char* kHelp = R"(Usage: swaymark check TOWER.yaml [options]
       swaymark modes TOWER.yaml [options]
       swaymark new KIND

Modal analysis and response-spectrum checks of truss towers.

  swaymark check tower.yaml                       the whole report
  swaymark check tower.yaml --json results.json   and the figures for other programs
  swaymark modes tower.yaml --csv out --shapes    frequencies, and shapes as tables
  swaymark new tank-stand > tower.yaml            a commented tower file to begin with

Commands
  check TOWER.yaml   all that the tower file asks for: modes, excitation bands, seismic response
  modes TOWER.yaml   frequencies, participation and effective mass only
  new KIND           a commented tower file to begin with, on standard output; kinds:
@KINDS@
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

Parsed help() {
  std::string kinds;
  for (const Starter& starter : starters())
    kinds += fmt::format("{}                       {:<18}  {}", kinds.empty() ? "" : "\n", starter.kind,
                         starter.what);
  std::string text = kHelp;
  const std::string mark = "@KINDS@";
  return {std::nullopt, text.replace(text.find(mark), mark.size(), kinds), "", kAllMet};
}

std::vector<std::string> kinds_of_starters() {
  std::vector<std::string> kinds;
  for (const Starter& starter : starters()) kinds.push_back(starter.kind);
  return kinds;
}

// swaymark new KIND: a text to print, as help is.
Parsed parse_new(const std::vector<std::string>& arguments) {
  const auto kinds = kinds_of_starters();
  const std::string known = fmt::format("the kinds are {}", fmt::join(kinds, ", "));
  if (arguments.empty()) return usage_error("'new' wants a kind of tower: " + known);
  if (arguments.size() > 1) return usage_error("'new' takes one kind of tower and nothing else");
  const std::string& kind = arguments.front();
  if (const auto starter = starter_of(kind)) return {std::nullopt, std::string(starter->text), "", kAllMet};
  if (kind.starts_with('-')) return usage_error(fmt::format("'new' has no option '{}'", excerpt(kind)));
  const auto close = nearest(kind, kinds);
  return usage_error(fmt::format("unknown kind of tower '{}'{}", excerpt(kind),
                                 close ? fmt::format(", did you mean '{}'?", *close) : "; " + known));
}

std::optional<Parsed> known_later(const std::string& command) {
  if (command != "compare") return std::nullopt;
  return usage_error(fmt::format("the command '{}' is not yet supported", command));
}

std::vector<std::string> options() {
  return {"--json", "--csv", "--shapes", "--color", "--no-color", "--help", "--version"};
}

bool is(const CLI::ParseError& error, CLI::ExitCodes kind) {
  return error.get_exit_code() == static_cast<int>(kind);
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

// The first argument that looks like an option and is none.
std::string about_extras(const std::vector<std::string>& arguments) {
  const auto known = options();
  const auto options_end = std::find(arguments.begin(), arguments.end(), "--");
  for (auto argument = arguments.begin(); argument != options_end; ++argument) {
    if (!argument->starts_with('-') || argument->size() < 2) continue;
    const std::string name = argument->substr(0, argument->find('='));
    if (std::find(known.begin(), known.end(), name) != known.end()) continue;
    if (name == "--html") return "the option '--html' is not yet supported";
    const auto close = nearest(name, known);
    return fmt::format("unknown option '{}'{}", excerpt(name),
                       close ? fmt::format(", did you mean '{}'?", *close) : "");
  }
  return "more than one tower file is named";
}

bool given_twice(const std::string& option, const std::vector<std::string>& arguments) {
  return std::count_if(arguments.begin(), arguments.end(), [&](const std::string& argument) {
           return argument.substr(0, argument.find('=')) == option;
         }) > 1;
}

// CLI11 takes "--csv" for the value of a "--json" that lacks its own.
std::optional<std::string> option_without_value(const std::vector<std::string>& arguments) {
  const std::vector<std::string> with_value{"--json", "--csv", "--color"};
  for (std::size_t i = 0; i + 1 < arguments.size() && arguments[i] != "--"; ++i) {
    if (std::find(with_value.begin(), with_value.end(), arguments[i]) == with_value.end()) continue;
    if (arguments[i + 1].starts_with('-') && arguments[i + 1] != "-") return arguments[i];
  }
  return std::nullopt;
}

// What is wrong, in the words of the house for the commonest slips and in those of CLI11 for others.
std::string reason_of(const CLI::ParseError& error, const std::vector<std::string>& arguments) {
  std::string what = error.what();
  if (is(error, CLI::ExitCodes::ExtrasError)) return about_extras(arguments);
  if (is(error, CLI::ExitCodes::RequiredError)) return "no tower file is named";
  if (is(error, CLI::ExitCodes::ArgumentMismatch)) {
    const std::string option = what.substr(0, what.find(':'));
    return fmt::format("the option '{}' {}", option,
                       given_twice(option, arguments) ? "is given twice" : "lacks its value");
  }
  return what;
}

// Why the values of the options cannot be followed; empty where they can.
std::string reason_against(const Command& command) {
  if ((command.csv && command.csv->empty()) || (command.json && command.json->empty()))
    return "a file name is empty";
  if (command.csv && *command.csv == "-") return "--csv wants a folder, which '-' is not";
  if (command.shapes && !command.csv && !command.json) return "--shapes goes with --json or --csv";
  return {};
}

Parsed parse_arguments(Command command, std::vector<std::string> arguments) {
  if (const auto option = option_without_value(arguments))
    return usage_error(fmt::format("the option '{}' lacks its value", *option));
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
  const std::string reason = reason_against(command);
  if (!reason.empty()) return usage_error(reason);
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
  if (word == "new") return parse_new({arguments.begin() + 1, arguments.end()});
  if (word == "modes") {
    command.scope = Scope::modes;
  } else if (word != "check") {
    if (auto later = known_later(word)) return *later;
    if (word.starts_with('-'))
      return usage_error(fmt::format("no command stands before '{}'", excerpt(word)));
    const auto close = nearest(word, {"check", "modes", "new", "help"});
    return usage_error(fmt::format("unknown command '{}'{}", excerpt(word),
                                   close ? fmt::format(", did you mean '{}'?", *close) : ""));
  }
  return parse_arguments(command, {arguments.begin() + 1, arguments.end()});
}

}  // namespace swaymark
