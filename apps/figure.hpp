#pragma once

#include <string>

/// Figures as a report prints them.
namespace swaymark {

/// A number with so many decimals, and without a minus sign before a rounded zero.
[[nodiscard]] std::string figure(double value, int decimals);
/// The value to nine significant digits, so that figures that differ by rounding alone rank as equal.
[[nodiscard]] double nine_digits(double value);
/// A ratio in percent with one decimal.
[[nodiscard]] std::string percent(double ratio);
/// N in kN, N m in kN m, with two decimals.
[[nodiscard]] std::string kilo(double value);
/// A mass [kg] with decimals to suit a tower of `total` [kg], of ten grams as of ten thousand tonnes.
[[nodiscard]] std::string kilograms(double mass, double total);

}  // namespace swaymark
