#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "core/error.hpp"

namespace swaymark {

/// The candidate nearest to `word` (optimal string alignment distance, case folded), if one is near enough to
/// be a slip of the pen: at most a third of its letters, and at least one letter kept.
[[nodiscard]] std::optional<std::string> nearest(std::string_view word,
                                                 const std::vector<std::string>& candidates);

/// The place of the first byte that is not valid UTF-8 text: malformed sequences (RFC 3629) and control
/// characters other than tab, line feed and carriage return.
[[nodiscard]] std::optional<Place> first_invalid_character(std::string_view text);

/// `text` on one line and at most `limit` characters long, control characters replaced: fit for a message.
[[nodiscard]] std::string excerpt(std::string_view text, std::size_t limit = 40);

/// "a", "a or b", "a, b or c"
[[nodiscard]] std::string alternatives(const std::vector<std::string>& words);

}  // namespace swaymark
