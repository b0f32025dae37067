#include "core/cure.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

FreeMotions motions_of(const Tower& tower) { return find_free_motions(tower, assemble(tower)); }

using Words = std::vector<std::string>;

}  // namespace

TEST_CASE("a panel that sways is held by either of its diagonals") {
  const Tower tower = portal();
  const FreeMotions motions = motions_of(tower);
  const Cures cures(tower, motions);
  Words bars = cures.bars(motions.list.front());
  std::sort(bars.begin(), bars.end());
  CHECK(bars == Words{"a bar from 3 to 2", "a bar from 4 to 1"});
}

TEST_CASE("a support against sway is named at a node that sways") {
  const Tower tower = portal();
  const FreeMotions motions = motions_of(tower);
  CHECK(Cures(tower, motions).supports(motions.list) == Words{"hold node 3 along x by a support"});
}

TEST_CASE("a bar from one free node to another is no cure where both move along it") {
  // Two nodes in the middle of opposite flat panels, each free along y.
  Tower tower = bare_tower(3);
  for (const double y : {0.0, 2.0}) {
    const std::size_t first = tower.nodes.size();
    for (const double x : {-1.0, 1.0}) {
      for (const double z : {0.0, 2.0}) fix(tower, add_node(tower, {x, y, z}));
    }
    const std::size_t middle = add_node(tower, {0.0, y, 1.0});
    for (std::size_t corner = first; corner < middle; ++corner) add_bar(tower, corner, middle);
  }
  const FreeMotions motions = motions_of(tower);
  REQUIRE(motions.list.size() == 2);
  const Words bars = Cures(tower, motions).bars(motions.list.front());
  REQUIRE(!bars.empty());
  for (const std::string& bar : bars) CHECK_THAT(bar, !Catch::EndsWith("to 10"));
}

TEST_CASE("a bar that would lie along others is no cure") {
  // Three nodes of a line, held at the ends: a bar between the ends holds nothing and is not named.
  Tower tower = bare_tower(2);
  for (int i = 0; i < 3; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  fix(tower, 0);
  fix(tower, 2);
  add_bar(tower, 0, 1);
  add_bar(tower, 1, 2);
  const FreeMotions motions = motions_of(tower);
  CHECK(Cures(tower, motions).bars(motions.list.front()).empty());
}

TEST_CASE("supports for several motions of one body hold them all") {
  Tower tower = bare_tower(2);
  add_node(tower, {0.0, 0.0, 0.0});
  add_node(tower, {2.0, 0.0, 0.0});
  add_node(tower, {1.0, 0.0, 1.0});
  for (std::size_t i = 0; i < 3; ++i) add_bar(tower, i, (i + 1) % 3);
  const FreeMotions motions = motions_of(tower);
  const Words words = Cures(tower, motions).supports(motions.list);
  REQUIRE(words.size() == 3);
  for (const std::string& cure : words) {
    Support support;
    support.node = std::stoul(cure.substr(10)) - 1;
    support.fixed[cure.find("along x") != std::string::npos ? 0 : 2] = true;
    const auto known = std::find_if(tower.supports.begin(), tower.supports.end(),
                                    [&](const Support& other) { return other.node == support.node; });
    if (known == tower.supports.end()) {
      tower.supports.push_back(support);
    } else {
      for (std::size_t a = 0; a < 3; ++a) known->fixed[a] = known->fixed[a] || support.fixed[a];
    }
  }
  CHECK(motions_of(tower).list.empty());
}

TEST_CASE("a direction is told by its axis where it has one") {
  CHECK(direction_words({0.0, -1.0, 0.0}) == "y");
  CHECK(direction_words({0.0, 0.0, 3.0}) == "z");
  CHECK(direction_words({0.5, 0.0, 1.0}) == "(0.5, 0, 1)");
}

}  // namespace swaymark::test
