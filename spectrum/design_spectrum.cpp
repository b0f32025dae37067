#include "spectrum/design_spectrum.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace swaymark {

double damping_correction(double damping) {
  return std::max(0.55, std::sqrt(10.0 / (5.0 + 100.0 * damping)));
}

DesignSpectrum::DesignSpectrum(SpectrumStatement statement, double factor)
    : statement_(std::move(statement)), factor_(factor) {}

double DesignSpectrum::ordinate(double period, double eta) const {
  const auto corrected = [&](const std::pair<double, double>& point) {
    return factor_ * point.second * (point.first > 0.0 ? eta : 1.0);
  };
  const auto& points = statement_.points;
  if (period <= points.front().first) return corrected(points.front());
  if (period >= points.back().first) return corrected(points.back());
  const auto above = std::upper_bound(points.begin(), points.end(), period,
                                      [](double t, const auto& point) { return t < point.first; });
  const double t0 = (above - 1)->first;
  const double t1 = above->first;
  const double a0 = corrected(*(above - 1));
  const double a1 = corrected(*above);
  if (statement_.interpolation == Interpolation::log_log)
    return a0 * std::pow(a1 / a0, std::log(period / t0) / std::log(t1 / t0));
  return a0 + (a1 - a0) * (period - t0) / (t1 - t0);
}

double DesignSpectrum::acceleration(double period, double damping) const {
  const bool rigid = period <= 0.0;
  if (rigid || !statement_.damping_correction) return ordinate(period, 1.0);
  return ordinate(period, damping_correction(damping) / damping_correction(*statement_.damping));
}

bool DesignSpectrum::covers(double period) const {
  return period >= statement_.points.front().first && period <= statement_.points.back().first;
}

bool DesignSpectrum::differs_in_damping(double damping) const {
  return statement_.damping && std::abs(*statement_.damping - damping) > 1e-9;
}

}  // namespace swaymark
