#include "modal/repeated_modes.hpp"

#include <cmath>

namespace swaymark {

namespace {

// Below this share of the largest participation a direction does not tell the shapes apart.
constexpr double kTellsApart = 1e-7;

// Orthogonal Q, m x m, such that column k of Q is what row k of the functionals singles out.
// \param functionals  candidates in order of preference, each row one linear functional of the m shapes.
Eigen::MatrixXd rotation_by(const Eigen::MatrixXd& functionals) {
  const Index m = functionals.cols();
  Eigen::MatrixXd q(m, m);
  Index found = 0;
  const double scale = functionals.rowwise().norm().maxCoeff();
  for (Index row = 0; row < functionals.rows() && found < m; ++row) {
    Eigen::VectorXd candidate = functionals.row(row).transpose();
    for (int pass = 0; pass < 2; ++pass) {
      for (Index k = 0; k < found; ++k) candidate -= q.col(k).dot(candidate) * q.col(k);
    }
    if (candidate.norm() <= kTellsApart * scale) continue;
    q.col(found++) = candidate.normalized();
  }
  return found == m ? q : Eigen::MatrixXd::Identity(m, m);
}

// Directions first; then, for what they leave open, the degrees of freedom that move most.
Eigen::MatrixXd functionals_of(const Eigen::MatrixXd& shapes, const Eigen::MatrixXd& drive) {
  const Index m = shapes.cols();
  Eigen::MatrixXd rows(drive.cols() + m, m);
  rows.topRows(drive.cols()) = (shapes.transpose() * drive).transpose();
  Eigen::MatrixXd left = shapes;
  for (Index k = 0; k < m; ++k) {
    // The largest row of a subspace basis does not depend on the basis; ties go to the first within rounding.
    const Eigen::VectorXd sizes = left.rowwise().norm();
    const double largest = sizes.maxCoeff();
    Index row = 0;
    while (sizes(row) < largest * (1.0 - 1e-6)) ++row;
    // Scaled so that displacements only decide where no direction does.
    rows.row(drive.cols() + k) = shapes.row(row) / shapes.rowwise().norm().maxCoeff();
    const Eigen::RowVectorXd unit = left.row(row).normalized();
    left -= (left * unit.transpose()) * unit;
  }
  const double participation = rows.topRows(drive.cols()).rowwise().norm().maxCoeff();
  const double whole =
      std::sqrt(drive.colwise().squaredNorm().maxCoeff()) * shapes.colwise().norm().maxCoeff();
  if (participation > 1e-9 * whole) {
    rows.bottomRows(m) *= participation;
  } else {
    rows.topRows(drive.cols()).setZero();  // rounding alone
  }
  return rows;
}

}  // namespace

Modes turn_repeated(const SparseMatrix& stiffness, const SparseMatrix& mass, Modes modes,
                    const Eigen::MatrixXd& drive) {
  for (Index begin = 0; begin < modes.count();) {
    Index end = begin + 1;
    while (end < modes.count() && modes.omega(end) - modes.omega(begin) <= kRepeated * modes.omega(begin))
      ++end;
    const Index m = end - begin;
    if (m > 1) {
      auto block = modes.shapes.middleCols(begin, m);
      const Eigen::MatrixXd turned = block * rotation_by(functionals_of(block, drive));
      const double omega = modes.omega.segment(begin, m).mean();
      for (Index k = 0; k < m; ++k) {
        Eigen::VectorXd shape = turned.col(k);
        Index largest = 0;
        shape.cwiseAbs().maxCoeff(&largest);
        if (shape(largest) < 0.0) shape = -shape;
        const Eigen::VectorXd force = stiffness * shape;
        modes.omega(begin + k) = omega;
        modes.residual(begin + k) = (force - omega * omega * (mass * shape)).norm() / force.norm();
        block.col(k) = shape;
      }
    }
    begin = end;
  }
  return modes;
}

}  // namespace swaymark
