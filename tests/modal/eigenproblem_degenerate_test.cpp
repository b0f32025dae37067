#include <Eigen/Eigenvalues>

#include "modal/eigenproblem.hpp"
#include "tests/support/models.hpp"

/// Structures on which eigensolvers lose modes or digits without a word.
namespace swaymark::test {

namespace {

// The modes of M = diag(M_mm, 0): static condensation of the degrees of freedom without mass by hand,
//   K_c = K_mm - K_ms K_ss^-1 K_sm,    phi_s = -K_ss^-1 K_sm phi_m.
Oracle condensed(const Model& model) {
  const Eigen::MatrixXd stiffness(model.stiffness());
  const Eigen::MatrixXd mass(model.mass());
  std::vector<Index> heavy;
  std::vector<Index> light;
  for (Index i = 0; i < mass.rows(); ++i) (mass(i, i) > 0.0 ? heavy : light).push_back(i);
  const Eigen::MatrixXd follow = -stiffness(light, light).llt().solve(stiffness(light, heavy));
  const Oracle small =
      oracle_of(stiffness(heavy, heavy) + stiffness(heavy, light) * follow, mass(heavy, heavy));
  Oracle whole{small.omega, Eigen::MatrixXd(mass.rows(), small.omega.size())};
  whole.shapes(heavy, Eigen::all) = small.shapes;
  whole.shapes(light, Eigen::all) = follow * small.shapes;
  return whole;
}

using Extended = Eigen::Matrix<long double, Eigen::Dynamic, Eigen::Dynamic>;

// All frequencies of bars alone in extended precision, with matrices summed bar by bar in extended precision.
Eigen::VectorXd extended_frequencies(const Tower& tower) {
  const DofMap dofs(tower);
  const MassShares shares = mass_shares(tower.mass_scheme);
  Extended stiffness = Extended::Zero(dofs.free_count(), dofs.free_count());
  Extended mass = stiffness;
  const auto add = [&](Extended& matrix, std::size_t n, std::size_t i, std::size_t m, std::size_t j,
                       double v) {
    const Index row = dofs.free(dofs.dof(n, i));
    const Index column = dofs.free(dofs.dof(m, j));
    if (row >= 0 && column >= 0) matrix(row, column) += static_cast<long double>(v);
  };
  const auto axes = tower.axes();
  for (const BarElement& bar : bar_elements(tower)) {
    for (std::size_t i = 0; i < axes.size(); ++i) {
      for (const std::size_t end : {bar.from, bar.to}) {
        const std::size_t other = end == bar.from ? bar.to : bar.from;
        add(mass, end, i, end, i, shares.own_end * bar.mass());
        add(mass, end, i, other, i, shares.other_end * bar.mass());
        for (std::size_t j = 0; j < axes.size(); ++j) {
          const double k =
              bar.axial_stiffness * bar.direction[index_of(axes[i])] * bar.direction[index_of(axes[j])];
          add(stiffness, end, i, end, j, k);
          add(stiffness, end, i, other, j, -k);
        }
      }
    }
  }
  const Eigen::GeneralizedSelfAdjointEigenSolver<Extended> solver(stiffness, mass, Eigen::EigenvaluesOnly);
  REQUIRE(solver.info() == Eigen::Success);
  return solver.eigenvalues().cwiseSqrt().cast<double>();
}

}  // namespace

TEST_CASE("no mode of the lowest twenty is missing on regular polygonal masts") {
  // Their repeated modes are what a Lanczos method started from one vector passes over.
  int masts = 0;
  for (const int legs : {3, 4, 5, 6, 8}) {
    for (const int panels : {6, 7, 8, 9, 10}) {
      for (const double top_radius : {1.0, 0.4}) {
        Mast mast;
        mast.legs = legs;
        mast.panels = panels;
        mast.top_radius = top_radius;
        mast.turn = 0.3 * panels;
        INFO(legs << " legs, " << panels << " panels, top radius " << top_radius);
        const Model model = model_of(regular_mast(mast));
        const Oracle oracle = oracle_of(model);
        const Modes modes = model.problem().lowest(20, EigenMethod::shift_invert);
        REQUIRE(modes.status == ModesStatus::complete);
        REQUIRE(modes.count() >= 20);
        check_same_modes(modes, oracle, model.mass());
        CHECK_THAT(modes.shapes, m_orthonormal(model.mass()));
        ++masts;
      }
    }
  }
  CHECK(masts == 50);
}

TEST_CASE("many copies of one mode are all found") {
  // Thirty equal pendulums side by side share every frequency.
  Tower tower = bare_tower(1);
  tower.mass_scheme = MassScheme::lumped;
  for (int i = 0; i < 30; ++i) {
    std::size_t before = add_node(tower, {0.0, 0.0, 0.0});
    fix(tower, before);
    for (int k = 1; k <= 6; ++k) {
      const std::size_t next = add_node(tower, {1.0 * k, 0.0, 0.0});
      add_bar(tower, before, next);
      before = next;
    }
  }
  const Model model = model_of(tower);
  const Oracle oracle = oracle_of(model);
  for (const EigenMethod method : {EigenMethod::automatic, EigenMethod::shift_invert}) {
    const Modes modes = model.problem().lowest(5, method);
    REQUIRE(modes.status == ModesStatus::complete);
    CHECK(modes.count() == 30);
    check_same_modes(modes, oracle, model.mass());
  }
}

TEST_CASE("degrees of freedom without mass follow statically") {
  for (const int legs : {3, 4, 6}) {
    for (const int panels : {2, 4, 14}) {
      INFO(legs << " legs, " << panels << " panels");
      const Model model = model_of(massless_mast(legs, panels));
      const Oracle oracle = condensed(model);
      const Eigenproblem problem = model.problem();
      CHECK(problem.mode_count() == 3 * legs);
      CHECK(problem.most_modes() == 3 * legs);
      for (const Index count : {Index{1}, Index{5}, problem.mode_count(), Index{1000}}) {
        const Modes modes = problem.lowest(count);
        INFO(count << " modes asked for");
        REQUIRE(modes.status == ModesStatus::complete);
        REQUIRE(modes.count() >= std::min(count, problem.mode_count()));
        check_same_modes(modes, oracle, model.mass());
      }
    }
  }
}

TEST_CASE("one heavy node among many without mass has as many modes as axes") {
  std::mt19937 random(41);
  Tower tower = random_truss(3, 60, random);
  tower.materials.front().density = 0.0;
  tower.node_masses.clear();
  carry(tower, 40, 300.0);
  const Model model = model_of(tower);
  const Modes modes = model.problem().lowest(100);
  REQUIRE(modes.status == ModesStatus::complete);
  CHECK(modes.count() == 3);
  check_same_modes(modes, condensed(model), model.mass());
}

TEST_CASE("areas spread over ten powers of ten keep eigenvalues to a millionth") {
  constexpr double eigenvalue_error = 1e-6;  // measured limit of double precision at this spread
  std::mt19937 random(42);
  std::uniform_real_distribution<double> exponent(-5.0, 5.0);
  for (int i = 0; i < 10; ++i) {
    Tower tower = random_truss(2, 20, random);
    tower.node_masses.clear();
    for (Section& section : tower.sections) section.area = 1e-3 * std::pow(10.0, exponent(random));
    const Eigen::VectorXd expected = extended_frequencies(tower);
    const Model model = model_of(tower);
    const Modes modes = model.problem().lowest(10);
    INFO("truss " << i);
    REQUIRE(modes.usable());
    for (Index j = 0; j < modes.count(); ++j) {
      INFO("mode " << j + 1);
      CHECK_THAT(std::pow(modes.omega(j), 2), is_near(std::pow(expected(j), 2), eigenvalue_error));
    }
  }
}

TEST_CASE("a set of modes may end just below another mode") {
  // Two masses whose frequencies differ by half a percent.
  Tower tower = bare_tower(1);
  tower.materials.front().density = 0.0;
  for (const double mass : {100.0, 99.0}) {
    const std::size_t ground = add_node(tower, {0.0, 0.0, 0.0});
    const std::size_t free = add_node(tower, {1.0, 0.0, 0.0});
    fix(tower, ground);
    add_bar(tower, ground, free);
    carry(tower, free, mass);
  }
  const Model model = model_of(tower);
  const Eigenproblem problem = model.problem();
  const Modes one = problem.lowest(1);
  REQUIRE(one.status == ModesStatus::complete);
  CHECK(one.count() == 1);
  const Modes again = problem.first(one, 1);
  CHECK(again.status == ModesStatus::complete);
  CHECK(again.certificate->below == 1);
}

}  // namespace swaymark::test
