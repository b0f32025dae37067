#pragma once

#include <array>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include "core/axis.hpp"
#include "core/error.hpp"

/// What a tower file asks to be computed and checked, as it was stated. SI units throughout.
namespace swaymark {

/// Which modes are wanted; every condition given must hold, and at least one is given.
struct ModeRequest {
  std::optional<int> count;
  std::optional<double> up_to;       ///< [Hz]: every mode at or below it
  std::optional<double> mass_share;  ///< fraction of the moving mass, in every direction excited
};

/// The directions in which a mode must move to matter to a band.
enum class BandDirection { x, y, z, horizontal, any };

/// A range of frequencies to keep clear of.
struct BandStatement {
  std::string label;
  int harmonic = 0;     ///< 0 where the band was given by its ends; else the multiple of the running speed
  double from = 0.0;    ///< [Hz]
  double to = 0.0;      ///< [Hz]
  double margin = 0.0;  ///< fraction of the band's ends, kept outside it
  BandDirection direction = BandDirection::any;
  Place place;
};

enum class Interpolation { linear, log_log };

/// A design spectrum by points.
struct SpectrumStatement {
  std::string name;
  std::vector<std::pair<double, double>> points;  ///< period [s], ascending; acceleration [m/s2]
  Interpolation interpolation = Interpolation::linear;
  std::optional<double> damping;  ///< fraction of critical the ordinates were drawn for
  bool damping_correction = false;
  Place place;
};

enum class ModalRule { cqc, srss, absolute_sum };
enum class DirectionalRule { srss, percent_30, percent_40 };

/// The response-spectrum analysis asked for.
struct SeismicStatement {
  std::array<std::optional<std::size_t>, 3> spectrum;  ///< by axis: index into Tower::spectra
  ModalRule modes = ModalRule::cqc;
  DirectionalRule directions = DirectionalRule::srss;
  bool missing_mass = true;
  double factor = 1.0;  ///< scales every ordinate
  Place place;
};

/// How the first frequencies move where the supports give way upright: the range of stiffness of one support.
struct BaseStudyStatement {
  double from = 0.0;  ///< [N/m] > 0
  double to = 0.0;    ///< [N/m] > from
  Place place;
};

}  // namespace swaymark
