#include "modal/mode_character.hpp"

#include <algorithm>
#include <functional>

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

// Two square levels of equal masses.
NodeCloud two_squares() {
  NodeCloud cloud;
  cloud.positions.resize(8, 3);
  cloud.positions << 1, 1, 2, -1, 1, 2, -1, -1, 2, 1, -1, 2,  //
      1, 1, 5, -1, 1, 5, -1, -1, 5, 1, -1, 5;
  cloud.masses = Eigen::VectorXd::Constant(8, 3.0);
  return cloud;
}

using Field = std::function<Eigen::Vector3d(const Eigen::Vector3d&)>;

Eigen::MatrixXd motion(const NodeCloud& cloud, const Field& field) {
  Eigen::MatrixXd result(cloud.positions.rows(), 3);
  for (Index i = 0; i < result.rows(); ++i)
    result.row(i) = field(cloud.positions.row(i).transpose()).transpose();
  return result;
}

CharacterShares shares_of(const Field& field) {
  const NodeCloud cloud = two_squares();
  return character_shares(cloud, motion(cloud, field));
}

double sum_of(const CharacterShares& s) { return s.sway_x + s.sway_y + s.torsion + s.breathing + s.vertical; }

Eigen::Vector3d sway_x(const Eigen::Vector3d& p) { return {p.z(), 0.0, 0.0}; }
Eigen::Vector3d sway_y(const Eigen::Vector3d& p) { return {0.0, -p.z(), 0.0}; }
Eigen::Vector3d twist(const Eigen::Vector3d& p) { return {-p.y() * p.z(), p.x() * p.z(), 0.0}; }
Eigen::Vector3d breathe(const Eigen::Vector3d& p) { return {p.x(), -p.y(), 0.0}; }
Eigen::Vector3d lift(const Eigen::Vector3d& p) { return {0.0, 0.0, p.z()}; }

}  // namespace

TEST_CASE("each pure motion of the levels has all of the kinetic energy in its own share") {
  CHECK_THAT(shares_of(sway_x).sway_x, is_near(1.0, kRoundoff));
  CHECK_THAT(shares_of(sway_y).sway_y, is_near(1.0, kRoundoff));
  CHECK_THAT(shares_of(twist).torsion, is_near(1.0, kRoundoff));
  CHECK_THAT(shares_of(breathe).breathing, is_near(1.0, kRoundoff));
  CHECK_THAT(shares_of(lift).vertical, is_near(1.0, kRoundoff));
}

TEST_CASE("each pure motion of the levels is called by its name") {
  CHECK(character_of(shares_of(sway_x)) == "sway x");
  CHECK(character_of(shares_of(sway_y)) == "sway y");
  CHECK(character_of(shares_of(twist)) == "torsion");
  CHECK(character_of(shares_of(breathe)) == "breathing");
  CHECK(character_of(shares_of(lift)) == "vertical");
}

TEST_CASE("sway between the axes is sway in neither of them") {
  const auto diagonal = [](const Eigen::Vector3d& p) { return (sway_x(p) + sway_y(p)).eval(); };
  const CharacterShares shares = shares_of(diagonal);
  CHECK_THAT(shares.sway_x, is_near(0.5, kRoundoff));
  CHECK_THAT(shares.sway_y, is_near(0.5, kRoundoff));
  CHECK(character_of(shares) == "sway");
}

TEST_CASE("a mode in which no motion holds half the energy is mixed") {
  const auto field = [](const Eigen::Vector3d& p) { return (breathe(p) * 3.0 + twist(p) + lift(p)).eval(); };
  const CharacterShares shares = shares_of(field);
  CHECK(std::max({shares.breathing, shares.torsion, shares.vertical}) < 0.5);
  CHECK(character_of(shares) == "mixed");
}

TEST_CASE("the shares of any motion add up to one") {
  const NodeCloud cloud = two_squares();
  for (int i = 0; i < 20; ++i) {
    const Eigen::MatrixXd any = Eigen::MatrixXd::Random(8, 3);
    CHECK_THAT(sum_of(character_shares(cloud, any)), is_near(1.0, kRoundoff));
  }
}

TEST_CASE("torsion is about the centre of mass of each level and not about the origin") {
  NodeCloud cloud = two_squares();
  cloud.positions.col(0).array() += 100.0;
  const auto field = [](const Eigen::Vector3d& p) { return twist(p - Eigen::Vector3d(100.0, 0.0, 0.0)); };
  CHECK_THAT(character_shares(cloud, motion(cloud, field)).torsion, is_near(1.0, kRoundoff));
}

TEST_CASE("a motion that is nowhere has no shares") {
  const NodeCloud cloud = two_squares();
  CHECK(sum_of(character_shares(cloud, Eigen::MatrixXd::Zero(8, 3))) == 0.0);
}

TEST_CASE("levels without mass do not disturb the shares") {
  NodeCloud cloud = two_squares();
  cloud.masses.head(4).setZero();
  CHECK_THAT(character_shares(cloud, motion(cloud, twist)).torsion, is_near(1.0, kRoundoff));
}

TEST_CASE("the nodes that hold nine tenths of the energy come with the most first") {
  const NodeCloud cloud = two_squares();
  Eigen::MatrixXd shape = Eigen::MatrixXd::Zero(8, 3);
  shape(5, 0) = 2.0;   // 4 of 5.2
  shape(2, 1) = -1.0;  // 1 of 5.2: together 0.96
  shape(7, 2) = 0.4;
  shape(0, 2) = 0.2;
  CHECK(energy_nodes(cloud, shape) == std::vector<Index>{5, 2});
}

TEST_CASE("masses weigh the energy of a node") {
  NodeCloud cloud = two_squares();
  cloud.masses(1) = 3000.0;
  Eigen::MatrixXd shape = Eigen::MatrixXd::Zero(8, 3);
  shape(5, 0) = 2.0;
  shape(1, 0) = 1.0;
  CHECK(energy_nodes(cloud, shape) == std::vector<Index>{1});
}

}  // namespace swaymark::test
