#include "apps/starter.hpp"

#include "apps/starter_data.hpp"

namespace swaymark {

std::vector<Starter> starters() {
  return {
      {"telecom-tower", "lattice by panels, antennas, spectrum, scenarios", starter_data::telecom_tower()},
      {"wind-turbine-tower", "lattice with a hub, rotor bands, soft ground",
       starter_data::wind_turbine_tower()},
      {"tank-stand", "tank on a braced stand, full and empty", starter_data::tank_stand()},
      {"plane-truss", "truss in one plane, node by node", starter_data::plane_truss()},
      {"nodes-and-bars", "any tower in space, node by node", starter_data::nodes_and_bars()},
  };
}

std::optional<Starter> starter_of(std::string_view kind) {
  for (const Starter& starter : starters()) {
    if (starter.kind == kind) return starter;
  }
  return std::nullopt;
}

}  // namespace swaymark
