#pragma once

#include <optional>
#include <string>

#include "apps/analysis.hpp"

namespace swaymark {

enum class ColourChoice { automatic, always, never };

/// What the command line asks for.
struct Command {
  Scope scope = Scope::check;
  std::string tower;                ///< file name, or "-"
  std::optional<std::string> json;  ///< file name, or "-"
  std::optional<std::string> csv;   ///< folder
  bool shapes = false;
  ColourChoice colour = ColourChoice::automatic;
};

/// A command, or the text to print and the status to end with.
struct Parsed {
  std::optional<Command> command;
  std::string output;  ///< help or version, for standard output
  std::string error;   ///< one line, for standard error
  int status = 0;
};

[[nodiscard]] Parsed parse_command_line(int argc, const char* const* argv);

}  // namespace swaymark
