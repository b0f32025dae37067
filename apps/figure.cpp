#include "apps/figure.hpp"

#include <cmath>

#include <fmt/format.h>

namespace swaymark {

std::string figure(double value, int decimals) {
  const std::string text = fmt::format("{:.{}f}", value, decimals);
  const bool zero = text.find_first_not_of("-0.") == std::string::npos;
  return zero && text.starts_with('-') ? text.substr(1) : text;
}

double nine_digits(double value) {
  if (value == 0.0 || !std::isfinite(value)) return value;
  const double scale = std::pow(10.0, 8.0 - std::floor(std::log10(std::abs(value))));
  return std::round(value * scale) / scale;
}

std::string percent(double ratio) { return figure(100.0 * ratio, 1); }

std::string kilo(double value) { return figure(value / 1000.0, 2); }

std::string kilograms(double mass, double total) { return figure(mass, total < 100.0 ? 3 : 1); }

}  // namespace swaymark
