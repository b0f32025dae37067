#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace swaymark {

/// A tower file to begin with.
struct Starter {
  std::string kind;  ///< as on the command line: `tank-stand`
  std::string what;  ///< what it holds, in a few words
  std::string_view text;
};

/// All kinds, in the order they are listed.
[[nodiscard]] std::vector<Starter> starters();

/// The starter of a kind; nothing where there is none.
[[nodiscard]] std::optional<Starter> starter_of(std::string_view kind);

}  // namespace swaymark
