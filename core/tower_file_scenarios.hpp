#pragma once

#include <vector>

#include "core/tower_file.hpp"
#include "core/tower_file_parts.hpp"

/// The key `scenarios` of a tower file. Private to the reader.
namespace swaymark {

/// The names that a scenario may use: those of the tower as stated.
struct ScenarioNames {
  const PartNames& parts;
  const NameTable& groups;
  const NameTable& spectra;
};

/// Refuses the keys that only a scenario has.
void refuse_scenario_keys(MapView& file);

/// \param file   which every other key was asked of, so that those a scenario may not state are told from
/// unknown ones. \param tower  as stated.
[[nodiscard]] std::vector<Scenario> read_scenarios(MapView& file, const ScenarioNames& names,
                                                   const Tower& tower);

}  // namespace swaymark
