#include "apps/provenance.hpp"

#include <array>
#include <cstdint>
#include <cstdlib>
#include <ctime>

#include <fmt/format.h>
#include <sha2.h>

#include "core/quantity.hpp"

namespace swaymark {

namespace {

std::string sha256_of(std::string_view bytes) {
  std::array<char, SHA256_DIGEST_STRING_LENGTH> hex{};
  // The C interface wants unsigned bytes.
  SHA256Data(reinterpret_cast<const std::uint8_t*>(bytes.data()), bytes.size(), hex.data());  // NOLINT
  return hex.data();
}

std::string today() {
  constexpr double end_of_calendar = 253'402'300'800.0;  // [s]: the year 10000
  std::tm calendar{};
  const char* fixed = std::getenv("SOURCE_DATE_EPOCH");
  const auto seconds = read_number(fixed != nullptr ? fixed : "");
  if (seconds && *seconds >= 0.0 && *seconds < end_of_calendar) {
    const auto time = static_cast<std::time_t>(*seconds);
    gmtime_r(&time, &calendar);
  } else {
    const std::time_t now = std::time(nullptr);
    localtime_r(&now, &calendar);
  }
  return fmt::format("{:04}-{:02}-{:02}", calendar.tm_year + 1900, calendar.tm_mon + 1, calendar.tm_mday);
}

}  // namespace

std::string program_version() { return SWAYMARK_VERSION; }

Provenance provenance_of(const std::string& file, std::string_view bytes) {
  return {program_version(), file, sha256_of(bytes), today()};
}

}  // namespace swaymark
