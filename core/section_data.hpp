#pragma once

#include <string_view>

/// The tables of data/sections as they were when the program was built, so that it needs no file of them when
/// it runs. Their definitions are generated from the CSV files. Private to section_table.
namespace swaymark::section_data {

[[nodiscard]] std::string_view equal_angles();
[[nodiscard]] std::string_view circular_hollow();
[[nodiscard]] std::string_view square_hollow();

}  // namespace swaymark::section_data
