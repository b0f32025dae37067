#include "apps/plausibility.hpp"

#include <algorithm>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

std::vector<std::string> notes_for(Tower tower) {
  return plausibility_notes(analyse(std::move(tower), {}, Scope::modes));
}

bool mentions(const std::vector<std::string>& notes, const std::string& words) {
  return std::any_of(notes.begin(), notes.end(),
                     [&](const std::string& note) { return note.find(words) != std::string::npos; });
}

}  // namespace

TEST_CASE("a common tower gets no word on plausibility") { CHECK(notes_for(regular_mast({})).empty()); }

TEST_CASE("steel of the wrong density is noted and other metals are not") {
  Tower tower = regular_mast({});
  tower.materials[0].density = 785.0;
  CHECK(mentions(notes_for(tower), "modulus of steel"));
  tower.materials[0] = {"aluminium", 70e9, 2700.0, {}, {}};
  CHECK_FALSE(mentions(notes_for(tower), "kg/m3"));
  tower.materials[0] = {"feather", 70e9, 27.0, {}, {}};
  CHECK(mentions(notes_for(tower), "no metal's"));
}

TEST_CASE("a mass equal to that of the bars is asked about") {
  Tower tower = regular_mast({});
  double bars = 0.0;
  for (const BarElement& bar : bar_elements(tower)) bars += bar.own_mass;
  tower.node_masses[0].total = bars;
  CHECK(mentions(notes_for(tower), "counted twice"));
  tower.node_masses[0].total = 1.1 * bars;
  CHECK_FALSE(mentions(notes_for(tower), "counted twice"));
}

TEST_CASE("a tower that carries far more than itself and sways slowly is asked about") {
  Tower tower = regular_mast({});
  tower.node_masses[0].total = 4e6;
  const auto notes = notes_for(tower);
  CHECK(mentions(notes, "times the mass of its bars"));
  CHECK(mentions(notes, "kg on a height of"));
  CHECK(mentions(notes, "f1 ="));
}

TEST_CASE("a bar much longer than the tower is high is named") {
  Tower tower = bare_tower(2);
  for (const double x : {0.0, 10.0}) fix(tower, add_node(tower, {x, 0.0, 0.0}));
  add_node(tower, {5.0, 0.0, 1.0});
  add_bar(tower, 0, 2);
  add_bar(tower, 1, 2);
  CHECK(mentions(notes_for(tower), "Bar bars-1 is"));
}

}  // namespace swaymark::test
