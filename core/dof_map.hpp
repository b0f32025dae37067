#pragma once

#include <vector>

#include "core/matrix.hpp"
#include "core/tower.hpp"

namespace swaymark {

/// The degrees of freedom of a tower: one for each node and axis, numbered dof = d * node + (place of the
/// axis among the tower's d axes). Free ones and fixed ones are numbered again from 0, each in the order of
/// dof. What sloshes in a tank moves sideways only: upright its node is held, without a support and without
/// mass.
class DofMap {
 public:
  explicit DofMap(const Tower& tower);

  [[nodiscard]] const std::vector<Axis>& axes() const { return axes_; }
  [[nodiscard]] Index dof_count() const { return static_cast<Index>(free_.size()); }
  [[nodiscard]] Index free_count() const { return static_cast<Index>(free_dofs_.size()); }
  [[nodiscard]] Index fixed_count() const { return static_cast<Index>(fixed_dofs_.size()); }

  [[nodiscard]] Index dof(std::size_t node, std::size_t axis_place) const {
    return static_cast<Index>(node * axes_.size() + axis_place);
  }
  [[nodiscard]] std::size_t node_of(Index dof) const { return static_cast<std::size_t>(dof) / axes_.size(); }
  [[nodiscard]] Axis axis_of(Index dof) const { return axes_[static_cast<std::size_t>(dof) % axes_.size()]; }

  /// Number among the free degrees of freedom, or -1.
  [[nodiscard]] Index free(Index dof) const { return free_[static_cast<std::size_t>(dof)]; }
  /// Number among the fixed ones, or -1.
  [[nodiscard]] Index fixed(Index dof) const { return fixed_[static_cast<std::size_t>(dof)]; }
  [[nodiscard]] const std::vector<Index>& free_dofs() const { return free_dofs_; }
  [[nodiscard]] const std::vector<Index>& fixed_dofs() const { return fixed_dofs_; }

  /// Values of the free degrees of freedom spread over all of them, zero where fixed.
  /// \param free  n_free x m    \return n_dof x m
  [[nodiscard]] Eigen::MatrixXd expand(const Eigen::MatrixXd& free) const;

  /// The rows of the free degrees of freedom. \param all n_dof    \return n_free
  [[nodiscard]] Eigen::VectorXd free_part(const Eigen::VectorXd& all) const;

 private:
  std::vector<Axis> axes_;
  std::vector<Index> free_;
  std::vector<Index> fixed_;
  std::vector<Index> free_dofs_;
  std::vector<Index> fixed_dofs_;
};

}  // namespace swaymark
