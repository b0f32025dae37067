#include "core/strainless.hpp"

#include <algorithm>
#include <cstdint>
#include <utility>

#include <Eigen/Eigenvalues>
#include <Eigen/SparseCholesky>

namespace swaymark {

namespace {

// Lifts the pivot of a free motion out of the rounding, to a few times its own size.
constexpr double kLift = 1e-13;
// Pivots below this share of their diagonal make a degree of freedom suspect. Towers that stand have such
// pivots where they are very slender; that costs them a second look. A free motion that hardly moves the
// degree of freedom eliminated last has a larger pivot: it is found by iteration.
constexpr double kSuspectPivot = 1e-6;
// Squared elongations of a motion of unit length. Rounding leaves 1e-24; the softest tower that stands 1e-14.
constexpr double kNoStrain = 1e-20;
constexpr Index kMostSuspects = 4000;  // that are looked at
constexpr Index kMostDense = 600;      // that stand for no free motion by themselves

class NullSpace {
 public:
  explicit NullSpace(const SparseMatrix& elongation)
      : elongation_(elongation), suspect_(static_cast<std::size_t>(elongation.cols()), false) {}

  StrainlessMotions run() {
    hold_suspects();
    if (suspects_.empty()) return {};
    if (static_cast<Index>(suspects_.size()) > kMostSuspects) {
      suspects_.resize(static_cast<std::size_t>(kMostSuspects));
      found_.complete = false;
    }
    take_motions();
    return std::move(found_);
  }

 private:
  // What is suspect gets a unit spring, until nothing is free: the matrix that stays factorised is then
  // regular.
  void hold_suspects() {
    SparseMatrix held = elongation_.transpose() * elongation_;
    for (;;) {
      SparseMatrix lifted = held;
      for (Index i = 0; i < held.rows(); ++i) lifted.coeffRef(i, i) += kLift;
      factor_.compute(lifted);
      std::vector<Index> fresh = suspect_pivots(lifted);
      std::erase_if(fresh, [&](Index i) { return suspect_[static_cast<std::size_t>(i)]; });
      if (fresh.empty()) {
        const Index left = still_free();
        if (left >= 0 && !suspect_[static_cast<std::size_t>(left)]) fresh.push_back(left);
      }
      if (fresh.empty()) break;
      for (const Index i : fresh) {
        suspect_[static_cast<std::size_t>(i)] = true;
        suspects_.push_back(i);
        held.coeffRef(i, i) += 1.0;
      }
    }
    if (!suspects_.empty()) factor_.compute(held);
  }

  [[nodiscard]] std::vector<Index> suspect_pivots(const SparseMatrix& matrix) const {
    const Eigen::VectorXd pivots = factor_.vectorD();
    const Eigen::VectorXd diagonal = matrix.diagonal();
    const auto& order = factor_.permutationPinv().indices();  // place in the factor -> degree of freedom
    std::vector<Index> result;
    for (Index i = 0; i < pivots.size(); ++i) {
      const Index dof = order.size() > 0 ? order(i) : i;
      if (!(pivots(i) > kSuspectPivot * std::max(1.0, diagonal(dof)))) result.push_back(dof);
    }
    return result;
  }

  // The degree of freedom that moves most in a motion that strains nothing and moves no suspect; -1 if there
  // is none. Inverse iteration with the lifted matrix: what is left free has the lift alone for an
  // eigenvalue.
  [[nodiscard]] Index still_free() const {
    Eigen::VectorXd motion(elongation_.cols());
    std::uint64_t state = 20'011;  // fixed, so that the same tower gives the same list
    for (double& value : motion) {
      state = state * 6364136223846793005ULL + 1442695040888963407ULL;
      value = static_cast<double>(state >> 11U) / 9007199254740992.0 - 0.5;
    }
    constexpr int steps = 6;
    for (int step = 0; step < steps; ++step) motion = factor_.solve(motion).normalized();
    double strain = (elongation_ * motion).squaredNorm();
    for (const Index suspect : suspects_) strain += motion(suspect) * motion(suspect);
    if (!(strain < kNoStrain)) return -1;
    Index most = 0;
    motion.cwiseAbs().maxCoeff(&most);
    return most;
  }

  // Column i is 1 at suspect i and 0 at the others where it strains nothing; those that do are set against
  // each other, since a free motion may need several of them.
  void take_motions() {
    const Index n = elongation_.cols();
    std::vector<Eigen::VectorXd> strained;
    for (const Index suspect : suspects_) {
      const Eigen::VectorXd motion = factor_.solve(Eigen::VectorXd(Eigen::VectorXd::Unit(n, suspect)));
      if ((elongation_ * motion).squaredNorm() < kNoStrain * motion.squaredNorm()) {
        found_.motions.push_back(motion);
      } else {
        strained.push_back(motion.normalized());
      }
    }
    const auto left = static_cast<Index>(strained.size());
    if (left == 0) return;
    if (left > kMostDense) {
      found_.complete = false;
      return;
    }
    Eigen::MatrixXd basis(n, left);
    for (Index j = 0; j < left; ++j) basis.col(j) = strained[static_cast<std::size_t>(j)];
    take_combinations(basis);
  }

  void take_combinations(const Eigen::MatrixXd& basis) {
    const Eigen::MatrixXd strains = elongation_ * basis;
    const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(strains.transpose() * strains);
    std::vector<Eigen::VectorXd> motions;
    for (Index j = 0; j < basis.cols(); ++j) {
      const Eigen::VectorXd motion = basis * solver.eigenvectors().col(j);
      if ((elongation_ * motion).squaredNorm() >= kNoStrain * motion.squaredNorm()) break;
      motions.push_back(motion);
    }
    for (std::size_t k = 0; k < motions.size(); ++k) {
      Index at = 0;
      motions[k].cwiseAbs().maxCoeff(&at);
      motions[k] /= motions[k](at);
      for (std::size_t j = 0; j < motions.size(); ++j) {
        if (j != k) motions[j] -= motions[j](at) * motions[k];
      }
    }
    for (const Eigen::VectorXd& motion : motions) found_.motions.push_back(motion);
  }

  const SparseMatrix& elongation_;
  std::vector<bool> suspect_;    // n
  std::vector<Index> suspects_;  // in the order in which they were held
  Eigen::SimplicialLDLT<SparseMatrix> factor_;
  StrainlessMotions found_;
};

}  // namespace

StrainlessMotions strainless_motions(const SparseMatrix& elongation) { return NullSpace(elongation).run(); }

}  // namespace swaymark
