#include "spectrum/combine_directions.hpp"

namespace swaymark {

Eigen::VectorXd combine_directions(const std::vector<Eigen::VectorXd>& by_direction, DirectionalRule rule) {
  const Index responses = by_direction.front().size();
  if (rule == DirectionalRule::srss) {
    Eigen::VectorXd squares = Eigen::VectorXd::Zero(responses);
    for (const auto& peak : by_direction) squares += peak.cwiseAbs2();
    return squares.cwiseSqrt();
  }
  const double share = rule == DirectionalRule::percent_30 ? 0.3 : 0.4;
  // With one share for all minor directions, the largest sum has the largest peak as the major one.
  Eigen::VectorXd sum = Eigen::VectorXd::Zero(responses);
  Eigen::VectorXd largest = Eigen::VectorXd::Zero(responses);
  for (const auto& peak : by_direction) {
    sum += peak;
    largest = largest.cwiseMax(peak);
  }
  return share * sum + (1.0 - share) * largest;
}

}  // namespace swaymark
