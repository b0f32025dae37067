#include "core/spectrum_csv.hpp"

#include <catch2/catch.hpp>

#include "core/quantity.hpp"
#include "tests/core/tower_text.hpp"
#include "tests/support/beside.hpp"
#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

const std::string kSpectrum = "spectra: {quay: {points_from: quay.csv}}";

using Points = std::vector<std::pair<double, double>>;

Points points_of(const std::string& table) {
  return tower_beside(tower_with({kSpectrum}), {{"quay.csv", table}}).spectra.at(0).points;
}

std::string refusal_of(const std::string& table, const std::string& spectrum = kSpectrum) {
  return refusal_beside(tower_with({spectrum}), {{"quay.csv", table}});
}

}  // namespace

TEST_CASE("points from a table are those written out") {
  const Points written =
      tower_of(tower_with({"spectra: {quay: {points: [[0 s, 0.1 g], [0.15 s, 0.25 g], [2 s, 0.075 g]]}}"}))
          .spectra.at(0)
          .points;
  const Points tabled = points_of("period [ms],acceleration [g]\n0,0.1\n150,0.25\n2000,0.075\n");
  REQUIRE(tabled.size() == written.size());
  for (std::size_t i = 0; i < written.size(); ++i) {
    CHECK_THAT(tabled[i].first, is_near(written[i].first, kRoundoff));
    CHECK_THAT(tabled[i].second, is_near(written[i].second, kRoundoff));
  }
}

TEST_CASE("frequencies become periods and are sorted") {
  const Points points = points_of("acceleration [g],frequency [Hz]\n0.1,0.5\n0.2,20\n0.25,5\n");
  REQUIRE(points.size() == 3);
  CHECK_THAT(points[0].first, is_near(0.05, kRoundoff));
  CHECK_THAT(points[0].second, is_near(0.2 * kStandardGravity, kRoundoff));
  CHECK_THAT(points[1].first, is_near(0.2, kRoundoff));
  CHECK_THAT(points[2].first, is_near(2.0, kRoundoff));
  CHECK_THAT(points[2].second, is_near(0.1 * kStandardGravity, kRoundoff));
}

TEST_CASE("a table of points is refused in its own cells") {
  CHECK(refusal_of("period,frequency,acceleration\n1,1,1\n2,2,2\n") ==
        "quay.csv:1:8 the columns 'period' and 'frequency' exclude each other");
  CHECK(refusal_of("acceleration\n1\n2\n") ==
        "quay.csv:1:1 'period' or 'frequency' is missing in a table of spectrum points");
  CHECK(refusal_of("period\n1\n2\n") ==
        "quay.csv:1:1 'acceleration' is missing in a table of spectrum points");
  CHECK_THAT(refusal_of("period [Hz],acceleration\n1,1\n2,2\n"), Catch::StartsWith("quay.csv:1:1 "));
  CHECK_THAT(refusal_of("period,acceleration\n0.5,1\n0.2,2\n"), Catch::StartsWith("quay.csv:3:1 "));
  CHECK(refusal_of("frequency,acceleration\n5,1\n1,2\n5.0,2\n") ==
        "quay.csv:4:1 the frequency 5.0 stands twice, first in line 2");
  CHECK_THAT(refusal_of("frequency,acceleration\n0,1\n1,2\n"), Catch::StartsWith("quay.csv:2:1 "));
  CHECK_THAT(refusal_of("period,acceleration\n-1,1\n1,-2\n"),
             Catch::Contains("quay.csv:2:1 ") && Catch::Contains("quay.csv:3:3 "));
  CHECK_THAT(refusal_of("period,acceleration\n1,1\n"), Catch::StartsWith("quay.csv:1:1 "));
  CHECK_THAT(refusal_of("period,acceleration\n"), Catch::StartsWith("quay.csv:1:1 "));
}

TEST_CASE("logarithms need points above zero in a table too") {
  const std::string spectrum = "spectra: {quay: {points_from: quay.csv, interpolation: log-log}}";
  CHECK_THAT(refusal_of("period,acceleration\n0,1\n1,0\n", spectrum),
             Catch::Contains("quay.csv:2:1 ") && Catch::Contains("quay.csv:3:3 "));
}

TEST_CASE("points stand in one place") {
  CHECK_THAT(refusal_of("period,acceleration\n0,1\n1,1\n",
                        "spectra: {quay: {points: [[0, 1], [1, 1]], points_from: quay.csv}}"),
             Catch::StartsWith("tower.yaml:8:11 'points' and 'points_from'"));
}

}  // namespace swaymark::test
