#include "tests/core/written.hpp"

#include <fmt/format.h>

namespace swaymark::test {

std::string parts_of(const Tower& tower) {
  std::string text = "sections: {";
  for (const Section& section : tower.sections)
    text += fmt::format("{}: {{area: {}}}, ", section.name, section.area);
  text += "}\nmaterials: {";
  for (const Material& material : tower.materials)
    text +=
        fmt::format("{}: {{E: {}, density: {}}}, ", material.name, material.youngs_modulus, material.density);
  text += "}\nmembers:\n";
  for (const Group& group : tower.groups)
    text += fmt::format("  - {{group: {}, section: {}, material: {}}}\n", group.name,
                        tower.sections[group.section].name, tower.materials[group.material].name);
  return text;
}

}  // namespace swaymark::test
