#pragma once

#include <optional>
#include <vector>

#include "core/assembly.hpp"
#include "modal/eigenproblem.hpp"

namespace swaymark {

/// The first frequencies of the tower on supports that give way upright.
struct BaseStudy {
  struct Row {
    std::optional<double> stiffness;  ///< of each support [N/m]; empty where it is rigid
    std::vector<double> frequencies;  ///< [Hz], ascending
    std::optional<double> bound;      ///< below the first frequency [Hz]; empty where the supports are rigid
  };
  Axis axis = Axis::z;       ///< the axis that gives way
  std::size_t supports = 0;  ///< how many do
  std::vector<Row> rows;     ///< from soft to rigid
};

/// The mass [kg] that one support stands for in the lowest motion of a tower that is rigid on springs alone.
///
/// T: n_dof x n_supports, column s is the static shape of the tower when support s is raised by 1; the mass
/// is the largest eigenvalue of TT M T. On supports whose reactions follow from equilibrium alone T holds
/// rigid motions only (lifting and rocking), and likewise for the rocking of a symmetric tower.
[[nodiscard]] double mass_on_support(const Tower& tower, const Assembly& assembly,
                                     const Factorisation& stiffness);

/// Solves the tower once for each stiffness of its `base_study`, and once with rigid supports.
///
/// The bound is that of springs in series, 1/f2 = 1/f_fixed2 + 1/f_base2 with f_base = sqrt(k / m) / 2 pi and
/// m = mass_on_support (Dunkerley). It lies below f whatever the tower: for any load p the compliance of the
/// tower on springs is at most that of the fixed tower plus RT R / k, R the reactions of the fixed tower,
/// because these are one of the states in equilibrium with p; and R = TT p.
/// \param problem  that of the tower as it stands. \throws ComputationError where a variant has no modes.
[[nodiscard]] BaseStudy study_base(const Tower& tower, const Assembly& assembly, const Eigenproblem& problem);

}  // namespace swaymark
