#include "core/wording_masses.hpp"

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark::wording {

Message perimeter_too_short(double perimeter, double least) {
  return {fmt::format("a perimeter of {:.4g} m cannot enclose the area: a circle of it has {:.4g} m",
                      perimeter, least),
          "check both values and their units"};
}
Message perimeter_missing(const std::vector<std::string>& sections) {
  constexpr std::size_t most = 3;
  std::string names;
  for (std::size_t i = 0; i < sections.size() && i < most; ++i)
    names += fmt::format("{}'{}'", names.empty() ? "" : ", ", excerpt(sections[i]));
  if (sections.size() > most) names += fmt::format(" and {} more", sections.size() - most);
  return {fmt::format("ice needs the outline of its bars, and no perimeter is known of section{} {}",
                      sections.size() == 1 ? "" : "s", names),
          "add for example 'perimeter: 0.6 m' there, or give the section by 'size' or 'tube'"};
}
Message ice_on_nothing(std::string_view group) {
  return {group == "all" ? std::string("no bar lies within these heights")
                         : fmt::format("no bar of '{}' lies within these heights", excerpt(group)),
          "check 'from' and 'to', which are heights z, or remove the entry"};
}
Message heights_reversed(double from, double to) {
  return {fmt::format("the heights end at {:.6g} m, not above their begin at {:.6g} m", to, from),
          "exchange 'from' and 'to'"};
}
Message heights_in_one_dimension() {
  return {"a tower of 1 dimension has no heights", "remove 'from' and 'to', or name a group of its bars"};
}
Message liquid_in_one_dimension() {
  return {"a liquid needs to know what is upright, and a tower of 1 dimension does not tell",
          "carry its mass by 'mass', or write the tower in 2 or 3 dimensions"};
}
Message liquid_needs_label() {
  return {"the mass that sloshes has no name in the results", "add for example 'label: water'"};
}
Message liquid_label_taken(std::string_view label) {
  return {fmt::format(
              "the mass that sloshes takes its name from the label, and '{}' names something else already",
              excerpt(label)),
          "choose another label"};
}
Message liquid_without_mass() {
  return {"the mass of this liquid, or the spring of its sloshing, is beyond the range of numbers",
          "check 'radius', 'depth', 'density' and their units"};
}

}  // namespace swaymark::wording
