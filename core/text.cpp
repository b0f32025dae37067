#include "core/text.hpp"

#include <algorithm>
#include <cctype>
#include <numeric>

namespace swaymark {

namespace {

std::string folded(std::string_view word) {
  std::string result(word);
  for (char& c : result) c = static_cast<char>(std::tolower(static_cast<unsigned char>(c)));
  return result;
}

// Edits, swaps of neighbours included, between two short words.
std::size_t edit_distance(std::string_view a, std::string_view b) {
  std::vector<std::size_t> before(b.size() + 1);
  std::vector<std::size_t> last(b.size() + 1);
  std::vector<std::size_t> row(b.size() + 1);
  std::iota(last.begin(), last.end(), std::size_t{0});
  for (std::size_t i = 1; i <= a.size(); ++i) {
    row[0] = i;
    for (std::size_t j = 1; j <= b.size(); ++j) {
      const std::size_t replace = last[j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
      row[j] = std::min({last[j] + 1, row[j - 1] + 1, replace});
      const bool swapped = i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1];
      if (swapped) row[j] = std::min(row[j], before[j - 2] + 1);
    }
    before.swap(last);
    last.swap(row);
  }
  return last[b.size()];
}

// Length of the valid UTF-8 sequence that starts at `at`, or 0 (RFC 3629: no overlong forms, no surrogates).
std::size_t sequence_length(std::string_view text, std::size_t at) {
  const auto byte = [&](std::size_t i) { return static_cast<unsigned char>(i < text.size() ? text[i] : 0); };
  const auto tail = [&](std::size_t i) { return (byte(i) & 0xC0U) == 0x80U; };
  const unsigned char lead = byte(at);
  if (lead < 0x80)
    return (lead >= 0x20 && lead != 0x7F) || lead == '\t' || lead == '\n' || lead == '\r' ? 1 : 0;
  if (lead >= 0xC2 && lead <= 0xDF) return tail(at + 1) ? 2 : 0;
  if (lead >= 0xE0 && lead <= 0xEF) {
    const unsigned char second = byte(at + 1);
    if ((lead == 0xE0 && second < 0xA0) || (lead == 0xED && second > 0x9F)) return 0;
    return tail(at + 1) && tail(at + 2) ? 3 : 0;
  }
  if (lead >= 0xF0 && lead <= 0xF4) {
    const unsigned char second = byte(at + 1);
    if ((lead == 0xF0 && second < 0x90) || (lead == 0xF4 && second > 0x8F)) return 0;
    return tail(at + 1) && tail(at + 2) && tail(at + 3) ? 4 : 0;
  }
  return 0;
}

}  // namespace

std::optional<std::string> nearest(std::string_view word, const std::vector<std::string>& candidates) {
  constexpr std::size_t longest_compared = 64;  // keeps a hostile word from costing time
  if (word.empty() || word.size() > longest_compared) return std::nullopt;
  const std::string wanted = folded(word);
  std::optional<std::string> best;
  std::size_t best_distance = 0;
  for (const std::string& candidate : candidates) {
    if (candidate.size() > longest_compared) continue;
    const std::size_t distance = edit_distance(wanted, folded(candidate));
    const std::size_t allowed = std::max<std::size_t>(1, std::max(word.size(), candidate.size()) / 3);
    if (distance > allowed || distance >= std::max(word.size(), candidate.size())) continue;
    if (!best || distance < best_distance) {
      best = candidate;
      best_distance = distance;
    }
  }
  return best;
}

std::optional<Place> first_invalid_character(std::string_view text) {
  Place place{1, 1};
  for (std::size_t at = 0; at < text.size();) {
    const std::size_t length = sequence_length(text, at);
    if (length == 0) return place;
    if (text[at] == '\n') {
      ++place.line;
      place.column = 1;
    } else {
      ++place.column;
    }
    at += length;
  }
  return std::nullopt;
}

std::string excerpt(std::string_view text, std::size_t limit) {
  std::string result;
  std::size_t characters = 0;
  for (std::size_t at = 0; at < text.size(); ++characters) {
    if (characters == limit) return result + "...";
    const std::size_t length = sequence_length(text, at);
    const bool printable = length > 0 && (length > 1 || static_cast<unsigned char>(text[at]) >= 0x20);
    result += printable ? text.substr(at, length) : std::string_view("?");
    at += std::max<std::size_t>(length, 1);
  }
  return result;
}

std::string alternatives(const std::vector<std::string>& words) {
  std::string result;
  for (std::size_t i = 0; i < words.size(); ++i) {
    if (i > 0) result += i + 1 == words.size() ? " or " : ", ";
    result += words[i];
  }
  return result;
}

}  // namespace swaymark
