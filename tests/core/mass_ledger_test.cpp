#include "core/mass_ledger.hpp"

#include <numbers>

#include "tests/support/matchers.hpp"
#include "tests/support/towers.hpp"

namespace swaymark::test {

namespace {

// Group "bars": 4 m along x from the origin; group "post": 2 m along z at x = 4. Node 1 is held.
Tower two_groups() {
  Tower tower = bare_tower(3);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  add_node(tower, {4.0, 0.0, 0.0});
  add_node(tower, {4.0, 0.0, 2.0});
  add_bar(tower, 0, 1);
  tower.groups.push_back({"post", 0, 0, {}});
  add_bar(tower, 1, 2);
  tower.allowances.push_back({std::nullopt, 0.1, "bolts", {}});
  tower.line_masses.push_back({std::size_t{1}, 5.0, "cables", {}});
  tower.node_masses.push_back({{1, 2}, 100.0, "lamp", {}});
  return tower;
}

void check_entry(const LedgerEntry& entry, MassOrigin origin, const std::string& label,
                 const std::string& group, double mass, const Eigen::Vector3d& centre) {
  INFO(name_of(origin) << ' ' << label << ' ' << group);
  CHECK(entry.origin == origin);
  CHECK(entry.label == label);
  CHECK(entry.group == group);
  CHECK_THAT(entry.mass, is_near(mass, kRoundoff));
  CHECK((entry.centre - centre).norm() <= kRoundoff * 4.0);
}

}  // namespace

TEST_CASE("the ledger tells mass by origin with its centre") {
  const Tower tower = two_groups();
  const MassLedger ledger = mass_ledger(tower, assemble(tower));
  const double per_metre = 7850.0 * 1e-3;
  REQUIRE(ledger.entries.size() == 5);
  check_entry(ledger.entries[0], MassOrigin::bars, "", "bars", 4.0 * per_metre, {2.0, 0.0, 0.0});
  check_entry(ledger.entries[1], MassOrigin::bars, "", "post", 2.0 * per_metre, {4.0, 0.0, 1.0});
  // Two thirds of the bars' mass at x = 2, one third at x = 4 and z = 1.
  check_entry(ledger.entries[2], MassOrigin::allowance, "bolts", "all", 0.6 * per_metre,
              {8.0 / 3.0, 0.0, 1.0 / 3.0});
  check_entry(ledger.entries[3], MassOrigin::linear, "cables", "post", 10.0, {4.0, 0.0, 1.0});
  check_entry(ledger.entries[4], MassOrigin::discrete, "lamp", "", 100.0, {4.0, 0.0, 1.0});
  CHECK_THAT(ledger.bars, is_near(6.0 * per_metre, kRoundoff));
  CHECK_THAT(ledger.carried, is_near(0.6 * per_metre + 110.0, kRoundoff));
  CHECK_THAT(ledger.total(), is_near(6.6 * per_metre + 110.0, kRoundoff));
}

TEST_CASE("the ledger adds up to the mass that the matrix moves in every direction and scheme") {
  // Common practice, no source.
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    Tower tower = two_groups();
    tower.mass_scheme = scheme;
    const Assembly assembly = assemble(tower);
    const MassLedger ledger = mass_ledger(tower, assembly);
    double sum = 0.0;
    for (const LedgerEntry& entry : ledger.entries) sum += entry.mass;
    CHECK_THAT(sum, is_near(ledger.total(), kRoundoff));
    for (const Axis axis : kAllAxes) {
      const Eigen::VectorXd r = rigid_translation(assembly.dofs, axis);
      CHECK_THAT(r.dot(assembly.mass_all * r), is_near(ledger.total(), kRoundoff));
    }
  }
}

TEST_CASE("what the held nodes carry is half of their bars and their share of the masses") {
  Tower tower = two_groups();
  tower.node_masses.push_back({{0}, 7.0, "plate", {}});
  const double half_bar = 0.5 * 1.1 * 4.0 * 7850.0 * 1e-3;
  for (const MassScheme scheme : {MassScheme::consistent, MassScheme::lumped, MassScheme::averaged}) {
    tower.mass_scheme = scheme;
    CHECK_THAT(mass_ledger(tower, assemble(tower)).at_supports, is_near(half_bar + 7.0, kRoundoff));
  }
}

TEST_CASE("a node on springs alone holds no mass back") {
  Tower tower = two_groups();
  tower.supports[0].fixed = {};
  tower.supports[0].spring = {1e6, 1e6, 1e6};
  CHECK(mass_ledger(tower, assemble(tower)).at_supports == 0.0);
}

TEST_CASE("a tower without mass has a ledger of zeros") {
  Tower tower = two_groups();
  tower.materials[0].density = 0.0;
  tower.line_masses.clear();
  tower.node_masses.clear();
  const MassLedger ledger = mass_ledger(tower, assemble(tower));
  CHECK(ledger.total() == 0.0);
  CHECK(ledger.entries[0].centre == Eigen::Vector3d::Zero());
}

TEST_CASE("ice and liquids have entries of their own") {
  Tower tower = two_groups();
  tower.sections[0].perimeter = 0.4;
  tower.ice.push_back({std::size_t{1}, 0.02, 900.0, std::nullopt, 1.0, "glaze", {}});
  tower.liquids.push_back({{1, 2}, 1.0, 2.0, 1000.0, true, "oil", {}, {}});
  const MassLedger ledger = mass_ledger(tower, assemble(tower));
  REQUIRE(ledger.entries.size() == 7);
  // Half of the post lies below z = 1; the ice is spread over all of it.
  const double ice = 900.0 * (0.4 * 0.02 + std::numbers::pi * 0.02 * 0.02);
  check_entry(ledger.entries[5], MassOrigin::ice, "glaze", "post", ice, {4.0, 0.0, 1.0});
  const double oil = 1000.0 * std::numbers::pi * 2.0;
  check_entry(ledger.entries[6], MassOrigin::liquid, "oil", "", oil, {4.0, 0.0, 1.0});
  CHECK_THAT(ledger.carried, is_near(0.6 * 7.850 + 110.0 + ice + oil, kRoundoff));
}

TEST_CASE("origins carry the names of the results") {
  CHECK(name_of(MassOrigin::bars) == "bars");
  CHECK(name_of(MassOrigin::allowance) == "allowance");
  CHECK(name_of(MassOrigin::linear) == "linear");
  CHECK(name_of(MassOrigin::discrete) == "discrete");
  CHECK(name_of(MassOrigin::ice) == "ice");
  CHECK(name_of(MassOrigin::liquid) == "liquid");
}

}  // namespace swaymark::test
