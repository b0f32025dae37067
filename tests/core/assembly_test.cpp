#include "core/assembly.hpp"

#include <limits>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// Two bars of 10 cm2 to a free node: 5 m long along (0.6, 0.8) from node 1, 15 m along (-0.8, 0.6) from
// node 2. EA/L is 42 and 14 MN/m, the masses are 39.25 and 117.75 kg.
Tower two_bars() {
  Tower tower = bare_tower(2);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  fix(tower, add_node(tower, {15.0, 0.0, -5.0}));
  add_node(tower, {3.0, 0.0, 4.0});
  add_bar(tower, 0, 2);
  add_bar(tower, 1, 2);
  return tower;
}

constexpr double kFirst = 39.25;
constexpr double kSecond = 117.75;

}  // namespace

TEST_CASE("the stiffness of two bars is that of a computation by hand") {
  const Assembly assembly = assemble(two_bars());
  Eigen::Matrix2d free;
  free << 24.08e6, 13.44e6, 13.44e6, 31.92e6;
  CHECK_THAT(Eigen::MatrixXd(assembly.stiffness), matrix_near(free, kRoundoff));
  Eigen::MatrixXd support(4, 2);
  support << -15.12e6, -20.16e6, -20.16e6, -26.88e6, -8.96e6, 6.72e6, 6.72e6, -5.04e6;
  CHECK_THAT(Eigen::MatrixXd(assembly.support_stiffness), matrix_near(support, kRoundoff));
}

TEST_CASE("the forces of two bars follow from displacements with tension positive") {
  const Assembly assembly = assemble(two_bars());
  Eigen::Matrix2d axial;
  axial << 42e6 * 0.6, 42e6 * 0.8, 14e6 * -0.8, 14e6 * 0.6;
  CHECK_THAT(Eigen::MatrixXd(assembly.axial), matrix_near(axial, kRoundoff));
}

TEST_CASE("the masses of two bars are those of a computation by hand in every scheme") {
  struct Case {
    MassScheme scheme;
    double own;
    double other;
  };
  for (const Case& c :
       {Case{MassScheme::consistent, 1.0 / 3.0, 1.0 / 6.0}, Case{MassScheme::lumped, 0.5, 0.0},
        Case{MassScheme::averaged, 5.0 / 12.0, 1.0 / 12.0}}) {
    Tower tower = two_bars();
    tower.mass_scheme = c.scheme;
    const Assembly assembly = assemble(tower);
    CHECK_THAT(Eigen::MatrixXd(assembly.mass),
               matrix_near((kFirst + kSecond) * c.own * Eigen::Matrix2d::Identity(), kRoundoff));
    Eigen::MatrixXd support(4, 2);
    support << kFirst * c.other * Eigen::Matrix2d::Identity(),
        kSecond * c.other * Eigen::Matrix2d::Identity();
    CHECK((Eigen::MatrixXd(assembly.support_mass) - support).cwiseAbs().maxCoeff() <= kRoundoff * kSecond);
  }
}

TEST_CASE("ground motion reaches the free nodes also through the mass they share with the supports") {
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    Tower tower = two_bars();
    tower.mass_scheme = scheme;
    const Assembly assembly = assemble(tower);
    // b = M_ff r_f + M_fs r_s: half of each bar in every scheme.
    const Eigen::Vector2d along_x(0.5 * (kFirst + kSecond), 0.0);
    const Eigen::Vector2d along_z(0.0, 0.5 * (kFirst + kSecond));
    CHECK_THAT(Eigen::MatrixXd(inertia_vector(assembly, rigid_translation(assembly.dofs, Axis::x))),
               matrix_near(along_x, kRoundoff));
    CHECK_THAT(Eigen::MatrixXd(inertia_vector(assembly, rigid_translation(assembly.dofs, Axis::z))),
               matrix_near(along_z, kRoundoff));
  }
}

TEST_CASE("carried masses act in every direction at the nodes that share them") {
  Tower tower = two_bars();
  tower.mass_scheme = MassScheme::lumped;
  const Eigen::MatrixXd bare = Eigen::MatrixXd(assemble(tower).mass_all);
  tower.node_masses.push_back({{0, 2}, 60.0, "", {}});
  const Eigen::MatrixXd added = Eigen::MatrixXd(assemble(tower).mass_all) - bare;
  Eigen::VectorXd expected(6);
  expected << 30.0, 30.0, 0.0, 0.0, 30.0, 30.0;
  CHECK_THAT(added, matrix_near(expected.asDiagonal(), kRoundoff));
}

TEST_CASE("a spring adds to the diagonal and leaves its node free") {
  Tower tower = two_bars();
  const Eigen::MatrixXd rigid(assemble(tower).stiffness);
  Support spring;
  spring.node = 2;
  spring.spring[2] = 5e6;
  tower.supports.push_back(spring);
  const Assembly assembly = assemble(tower);
  Eigen::Matrix2d expected = rigid;
  expected(1, 1) += 5e6;
  CHECK_THAT(Eigen::MatrixXd(assembly.stiffness), matrix_near(expected, kRoundoff));
  CHECK(assembly.springs == Eigen::Vector2d(0.0, 5e6));
}

TEST_CASE("in one dimension bars are springs in a row") {
  const Assembly assembly = assemble(rod(2, 2.0, MassScheme::lumped));
  const double k = 210e9 * 1e-3;  // EA/L of a metre
  Eigen::Matrix2d expected;
  expected << 2.0 * k, -k, -k, k;
  CHECK_THAT(Eigen::MatrixXd(assembly.stiffness), matrix_near(expected, kRoundoff));
}

TEST_CASE("bars of any direction give symmetric matrices that turning the bars around does not change") {
  std::mt19937 random(7);
  for (const int dimensions : {1, 2, 3}) {
    Tower tower = random_truss(dimensions, 12, random);
    const Assembly assembly = assemble(tower);
    const Eigen::MatrixXd stiffness(assembly.stiffness);
    const Eigen::MatrixXd mass(assembly.mass_all);
    CHECK_THAT(stiffness, matrix_near(stiffness.transpose(), kRoundoff));
    CHECK_THAT(mass, matrix_near(mass.transpose(), kRoundoff));
    for (Bar& bar : tower.bars) std::swap(bar.from, bar.to);
    const Assembly turned = assemble(tower);
    CHECK_THAT(Eigen::MatrixXd(turned.stiffness), matrix_near(stiffness, kRoundoff));
    CHECK_THAT(Eigen::MatrixXd(turned.mass_all), matrix_near(mass, kRoundoff));
  }
}

TEST_CASE("a rigid motion of a tower strains none of its bars") {
  Tower tower = regular_mast({});
  tower.supports.clear();
  const Assembly assembly = assemble(tower);
  const double largest = assembly.stiffness.coeffs().cwiseAbs().maxCoeff();
  for (const Axis axis : kAllAxes) {
    const Eigen::VectorXd force = assembly.stiffness * rigid_translation(assembly.dofs, axis);
    CHECK(force.cwiseAbs().maxCoeff() <= kRoundoff * largest);
  }
  for (const Axis axis : {Axis::x, Axis::y}) {
    const Eigen::VectorXd tilt = rigid_tilt(tower, assembly.dofs, axis, {0.3, -0.2, 1.0});
    CHECK((assembly.stiffness * tilt).cwiseAbs().maxCoeff() <= kRoundoff * largest * tower.extent());
  }
}

TEST_CASE("a tilt moves what lies above its centre along its direction") {
  const Tower tower = two_bars();
  const Assembly assembly = assemble(tower);
  const Eigen::VectorXd tilt = rigid_tilt(tower, assembly.dofs, Axis::x, {1.0, 0.0, 1.0});
  CHECK(tilt.tail(2) == Eigen::Vector2d(3.0, -2.0));  // node 3 lies 3 m above and 2 m beside the centre
}

TEST_CASE("a tower that is held everywhere has empty matrices") {
  Tower tower = two_bars();
  fix(tower, 2);
  const Assembly assembly = assemble(tower);
  CHECK(assembly.stiffness.size() == 0);
  CHECK(assembly.mass.size() == 0);
  CHECK(assembly.mass_all.rows() == 6);
}

TEST_CASE("a stiffness or mass that is not finite stops the computation and names the bar") {
  Tower tower = two_bars();
  tower.materials[0].youngs_modulus = std::numeric_limits<double>::max();
  tower.sections[0].area = 1e10;
  CHECK_THROWS_WITH(assemble(tower), Catch::Contains("bar bars-1 is not finite"));
}

TEST_CASE("a spring that stabilises acts along the open direction of its node alone") {
  // Two bars in line along (1, 1): the spring acts along (1, -1).
  Tower tower = bare_tower(2);
  for (const double s : {0.0, 2.0, 1.0}) add_node(tower, {s, 0.0, s});
  fix(tower, 0);
  fix(tower, 1);
  add_bar(tower, 0, 2);
  add_bar(tower, 1, 2);
  const Eigen::MatrixXd before(assemble(tower).stiffness);
  tower.stabilisers.push_back({2, 6.0, {}});
  const Assembly assembly = assemble(tower);
  REQUIRE(assembly.stabilisers.size() == 1);
  CHECK(assembly.stabilisers[0].node == 2);
  Eigen::Matrix2d expected;
  expected << 3.0, -3.0, -3.0, 3.0;
  // The difference of two large matrices: rounding of the bars' stiffness.
  CHECK((Eigen::MatrixXd(assembly.stiffness) - before - expected).cwiseAbs().maxCoeff() <=
        kRoundoff * before.maxCoeff());
}

}  // namespace swaymark::test
