#include "apps/notes.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "apps/plausibility.hpp"
#include "apps/report_parts.hpp"
#include "apps/segment_notes.hpp"

namespace swaymark {

namespace {

using Notes = std::vector<std::string>;

void about_shapes(const Analysis& analysis, Notes& notes) {
  for (Index j = 0; j < analysis.mode_count(); ++j) {
    const std::string& character = analysis.character[static_cast<std::size_t>(j)];
    if (character.starts_with("sway")) return;
    if (character != "breathing") continue;
    notes.push_back(fmt::format(
        "Mode {} ({:.3f} Hz), below every sway, changes the shape of the section: is plan bracing missing?",
        j + 1, analysis.frequency(j)));
    return;
  }
}

void about_unused(const Analysis& analysis, Notes& notes) {
  const Tower& tower = analysis.tower;
  const bool any = std::any_of(tower.materials.begin(), tower.materials.end(),
                               [](const auto& m) { return m.yield.has_value(); }) ||
                   std::any_of(tower.sections.begin(), tower.sections.end(),
                               [](const auto& s) { return s.curve.has_value(); });
  if (any)
    notes.emplace_back(
        "Yield stresses, radii of gyration and buckling curves were read, but this version checks no "
        "resistances.");
}

void about_modes(const Analysis& analysis, Notes& notes) {
  const ModeSet& set = analysis.set;
  const Tower& tower = analysis.tower;
  const auto count = analysis.mode_count();
  const bool only_count = tower.modes.count && !tower.modes.up_to && !tower.modes.mass_share;
  const auto wanted = count - set.copies_added;
  if (tower.modes.count && *tower.modes.count > set.available) {
    notes.push_back(fmt::format(
        "{} modes are asked for; the tower has {}, one for each free degree of freedom with mass.",
        *tower.modes.count, set.available));
  } else if (only_count && wanted > *tower.modes.count) {
    notes.push_back(fmt::format("{} modes are kept instead of {}: the highest band reaches up to mode {}.",
                                wanted, *tower.modes.count, wanted));
  }
  if (set.copies_added > 0 && tower.modes.count) {
    notes.push_back(
        fmt::format("{} kept besides: {} the frequency of mode {}, and half of a repeated mode says nothing.",
                    set.copies_added == 1 ? "1 mode is" : fmt::format("{} modes are", set.copies_added),
                    set.copies_added == 1 ? "it has" : "they have", wanted));
  }
  const auto massless = analysis.assembly.mass.rows() - set.available;
  if (massless > 0) {
    notes.push_back(fmt::format("{} no mass: {} and follow{} statically.",
                                massless == 1 ? "1 free degree of freedom has"
                                              : fmt::format("{} free degrees of freedom have", massless),
                                massless == 1 ? "it adds no mode" : "they add no mode",
                                massless == 1 ? "s" : ""));
  }
  if (tower.damping.size() > 1 && count > static_cast<Index>(tower.damping.size())) {
    notes.push_back(
        fmt::format("Damping is listed for {} modes; the modes above take the last value, {:.3g} %.",
                    tower.damping.size(), 100.0 * tower.damping.back()));
  }
}

void about_bands(const Analysis& analysis, Notes& notes) {
  for (std::size_t b = 0; b < analysis.bands.size(); ++b) {
    const BandStatement& band = analysis.tower.bands[b];
    if (band.from == band.to && band.margin == 0.0) {
      notes.push_back(
          fmt::format("Band {} has no width: only an exact hit would count. Give a spread or a margin.",
                      band_name(band)));
    }
    const auto& slight = analysis.bands[b].slight;
    if (slight.empty()) continue;
    const std::string direction = band.direction == BandDirection::any
                                      ? "in any one direction"
                                      : fmt::format("in direction {}", name_of(band.direction));
    notes.push_back(fmt::format(
        "Band {}: mode{} {} within it or its margin do{} not count, with less than {:.0f} % of the moving "
        "mass {}. "
        "A force at one node, or off the centre, may still excite {}.",
        band_name(band), slight.size() > 1 ? "s" : "", mode_list(slight), slight.size() > 1 ? "" : "es",
        100.0 * kCountsForBand, direction, slight.size() > 1 ? "them" : "it"));
  }
}

void about_spectra(const Analysis& analysis, Notes& notes) {
  for (const DirectionResult& direction : analysis.seismic->directions) {
    if (!direction.moves) {
      notes.push_back(fmt::format("No free mass moves along {}, so that its spectrum excites nothing.",
                                  name_of(direction.axis)));
      continue;
    }
    if (!direction.below_table.empty()) {
      notes.push_back(
          fmt::format("Spectrum {} along {}: the period of mode{} {} is shorter than its first point, whose "
                      "acceleration is held.",
                      direction.spectrum, name_of(direction.axis),
                      direction.below_table.size() > 1 ? "s" : "", mode_list(direction.below_table)));
    }
    if (!direction.above_table.empty()) {
      notes.push_back(
          fmt::format("Spectrum {} along {}: the period of mode{} {} is longer than its last point, whose "
                      "acceleration is held.",
                      direction.spectrum, name_of(direction.axis),
                      direction.above_table.size() > 1 ? "s" : "", mode_list(direction.above_table)));
    }
  }
  for (std::size_t s = 0; s < analysis.tower.spectra.size(); ++s) {
    const auto& used = analysis.seismic->statement.spectrum;
    if (std::find(used.begin(), used.end(), s) == used.end()) continue;
    const SpectrumStatement& statement = analysis.tower.spectra[s];
    const DesignSpectrum spectrum(statement, 1.0);
    const bool differs = std::any_of(analysis.damping.begin(), analysis.damping.end(),
                                     [&](double ratio) { return spectrum.differs_in_damping(ratio); });
    if (!differs) continue;
    const double least = analysis.damping.minCoeff();
    const double most = analysis.damping.maxCoeff();
    const auto eta = [&](double ratio) {
      return damping_correction(ratio) / damping_correction(*statement.damping);
    };
    const std::string damping = most > least ? fmt::format("{:.3g} to {:.3g} %", 100.0 * least, 100.0 * most)
                                             : fmt::format("{:.3g} %", 100.0 * least);
    const std::string etas = most > least ? fmt::format("{:.3f} to {:.3f}", eta(least), eta(most))
                                          : fmt::format("{:.3f}", eta(least));
    notes.push_back(
        statement.damping_correction
            ? fmt::format("Spectrum {} is drawn for {:.3g} % damping and was corrected by eta = {} for the "
                          "{} of the modes.",
                          statement.name, 100.0 * *statement.damping, etas, damping)
            : fmt::format("Spectrum {} is drawn for {:.3g} % damping, the modes have {}; the ordinates "
                          "were used as they stand (eta would be {}: 'damping_correction: true').",
                          statement.name, 100.0 * *statement.damping, damping, etas));
  }
}

void about_combination(const Analysis& analysis, Notes& notes) {
  for (const RuleRatio& ratio : analysis.seismic->srss_against_cqc) {
    notes.push_back(fmt::format(
        "WARNING: SRSS with modes closer than 10 % along {}: SRSS / CQC = {:.3f} for the base shear, "
        "{:.3f} to {:.3f} for the bar forces. SRSS is not valid here; use CQC.",
        name_of(ratio.axis), ratio.base_shear, ratio.least_bar, ratio.most_bar));
  }
  std::string lifted;
  int supports = 0;
  for (const NodeReaction& reaction : node_reactions(analysis)) {
    if (reaction.uplift.value_or(0.0) <= 0.0) continue;
    ++supports;
    lifted += (lifted.empty() ? "" : ", ") + analysis.tower.nodes[reaction.node].name;
  }
  if (!lifted.empty()) {
    notes.push_back(
        fmt::format("Gravity - seismic lifts the {} {}: the anchorage must hold the uplift listed.",
                    supports == 1 ? "support at node" : "supports at nodes", lifted));
  }
}

}  // namespace

std::vector<std::string> notes_of(const Analysis& analysis) {
  Notes notes = segment_notes(analysis.tower);
  about_modes(analysis, notes);
  about_shapes(analysis, notes);
  about_bands(analysis, notes);
  if (analysis.seismic) {
    about_spectra(analysis, notes);
    about_combination(analysis, notes);
  }
  about_unused(analysis, notes);
  const Notes plausibility = plausibility_notes(analysis);
  notes.insert(notes.end(), plausibility.begin(), plausibility.end());
  return notes;
}

}  // namespace swaymark
