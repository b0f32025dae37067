#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"

namespace swaymark {

/// One value of a YAML document with the place it stands at.
struct YamlNode {
  enum class Kind { null, scalar, sequence, map };

  Kind kind = Kind::null;
  Place place;
  std::string text;             ///< of a scalar
  std::vector<YamlNode> items;  ///< of a sequence; of a map: key, value, key, value ...

  /// "a map", "a list", "nothing", or the scalar itself in quotes; for messages.
  [[nodiscard]] std::string description() const;
};

/// Limits that keep a hostile file from costing time or memory; far above any tower.
struct YamlLimits {
  std::size_t bytes = std::size_t{64} << 20U;
  std::size_t nodes = 3'000'000;  ///< values written out
  std::size_t aliased = 100'000;  ///< values that all aliases together stand for
  std::size_t depth = 24;
  std::size_t open_brackets =
      10'000;  ///< unclosed at one place, looked at before the parser reads that far ahead
};

/// Parses one YAML document.
///
/// Anchors and aliases are honoured within the limits. Keys written twice, or that are no words, are added to
/// `faults`, so that the reader can go on and report its own beside them.
/// \throws InputError for what ends the reading at once: no YAML, several documents, tags, invalid UTF-8,
/// control characters, a limit exceeded. It names `file`.
[[nodiscard]] YamlNode parse_yaml(std::string_view text, const std::string& file, FaultList& faults,
                                  const YamlLimits& limits = {});

}  // namespace swaymark
