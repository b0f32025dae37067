#include "core/tower.hpp"

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

TEST_CASE("a bar is named by its group and its number within it") {
  Tower tower = bare_tower(3);
  for (int i = 0; i < 3; ++i) add_node(tower, {1.0 * i, 0.0, 0.0});
  add_bar(tower, 0, 1);
  add_bar(tower, 1, 2);
  tower.groups.push_back({"plan bracing", 0, 0, {}});
  add_bar(tower, 0, 2);
  CHECK(tower.bar_name(0) == "bars-1");
  CHECK(tower.bar_name(1) == "bars-2");
  CHECK(tower.bar_name(2) == "plan bracing-1");
}

TEST_CASE("the extent is the diagonal of the box around the nodes") {
  Tower tower = bare_tower(3);
  CHECK(tower.extent() == 0.0);
  add_node(tower, {5.0, 5.0, 5.0});
  CHECK(tower.extent() == 0.0);
  add_node(tower, {-1.0, 7.0, 8.0});
  CHECK_THAT(tower.extent(), is_near(7.0, kRoundoff));  // 6, 2, 3
}

TEST_CASE("a tower moves along the axes of its dimensions") {
  CHECK(bare_tower(1).axes() == std::vector<Axis>{Axis::x});
  CHECK(bare_tower(2).axes() == std::vector<Axis>{Axis::x, Axis::z});
  CHECK(bare_tower(3).axes() == std::vector<Axis>{Axis::x, Axis::y, Axis::z});
}

TEST_CASE("schemes and rules carry the names of the tower file") {
  CHECK(name_of(MassScheme::consistent) == "consistent");
  CHECK(name_of(MassScheme::lumped) == "lumped");
  CHECK(name_of(MassScheme::averaged) == "averaged");
  CHECK(name_of(ModalRule::cqc) == "CQC");
  CHECK(name_of(ModalRule::srss) == "SRSS");
  CHECK(name_of(ModalRule::absolute_sum) == "absolute sum");
  CHECK(name_of(DirectionalRule::srss) == "SRSS");
  CHECK(name_of(DirectionalRule::percent_30) == "100-30");
  CHECK(name_of(DirectionalRule::percent_40) == "100-40");
  CHECK(name_of(BandDirection::x) == "x");
  CHECK(name_of(BandDirection::y) == "y");
  CHECK(name_of(BandDirection::z) == "z");
  CHECK(name_of(BandDirection::horizontal) == "horizontal");
  CHECK(name_of(BandDirection::any) == "any");
}

}  // namespace swaymark::test
