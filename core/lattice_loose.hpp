#pragma once

#include "core/lattice.hpp"

namespace swaymark {

/// Which nodes the pattern of a lattice leaves loose, and what would hold them; the corners of the base count
/// as held. The generator adds nothing of its own: the engineer chooses.
///
/// - A mid node whose bars lie in one plane is free square to its face. A diamond in plan holds the three of
///   a triangle; the four of a square keep one motion, two opposite ones out while the others move in.
/// - A face with one diagonal needs the horizontal at its top, and so does 'K down': without it up to one
///   motion a face is left, unless the panel above is braced by X and has its horizontals.
///
/// find_mechanisms() sees the whole tower, supports and bars written by hand included, and decides.
[[nodiscard]] std::vector<LooseNodes> loose_nodes(const LatticeStatement& statement, const Lattice& lattice);

}  // namespace swaymark
