#include "core/pad.hpp"

#include <algorithm>
#include <cmath>

namespace swaymark {

PadSprings pad_springs(const Pad& pad) {
  const double half = 0.5 * std::min(pad.length, pad.width);
  const double q = 0.5 * std::max(pad.length, pad.width) / half;
  const double sideways = pad.shear_modulus * half / (2.0 - pad.poisson);
  const double along_long = sideways * (6.8 * std::pow(q, 0.65) + 2.4);
  const double along_short = sideways * (6.8 * std::pow(q, 0.65) + 0.8 * q + 1.6);
  const bool long_in_x = pad.length >= pad.width;
  return {long_in_x ? along_long : along_short, long_in_x ? along_short : along_long,
          pad.shear_modulus * half / (1.0 - pad.poisson) * (3.1 * std::pow(q, 0.75) + 1.6)};
}

}  // namespace swaymark
