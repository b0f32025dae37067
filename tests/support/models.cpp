#include "tests/support/models.hpp"

#include <Eigen/Eigenvalues>

namespace swaymark::test {

Model model_of(const Tower& tower) {
  Model model{assemble(tower), {}};
  model.drive = inertia_vectors(model.assembly);
  return model;
}

Oracle oracle_of(const Eigen::MatrixXd& stiffness, const Eigen::MatrixXd& mass) {
  const Eigen::GeneralizedSelfAdjointEigenSolver<Eigen::MatrixXd> solver(stiffness, mass);
  REQUIRE(solver.info() == Eigen::Success);
  return {solver.eigenvalues().cwiseSqrt(), solver.eigenvectors()};
}

Oracle oracle_of(const Model& model) {
  return oracle_of(Eigen::MatrixXd(model.stiffness()), Eigen::MatrixXd(model.mass()));
}

void check_same_modes(const Modes& modes, const Oracle& oracle, const SparseMatrix& mass) {
  constexpr double clear_gap = 1e-4;  // the angle of a subspace is uncertain by rounding over the gap
  REQUIRE(modes.count() <= oracle.omega.size());
  for (Index j = 0; j < modes.count(); ++j) {
    INFO("mode " << j + 1);
    CHECK_THAT(modes.omega(j), is_near(oracle.omega(j), kTwoSolvers));
  }
  for (Index begin = 0; begin < modes.count();) {
    Index end = begin + 1;
    while (end < oracle.omega.size() && oracle.omega(end) / oracle.omega(end - 1) - 1.0 <= clear_gap) ++end;
    if (end > modes.count()) break;
    INFO("modes " << begin + 1 << " to " << end);
    CHECK_THAT(modes.shapes.middleCols(begin, end - begin).eval(),
               same_subspace(oracle.shapes.middleCols(begin, end - begin), mass));
    begin = end;
  }
}

Tower massless_mast(int legs, int panels) {
  Mast mast;
  mast.legs = legs;
  mast.panels = panels;
  Tower tower = regular_mast(mast);
  tower.materials.front().density = 0.0;
  return tower;
}

}  // namespace swaymark::test
