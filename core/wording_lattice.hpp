#pragma once

#include <cstddef>
#include <string_view>

#include "core/error.hpp"

/// What is wrong with a lattice by panels.
namespace swaymark::wording {

[[nodiscard]] Message lattice_needs_space(int dimensions);
[[nodiscard]] Message lattice_without_material();
[[nodiscard]] Message legs_meet(std::string_view text, double least);
[[nodiscard]] Message panel_too_low(std::string_view text, double least);
[[nodiscard]] Message lattice_too_high(double height, double limit);
[[nodiscard]] Message lattice_too_many_nodes(double nodes, std::size_t limit);
[[nodiscard]] Message k_without_horizontals();
[[nodiscard]] Message k_down_without_horizontals(bool lowest);
[[nodiscard]] Message diamond_without_mid_nodes();
[[nodiscard]] Message triangle_is_rigid_in_plan();

}  // namespace swaymark::wording
