#include "modal/mode_character.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace swaymark {

namespace {

// Nodes whose heights agree to a thousandth of the tower's height make one level.
std::vector<std::vector<Index>> levels_of(const NodeCloud& cloud) {
  std::vector<Index> order(static_cast<std::size_t>(cloud.positions.rows()));
  std::iota(order.begin(), order.end(), Index{0});
  const auto height = [&](Index node) { return cloud.positions(node, 2); };
  std::stable_sort(order.begin(), order.end(), [&](Index a, Index b) { return height(a) < height(b); });
  std::vector<std::vector<Index>> levels;
  if (order.empty()) return levels;
  const double tolerance = 1e-3 * std::max(1e-9, height(order.back()) - height(order.front()));
  for (const Index node : order) {
    if (levels.empty() || height(node) - height(levels.back().front()) > tolerance) levels.emplace_back();
    levels.back().push_back(node);
  }
  return levels;
}

}  // namespace

CharacterShares character_shares(const NodeCloud& cloud, const Eigen::MatrixXd& motion) {
  CharacterShares sums;
  double whole = 0.0;
  for (const auto& level : levels_of(cloud)) {
    double mass = 0.0;
    Eigen::Vector2d centre = Eigen::Vector2d::Zero();
    Eigen::Vector2d mean = Eigen::Vector2d::Zero();
    for (const Index node : level) {
      mass += cloud.masses(node);
      centre += cloud.masses(node) * cloud.positions.row(node).head<2>().transpose();
      mean += cloud.masses(node) * motion.row(node).head<2>().transpose();
    }
    if (mass <= 0.0) continue;
    centre /= mass;
    mean /= mass;
    double polar = 0.0;
    double angular = 0.0;
    double around = 0.0;  // horizontal energy about the mean motion
    for (const Index node : level) {
      const double m = cloud.masses(node);
      const Eigen::Vector2d arm = cloud.positions.row(node).head<2>().transpose() - centre;
      const Eigen::Vector2d rest = motion.row(node).head<2>().transpose() - mean;
      polar += m * arm.squaredNorm();
      angular += m * (arm.x() * rest.y() - arm.y() * rest.x());
      around += m * rest.squaredNorm();
      sums.vertical += m * motion(node, 2) * motion(node, 2);
    }
    const double torsion = polar > 0.0 ? angular * angular / polar : 0.0;
    sums.sway_x += mass * mean.x() * mean.x();
    sums.sway_y += mass * mean.y() * mean.y();
    sums.torsion += torsion;
    sums.breathing += std::max(0.0, around - torsion);
  }
  whole = sums.sway_x + sums.sway_y + sums.torsion + sums.breathing + sums.vertical;
  if (whole <= 0.0) return sums;
  for (double* share : {&sums.sway_x, &sums.sway_y, &sums.torsion, &sums.breathing, &sums.vertical})
    *share /= whole;
  return sums;
}

std::string character_of(const CharacterShares& shares) {
  const double sway = shares.sway_x + shares.sway_y;
  const double largest = std::max({sway, shares.torsion, shares.breathing, shares.vertical});
  if (largest < 0.5) return "mixed";
  if (largest == sway) {
    if (shares.sway_x >= 0.9 * sway) return "sway x";
    if (shares.sway_y >= 0.9 * sway) return "sway y";
    return "sway";
  }
  if (largest == shares.torsion) return "torsion";
  return largest == shares.vertical ? "vertical" : "breathing";
}

std::vector<Index> energy_nodes(const NodeCloud& cloud, const Eigen::MatrixXd& motion) {
  const Eigen::VectorXd energy = cloud.masses.array() * motion.rowwise().squaredNorm().array();
  std::vector<Index> order(static_cast<std::size_t>(energy.size()));
  std::iota(order.begin(), order.end(), Index{0});
  std::stable_sort(order.begin(), order.end(), [&](Index a, Index b) { return energy(a) > energy(b); });
  double held = 0.0;
  std::size_t count = 0;
  while (count < order.size() && held < 0.9 * energy.sum()) held += energy(order[count++]);
  order.resize(count);
  return order;
}

}  // namespace swaymark
