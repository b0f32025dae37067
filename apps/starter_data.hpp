#pragma once

#include <string_view>

/// The files of data/starters, embedded when built.
namespace swaymark::starter_data {

std::string_view telecom_tower();
std::string_view wind_turbine_tower();
std::string_view tank_stand();
std::string_view plane_truss();
std::string_view nodes_and_bars();

}  // namespace swaymark::starter_data
