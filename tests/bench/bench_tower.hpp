#pragma once

#include <string>

/// The tower that times are taken of.
namespace swaymark::bench {

/// In what units the same tower is written.
enum class Units {
  bare,     ///< plain SI numbers
  common,   ///< GPa, cm2, kg/m3 and others that the program knows by itself
  library,  ///< the same, with densities in lb/ft3, which the units library is opened for
};

/// "plain numbers", "common units", "units library"
[[nodiscard]] const char* name_of(Units units);

/// A square tower of eleven panels under an apex, 200 bars and 136 free degrees of freedom, to be checked for
/// a band and for two directions of a spectrum. Invented.
[[nodiscard]] std::string tower_text(Units units);

}  // namespace swaymark::bench
