#include "spectrum/band.hpp"

#include <algorithm>

namespace swaymark {

namespace {

double ratio_along(BandDirection direction, const Eigen::Vector3d& ratio) {
  switch (direction) {
    case BandDirection::x:
      return ratio.x();
    case BandDirection::y:
      return ratio.y();
    case BandDirection::z:
      return ratio.z();
    case BandDirection::horizontal:
      return ratio.x() + ratio.y();
    case BandDirection::any:
      return ratio.sum();
  }
  return 0.0;
}

double clearance_of(const BandStatement& band, double frequency) {
  if (frequency < band.from) return 1.0 - frequency / band.from;
  if (frequency > band.to) return frequency / band.to - 1.0;
  return 0.0;
}

}  // namespace

std::string_view name_of(BandVerdict verdict) {
  switch (verdict) {
    case BandVerdict::clear:
      return "clear";
    case BandVerdict::close:
      return "close";
    case BandVerdict::inside:
      return "inside";
  }
  return "";
}

double band_reach(const BandStatement& band) { return band.to * (1.0 + band.margin); }

BandResult examine_band(const BandStatement& band, const Eigen::VectorXd& frequency,
                        const Eigen::MatrixXd& mass_ratio) {
  BandResult result;
  for (Index mode = 0; mode < frequency.size(); ++mode) {
    const double f = frequency(mode);
    const bool counts = ratio_along(band.direction, mass_ratio.row(mode).transpose()) >= kCountsForBand;
    const double clearance = clearance_of(band, f);
    if (counts && (!result.nearest || clearance < result.clearance)) {
      result.nearest = mode;
      result.clearance = clearance;
    }
    const bool inside = f >= band.from && f <= band.to;
    const bool near = f >= band.from * (1.0 - band.margin) && f <= band_reach(band);
    if (!near) continue;
    if (!counts) {
      result.slight.push_back(mode);
    } else {
      (inside ? result.inside : result.close).push_back(mode);
    }
  }
  if (!result.inside.empty()) {
    result.verdict = BandVerdict::inside;
  } else if (!result.close.empty()) {
    result.verdict = BandVerdict::close;
  }
  return result;
}

}  // namespace swaymark
