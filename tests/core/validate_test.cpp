#include "core/validate.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

std::vector<std::string> faults_in(const Tower& tower) {
  FaultList faults(tower.file);
  validate(tower, faults);
  std::vector<std::string> found;
  try {
    faults.throw_if_any();
  } catch (const InputError& error) {
    for (const Fault& fault : error.faults()) found.push_back(fault.message.what);
  }
  return found;
}

// Nodes 1, 2, 3 of a triangle without bars.
Tower triangle() {
  Tower tower = bare_tower(2);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {2.0, 0.0, 0.0});
  add_node(tower, {1.0, 0.0, 1.0});
  return tower;
}

using Texts = std::vector<std::string>;

}  // namespace

TEST_CASE("a sound structure has no faults") {
  Tower tower = triangle();
  add_bar(tower, 0, 1);
  add_bar(tower, 1, 2);
  add_bar(tower, 2, 0);
  CHECK(faults_in(tower).empty());
  CHECK(faults_in(regular_mast({})).empty());
  CHECK(faults_in(Tower{}).empty());
}

TEST_CASE("nodes at the same place are one fault for each beyond the first") {
  Tower tower = triangle();
  add_node(tower, {2.0, 0.0, 0.0});
  add_node(tower, {2.0, 0.0, 0.0});
  CHECK(faults_in(tower) ==
        Texts{"nodes '2' and '4' stand at the same place", "nodes '2' and '5' stand at the same place"});
}

TEST_CASE("nodes less than a micron apart coincide wherever they lie") {
  // 1e-6 m is the tolerance of validate; half of it must be found on any grid.
  for (int i = 0; i < 40; ++i) {
    const double x = 0.1e-6 * i;
    Tower tower = bare_tower(3);
    add_node(tower, {x, 1.0, 0.0});
    add_node(tower, {x + 0.5e-6, 1.0, 0.0});
    INFO(i);
    CHECK(faults_in(tower).size() == 1);
  }
}

TEST_CASE("nodes a hundredth of a millimetre apart are two nodes") {
  Tower tower = triangle();
  add_node(tower, {2.0 + 1e-5, 0.0, 0.0});
  CHECK(faults_in(tower).empty());
}

TEST_CASE("a bar from a node to itself is refused once") {
  Tower tower = triangle();
  add_bar(tower, 1, 1);
  CHECK(faults_in(tower) == Texts{"bar bars-1 joins node '2' to itself"});
}

TEST_CASE("a bar between nodes at the same place has no length") {
  Tower tower = triangle();
  add_node(tower, {2.0, 0.0, 0.0});
  add_bar(tower, 1, 3);
  CHECK(faults_in(tower) == Texts{"nodes '2' and '4' stand at the same place",
                                  "bar bars-1 has no length: nodes '2' and '4' stand at the same place"});
}

TEST_CASE("two bars between the same nodes are refused whichever way they run") {
  Tower tower = triangle();
  add_bar(tower, 0, 1);
  add_bar(tower, 1, 0);
  add_bar(tower, 0, 1);
  CHECK(faults_in(tower) == Texts{"bar bars-2 joins nodes '2' and '1', as bar bars-1 does already",
                                  "bar bars-3 joins nodes '1' and '2', as bar bars-1 does already"});
}

TEST_CASE("a tower that stands loose is no fault of the input") {
  Tower tower = triangle();
  add_bar(tower, 0, 1);
  CHECK(faults_in(tower).empty());
}

}  // namespace swaymark::test
