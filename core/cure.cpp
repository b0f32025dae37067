#include "core/cure.hpp"

#include <algorithm>
#include <cmath>
#include <set>

#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr double kAlong = 1e-6;  // of a unit direction: along an axis
constexpr double kLeastEffect =
    0.2;                          // a bar that elongates less per unit motion holds it too softly to be named
constexpr double kLongest = 4.0;  // usual lengths: a bar beyond is no small cure
constexpr std::size_t kMostMoving = 12;  // moving nodes that are tried, the largest motions first
constexpr std::size_t kMostNamed = 2;

}  // namespace

std::string direction_words(const Eigen::Vector3d& direction) {
  for (const Axis axis : kAllAxes) {
    if (std::abs(std::abs(direction[index_of(axis)]) - direction.norm()) < kAlong)
      return std::string(name_of(axis));
  }
  return fmt::format("({:.3g}, {:.3g}, {:.3g})", direction.x(), direction.y(), direction.z());
}

Cures::Cures(const Tower& tower, const FreeMotions& motions)
    : tower_(tower),
      neighbours_(tower.nodes.size()),
      open_(tower.nodes.size()),
      supported_(tower.nodes.size(), false) {
  for (const Bar& bar : tower.bars) {
    neighbours_[bar.from].push_back(bar.to);
    neighbours_[bar.to].push_back(bar.from);
    usual_length_ += (tower.nodes[bar.to].position - tower.nodes[bar.from].position).norm() /
                     static_cast<double>(tower.bars.size());
  }
  if (tower.bars.empty()) usual_length_ = tower.extent();
  for (const FreeMotion& motion : motions.list) {
    if (motion.parts.size() == 1)
      open_[motion.parts.front().node].push_back(motion.parts.front().direction.normalized());
  }
  for (const Support& support : tower.supports) supported_[support.node] = true;
}

bool Cures::may_be_built(const Candidate& candidate) const {
  const auto& taken = neighbours_[candidate.from];
  if (std::find(taken.begin(), taken.end(), candidate.to) != taken.end()) return false;
  const Eigen::Vector3d start = tower_.nodes[candidate.from].position;
  const Eigen::Vector3d along = tower_.nodes[candidate.to].position - start;
  // Nodes near the line can only be neighbours of its ends in a tower without loose ends close by.
  for (const std::size_t end : {candidate.from, candidate.to}) {
    for (const std::size_t node : neighbours_[end]) {
      const Eigen::Vector3d arm = tower_.nodes[node].position - start;
      const double share = arm.dot(along) / along.squaredNorm();
      if (share > 0.0 && share < 1.0 && (arm - share * along).norm() < kAlong * along.norm()) return false;
    }
  }
  return true;
}

std::vector<Cures::Candidate> Cures::candidates(const FreeMotion& motion) const {
  std::vector<Eigen::Vector3d> displacement(tower_.nodes.size(), Eigen::Vector3d::Zero());
  for (const FreeMotion::Part& part : motion.parts) displacement[part.node] = part.direction;
  std::vector<Candidate> result;
  for (std::size_t i = 0; i < std::min(motion.parts.size(), kMostMoving); ++i) {
    const std::size_t from = motion.parts[i].node;
    for (std::size_t to = 0; to < tower_.nodes.size(); ++to) {
      if (to == from || (neighbours_[to].empty() && !supported_[to])) continue;
      const Eigen::Vector3d along = tower_.nodes[to].position - tower_.nodes[from].position;
      const double length = along.norm();
      if (length > kLongest * usual_length_) continue;
      // An end that is free along the bar by itself would give way to it.
      const auto gives_way = [&](const Eigen::Vector3d& open) {
        return std::abs(open.dot(along)) > kAlong * length;
      };
      if (std::any_of(open_[to].begin(), open_[to].end(), gives_way)) continue;
      const double effect = std::abs(along.dot(displacement[to] - displacement[from])) / length;
      if (effect >= kLeastEffect) result.push_back({from, to, effect, length});
    }
  }
  return result;
}

std::vector<std::string> Cures::bars(const FreeMotion& motion) const {
  std::vector<Candidate> list = candidates(motion);
  // What is built per stiffness gained against the motion; the order of the nodes where that is the same.
  const auto cost = [](const Candidate& c) {
    return std::lround(1e6 * std::log(c.length / (c.effect * c.effect)));
  };
  std::stable_sort(list.begin(), list.end(),
                   [&](const Candidate& a, const Candidate& b) { return cost(a) < cost(b); });
  std::vector<std::string> words;
  std::set<std::pair<std::size_t, std::size_t>> named;
  for (const Candidate& candidate : list) {
    if (words.size() == kMostNamed) break;
    if (!named.insert(std::minmax(candidate.from, candidate.to)).second || !may_be_built(candidate)) continue;
    words.push_back(fmt::format("a bar from {} to {}", excerpt(tower_.nodes[candidate.from].name),
                                excerpt(tower_.nodes[candidate.to].name)));
  }
  return words;
}

std::vector<std::string> Cures::supports(const std::vector<FreeMotion>& motions) const {
  // Of the largest motion, this much will do where a support stands already or lower: it is the smaller
  // change.
  constexpr double enough = 0.5;
  constexpr double enough_at_support = 0.02;
  Eigen::MatrixXd left =
      Eigen::MatrixXd::Zero(3 * static_cast<Index>(tower_.nodes.size()), static_cast<Index>(motions.size()));
  for (std::size_t k = 0; k < motions.size(); ++k) {
    for (const FreeMotion::Part& part : motions[k].parts)
      left.col(static_cast<Index>(k)).segment<3>(3 * static_cast<Index>(part.node)) = part.direction;
  }
  std::vector<std::string> words;
  for (Index k = 0; k < left.cols(); ++k) {
    const Eigen::VectorXd motion = left.col(k).cwiseAbs();
    const double largest = motion.maxCoeff();
    Index best = -1;
    for (Index dof = 0; dof < motion.size(); ++dof) {
      const bool supported = supported_[static_cast<std::size_t>(dof / 3)];
      if (motion(dof) < (supported ? enough_at_support : enough) * largest) continue;
      if (best < 0 || is_smaller_change(dof, best, motion)) best = dof;
    }
    left.col(k) /= left(best, k);
    for (Index j = k + 1; j < left.cols(); ++j) left.col(j) -= left(best, j) * left.col(k);
    words.push_back(fmt::format("hold node {} along {} by a support",
                                excerpt(tower_.nodes[static_cast<std::size_t>(best / 3)].name),
                                name_of(kAllAxes[static_cast<std::size_t>(best % 3)])));
  }
  return words;
}

bool Cures::is_smaller_change(Index dof, Index than, const Eigen::VectorXd& motion) const {
  const auto node = static_cast<std::size_t>(dof / 3);
  const auto other = static_cast<std::size_t>(than / 3);
  if (supported_[node] != supported_[other]) return supported_[node];
  const double lower = tower_.nodes[other].position.z() - tower_.nodes[node].position.z();
  if (std::abs(lower) > kAlong * usual_length_) return lower > 0.0;
  return motion(dof) > motion(than) * (1.0 + kAlong);
}

}  // namespace swaymark
