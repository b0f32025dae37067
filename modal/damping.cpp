#include "modal/damping.hpp"

#include <algorithm>

namespace swaymark {

Eigen::VectorXd modal_damping(const std::vector<double>& stated, Index modes) {
  Eigen::VectorXd ratios(modes);
  for (Index j = 0; j < modes; ++j)
    ratios(j) = stated[std::min(static_cast<std::size_t>(j), stated.size() - 1)];
  return ratios;
}

}  // namespace swaymark
