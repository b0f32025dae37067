#pragma once

#include "core/file_source.hpp"
#include "core/tower.hpp"
#include "core/tower_file_values.hpp"

/// The keys of a tower file that ask for something: modes, bands, spectra, seismic. Private to the reader.
namespace swaymark {

void read_modes(MapView& file, Tower& tower);
void read_bands(MapView& file, Tower& tower);
void read_spectra(MapView& file, const FileSource& source, Tower& tower, NameTable& names);
/// \param damped  whether a damping is stated, which the analysis needs.
void read_seismic(MapView& file, Tower& tower, const NameTable& spectra, bool damped);

}  // namespace swaymark
