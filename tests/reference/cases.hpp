#pragma once

#include <string>
#include <vector>

#include <nlohmann/json.hpp>

#include "apps/analysis.hpp"
#include "tests/support/files.hpp"
#include "tests/support/matchers.hpp"

/// The cases of data/reference: what is published beside what the program finds.
namespace swaymark::test {

using Json = nlohmann::json;

[[nodiscard]] Json reference_data(const std::string& name);

/// The names of all cases, sorted.
[[nodiscard]] std::vector<std::string> reference_names();

[[nodiscard]] Tower reference_tower(const Json& data);

[[nodiscard]] Analysis analysed(Tower tower);

/// Where a figure comes from, for the message of a check that fails.
[[nodiscard]] std::string source_of(const Json& data);

}  // namespace swaymark::test
