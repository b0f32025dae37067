// Uses the installed libraries: the period of one mass on one bar, T = 2 pi sqrt(m L / (E A)).
#include <cmath>
#include <numbers>

#include "core/assembly.hpp"
#include "core/tower_file.hpp"
#include "modal/eigenproblem.hpp"
#include "spectrum/combine_modes.hpp"

int main() {
  const swaymark::Tower tower = swaymark::read_tower(R"(
swaymark: 1
dimensions: 1
materials: {steel: {E: 210 GPa, density: 0}}
sections: {bar: {area: 10 cm2}}
nodes: {a: [0], b: [2]}
members: [{group: bars, section: bar, material: steel, bars: [[a, b]]}]
supports: [{nodes: [a], fixed: [x]}]
masses: [{nodes: [b], mass: 1 t}]
)",
                                                     "tower.yaml");
  const swaymark::Assembly assembly = swaymark::assemble(tower);
  const swaymark::Modes modes = swaymark::Eigenproblem(assembly.stiffness, assembly.mass).lowest(1);
  const double omega = std::sqrt(210e9 * 1e-3 / 2.0 / 1000.0);
  const bool found = modes.usable() && std::abs(modes.omega(0) / omega - 1.0) < 1e-12;
  const bool correlated = swaymark::cqc_correlation(omega, omega, 0.05, 0.05) > 0.999999;
  return found && correlated ? 0 : 1;
}
