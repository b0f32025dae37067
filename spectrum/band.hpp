#pragma once

#include <optional>
#include <string_view>
#include <vector>

#include "core/matrix.hpp"
#include "core/request.hpp"

namespace swaymark {

/// A mode counts for a band if it takes at least this share of the moving mass in the band's direction. In
/// direction `horizontal` or `any` that is the direction in which it takes most: the shares along the axes
/// add up, as the squares of a vector's components do, so that turning the tower changes nothing (exactly
/// where the moving masses are equal).
inline constexpr double kCountsForBand = 0.01;

enum class BandVerdict { clear, close, inside };

/// "clear", "close", "inside"
[[nodiscard]] std::string_view name_of(BandVerdict verdict);

struct BandResult {
  BandVerdict verdict = BandVerdict::clear;
  std::vector<Index>
      inside;                ///< modes that count and lie within the band, its ends included; numbered from 0
  std::vector<Index> close;  ///< modes that count and lie within the margin outside it
  std::vector<Index> slight;     ///< modes within band or margin that take too little mass to count
  std::optional<Index> nearest;  ///< of the modes that count, the one closest to the band; inside or not
  double clearance = 0.0;        ///< its distance outside the band as a share of the band's end; 0 inside it
};

/// The highest frequency [Hz] that matters to the band.
[[nodiscard]] double band_reach(const BandStatement& band);

/// \param frequency    n_modes [Hz].
/// \param mass_ratio   n_modes x 3: effective mass over moving mass along x, y, z; zero for axes that are not
/// there.
[[nodiscard]] BandResult examine_band(const BandStatement& band, const Eigen::VectorXd& frequency,
                                      const Eigen::MatrixXd& mass_ratio);

}  // namespace swaymark
