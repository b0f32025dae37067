#pragma once

#include "core/error.hpp"
#include "core/tower.hpp"

namespace swaymark {

/// Adds a fault for everything in the tower that no analysis can make sense of: nodes at the same place, bars
/// of zero length, from a node to itself, or twice between the same nodes.
///
/// References between parts must be valid indices. A tower that stands loose is no fault here: see
/// mechanism.hpp.
void validate(const Tower& tower, FaultList& faults);

/// The part of it that depends on the supports: adds a fault for every node that `stabilise` names and that
/// is not free in a direction of its own. Says nothing where other faults are known.
void check_stabilisers(const Tower& tower, FaultList& faults);

}  // namespace swaymark
