#include "core/text.hpp"

#include <algorithm>
#include <array>
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

// Valid UTF-8 by its first byte: how many bytes, and the range of the second one (RFC 3629: no overlong
// forms, no surrogates).
struct Lead {
  unsigned char first;
  unsigned char last;
  std::size_t length;
  unsigned char second_first;
  unsigned char second_last;
};
constexpr std::array<Lead, 8> kLeads{{{0xC2, 0xDF, 2, 0x80, 0xBF},
                                      {0xE0, 0xE0, 3, 0xA0, 0xBF},
                                      {0xE1, 0xEC, 3, 0x80, 0xBF},
                                      {0xED, 0xED, 3, 0x80, 0x9F},
                                      {0xEE, 0xEF, 3, 0x80, 0xBF},
                                      {0xF0, 0xF0, 4, 0x90, 0xBF},
                                      {0xF1, 0xF3, 4, 0x80, 0xBF},
                                      {0xF4, 0xF4, 4, 0x80, 0x8F}}};

bool is_text(unsigned char byte) {
  return (byte >= 0x20 && byte < 0x7F) || byte == '\t' || byte == '\n' || byte == '\r';
}

// Length of the valid UTF-8 sequence that starts at `at`, or 0; control characters are none.
std::size_t sequence_length(std::string_view text, std::size_t at) {
  const auto byte = [&](std::size_t i) { return static_cast<unsigned char>(i < text.size() ? text[i] : 0); };
  const unsigned char first = byte(at);
  if (first < 0x80) return is_text(first) ? 1 : 0;
  const auto lead = std::find_if(kLeads.begin(), kLeads.end(),
                                 [&](const Lead& row) { return first >= row.first && first <= row.last; });
  if (lead == kLeads.end()) return 0;
  if (byte(at + 1) < lead->second_first || byte(at + 1) > lead->second_last) return 0;
  for (std::size_t i = 2; i < lead->length; ++i) {
    if ((byte(at + i) & 0xC0U) != 0x80U) return 0;
  }
  return lead->length;
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
