#include "core/mechanism.hpp"

#include <algorithm>
#include <cmath>

#include <Eigen/Eigenvalues>
#include <Eigen/QR>
#include <Eigen/SparseCholesky>
#include <fmt/format.h>

#include "core/text.hpp"

namespace swaymark {

namespace {

// A node whose bars leave a direction open to within this much of their unit stiffness; a slope of 1e-5.
constexpr double kLocalOpen = 1e-10;
// Pivots below this share of their diagonal make the whole suspect. Rounding lifts the pivot of a mechanism,
// by far more than its own size where the pivots before it are small, so that this only spares stiff towers
// the search.
constexpr double kSuspectPivot = 1e-6;
// Strain energy of a unit motion at unit stiffness. Rounding leaves 1e-30; the softest sound tower 1e-14.
constexpr double kNoStrain = 1e-22;
constexpr double kMoves = 1e-6;    // of the largest component: below it a node stands still
constexpr Index kMostGlobal = 40;  // independent motions of the whole that are looked for
constexpr std::size_t kMostListed = 2000;

// E: n_bars + n_springs rows, each the elongation of one bar or spring per free displacement.
SparseMatrix elongation_matrix(const Assembly& assembly) {
  std::vector<Eigen::Triplet<double>> triplets;
  const DofMap& dofs = assembly.dofs;
  Index row = 0;
  for (const BarElement& bar : assembly.bars) {
    for (std::size_t i = 0; i < dofs.axes().size(); ++i) {
      const double value = bar.direction[index_of(dofs.axes()[i])];
      const Index from = dofs.free(dofs.dof(bar.from, i));
      const Index to = dofs.free(dofs.dof(bar.to, i));
      if (from >= 0) triplets.emplace_back(row, from, -value);
      if (to >= 0) triplets.emplace_back(row, to, value);
    }
    ++row;
  }
  for (Index i = 0; i < assembly.springs.size(); ++i) {
    if (assembly.springs(i) > 0.0) triplets.emplace_back(row++, i, 1.0);
  }
  SparseMatrix elongation(row, dofs.free_count());
  elongation.setFromTriplets(triplets.begin(), triplets.end());
  return elongation;
}

// The axes that are free at a node, and their numbers.
struct FreeAxes {
  std::vector<Index> numbers;
  std::vector<Axis> axes;
};

FreeAxes free_axes(const DofMap& dofs, std::size_t node) {
  FreeAxes result;
  for (std::size_t k = 0; k < dofs.axes().size(); ++k) {
    const Index number = dofs.free(dofs.dof(node, k));
    if (number < 0) continue;
    result.numbers.push_back(number);
    result.axes.push_back(dofs.axes()[k]);
  }
  return result;
}

std::string direction_words(const Eigen::Vector3d& direction) {
  for (const Axis axis : kAllAxes) {
    if (std::abs(std::abs(direction[index_of(axis)]) - 1.0) < kMoves) return std::string(name_of(axis));
  }
  return fmt::format("({:.3g}, {:.3g}, {:.3g})", direction.x(), direction.y(), direction.z());
}

Mechanism local_mechanism(const Tower& tower, std::size_t node, const Eigen::Vector3d& direction,
                          bool loose) {
  Mechanism mechanism;
  const std::string name = excerpt(tower.nodes[node].name);
  const std::string words = direction_words(direction);
  mechanism.kind = loose ? "loose node" : "node free square to its bars";
  mechanism.motion = {{node, direction}};
  if (loose) {
    mechanism.cures = {fmt::format("join node '{}' to the tower by bars, or remove it", name)};
  } else {
    mechanism.cures = {fmt::format("add a bar at node '{}' that has a part along {}", name, words),
                       fmt::format("or hold node '{}' along {} by a support", name, words)};
  }
  return mechanism;
}

struct LocalSearch {
  std::vector<Mechanism> mechanisms;
  SparseMatrix elongation;  // with a row more for each mechanism, as if a unit spring held it
};

// Motions open at single nodes, and a spring for each so that the rest can be looked at without them.
LocalSearch local_mechanisms(const Tower& tower, const Assembly& assembly, const SparseMatrix& elongation) {
  std::vector<Mechanism> found;
  std::vector<Eigen::Triplet<double>> springs;
  const SparseMatrix stiffness = elongation.transpose() * elongation;
  for (std::size_t node = 0; node < tower.nodes.size(); ++node) {
    const FreeAxes open = free_axes(assembly.dofs, node);
    const auto size = static_cast<Index>(open.numbers.size());
    if (size == 0) continue;
    Eigen::MatrixXd block(size, size);
    for (Index i = 0; i < size; ++i) {
      for (Index j = 0; j < size; ++j) {
        block(i, j) = stiffness.coeff(open.numbers[static_cast<std::size_t>(i)],
                                      open.numbers[static_cast<std::size_t>(j)]);
      }
    }
    const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(block);
    const double largest = solver.eigenvalues()(size - 1);
    for (Index k = 0; k < size && solver.eigenvalues()(k) <= kLocalOpen * std::max(1.0, largest); ++k) {
      const Eigen::VectorXd vector = solver.eigenvectors().col(k);
      Eigen::Vector3d direction = Eigen::Vector3d::Zero();
      for (Index i = 0; i < size; ++i)
        direction[index_of(open.axes[static_cast<std::size_t>(i)])] = vector(i);
      Index leading = 0;
      direction.cwiseAbs().maxCoeff(&leading);
      direction /= direction[leading];
      const Index row = elongation.rows() + static_cast<Index>(found.size());
      for (Index i = 0; i < size; ++i)
        springs.emplace_back(row, open.numbers[static_cast<std::size_t>(i)], vector(i));
      found.push_back(local_mechanism(tower, node, direction, largest <= 0.0));
    }
  }
  if (found.empty()) return {{}, elongation};
  for (Index column = 0; column < elongation.outerSize(); ++column) {
    for (SparseMatrix::InnerIterator entry(elongation, column); entry; ++entry) {
      springs.emplace_back(entry.row(), column, entry.value());
    }
  }
  SparseMatrix extended(elongation.rows() + static_cast<Index>(found.size()), elongation.cols());
  extended.setFromTriplets(springs.begin(), springs.end());
  LocalSearch result;
  result.mechanisms = std::move(found);
  result.elongation.swap(extended);
  return result;
}

using Factor = Eigen::SimplicialLDLT<SparseMatrix>;

// How many pivots are tiny against the diagonal they started from.
Index suspect_pivots(const Factor& factor, const SparseMatrix& matrix) {
  const Eigen::VectorXd pivots = factor.vectorD();
  const Eigen::VectorXd diagonal = factor.permutationP() * Eigen::VectorXd(matrix.diagonal());
  Index count = 0;
  for (Index i = 0; i < pivots.size(); ++i) {
    if (!(pivots(i) > kSuspectPivot * diagonal(i))) ++count;
  }
  return count;
}

// Columns span the motions of the whole that strain nothing: block inverse iteration on K + eps I, then the
// singular vectors of the elongations within the block.
Eigen::MatrixXd strainless_motions(const SparseMatrix& stiffness, const SparseMatrix& elongation,
                                   Index suspects) {
  const Index n = stiffness.rows();
  const Index block = std::min<Index>(n, std::min<Index>(suspects, kMostGlobal) + 8);
  constexpr double shift = 1e-13;
  SparseMatrix shifted = stiffness;
  for (Index i = 0; i < n; ++i) shifted.coeffRef(i, i) += shift;
  Factor factor(shifted);
  if (factor.info() != Eigen::Success) return Eigen::MatrixXd(n, 0);
  Eigen::MatrixXd basis(n, block);
  std::uint64_t state = 20'011;  // fixed, so that the same tower gives the same list
  for (Index j = 0; j < block; ++j) {
    for (Index i = 0; i < n; ++i) {
      state = state * 6364136223846793005ULL + 1442695040888963407ULL;
      basis(i, j) = static_cast<double>(state >> 11U) / 9007199254740992.0 - 0.5;
    }
  }
  const auto orthonormal = [&](const Eigen::MatrixXd& columns) {
    const Eigen::HouseholderQR<Eigen::MatrixXd> qr(columns);
    return Eigen::MatrixXd(qr.householderQ() * Eigen::MatrixXd::Identity(n, block));
  };
  for (int sweep = 0; sweep < 6; ++sweep) basis = orthonormal(factor.solve(basis));
  const Eigen::MatrixXd strains = elongation * basis;
  const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver(strains.transpose() * strains);
  Index strainless = 0;
  for (Index j = 0; j < block; ++j) {
    const Eigen::VectorXd motion = basis * solver.eigenvectors().col(j);
    if ((elongation * motion).squaredNorm() < kNoStrain) ++strainless;
  }
  // A full block may have left some out.
  if (strainless == block && block < n && suspects < kMostGlobal)
    return strainless_motions(stiffness, elongation, std::min(2 * suspects + 8, kMostGlobal));
  return basis * solver.eigenvectors().leftCols(strainless);
}

// Each column 1 at a degree of freedom of its own where the others are 0: motions as local as the space
// allows.
Eigen::MatrixXd localised(Eigen::MatrixXd basis) {
  for (Index j = 0; j < basis.cols(); ++j) {
    Index row = 0;
    Index column = 0;
    basis.rightCols(basis.cols() - j).cwiseAbs().maxCoeff(&row, &column);
    basis.col(j).swap(basis.col(j + column));
    basis.col(j) /= basis(row, j);
    for (Index k = 0; k < basis.cols(); ++k) {
      if (k != j) basis.col(k) -= basis(row, k) * basis.col(j);
    }
  }
  return basis;
}

Mechanism global_mechanism(const Tower& tower, const DofMap& dofs, const Eigen::VectorXd& motion) {
  Mechanism mechanism;
  const double largest = motion.cwiseAbs().maxCoeff();
  const Eigen::VectorXd all = dofs.expand(motion / largest);
  for (std::size_t node = 0; node < tower.nodes.size(); ++node) {
    Eigen::Vector3d direction = Eigen::Vector3d::Zero();
    for (std::size_t k = 0; k < dofs.axes().size(); ++k)
      direction[index_of(dofs.axes()[k])] = all(dofs.dof(node, k));
    if (direction.cwiseAbs().maxCoeff() > kMoves) mechanism.motion.push_back({node, direction});
  }
  std::stable_sort(mechanism.motion.begin(), mechanism.motion.end(), [](const auto& a, const auto& b) {
    return a.direction.norm() > b.direction.norm() * (1 + 1e-9);
  });
  const bool whole = mechanism.motion.size() == tower.nodes.size();
  const auto& lead = mechanism.motion.front();
  const std::string name = excerpt(tower.nodes[lead.node].name);
  if (whole) {
    mechanism.kind = "the whole tower moves";
    mechanism.cures = {fmt::format("support the tower against it, for example node '{}' along {}", name,
                                   direction_words(lead.direction))};
  } else {
    mechanism.kind = "part of the tower moves";
    mechanism.cures = {
        fmt::format(
            "add a bar between a node that moves and one that does not, for example at node '{}' along {}",
            name, direction_words(lead.direction)),
        fmt::format("or hold node '{}' by a support", name)};
  }
  return mechanism;
}

}  // namespace

MechanismReport find_mechanisms(const Tower& tower, const Assembly& assembly) {
  MechanismReport report;
  if (assembly.dofs.free_count() == 0) return report;
  LocalSearch local = local_mechanisms(tower, assembly, elongation_matrix(assembly));
  report.mechanisms = std::move(local.mechanisms);
  const SparseMatrix stiffness = local.elongation.transpose() * local.elongation;
  const Factor factor(stiffness);
  const Index suspects = factor.info() == Eigen::Success ? suspect_pivots(factor, stiffness) : kMostGlobal;
  if (suspects > 0) {
    const Eigen::MatrixXd motions = localised(strainless_motions(stiffness, local.elongation, suspects));
    for (Index j = 0; j < motions.cols(); ++j) {
      report.mechanisms.push_back(global_mechanism(tower, assembly.dofs, motions.col(j)));
    }
    report.complete = motions.cols() <= kMostGlobal;
  }
  if (report.mechanisms.size() > kMostListed) {
    report.mechanisms.resize(kMostListed);
    report.complete = false;
  }
  return report;
}

}  // namespace swaymark
