#include "core/free_motion.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <numeric>
#include <utility>

#include <Eigen/Eigenvalues>

#include "core/open_direction.hpp"
#include "core/strainless.hpp"

namespace swaymark {

namespace {

using Matrix6d = Eigen::Matrix<double, 6, 6>;
using Vector6d = Eigen::Matrix<double, 6, 1>;
using Triplets = std::vector<Eigen::Triplet<double>>;

// A direction counts as open where its bars oppose it by less than this much of unit stiffness; a slope of
// 1e-5.
constexpr double kOpen = 1e-10;
constexpr double kMoves = 1e-6;  // of the largest component: below it a node stands still

class Search {
 public:
  Search(const Tower& tower, const Assembly& assembly)
      : tower_(tower), dofs_(assembly.dofs), links_(assembly.links), stabilisers_(assembly.stabilisers) {
    add_elongations(assembly);
    held_.resize(static_cast<std::size_t>(dofs_.dof_count()), false);
    for (std::size_t dof = 0; dof < held_.size(); ++dof) {
      const Index free = dofs_.free(static_cast<Index>(dof));
      held_[dof] = free < 0 || assembly.springs(free) > 0.0;
    }
  }

  FreeMotions run() {
    if (dofs_.free_count() == 0) return {};
    look_at_nodes();
    look_at_bodies();
    look_at_the_whole();
    return std::move(found_);
  }

 private:
  // One row for each bar, spring, link and hold: its elongation per free displacement.
  void add_elongations(const Assembly& assembly) {
    for (const BarElement& bar : assembly.bars) {
      for (std::size_t i = 0; i < dofs_.axes().size(); ++i) {
        const double value = bar.direction[index_of(dofs_.axes()[i])];
        const Index from = dofs_.free(dofs_.dof(bar.from, i));
        const Index to = dofs_.free(dofs_.dof(bar.to, i));
        if (from >= 0) elongation_.emplace_back(rows_, from, -value);
        if (to >= 0) elongation_.emplace_back(rows_, to, value);
      }
      ++rows_;
    }
    for (Index i = 0; i < assembly.springs.size(); ++i) {
      if (assembly.springs(i) > 0.0) elongation_.emplace_back(rows_++, i, 1.0);
    }
    for (const Link& link : links_) {
      const double share = 1.0 / static_cast<double>(link.others.size());
      if (dofs_.free(link.dof) >= 0) elongation_.emplace_back(rows_, dofs_.free(link.dof), 1.0);
      for (const Index other : link.others) {
        if (dofs_.free(other) >= 0) elongation_.emplace_back(rows_, dofs_.free(other), -share);
      }
      ++rows_;
    }
  }

  // A unit spring against a motion found, so that the rest can be looked at without it.
  void hold(std::size_t node, const Eigen::Vector3d& direction) {
    for (std::size_t k = 0; k < dofs_.axes().size(); ++k) {
      const Index free = dofs_.free(dofs_.dof(node, k));
      const double value = direction[index_of(dofs_.axes()[k])];
      if (free >= 0 && value != 0.0) elongation_.emplace_back(rows_, free, value);
    }
    ++rows_;
  }

  void look_at_nodes() {
    std::vector<bool> loose(tower_.nodes.size(), true);
    for (const Bar& bar : tower_.bars) loose[bar.from] = loose[bar.to] = false;
    open_ = open_directions(tower_);
    // A node with a tank on it takes the liquid along, and is looked at as part of a body or of the whole.
    for (const Link& link : links_) {
      for (const Index other : link.others) open_[dofs_.node_of(other)].clear();
    }
    for (const NeighbourSpring& spring : stabilisers_) {
      for (const auto& [dof, value] : spring.elongation) {
        if (dofs_.free(dof) >= 0) elongation_.emplace_back(rows_, dofs_.free(dof), value);
      }
      ++rows_;
      open_[spring.node].clear();
    }
    for (std::size_t node = 0; node < tower_.nodes.size(); ++node) {
      for (const Eigen::Vector3d& direction : open_[node]) {
        hold(node, direction);
        Index leading = 0;
        direction.cwiseAbs().maxCoeff(&leading);
        found_.list.push_back({loose[node] ? MotionClass::loose_node : MotionClass::node,
                               {{node, direction / direction[leading]}}});
      }
    }
  }

  // The nodes of each part that bars join, with the liquids in it; two nodes at least.
  [[nodiscard]] std::vector<std::vector<std::size_t>> bodies() const {
    std::vector<std::size_t> root(tower_.nodes.size());
    std::iota(root.begin(), root.end(), std::size_t{0});
    const auto find = [&](std::size_t node) {
      while (root[node] != node) node = root[node] = root[root[node]];
      return node;
    };
    const auto join = [&](std::size_t one, std::size_t other) {
      const std::size_t a = find(one);
      const std::size_t b = find(other);
      root[std::max(a, b)] = std::min(a, b);
    };
    for (const Bar& bar : tower_.bars) join(bar.from, bar.to);
    for (const Link& link : links_) {
      for (const Index other : link.others) join(dofs_.node_of(link.dof), dofs_.node_of(other));
    }
    std::vector<std::vector<std::size_t>> members(tower_.nodes.size());
    for (std::size_t node = 0; node < tower_.nodes.size(); ++node) members[find(node)].push_back(node);
    std::erase_if(members, [](const auto& nodes) { return nodes.size() < 2; });
    return members;
  }

  void look_at_bodies() {
    for (const auto& nodes : bodies()) look_at_body(nodes);
  }

  // Displacement at an arm from the body's centre under (translation, rotation times size).
  [[nodiscard]] static Eigen::Matrix<double, 3, 6> rigid(const Eigen::Vector3d& arm) {
    Eigen::Matrix<double, 3, 6> motion;
    motion.leftCols<3>().setIdentity();
    motion.rightCols<3>() << 0.0, arm.z(), -arm.y(), -arm.z(), 0.0, arm.x(), arm.y(), -arm.x(), 0.0;
    return motion;
  }

  void look_at_body(const std::vector<std::size_t>& nodes) {
    Eigen::Vector3d centre = Eigen::Vector3d::Zero();
    for (const std::size_t node : nodes) centre += tower_.nodes[node].position;
    centre /= static_cast<double>(nodes.size());
    double size = 0.0;
    for (const std::size_t node : nodes) size = std::max(size, (tower_.nodes[node].position - centre).norm());
    const auto motion_at = [&](std::size_t node) {
      return rigid((tower_.nodes[node].position - centre) / size);
    };
    // What opposes a rigid motion: supports, the axes the tower does not have; what of it is no motion of
    // single nodes: everything square to those.
    Matrix6d opposed = Matrix6d::Zero();
    Matrix6d moves = Matrix6d::Zero();
    for (const std::size_t node : nodes) {
      const auto motion = motion_at(node);
      std::array<bool, 3> free{};
      for (std::size_t k = 0; k < dofs_.axes().size(); ++k) {
        free[static_cast<std::size_t>(dofs_.axes()[k])] =
            !held_[static_cast<std::size_t>(dofs_.dof(node, k))];
      }
      // What sloshes follows the middle of its tank, and is held upright without a support.
      if (tower_.sloshes(node)) continue;
      for (Index axis = 0; axis < 3; ++axis) {
        if (!free[static_cast<std::size_t>(axis)]) opposed += motion.row(axis).transpose() * motion.row(axis);
      }
      const Eigen::Matrix<double, 3, 6> rest = without_open(node, motion);
      moves += rest.transpose() * rest;
    }
    for (const NeighbourSpring& spring : stabilisers_) {
      if (!std::binary_search(nodes.begin(), nodes.end(), spring.node)) continue;
      Eigen::Matrix<double, 1, 6> strain = Eigen::Matrix<double, 1, 6>::Zero();
      for (const auto& [dof, value] : spring.elongation)
        strain += value * motion_at(dofs_.node_of(dof)).row(index_of(dofs_.axis_of(dof)));
      opposed += strain.transpose() * strain;
    }
    const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(opposed);
    Index ways = 0;
    while (ways < 6 && solver.eigenvalues()(ways) <= kOpen) ++ways;
    if (ways == 0) return;
    const Eigen::MatrixXd unopposed = solver.eigenvectors().leftCols(ways);
    add_bodies(nodes, motion_at, unopposed, unopposed.transpose() * moves * unopposed);
  }

  template <typename MotionAt>
  void add_bodies(const std::vector<std::size_t>& nodes, const MotionAt& motion_at,
                  const Eigen::MatrixXd& unopposed, const Eigen::MatrixXd& moves) {
    const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(moves);
    std::vector<Vector6d> rigid_motions;
    for (Index k = 0; k < moves.rows(); ++k) {
      if (solver.eigenvalues()(k) > kOpen)
        rigid_motions.emplace_back(unopposed * solver.eigenvectors().col(k));
    }
    // Each gets a component of its own: 1 for it, 0 for the others. Held there, and found the simplest way.
    for (std::size_t k = 0; k < rigid_motions.size(); ++k) {
      double best = 0.0;
      std::size_t best_node = 0;
      Index best_axis = 0;
      for (const std::size_t node : nodes) {
        const Eigen::Vector3d rest = without_open(node, motion_at(node)) * rigid_motions[k];
        Index axis = 0;
        const double value = rest.cwiseAbs().maxCoeff(&axis);
        if (value > best * (1.0 + kMoves)) {
          best = value;
          best_node = node;
          best_axis = axis;
        }
      }
      const Eigen::Matrix<double, 1, 6> at = without_open(best_node, motion_at(best_node)).row(best_axis);
      rigid_motions[k] /= at.dot(rigid_motions[k]);
      for (std::size_t j = 0; j < rigid_motions.size(); ++j) {
        if (j != k) rigid_motions[j] -= at.dot(rigid_motions[j]) * rigid_motions[k];
      }
      // Where single nodes are free as well, the hold acts on what is left of the node's motion without them.
      Eigen::Vector3d direction = Eigen::Vector3d::Unit(best_axis);
      for (const Eigen::Vector3d& open : open_[best_node]) direction -= open.dot(direction) * open;
      hold(best_node, direction);
    }
    for (const Vector6d& motion : rigid_motions) {
      FreeMotion body{MotionClass::body, {}};
      for (const std::size_t node : nodes) {
        body.parts.push_back({node, motion_at(node) * motion});
        if (tower_.sloshes(node)) body.parts.back().direction.z() = 0.0;
      }
      add(std::move(body));
    }
  }

  // What is left of motions of a node once its own free directions are taken out.
  [[nodiscard]] Eigen::Matrix<double, 3, 6> without_open(std::size_t node,
                                                         Eigen::Matrix<double, 3, 6> motion) const {
    for (const Eigen::Vector3d& open : open_[node]) motion -= open * (open.transpose() * motion);
    return motion;
  }

  void look_at_the_whole() {
    SparseMatrix elongation(rows_, dofs_.free_count());
    elongation.setFromTriplets(elongation_.begin(), elongation_.end());
    const StrainlessMotions whole = strainless_motions(elongation);
    found_.complete = whole.complete;
    for (const Eigen::VectorXd& motion : whole.motions) add_shape(motion);
  }

  void add_shape(const Eigen::VectorXd& motion) {
    FreeMotion shape{MotionClass::shape, {}};
    for (Index i = 0; i < motion.size(); ++i) {
      if (motion(i) == 0.0) continue;
      const Index dof = dofs_.free_dofs()[static_cast<std::size_t>(i)];
      const std::size_t node = dofs_.node_of(dof);
      if (shape.parts.empty() || shape.parts.back().node != node)
        shape.parts.push_back({node, Eigen::Vector3d::Zero()});
      shape.parts.back().direction[index_of(dofs_.axis_of(dof))] = motion(i);
    }
    add(std::move(shape));
  }

  // Scaled, without what stands still, the largest first and otherwise in the order of the nodes.
  void add(FreeMotion motion) {
    double largest = 0.0;
    for (const auto& part : motion.parts) {
      for (const double value : part.direction) {
        if (std::abs(value) > std::abs(largest) * (1.0 + kMoves)) largest = value;
      }
    }
    for (auto& part : motion.parts) {
      part.direction /= largest;
      for (double& value : part.direction) {
        if (std::abs(value) <= kMoves) value = 0.0;
      }
    }
    std::erase_if(motion.parts, [](const auto& part) { return part.direction.isZero(0.0); });
    const auto rank = [](const auto& part) { return std::lround(1e6 * part.direction.norm()); };
    std::stable_sort(motion.parts.begin(), motion.parts.end(),
                     [&](const auto& a, const auto& b) { return rank(a) > rank(b); });
    found_.list.push_back(std::move(motion));
  }

  const Tower& tower_;
  const DofMap& dofs_;
  const std::vector<Link>& links_;
  const std::vector<NeighbourSpring>& stabilisers_;
  Triplets elongation_;
  Index rows_ = 0;
  std::vector<bool> held_;                          // n_dof: fixed or on a spring
  std::vector<std::vector<Eigen::Vector3d>> open_;  // by node: unit directions free with the neighbours held
  FreeMotions found_;
};

}  // namespace

Eigen::Vector3d FreeMotion::of(std::size_t node) const {
  for (const Part& part : parts) {
    if (part.node == node) return part.direction;
  }
  return Eigen::Vector3d::Zero();
}

FreeMotions find_free_motions(const Tower& tower, const Assembly& assembly) {
  return Search(tower, assembly).run();
}

}  // namespace swaymark
