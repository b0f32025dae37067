#include "apps/figure.hpp"

#include <limits>

#include <catch2/catch.hpp>

namespace swaymark::test {

TEST_CASE("a figure has as many decimals as it is asked for") {
  CHECK(figure(2.34567, 3) == "2.346");
  CHECK(figure(-1.5, 1) == "-1.5");
  CHECK(figure(12.0, 0) == "12");
}

TEST_CASE("a figure that rounds to zero has no minus sign") {
  CHECK(figure(-0.0, 2) == "0.00");
  CHECK(figure(-1e-9, 2) == "0.00");
  CHECK(figure(-0.4, 0) == "0");
  CHECK(figure(-0.006, 2) == "-0.01");
}

TEST_CASE("ratios come in percent and forces in thousands") {
  CHECK(percent(0.12345) == "12.3");
  CHECK(percent(-1e-12) == "0.0");
  CHECK(kilo(12'345.6) == "12.35");
  CHECK(kilo(-1e-6) == "0.00");
}

TEST_CASE("a mass has grams where the tower is light and tenths of a kilogram elsewhere") {
  CHECK(kilograms(1.23456, 50.0) == "1.235");
  CHECK(kilograms(1450.04, 4000.0) == "1450.0");
}

TEST_CASE("nine digits make figures that differ by rounding alone equal and keep others apart") {
  CHECK(nine_digits(1.0 / 3.0) == nine_digits(1.0 / 3.0 * (1.0 + 1e-12)));
  CHECK(nine_digits(1.0 / 3.0) != nine_digits(1.0 / 3.0 * (1.0 + 1e-7)));
  CHECK(nine_digits(-2.0) == -2.0);
  CHECK(nine_digits(0.0) == 0.0);
  CHECK(nine_digits(std::numeric_limits<double>::infinity()) == std::numeric_limits<double>::infinity());
}

}  // namespace swaymark::test
