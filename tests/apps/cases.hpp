#pragma once

#include <string>
#include <vector>

#include "apps/analysis.hpp"
#include "tests/core/tower_text.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

/// Analyses for the tests of reports, of towers small enough to be known by hand.
namespace swaymark::test {

/// A provenance that does not change from day to day.
inline const Provenance kStated{"1.2.3", "tower.yaml", std::string(64, 'a'), "2024-02-29"};

[[nodiscard]] Analysis checked(Tower tower, Scope scope = Scope::check);

[[nodiscard]] Analysis checked(const std::string& text, Scope scope = Scope::check);

[[nodiscard]] Analysis harbour_light(Scope scope = Scope::check);

/// The two weightless bars of the small tower with 150 t at their free node c: sideways and upright each of
/// stiffness EA/L, as both bars stand at 45 degrees; one repeated mode.
[[nodiscard]] std::string lone_mass(std::vector<std::string> lines = {});

/// sqrt(K/m) / 2 pi of the lone mass [Hz], from E, A and L as the file states them.
[[nodiscard]] double lone_frequency();

/// A spectrum of 0.2 g at every period, and its use along x.
inline const std::string kFlatSpectrum = "spectra: {flat: {points: [[0.01 s, 0.2 g], [10 s, 0.2 g]]}}";
inline const std::string kAlongX = "seismic: {spectrum: {x: flat}}";

/// The small tower without the bar that would hold it against turning about node a.
[[nodiscard]] std::string swinging_bar();

/// A rod along x of eight elements with one mode asked for, shaken along x by 1 m/s2.
[[nodiscard]] Tower shaken_rod(int modes);

/// The lines of a text, without their ends.
[[nodiscard]] std::vector<std::string> lines_of(const std::string& text);

/// Whether one of the lines holds all of the words.
[[nodiscard]] bool has_line(const std::string& text, const std::vector<std::string>& words);

/// The text on one line, its blanks single, so that a phrase is found wherever lines are broken.
[[nodiscard]] std::string on_one_line(const std::string& text);

}  // namespace swaymark::test
