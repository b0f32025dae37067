#pragma once

#include <memory>
#include <optional>

#include "modal/dense.hpp"
#include "modal/factorisation.hpp"
#include "modal/inertia.hpp"

/// The undamped free vibration of a structure,
///
///   K phi = omega^2 M phi,    K symmetric positive definite, M symmetric positive semidefinite.
///
/// A degree of freedom whose row of M is zero has no inertia: it adds no mode, and its part of every shape
/// follows the others statically. There are as many modes as degrees of freedom with mass.
namespace swaymark {

enum class EigenMethod { automatic, dense, shift_invert };

/// What an extraction ended with. Only `complete` modes may be used without a word.
enum class ModesStatus {
  complete,               ///< the count from the factorisation agrees: no mode is missing
  uncounted,              ///< the modes converged, but no factorisation could count them
  incomplete,             ///< the count disagrees: modes are missing
  not_converged,          ///< the solver gave up
  not_positive_definite,  ///< K is singular to working precision
};

/// Exactly `below` modes of the model lie below `omega`, counted from a factorisation of its own.
struct Certificate {
  Index below = 0;
  double omega = 0.0;  ///< [rad/s]
};

struct Modes {
  Eigen::VectorXd omega;     ///< n_modes [rad/s], ascending
  Eigen::MatrixXd shapes;    ///< n_free x n_modes [1/sqrt(kg)], unit modal mass, largest component positive
  Eigen::VectorXd residual;  ///< n_modes [-]: |K phi - omega^2 M phi| / |K phi|, Euclidean norms
  ModesStatus status = ModesStatus::not_converged;
  std::optional<Certificate> certificate;

  [[nodiscard]] Index count() const { return omega.size(); }
  [[nodiscard]] bool usable() const {
    return status == ModesStatus::complete || status == ModesStatus::uncounted;
  }
};

/// One structure, factorised once, from which modes are taken as often as needed.
class Eigenproblem {
 public:
  /// \param stiffness K [N/m], \param mass M [kg]; both n_free x n_free, n_free >= 1. They must outlive the
  /// object.
  Eigenproblem(const SparseMatrix& stiffness, const SparseMatrix& mass);
  /// The same with a factorisation of that very K made before.
  Eigenproblem(const SparseMatrix& stiffness, const SparseMatrix& mass,
               std::shared_ptr<const Factorisation> factor);

  [[nodiscard]] const Factorisation& factor() const { return *factor_; }
  /// The number of modes there are: degrees of freedom with mass.
  [[nodiscard]] Index mode_count() const { return mode_count_; }
  /// The most modes that lowest() can give: all of a model of a few thousand unknowns, a third of a larger
  /// one.
  [[nodiscard]] Index most_modes() const;

  /// The lowest `count` modes, and any others that lie within a hundred-thousandth of the last one.
  ///
  /// Small problems and requests for a large part of the modes go to the dense solver, all others to
  /// shift-and-invert Lanczos; both are counted against the inertia of K - omega^2 M, and the Lanczos run is
  /// continued square to what is known until the count agrees.
  [[nodiscard]] Modes lowest(Index count, EigenMethod method = EigenMethod::automatic) const;

  /// The first `count` of given modes, with a certificate for the last one kept.
  [[nodiscard]] Modes first(const Modes& modes, Index count) const;

  [[nodiscard]] std::optional<InertiaCount> below(double omega_squared) const;

 private:
  [[nodiscard]] ReciprocalPairs pairs(Index count, EigenMethod method) const;
  [[nodiscard]] Modes shapes_of(const ReciprocalPairs& pairs) const;

  const SparseMatrix& stiffness_;
  const SparseMatrix& mass_;
  std::shared_ptr<const Factorisation> factor_;
  Index mode_count_;
};

}  // namespace swaymark
