#include "core/dof_map.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// Two dimensions: node 1 held along both axes, node 2 along z only, node 3 free.
Tower partly_held() {
  Tower tower = bare_tower(2);
  for (int i = 0; i < 3; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  fix(tower, 0);
  Support roller;
  roller.node = 1;
  roller.fixed[2] = true;
  tower.supports.push_back(roller);
  return tower;
}

}  // namespace

TEST_CASE("every node has one degree of freedom along each axis of the tower") {
  const DofMap dofs(partly_held());
  REQUIRE(dofs.dof_count() == 6);
  for (std::size_t node = 0; node < 3; ++node) {
    for (std::size_t place = 0; place < 2; ++place) {
      const Index dof = dofs.dof(node, place);
      CHECK(dofs.node_of(dof) == node);
      CHECK(dofs.axis_of(dof) == dofs.axes()[place]);
    }
  }
}

TEST_CASE("free and fixed degrees of freedom share out all of them") {
  const DofMap dofs(partly_held());
  CHECK(dofs.fixed_dofs() == std::vector<Index>{0, 1, 3});
  CHECK(dofs.free_dofs() == std::vector<Index>{2, 4, 5});
  for (Index dof = 0; dof < dofs.dof_count(); ++dof) {
    CHECK((dofs.free(dof) < 0) != (dofs.fixed(dof) < 0));
  }
  CHECK(dofs.free(4) == 1);
  CHECK(dofs.fixed(3) == 2);
}

TEST_CASE("a spring leaves its degree of freedom free") {
  Tower tower = partly_held();
  tower.supports[1].spring[0] = 1e6;
  CHECK(DofMap(tower).free_count() == 3);
}

TEST_CASE("what is held along an axis the tower does not have does not count") {
  Tower tower = partly_held();
  tower.supports[1].fixed[1] = true;
  CHECK(DofMap(tower).fixed_count() == 3);
}

TEST_CASE("spreading free values and taking them back changes nothing") {
  const DofMap dofs(partly_held());
  const Eigen::Vector3d free(1.0, 2.0, 3.0);
  const Eigen::VectorXd all = dofs.expand(free);
  CHECK(all.size() == 6);
  CHECK(all(0) == 0.0);
  CHECK(all(2) == 1.0);
  CHECK(all(5) == 3.0);
  CHECK((dofs.free_part(all) - free).norm() == 0.0);
}

TEST_CASE("a tower held everywhere has nothing free") {
  Tower tower = bare_tower(3);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  const DofMap dofs(tower);
  CHECK(dofs.free_count() == 0);
  CHECK(dofs.expand(Eigen::MatrixXd(0, 2)).cols() == 2);
  CHECK(dofs.free_part(Eigen::Vector3d::Ones()).size() == 0);
}

}  // namespace swaymark::test
