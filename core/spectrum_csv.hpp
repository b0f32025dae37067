#pragma once

#include "core/file_source.hpp"
#include "core/tower_file_values.hpp"

/// Points of a design spectrum from a table. Private to the reader.
namespace swaymark {

/// Reads the table behind `points_from` of a spectrum, whose interpolation is known by then: the columns
/// `period` or `frequency`, and `acceleration`, with units in brackets. Periods must rise; frequencies may
/// stand in any order and become periods. `tower_file` names the tower file.
void read_points_from(MapView& view, const std::string& tower_file, const FileSource& source,
                      SpectrumStatement& spectrum);

}  // namespace swaymark
