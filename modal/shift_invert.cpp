#include "modal/shift_invert.hpp"

#include <algorithm>

#include <Spectra/SymEigsSolver.h>

namespace swaymark {

namespace {

// y = (I - V VT) L^-1 M L^-T (I - V VT) x, in the form Spectra calls.
class ReciprocalOperator {
 public:
  using Scalar = double;

  ReciprocalOperator(const Factorisation& factor, const SparseMatrix& mass, const Eigen::MatrixXd& known)
      : factor_(factor), mass_(mass), known_(known) {}

  [[nodiscard]] Index rows() const { return mass_.rows(); }
  [[nodiscard]] Index cols() const { return mass_.cols(); }

  void perform_op(const double* in, double* out) const {
    Eigen::VectorXd x = Eigen::Map<const Eigen::VectorXd>(in, rows());
    remove_known(x);
    Eigen::VectorXd y = factor_.forward(mass_ * factor_.backward(x));
    remove_known(y);
    Eigen::Map<Eigen::VectorXd>(out, rows()) = y;
  }

 private:
  void remove_known(Eigen::VectorXd& x) const {
    if (known_.cols() > 0) x -= known_ * (known_.transpose() * x);
  }

  const Factorisation& factor_;
  const SparseMatrix& mass_;
  const Eigen::MatrixXd& known_;
};

}  // namespace

ReciprocalPairs solve_shift_invert(const Factorisation& factor, const SparseMatrix& mass, Index count,
                                   const Eigen::MatrixXd& known) {
  constexpr Index most_restarts = 1000;
  constexpr double tolerance = 1e-12;
  const Index subspace = std::min(mass.rows(), std::max<Index>(2 * count + 1, count + 24));
  ReciprocalOperator operation(factor, mass, known);
  Spectra::SymEigsSolver<ReciprocalOperator> solver(operation, count, subspace);
  solver.init();  // from a fixed start vector, so that a run can be repeated
  solver.compute(Spectra::SortRule::LargestAlge, most_restarts, tolerance, Spectra::SortRule::LargestAlge);
  ReciprocalPairs pairs;
  pairs.converged = solver.info() == Spectra::CompInfo::Successful;
  pairs.mu = solver.eigenvalues();
  pairs.v = solver.eigenvectors();
  return pairs;
}

}  // namespace swaymark
