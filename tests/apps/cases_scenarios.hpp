#pragma once

#include "apps/study.hpp"
#include "tests/apps/cases.hpp"

/// Studies of small towers for the tests of what is written of scenarios.
namespace swaymark::test {

inline Study studied(const std::string& text, Scope scope = Scope::check) {
  return study_of(read_tower_file(text, "tower.yaml"), kStated, scope);
}

/// The lone mass of 150 t at 5 Hz with a fan at 4 Hz: four times the mass halves the frequency, a quarter of
/// the stiffness does so, too.
inline Study lone_mass_study(const std::string& scenarios, Scope scope = Scope::check) {
  return studied(lone_mass({"bands: [{label: fan, from: 2 Hz, to: 4 Hz}]", kFlatSpectrum, kAlongX,
                            "scenarios: " + scenarios}),
                 scope);
}

inline const std::string kHeavySlackAndLoose =
    "[{label: heavy, masses: [{nodes: [c], mass: 600000 kg}]}, {label: slack, stiffness_factor: 0.25}, "
    "{label: loose, supports: [{nodes: [a], fixed: [x, z]}]}]";

}  // namespace swaymark::test
