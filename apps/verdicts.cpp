#include "apps/verdicts.hpp"

#include <numbers>

#include <fmt/format.h>

#include "apps/analysis.hpp"
#include "apps/report_parts.hpp"

namespace swaymark {

namespace {

// Where the residual is larger the fourth digit of a frequency may be wrong.
constexpr double kMostResidual = 1e-6;
constexpr double kLeastMassShare = 0.9;  // EN 1998-1:2004, 4.3.3.3.1 (3)

std::string modes_in_words(const Analysis& analysis, const std::vector<Index>& modes) {
  std::string text;
  for (const Index mode : modes) {
    if (!text.empty()) text += ", ";
    text += fmt::format("mode {} ({:.3f} Hz, {})", mode + 1, analysis.frequency(mode),
                        analysis.character[static_cast<std::size_t>(mode)]);
  }
  return text;
}

std::string nearest_words(const Analysis& analysis, const BandResult& result) {
  if (!result.nearest) return "; no mode kept counts in this direction";
  std::string nearest = "; nearest is " + modes_in_words(analysis, {*result.nearest});
  if (result.clearance > 1.0) return nearest;
  return nearest + fmt::format(", {:.1f} % away", 100.0 * result.clearance);
}

Verdict band_verdict(const Analysis& analysis, std::size_t b) {
  const BandStatement& band = analysis.tower.bands[b];
  const BandResult& result = analysis.bands[b];
  Verdict verdict;
  verdict.check = "band " + band_name(band);
  verdict.met = result.verdict == BandVerdict::clear;
  const std::string range = fmt::format("{:.3f} to {:.3f} Hz", band.from, band.to);
  switch (result.verdict) {
    case BandVerdict::clear:
      verdict.detail = fmt::format("no mode that counts within {}", range);
      if (band.margin > 0.0) verdict.detail += fmt::format(" or its margin of {:.3g} %", 100.0 * band.margin);
      verdict.detail += nearest_words(analysis, result);
      break;
    case BandVerdict::close:
      verdict.detail = fmt::format("within the margin of {:.3g} % outside {}: {}", 100.0 * band.margin, range,
                                   modes_in_words(analysis, result.close));
      break;
    case BandVerdict::inside:
      verdict.detail = fmt::format("inside {}: {}", range, modes_in_words(analysis, result.inside));
      break;
  }
  if (!result.slight.empty())
    verdict.detail += fmt::format("; does not count: {}", modes_in_words(analysis, result.slight));
  return verdict;
}

Verdict mass_verdict(const Analysis& analysis, const DirectionResult& direction) {
  const double share = 1.0 - direction.missing_mass_ratio;
  const bool added = analysis.seismic->statement.missing_mass;
  Verdict verdict;
  verdict.check = fmt::format("effective mass {}", name_of(direction.axis));
  verdict.met = share >= kLeastMassShare - 1e-9;
  verdict.detail =
      fmt::format("{:.1f} % of the moving mass in {}", 100.0 * share, counted(analysis.mode_count(), "mode"));
  if (verdict.met) {
    if (added && direction.missing_mass_ratio > 1e-9)
      verdict.detail += ", the rest added at the zero-period acceleration";
    return verdict;
  }
  verdict.detail +=
      fmt::format("; at least {:.0f} % are wanted: ask for more modes", 100.0 * kLeastMassShare);
  if (added)
    verdict.detail +=
        "; the rest was added at the zero-period acceleration, too little for modes that are not rigid";
  return verdict;
}

}  // namespace

std::vector<Verdict> verdicts_of(const Analysis& analysis) {
  std::vector<Verdict> verdicts;
  for (std::size_t b = 0; b < analysis.bands.size(); ++b) verdicts.push_back(band_verdict(analysis, b));
  if (analysis.seismic) {
    for (const DirectionResult& direction : analysis.seismic->directions) {
      if (!direction.moves) continue;  // a note says so
      verdicts.push_back(mass_verdict(analysis, direction));
    }
  }
  const Modes& modes = analysis.set.modes;
  Verdict complete{"no mode missing", modes.status == ModesStatus::complete,
                   "the modes could not be counted"};
  if (modes.certificate) {
    complete.detail = fmt::format("exactly {} below {:.4g} Hz", counted(modes.certificate->below, "mode"),
                                  modes.certificate->omega / (2.0 * std::numbers::pi));
  }
  verdicts.push_back(complete);
  const double residual = modes.residual.maxCoeff();
  verdicts.push_back({"residual of the modes", residual <= kMostResidual,
                      fmt::format("largest {:.1e}, limit {:.0e}", residual, kMostResidual)});
  return verdicts;
}

}  // namespace swaymark
