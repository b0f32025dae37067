#pragma once

#include <string>
#include <vector>

#include "apps/analysis.hpp"

namespace swaymark {

/// Figures that are possible but seldom meant: mistaken units, masses counted twice. Each is a note, never a
/// fault.
///
/// The limits are common practice, no source: steel weighs 7000 to 8500 kg/m3 and other metals 1500 to 23
/// 000; a bar is rarely longer than one and a half times the tower's height; a lattice tower of height h [m]
/// has f1 between 10/h and 300/h [Hz], sloshing aside, and 2 to 50 000 kg per metre of height; ice is 2 to
/// 150 mm thick and weighs 200 (rime) to 920 kg/m3; liquids weigh 500 to 2000 kg/m3; the shear modulus of
/// soil and soft rock lies between 1 MPa and 10 GPa.
[[nodiscard]] std::vector<std::string> plausibility_notes(const Analysis& analysis);

}  // namespace swaymark
