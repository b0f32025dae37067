#include "spectrum/combine_modes.hpp"
#include "spectrum/seismic.hpp"
#include "tests/spectrum/shaken.hpp"

namespace swaymark::test {

namespace {

// Two masses, each on a bar of its own to the ground, with frequencies `ratio` apart.
Tower two_oscillators(double mass, double ratio) {
  Tower tower = massless(1);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  carry(tower, add_node(tower, {1.0, 0.0, 0.0}), mass);
  carry(tower, add_node(tower, {-1.0, 0.0, 0.0}), mass / (ratio * ratio));
  add_bar(tower, 0, 1);
  add_bar(tower, 0, 2);
  return tower;
}

}  // namespace

TEST_CASE("a repeated sway pair gives the whole base shear in any direction") {
  // The masses take part in full whichever way the pair of shapes happens to be turned.
  for (const double turn : {0.0, 0.2, 0.7}) {
    Mast mast;
    mast.turn = turn;
    Tower tower = regular_mast(mast);
    excite(tower, Axis::x, 2.0);
    excite(tower, Axis::y, 2.0);
    const SeismicResult result = shake(tower);
    CHECK(result.close_modes);
    CHECK_THAT(result.directions[1].base_shear, is_near(result.directions[0].base_shear, kSolved));
    CHECK_THAT(*result.directions[1].overturning_moment,
               is_near(*result.directions[0].overturning_moment, kSolved));
  }
}

TEST_CASE("close modes are found at ten percent between frequencies") {
  for (const auto& [ratio, close] : {std::pair{1.05, true}, {1.099, true}, {1.101, false}, {1.5, false}}) {
    Tower tower = two_oscillators(500.0, ratio);
    excite(tower, Axis::x, 2.0);
    CHECK(shake(tower).close_modes == close);
  }
}

TEST_CASE("SRSS of two close modes is set against CQC and falls short by the root of their correlation") {
  // Two oscillators of nearly one mass: SRSS sqrt(V1^2 + V2^2), CQC with + 2 rho V1 V2. Each bar belongs to
  // one mode and keeps its force.
  constexpr double ratio = 1.02;
  Tower tower = two_oscillators(500.0, ratio);
  excite(tower, Axis::x, 2.0);
  tower.seismic->modes = ModalRule::srss;
  const SeismicResult result = shake(tower);
  REQUIRE(result.srss_against_cqc.size() == 1);
  const RuleRatio& found = result.srss_against_cqc.front();
  const double first = 1000.0;
  const double second = 1000.0 / (ratio * ratio);
  const double rho = cqc_correlation(1.0, ratio, 0.05, 0.05);
  const double squares = first * first + second * second;
  CHECK_THAT(found.base_shear, is_near(std::sqrt(squares / (squares + 2.0 * rho * first * second)), kSolved));
  CHECK(found.base_shear < 0.75);
  CHECK(found.axis == Axis::x);
  CHECK_THAT(found.least_bar, is_near(1.0, kSolved));
  CHECK_THAT(found.most_bar, is_near(1.0, kSolved));
}

TEST_CASE("the range of SRSS over CQC in the bars spans sums and differences of close modes") {
  // A light mass on a heavy one, tuned to the same frequency.
  Tower tower = massless(1);
  fix(tower, add_node(tower, {0.0, 0.0, 0.0}));
  carry(tower, add_node(tower, {1.0, 0.0, 0.0}), 500.0);
  carry(tower, add_node(tower, {2.0, 0.0, 0.0}), 1.0);
  add_bar(tower, 0, 1);
  Section thin;
  thin.area = 1e-3 / 500.0;
  tower.sections.push_back(thin);
  tower.groups.push_back({"light", 1, 0, {}});
  add_bar(tower, 1, 2);
  excite(tower, Axis::x, 2.0);
  tower.seismic->modes = ModalRule::srss;
  const SeismicResult result = shake(tower);
  REQUIRE(result.close_modes);
  REQUIRE(result.srss_against_cqc.size() == 1);
  const RuleRatio& found = result.srss_against_cqc.front();
  // The modes move the heavy mass alike and the light one against each other: the root bar adds, the light
  // bar subtracts.
  CHECK(found.least_bar < 0.99);
  CHECK(found.most_bar > 1.5);
}

TEST_CASE("SRSS is not questioned where modes are apart and CQC never is") {
  Tower apart = TwoStoreys{}.excited(1.0, 2.0);
  apart.seismic->modes = ModalRule::srss;
  CHECK(shake(apart).srss_against_cqc.empty());
  Tower close = two_oscillators(500.0, 1.02);
  excite(close, Axis::x, 2.0);
  for (const ModalRule rule : {ModalRule::cqc, ModalRule::absolute_sum}) {
    close.seismic->modes = rule;
    CHECK(shake(close).srss_against_cqc.empty());
  }
}

}  // namespace swaymark::test
