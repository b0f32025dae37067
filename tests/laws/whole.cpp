#include "tests/laws/whole.hpp"

#include <stdexcept>
#include <utility>

namespace swaymark::test {

Analysis analysed(Tower tower) { return analyse(std::move(tower), {}, Scope::check); }

void shake(Tower& tower, const std::vector<Axis>& axes) {
  SpectrumStatement spectrum;
  spectrum.name = "quay";
  spectrum.points = {{0.0, 1.0}, {0.02, 2.5}, {0.1, 2.5}, {2.0, 0.3}};  // invented, [s] and [m/s2]
  tower.spectra = {spectrum};
  SeismicStatement seismic;
  for (const Axis axis : axes) seismic.spectrum[static_cast<std::size_t>(axis)] = 0;
  tower.seismic = seismic;
  tower.damping = {0.02};
}

void ask_for_all_modes(Tower& tower) {
  tower.modes = {};
  tower.modes.count = static_cast<int>(DofMap(tower).free_count());
}

Tower lopsided_mast() {
  Mast mast;
  mast.legs = 4;
  mast.panels = 3;
  Tower tower = regular_mast(mast);
  carry(tower, tower.nodes.size() - 3, 170.0);
  carry(tower, 6, 90.0);
  return tower;
}

const DirectionResult& along(const Analysis& analysis, Axis axis) {
  for (const DirectionResult& direction : analysis.seismic->directions) {
    if (direction.axis == axis) return direction;
  }
  throw std::logic_error("the axis is not excited");
}

std::map<std::string, double> peaks_by_name(const Analysis& analysis) {
  std::map<std::string, double> peaks;
  const Tower& tower = analysis.tower;
  const SeismicResult& seismic = *analysis.seismic;
  for (std::size_t b = 0; b < tower.bars.size(); ++b) {
    peaks["bar " + tower.bar_name(b)] = seismic.bar_force(static_cast<Index>(b));
    peaks["gravity " + tower.bar_name(b)] = seismic.bar_gravity(static_cast<Index>(b));
  }
  const DofMap& dofs = analysis.assembly.dofs;
  for (Index i = 0; i < dofs.free_count(); ++i) {
    const Index dof = dofs.free_dofs()[static_cast<std::size_t>(i)];
    const std::string place =
        tower.nodes[dofs.node_of(dof)].name + " " + std::string(name_of(dofs.axis_of(dof)));
    peaks["displacement " + place] = seismic.displacement(i);
  }
  for (std::size_t i = 0; i < seismic.supports.size(); ++i) {
    const SupportDof& support = seismic.supports[i];
    const std::string place = tower.nodes[support.node].name + " " + std::string(name_of(support.axis));
    peaks["reaction " + place] = seismic.reaction(static_cast<Index>(i));
    peaks["gravity at " + place] = seismic.reaction_gravity(static_cast<Index>(i));
  }
  for (const DirectionResult& direction : seismic.directions) {
    peaks["base shear " + std::string(name_of(direction.axis))] = direction.base_shear;
    if (direction.overturning_moment)
      peaks["overturning " + std::string(name_of(direction.axis))] = *direction.overturning_moment;
  }
  return peaks;
}

void check_same_peaks(const std::map<std::string, double>& actual,
                      const std::map<std::string, double>& expected) {
  REQUIRE(actual.size() == expected.size());
  std::map<std::string, double> largest;
  for (const auto& [name, value] : expected) {
    double& most = largest[name.substr(0, name.find(' '))];
    most = std::max(most, std::abs(value));
  }
  for (const auto& [name, value] : expected) {
    INFO(name);
    REQUIRE(actual.count(name) == 1);
    CHECK_THAT(actual.at(name), is_near(value, kSolved, kSolved * largest[name.substr(0, name.find(' '))]));
  }
}

}  // namespace swaymark::test
