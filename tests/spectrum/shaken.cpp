#include "tests/spectrum/shaken.hpp"

#include <algorithm>

#include "modal/damping.hpp"

namespace swaymark::test {

Eigen::VectorXd vector_of(std::initializer_list<double> values) {
  Eigen::VectorXd vector(static_cast<Index>(values.size()));
  std::copy(values.begin(), values.end(), vector.begin());
  return vector;
}

Vibrating::Vibrating(const Tower& stated)
    : tower(stated), assembly(assemble(tower)), problem(assembly.stiffness, assembly.mass) {
  ModeTarget target;
  target.count = tower.modes.count ? Index{*tower.modes.count} : problem.mode_count();
  set = find_modes(problem, assembly.stiffness, assembly.mass, inertia_vectors(assembly), target);
  REQUIRE(set.modes.usable());
}

SeismicResult shake(const Vibrating& vibrating) {
  const Eigen::VectorXd damping = modal_damping(vibrating.tower.damping, vibrating.set.modes.count());
  return seismic_analysis(vibrating.tower, vibrating.assembly, vibrating.problem, vibrating.set, damping);
}

SeismicResult shake(const Tower& tower) { return shake(Vibrating(tower)); }

void excite(Tower& tower, Axis axis, std::vector<std::pair<double, double>> points) {
  SpectrumStatement spectrum;
  spectrum.name = "spectrum " + std::to_string(tower.spectra.size() + 1);
  spectrum.points = std::move(points);
  tower.spectra.push_back(spectrum);
  if (!tower.seismic) tower.seismic.emplace();
  tower.seismic->spectrum[static_cast<std::size_t>(axis)] = tower.spectra.size() - 1;
  if (tower.damping.empty()) tower.damping = {0.05};
}

void excite(Tower& tower, Axis axis, double acceleration) {
  excite(tower, axis, {{0.0, acceleration}, {10.0, acceleration}});
}

Tower massless(int dimensions) {
  Tower tower = bare_tower(dimensions);
  tower.materials.front().density = 0.0;
  return tower;
}

}  // namespace swaymark::test
