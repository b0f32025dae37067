#include "modal/participation.hpp"
#include "tests/laws/whole.hpp"

/// No mass is lost on its way from the tower to the modes.
namespace swaymark::test {

namespace {

const std::vector<MassScheme> kSchemes{MassScheme::consistent, MassScheme::lumped, MassScheme::averaged};

Tower loaded(MassScheme scheme) {
  Tower tower = lopsided_mast();
  tower.mass_scheme = scheme;
  LineMass ladder;
  ladder.per_length = 12.0;
  ladder.label = "ladder";
  tower.line_masses.push_back(ladder);
  Allowance bolts;
  bolts.share = 0.05;
  tower.allowances.push_back(bolts);
  tower.sections.front().perimeter = 0.3;
  tower.ice.push_back({std::nullopt, 0.03, 900.0, 1.0, 4.5, "glaze", {}});
  const std::size_t last = tower.nodes.size() - 1;
  stand_tank(tower, {last, last - 1}, 0.8, 1.1);
  return tower;
}

}  // namespace

TEST_CASE("the mass matrix adds up to the mass of the ledger in every direction and scheme") {
  for (const MassScheme scheme : kSchemes) {
    const Tower tower = loaded(scheme);
    const Assembly assembly = assemble(tower);
    const double total = mass_ledger(tower, assembly).total();
    for (const Axis axis : kAllAxes) {
      const Eigen::VectorXd r = rigid_translation(assembly.dofs, axis);
      CHECK_THAT(r.dot(assembly.mass_all * r), is_near(total, kRoundoff));
    }
  }
}

TEST_CASE("every direction of M carries the whole mass in every scheme") {
  // Common practice, no source.
  for (const MassScheme scheme : kSchemes) {
    Tower tower = regular_mast({});
    tower.mass_scheme = scheme;
    const Assembly assembly = assemble(tower);
    double total = Mast{}.top_mass;
    for (const BarElement& bar : assembly.bars) total += bar.mass();
    for (const Axis axis : kAllAxes) {
      const Eigen::VectorXd r = rigid_translation(assembly.dofs, axis);
      CHECK_THAT(r.dot(assembly.mass_all * r), is_near(total, kRoundoff));
    }
  }
}

TEST_CASE("every scheme has the same row sums and so the same nodal masses") {
  const Assembly lumped = assemble(loaded(MassScheme::lumped));
  const Eigen::VectorXd ones = Eigen::VectorXd::Ones(lumped.dofs.dof_count());
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::averaged}) {
    const Assembly other = assemble(loaded(scheme));
    CHECK_THAT((other.mass_all * ones).eval(), matrix_near(lumped.mass_all * ones, kRoundoff));
  }
}

TEST_CASE("effective masses of all modes add up to the moving mass of a tower in each direction") {
  for (const MassScheme scheme : kSchemes) {
    Tower tower = loaded(scheme);
    ask_for_all_modes(tower);
    const Analysis analysis = analysed(tower);
    REQUIRE(analysis.mode_count() == analysis.assembly.dofs.free_count());
    const Eigen::VectorXd sums = analysis.set.participation.array().square().colwise().sum().transpose();
    CHECK_THAT(sums, matrix_near(analysis.set.moving, kSolved));
    CHECK_THAT(analysis.mass_ratio.colwise().sum().eval(), matrix_near(Eigen::RowVector3d::Ones(), kSolved));
  }
}

TEST_CASE("moving mass and what the supports hold are the whole of a lumped tower") {
  const Analysis analysis = analysed(loaded(MassScheme::lumped));
  for (Index k = 0; k < 3; ++k) {
    CHECK_THAT(analysis.set.moving(k) + analysis.ledger.at_supports,
               is_near(analysis.ledger.total(), kSolved));
  }
}

TEST_CASE("a consistent tower moves more than its free nodes hold and less than the whole") {
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::averaged}) {
    const Analysis analysis = analysed(loaded(scheme));
    for (Index k = 0; k < 3; ++k) {
      CHECK(analysis.set.moving(k) > analysis.ledger.total() - analysis.ledger.at_supports);
      CHECK(analysis.set.moving(k) < analysis.ledger.total());
    }
  }
}

TEST_CASE("a rod of one consistent element moves three quarters of its mass") {
  // b = m/3 + m/6 = m/2, M = m/3: b^2 / M = 3 m / 4. Derived.
  const Analysis analysis = analysed(rod(1, 4.0, MassScheme::consistent));
  CHECK_THAT(analysis.set.moving(0), is_near(0.75 * 7850.0 * 1e-3 * 4.0, kRoundoff));
}

}  // namespace swaymark::test
