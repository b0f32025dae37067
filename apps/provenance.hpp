#pragma once

#include <string>
#include <string_view>

namespace swaymark {

/// What a result was computed from and by, so that a report can be checked years later.
struct Provenance {
  std::string version;  ///< of the program
  std::string file;     ///< as named on the command line
  std::string sha256;   ///< of the file's bytes, hexadecimal
  std::string date;     ///< local calendar date, ISO 8601
};

[[nodiscard]] std::string program_version();

/// The date is today's, or that of SOURCE_DATE_EPOCH (in UTC) where a reproducible report is wanted.
[[nodiscard]] Provenance provenance_of(const std::string& file, std::string_view bytes);

}  // namespace swaymark
