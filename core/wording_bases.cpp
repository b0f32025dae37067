#include "core/wording_bases.hpp"

#include <fmt/format.h>

namespace swaymark::wording {

Message pad_in_one_dimension() {
  return {"a pad needs to know what is upright, and a tower of 1 dimension does not tell",
          "give 'springs: {x: ...}', or write the tower in 2 or 3 dimensions"};
}
Message pad_beside(std::string_view key) {
  return {fmt::format("'{}' stands beside 'pad', which holds every axis of its nodes already", key),
          fmt::format("remove '{}' or 'pad'", key)};
}
Message pad_too_slender(double ratio, double limit) {
  return {fmt::format("a pad of {:.4g} times its width is a strip; the formulas are for up to {:.4g}", ratio,
                      limit),
          "check 'length' and 'width', or give 'springs' by value"};
}
Message pad_without_stiffness() {
  return {"the springs of this pad are beyond the range of numbers",
          "check 'length', 'width', 'shear_modulus' and their units"};
}
Message poisson_out_of_range(double value) {
  return {fmt::format("no soil has a Poisson's ratio of {:.4g} here: 0 <= nu < 0.5 is wanted", value),
          "common are 0.2 to 0.35 for sand and 0.4 to 0.49 for wet clay"};
}
Message stabilised_twice(std::string_view node, Place first) {
  return {fmt::format("node '{}' is stabilised twice, first in line {}", node, first.line),
          "remove it from one of the lists"};
}
Message stabilise_without_bars(std::string_view node) {
  return {fmt::format("no bar joins node '{}', and 'stabilise' holds a node against its neighbours", node),
          "join it to the tower by bars, or remove it"};
}
Message nothing_to_stabilise(std::string_view node) {
  return {
      fmt::format("node '{}' is not free in a direction of its own, so that 'stabilise' has nothing to hold",
                  node),
      "remove it from the list; what moves several nodes together is held by a bar or a support"};
}
Message study_is_a_range(std::string_view came) {
  return {fmt::format("'base_study' wants two stiffnesses, got {}", came),
          "write for example [20 kN/mm, 1000 kN/mm]: the softest and the stiffest support"};
}
Message study_reversed(double from, double to) {
  return {fmt::format("the range ends at {:.6g} N/m, not above its begin at {:.6g} N/m", to, from),
          "exchange the two"};
}
Message study_of_nothing(std::string_view axis) {
  return {
      fmt::format("'base_study' puts springs in place of supports fixed along {}, and there are none", axis),
      "fix that axis at the supports, or remove the key"};
}

}  // namespace swaymark::wording
