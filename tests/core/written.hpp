#pragma once

#include <string>

#include "core/tower.hpp"

namespace swaymark::test {

/// The keys `sections`, `materials` and `members` of a tower as a file states them, groups without bars.
[[nodiscard]] std::string parts_of(const Tower& tower);

}  // namespace swaymark::test
