#include "core/dof_map.hpp"

namespace swaymark {

DofMap::DofMap(const Tower& tower) : axes_(tower.axes()) {
  const std::size_t count = tower.nodes.size() * axes_.size();
  std::vector<bool> held(count, false);
  for (const Support& support : tower.supports) {
    for (std::size_t k = 0; k < axes_.size(); ++k) {
      if (support.fixed[static_cast<std::size_t>(axes_[k])]) held[support.node * axes_.size() + k] = true;
    }
  }
  for (const Liquid& liquid : tower.liquids) {
    if (!liquid.node) continue;
    for (std::size_t k = 0; k < axes_.size(); ++k) {
      if (axes_[k] == Axis::z) held[*liquid.node * axes_.size() + k] = true;
    }
  }
  free_.assign(count, -1);
  fixed_.assign(count, -1);
  for (std::size_t dof = 0; dof < count; ++dof) {
    auto& numbers = held[dof] ? fixed_ : free_;
    auto& list = held[dof] ? fixed_dofs_ : free_dofs_;
    numbers[dof] = static_cast<Index>(list.size());
    list.push_back(static_cast<Index>(dof));
  }
}

Eigen::MatrixXd DofMap::expand(const Eigen::MatrixXd& free) const {
  Eigen::MatrixXd all = Eigen::MatrixXd::Zero(dof_count(), free.cols());
  for (Index i = 0; i < free_count(); ++i) all.row(free_dofs_[static_cast<std::size_t>(i)]) = free.row(i);
  return all;
}

Eigen::VectorXd DofMap::free_part(const Eigen::VectorXd& all) const {
  Eigen::VectorXd free(free_count());
  for (Index i = 0; i < free_count(); ++i) free(i) = all(free_dofs_[static_cast<std::size_t>(i)]);
  return free;
}

}  // namespace swaymark
