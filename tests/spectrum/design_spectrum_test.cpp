#include "spectrum/design_spectrum.hpp"

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// Rises to 0.2 s, is flat to 0.6 s and falls to 2 s.
SpectrumStatement four_points() {
  SpectrumStatement statement;
  statement.name = "quay";
  statement.points = {{0.0, 1.0}, {0.2, 3.0}, {0.6, 3.0}, {2.0, 0.9}};
  return statement;
}

SpectrumStatement corrected(double table_damping) {
  SpectrumStatement statement = four_points();
  statement.damping = table_damping;
  statement.damping_correction = true;
  return statement;
}

constexpr double kFivePercent = 0.05;
// Half a unit of the last of four decimals.
constexpr double kFourDecimals = 0.5e-4;

}  // namespace

TEST_CASE("a spectrum is linear in period between its points") {
  const DesignSpectrum spectrum(four_points(), 1.0);
  CHECK_THAT(spectrum.acceleration(0.05, kFivePercent), is_near(1.5, kRoundoff));
  CHECK_THAT(spectrum.acceleration(0.1, kFivePercent), is_near(2.0, kRoundoff));
  CHECK_THAT(spectrum.acceleration(0.4, kFivePercent), is_near(3.0, kRoundoff));
  CHECK_THAT(spectrum.acceleration(1.3, kFivePercent), is_near(1.95, kRoundoff));
}

TEST_CASE("a spectrum takes the values of its points at them") {
  for (const Interpolation interpolation : {Interpolation::linear, Interpolation::log_log}) {
    SpectrumStatement statement = four_points();
    statement.points.front().first = 0.01;
    statement.interpolation = interpolation;
    const DesignSpectrum spectrum(statement, 1.0);
    for (const auto& [period, ordinate] : statement.points)
      CHECK_THAT(spectrum.acceleration(period, kFivePercent), is_near(ordinate, kRoundoff));
  }
}

TEST_CASE("a hyperbola is a straight line between logarithms and not so in period") {
  // 2/T through (0.5, 4) and (2, 1): 2 at 1 s. Linear in period: 4 - 3 (1 - 0.5) / 1.5 = 3.
  SpectrumStatement statement = four_points();
  statement.points = {{0.5, 4.0}, {2.0, 1.0}};
  CHECK_THAT(DesignSpectrum(statement, 1.0).acceleration(1.0, kFivePercent), is_near(3.0, kRoundoff));
  statement.interpolation = Interpolation::log_log;
  const DesignSpectrum spectrum(statement, 1.0);
  CHECK_THAT(spectrum.acceleration(1.0, kFivePercent), is_near(2.0, kRoundoff));
  CHECK_THAT(spectrum.acceleration(0.8, kFivePercent), is_near(2.5, kRoundoff));
}

TEST_CASE("log-log interpolation picks the segment its period lies in") {
  // 10 T^2 up to 1 s, then 10 / T.
  SpectrumStatement statement = four_points();
  statement.points = {{0.1, 0.1}, {1.0, 10.0}, {4.0, 2.5}};
  statement.interpolation = Interpolation::log_log;
  const DesignSpectrum spectrum(statement, 1.0);
  CHECK_THAT(spectrum.acceleration(0.5, kFivePercent), is_near(2.5, kRoundoff));
  CHECK_THAT(spectrum.acceleration(2.0, kFivePercent), is_near(5.0, kRoundoff));
}

TEST_CASE("the end values of a spectrum are held outside its table") {
  for (const Interpolation interpolation : {Interpolation::linear, Interpolation::log_log}) {
    SpectrumStatement statement = four_points();
    statement.points = {{0.1, 2.0}, {1.0, 5.0}};
    statement.interpolation = interpolation;
    const DesignSpectrum spectrum(statement, 1.0);
    CHECK(spectrum.acceleration(0.0, kFivePercent) == 2.0);
    CHECK(spectrum.acceleration(0.09, kFivePercent) == 2.0);
    CHECK(spectrum.acceleration(1.01, kFivePercent) == 5.0);
    CHECK(spectrum.acceleration(1e9, kFivePercent) == 5.0);
    CHECK(spectrum.zero_period_acceleration() == 2.0);
  }
}

TEST_CASE("a spectrum covers the periods of its table with both ends") {
  SpectrumStatement statement = four_points();
  statement.points = {{0.1, 2.0}, {1.0, 5.0}};
  const DesignSpectrum spectrum(statement, 1.0);
  CHECK(spectrum.covers(0.1));
  CHECK(spectrum.covers(0.5));
  CHECK(spectrum.covers(1.0));
  CHECK_FALSE(spectrum.covers(0.0999));
  CHECK_FALSE(spectrum.covers(1.0001));
  CHECK_FALSE(spectrum.covers(0.0));
}

TEST_CASE("the factor scales every ordinate and the one at period zero") {
  for (const Interpolation interpolation : {Interpolation::linear, Interpolation::log_log}) {
    SpectrumStatement statement = four_points();
    statement.points.front().first = 0.01;
    statement.interpolation = interpolation;
    const DesignSpectrum plain(statement, 1.0);
    const DesignSpectrum scaled(statement, 1.4);
    for (const double period : {0.0, 0.01, 0.1, 0.2, 0.5, 1.3, 2.0, 7.0})
      CHECK_THAT(scaled.acceleration(period, kFivePercent),
                 is_near(1.4 * plain.acceleration(period, kFivePercent), kRoundoff));
    CHECK_THAT(scaled.zero_period_acceleration(), is_near(1.4, kRoundoff));
  }
}

TEST_CASE("the damping correction eta has the values of EN 1998-1") {
  // EN 1998-1:2004 3.2.2.2 (3): eta = sqrt(10 / (5 + xi)) >= 0.55 (read); its values follow by hand.
  CHECK_THAT(damping_correction(0.01), is_near(1.2910, 0.0, kFourDecimals));
  CHECK_THAT(damping_correction(0.02), is_near(1.1952, 0.0, kFourDecimals));
  CHECK_THAT(damping_correction(0.05), is_near(1.0, kRoundoff));
  CHECK_THAT(damping_correction(0.10), is_near(0.8165, 0.0, kFourDecimals));
  CHECK_THAT(damping_correction(0.0), is_near(std::sqrt(2.0), kRoundoff));
}

TEST_CASE("the damping correction is never below 0.55") {
  // 10 / (5 + xi) = 0.55^2 at xi = 28.0579 %.
  CHECK(damping_correction(0.280) > 0.55);
  CHECK(damping_correction(0.281) == 0.55);
  CHECK(damping_correction(0.9) == 0.55);
}

TEST_CASE("ordinates are corrected relative to the damping of their table") {
  // 3.0 sqrt((5 + 2) / (5 + 10)) on the plateau.
  const DesignSpectrum spectrum(corrected(0.02), 1.0);
  CHECK_THAT(spectrum.acceleration(0.4, 0.10), is_near(3.0 * std::sqrt(7.0 / 15.0), kRoundoff));
  CHECK_THAT(spectrum.acceleration(0.4, 0.02), is_near(3.0, kRoundoff));
  CHECK_THAT(spectrum.acceleration(0.4, 0.01), is_near(3.0 * std::sqrt(7.0 / 6.0), kRoundoff));
}

TEST_CASE("the floor of the damping correction holds for the structure and for the table by itself") {
  CHECK_THAT(DesignSpectrum(corrected(0.05), 1.0).acceleration(0.4, 0.5), is_near(3.0 * 0.55, kRoundoff));
  CHECK_THAT(DesignSpectrum(corrected(0.5), 1.0).acceleration(0.4, 0.05), is_near(3.0 / 0.55, kRoundoff));
}

TEST_CASE("ordinates held past the end of a table are corrected as those within it") {
  CHECK_THAT(DesignSpectrum(corrected(0.05), 1.0).acceleration(5.0, 0.02),
             is_near(0.9 * std::sqrt(10.0 / 7.0), kRoundoff));
}

TEST_CASE("the factor and the damping correction multiply") {
  CHECK_THAT(DesignSpectrum(corrected(0.05), 1.4).acceleration(0.4, 0.02),
             is_near(1.4 * 3.0 * std::sqrt(10.0 / 7.0), kRoundoff));
}

TEST_CASE("a rigid body follows the ground whatever its damping") {
  const DesignSpectrum spectrum(corrected(0.05), 1.0);
  CHECK(spectrum.zero_period_acceleration() == 1.0);
  CHECK(spectrum.acceleration(0.0, 0.01) == 1.0);
  CHECK(spectrum.acceleration(0.0, 0.20) == 1.0);
}

TEST_CASE("ordinates are not corrected for damping unless it is asked for") {
  SpectrumStatement statement = four_points();
  statement.damping = 0.05;
  const DesignSpectrum spectrum(statement, 1.0);
  CHECK(spectrum.acceleration(0.4, 0.01) == 3.0);
  CHECK(spectrum.acceleration(0.4, 0.20) == 3.0);
}

TEST_CASE("a spectrum says where the structure has another damping than its table") {
  SpectrumStatement statement = four_points();
  CHECK_FALSE(DesignSpectrum(statement, 1.0).differs_in_damping(0.02));
  statement.damping = 0.05;
  CHECK(DesignSpectrum(statement, 1.0).differs_in_damping(0.02));
  CHECK_FALSE(DesignSpectrum(statement, 1.0).differs_in_damping(5.0 / 100.0));
  CHECK_FALSE(DesignSpectrum(statement, 1.0).differs_in_damping(0.05 + 1e-12));
}

TEST_CASE("a spectrum keeps its name and its statement") {
  const DesignSpectrum spectrum(four_points(), 2.0);
  CHECK(spectrum.name() == "quay");
  CHECK(spectrum.statement().points == four_points().points);
}

TEST_CASE("a corrected table of the elastic spectrum of EN 1998-1 follows its formula with eta") {
  // EN 1998-1:2004, 3.2.2.2, type 1, ground A (read in a public reprint): Se = ag S [1 + T/TB (2.5 eta - 1)]
  // up to TB.
  SpectrumStatement table;
  table.name = "ground A";
  table.damping = 0.05;
  table.damping_correction = true;
  table.points = {{0.0, 2.0}, {0.15, 5.0}, {0.4, 5.0}};
  for (const double damping : {0.02, 0.05, 0.10}) {
    const double eta = damping_correction(damping);
    for (const double period : {0.001, 0.05, 0.14}) {
      const double published = 2.0 * (1.0 + period / 0.15 * (2.5 * eta - 1.0));
      CHECK_THAT(DesignSpectrum(table, 1.0).acceleration(period, damping), is_near(published, kRoundoff));
    }
  }
}

}  // namespace swaymark::test
