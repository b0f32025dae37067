#pragma once

#include "core/request.hpp"

namespace swaymark {

/// Spectral acceleration against period, by the points the user gave.
///
/// Interpolation is linear in period, or linear between the logarithms of both. Outside the table the end
/// value is held. The ordinates are for one damping; with `damping_correction` the points are multiplied by
///
///   eta(xi) / eta(xi_table),   eta(xi) = max(0.55, sqrt(10 / (5 + xi))),   xi in percent
///
/// (EN 1998-1:2004, 3.2.2.2 (3)), except a point at period zero, where a rigid body follows the ground
/// whatever its damping. A table that rises linearly from there, as the elastic spectrum of EN 1998-1 does,
/// is so corrected exactly as its formula is.
class DesignSpectrum {
 public:
  /// \param statement two points or more, periods rising.    \param factor scales every ordinate.
  DesignSpectrum(SpectrumStatement statement, double factor);

  [[nodiscard]] const std::string& name() const { return statement_.name; }
  [[nodiscard]] const SpectrumStatement& statement() const { return statement_; }

  /// Sa [m/s2] for a mode. \param period [s] >= 0.    \param damping fraction of critical.
  [[nodiscard]] double acceleration(double period, double damping) const;
  /// Sa at period zero [m/s2]; the first ordinate where the table starts later.
  [[nodiscard]] double zero_period_acceleration() const { return ordinate(0.0, 1.0); }
  /// Whether the table has points on both sides of the period (or on it).
  [[nodiscard]] bool covers(double period) const;
  /// Whether the structure's damping is another than the table's, beyond rounding.
  [[nodiscard]] bool differs_in_damping(double damping) const;

 private:
  [[nodiscard]] double ordinate(double period, double eta) const;

  SpectrumStatement statement_;
  double factor_;
};

/// eta(xi), EN 1998-1:2004 (3.6). \param damping fraction of critical.
[[nodiscard]] double damping_correction(double damping);

}  // namespace swaymark
