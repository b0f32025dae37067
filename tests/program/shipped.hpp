#pragma once

#include <cstdlib>
#include <filesystem>
#include <stdexcept>
#include <string>

#include <catch2/catch.hpp>
#include <sys/wait.h>

#include "tests/support/files.hpp"

/// The program as shipped, run as a process of its own through the shell, so that a test can say where its
/// streams go.
namespace swaymark::test {

inline std::filesystem::path source_folder() { return SWAYMARK_SOURCE; }

struct Outcome {
  int status = 0;  ///< as a shell counts: 128 + the number of the signal that ended it
  std::string output;
  std::string error;
};

/// A word as the shell takes it whole.
inline std::string quoted(const std::string& word) {
  std::string result = "'";
  for (const char c : word) result += c == '\'' ? std::string("'\\''") : std::string(1, c);
  return result + "'";
}

/// Runs a command line of the shell in which $SWAYMARK is the program, in the source folder, in UTC, and
/// without what the environment might say of colours, dates and languages.
inline Outcome shell(const std::string& command) {
  const ScratchFolder folder;
  const std::string output = (folder.path() / "output").string();
  const std::string error = (folder.path() / "error").string();
  const std::string script = folder.write(
      "script.sh", "unset NO_COLOR SOURCE_DATE_EPOCH LC_ALL LANG\nexport TERM=xterm TZ=UTC SWAYMARK=" +
                       quoted(SWAYMARK_PROGRAM) + "\ncd " + quoted(source_folder().string()) + "\n" +
                       command + "\n");
  const int ended = std::system(
      ("sh " + quoted(script) + " >" + quoted(output) + " 2>" + quoted(error) + " </dev/null").c_str());
  if (!WIFEXITED(ended)) throw std::runtime_error("the shell was ended by a signal");
  return {WEXITSTATUS(ended), bytes_of(output), bytes_of(error)};
}

/// Runs the program with these arguments, as the shell reads them.
inline Outcome swaymark(const std::string& arguments) { return shell("\"$SWAYMARK\" " + arguments); }

/// Two weightless bars that carry 150 t, of one repeated mode at 5 Hz; nothing to fail.
inline const std::string kSoundTower =
    "swaymark: 1\n"
    "dimensions: 2\n"
    "materials: {steel: {E: 210 GPa, density: 0}}\n"
    "sections: {bar: {area: 10 cm2}}\n"
    "nodes: {a: [0, 0], b: [2, 0], c: [1, 1]}\n"
    "members: [{group: g, section: bar, material: steel, bars: [[a, c], [b, c]]}]\n"
    "supports: [{nodes: [a, b], fixed: [x, z]}]\n"
    "masses: [{nodes: [c], mass: 150000 kg}]\n";

/// The same with one text put in the place of another that it holds.
inline std::string sound_tower_with(const std::string& before, const std::string& after) {
  std::string text = kSoundTower;
  const std::size_t at = text.find(before);
  REQUIRE(at != std::string::npos);
  return text.replace(at, before.size(), after);
}

}  // namespace swaymark::test
