#include "apps/shared_work.hpp"

#include <algorithm>

namespace swaymark {

namespace {

bool same(const SparseMatrix& a, const SparseMatrix& b) {
  return a.rows() == b.rows() && a.cols() == b.cols() && a.nonZeros() == b.nonZeros() &&
         std::equal(a.outerIndexPtr(), a.outerIndexPtr() + a.outerSize() + 1, b.outerIndexPtr()) &&
         std::equal(a.innerIndexPtr(), a.innerIndexPtr() + a.nonZeros(), b.innerIndexPtr()) &&
         std::equal(a.valuePtr(), a.valuePtr() + a.nonZeros(), b.valuePtr());
}

}  // namespace

SharedWork::Entry& SharedWork::entry_of(const Assembly& assembly) {
  const auto& free_dofs = assembly.dofs.free_dofs();
  // The free degrees of freedom are compared, too: other supports of a symmetric tower may give equal
  // matrices.
  for (Entry& entry : entries_) {
    if (entry.free_dofs == free_dofs && same(entry.stiffness, assembly.stiffness)) return entry;
  }
  ++different_;
  if (entries_.size() == 2) entries_.pop_back();
  entries_.push_back({free_dofs, assembly.stiffness, nullptr, nullptr});
  return entries_.back();
}

const MechanismReport& SharedWork::mechanisms(const Tower& tower, const Assembly& assembly) {
  Entry& entry = entry_of(assembly);
  if (!entry.mechanisms)
    entry.mechanisms = std::make_shared<const MechanismReport>(find_mechanisms(tower, assembly));
  return *entry.mechanisms;
}

std::shared_ptr<const Factorisation> SharedWork::factor(const Assembly& assembly) {
  Entry& entry = entry_of(assembly);
  if (!entry.factor) entry.factor = std::make_shared<const Factorisation>(assembly.stiffness);
  return entry.factor;
}

}  // namespace swaymark
