#include "modal/mode_search.hpp"

#include <algorithm>
#include <cmath>

#include "modal/participation.hpp"
#include "modal/repeated_modes.hpp"

namespace swaymark {

namespace {

constexpr Index kFirstTry = 12;
constexpr double kRounding = 1e-9;  // a share of "100 %" is met by the sum over all modes

// Modes at or below a frequency; counted a hair above it so that one exactly there belongs to them. Where no
// count can be had, all modes, so that none is left out.
Index modes_up_to(const Eigenproblem& problem, double omega) {
  const auto counted = problem.below(std::pow(omega * (1.0 + 1e-9), 2));
  return counted ? counted->below : problem.mode_count();
}

// The fewest modes whose effective masses reach the share in every direction, or nothing.
std::optional<Index> modes_for_share(const Eigen::MatrixXd& participation, const Eigen::VectorXd& moving,
                                     const ModeTarget& target) {
  Index needed = 0;
  for (const Index direction : target.share_directions) {
    if (moving(direction) <= 0.0) continue;
    double sum = 0.0;
    Index modes = 0;
    while (modes < participation.rows() && sum < (*target.mass_share - kRounding) * moving(direction)) {
      sum += std::pow(participation(modes++, direction), 2);
    }
    if (sum < (*target.mass_share - kRounding) * moving(direction)) return std::nullopt;
    needed = std::max(needed, modes);
  }
  return needed;
}

bool splits_repeated(const Eigen::VectorXd& omega, Index count) {
  return count > 0 && count < omega.size() && omega(count) - omega(count - 1) <= 1e-6 * omega(count - 1);
}

// What was looked for up to a frequency is certified up to it, not only to just above the last mode below it.
void certify_up_to(const Eigenproblem& problem, double omega, Modes& modes) {
  if (!modes.certificate || omega <= modes.certificate->omega) return;
  const auto counted = problem.below(std::pow(omega * (1.0 + 1e-9), 2));
  if (counted && counted->below == modes.count())
    modes.certificate = Certificate{counted->below, std::sqrt(counted->omega_squared)};
}

}  // namespace

ModeSet find_modes(const Eigenproblem& problem, const SparseMatrix& stiffness, const SparseMatrix& mass,
                   const Eigen::MatrixXd& drive, const ModeTarget& target) {
  ModeSet set;
  set.available = problem.mode_count();
  set.moving = moving_mass(mass, drive);
  const Index most = problem.most_modes();
  // More modes than there are cannot be missing: asking for them gives all.
  Index least = std::min(std::max<Index>(target.count.value_or(1), 1), set.available);
  if (target.omega_up_to) least = std::max(least, modes_up_to(problem, *target.omega_up_to));
  if (target.omega_covered) least = std::max(least, modes_up_to(problem, *target.omega_covered));
  Index tried = target.mass_share ? std::max(kFirstTry, least) : least;
  set.reached = least <= most;
  least = std::min(least, most);
  for (;; tried *= 2) {
    tried = std::min(tried, most);
    const Modes found = turn_repeated(stiffness, mass, problem.lowest(tried), drive);
    if (!found.usable()) {
      set.modes = found;
      return set;
    }
    set.participation = participation(found.shapes, drive);
    Index keep = least;
    if (target.mass_share) {
      const auto share = modes_for_share(set.participation, set.moving, target);
      if (!share && tried < most) continue;
      set.reached = set.reached && share.has_value();
      keep = std::max(keep, share.value_or(found.count()));
    }
    keep = std::min(keep, found.count());
    const Index met = keep;
    while (splits_repeated(found.omega, keep)) ++keep;
    set.copies_added = keep - met;
    set.modes = problem.first(found, keep);
    certify_up_to(problem, std::max(target.omega_up_to.value_or(0.0), target.omega_covered.value_or(0.0)),
                  set.modes);
    set.participation.conservativeResize(keep, Eigen::NoChange);
    return set;
  }
}

}  // namespace swaymark
