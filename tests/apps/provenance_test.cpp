#include "apps/provenance.hpp"

#include <cstdlib>
#include <regex>

#include <catch2/catch.hpp>

namespace swaymark::test {

namespace {

// SOURCE_DATE_EPOCH for the life of the object, and then as it was.
class DateStated {
 public:
  explicit DateStated(const char* seconds) {
    if (const char* before = std::getenv(kName)) before_ = before;
    setenv(kName, seconds, 1);
  }
  ~DateStated() { before_.empty() ? unsetenv(kName) : setenv(kName, before_.c_str(), 1); }
  DateStated(const DateStated&) = delete;
  DateStated& operator=(const DateStated&) = delete;

 private:
  static constexpr const char* kName = "SOURCE_DATE_EPOCH";
  std::string before_;
};

std::string today() { return provenance_of("tower.yaml", "").date; }

}  // namespace

TEST_CASE("the fingerprint of a file is its SHA-256") {
  // FIPS 180-4 and its example values, from memory; any other program for SHA-256 gives the same.
  CHECK(provenance_of("t", "").sha256 == "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855");
  CHECK(provenance_of("t", "abc").sha256 ==
        "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
}

TEST_CASE("one changed byte changes the fingerprint") {
  CHECK(provenance_of("t", "mass: 480 kg").sha256 != provenance_of("t", "mass: 481 kg").sha256);
  CHECK(provenance_of("t", std::string("a\0b", 3)).sha256 != provenance_of("t", "a").sha256);
}

TEST_CASE("a report carries the name of its file and the version of the program") {
  const Provenance provenance = provenance_of("towers/mast.yaml", "abc");
  CHECK(provenance.file == "towers/mast.yaml");
  CHECK(provenance.version == program_version());
  CHECK(std::regex_match(program_version(), std::regex("[0-9]+[.][0-9]+[.][0-9]+")));
}

TEST_CASE("the date is that of SOURCE_DATE_EPOCH where a reproducible report is wanted") {
  CHECK((DateStated("0"), today()) == "1970-01-01");
  {
    const DateStated stated("951782400");  // the leap day of 2000, counted from 1970 by hand: 11016 days
    CHECK(today() == "2000-02-29");
  }
}

TEST_CASE("a SOURCE_DATE_EPOCH that is no date leaves the date of today") {
  const std::string expected = today();
  for (const char* seconds : {"", "tomorrow", "-1", "1e300", "nan"}) {
    INFO("'" << seconds << "'");
    const DateStated stated(seconds);
    CHECK(today() >= expected);  // later only if midnight passes between the two
    CHECK(std::regex_match(today(), std::regex("2[0-9]{3}-[01][0-9]-[0-3][0-9]")));
  }
}

}  // namespace swaymark::test
