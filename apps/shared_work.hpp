#pragma once

#include <memory>
#include <vector>

#include "core/mechanism.hpp"
#include "modal/factorisation.hpp"

namespace swaymark {

/// What analyses of one tower in several states share: where free degrees of freedom and stiffness are the
/// same to the last bit, the search for mechanisms and the factorisation of K are done once.
///
/// The towers have the same nodes and bars (the caller's promise). The first state and the last one are kept.
class SharedWork {
 public:
  [[nodiscard]] const MechanismReport& mechanisms(const Tower& tower, const Assembly& assembly);
  [[nodiscard]] std::shared_ptr<const Factorisation> factor(const Assembly& assembly);

  /// How many states differed so far in what is shared.
  [[nodiscard]] int different() const { return different_; }

 private:
  struct Entry {
    std::vector<Index> free_dofs;
    SparseMatrix stiffness;
    std::shared_ptr<const MechanismReport> mechanisms;
    std::shared_ptr<const Factorisation> factor;
  };
  [[nodiscard]] Entry& entry_of(const Assembly& assembly);

  std::vector<Entry> entries_;
  int different_ = 0;
};

}  // namespace swaymark
