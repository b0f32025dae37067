#include "core/assembly.hpp"
#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

TEST_CASE("every direction of M carries the whole mass, in every scheme") {
  // Common practice, no source.
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    Tower tower = regular_mast({});
    tower.mass_scheme = scheme;
    const Assembly assembly = assemble(tower);
    double total = 200.0;
    for (const BarElement& bar : assembly.bars) total += bar.mass();
    for (const Axis axis : kAllAxes) {
      const Eigen::VectorXd r = rigid_translation(assembly.dofs, axis);
      CHECK_THAT(r.dot(assembly.mass_all * r), is_near(total, kRoundoff));
    }
  }
}

}  // namespace swaymark::test
