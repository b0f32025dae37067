#include "core/wording_lattice.hpp"

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark::wording {

Message lattice_needs_space(int dimensions) {
  return {fmt::format("a lattice by panels stands in 3 dimensions, this tower in {}", dimensions),
          "remove 'dimensions', or write the tower by nodes and members"};
}
Message lattice_without_material() {
  return {"this panel has no material",
          "add 'material: steel' to the lattice for all panels, or to the panel for itself"};
}
Message legs_meet(std::string_view text, double least) {
  return {fmt::format("the legs meet: a width of '{}' is under {:.6g} m", excerpt(text), least),
          "end the panels at a small width and join their top corners to a node under 'nodes' by bars under "
          "'members'"};
}
Message panel_too_low(std::string_view text, double least) {
  return {fmt::format("a panel of height '{}' is lower than {:.6g} m", excerpt(text), least),
          "check the unit; bare numbers are metres"};
}
Message lattice_too_high(double height, double limit) {
  return {fmt::format("the panels add up to {:.6g} m, more than {:.6g} m", height, limit),
          "check heights, units and 'repeat'"};
}
Message lattice_too_many_nodes(double nodes, std::size_t limit) {
  return {fmt::format("the lattice would have {:.0f} nodes, more than {}", nodes, limit),
          "lower 'repeat', or use higher panels"};
}
Message k_without_horizontals() {
  return {"K-bracing meets in the middle of the horizontals at the panel's top, and there are none",
          "add 'horizontals: <section>' to the panel"};
}
Message k_down_without_horizontals(bool lowest) {
  return {"bracing 'K down' meets in the middle of the horizontals at the panel's foot, and there are none",
          lowest ? "add 'base_horizontals: <section>' to the lattice, or use 'bracing: K'"
                 : "add 'horizontals: <section>' to the panel below"};
}
Message diamond_without_mid_nodes() {
  return {"a diamond joins the middles of the horizontals, and no diagonals meet there",
          "brace by K, or use 'pattern: diagonal' or 'pattern: crossed'"};
}
Message triangle_is_rigid_in_plan() {
  return {"a triangle needs no diagonal in plan and has none",
          "remove 'plan_bracing', or use 'pattern: diamond' with K-bracing"};
}

}  // namespace swaymark::wording
