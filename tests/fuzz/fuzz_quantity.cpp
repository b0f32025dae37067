// Whatever stands where a number with a unit is wanted, reading it ends with a finite value or a message.
#include <algorithm>
#include <cmath>
#include <cstdlib>

#include "core/quantity.hpp"
#include "tests/fuzz/fuzz_main.hpp"

namespace {

void read_as_everything(std::string_view text) {
  for (int quantity = 0; quantity <= static_cast<int>(swaymark::Quantity::velocity); ++quantity) {
    const auto reading = swaymark::read_quantity(text, static_cast<swaymark::Quantity>(quantity));
    if (const double* value = std::get_if<double>(&reading)) {
      if (!std::isfinite(*value)) std::abort();
    } else if (std::get<swaymark::Message>(reading).what.empty()) {
      std::abort();
    }
  }
}

}  // namespace

// One value for each input of an engine; of a longer text the pieces between the signs of YAML, the first
// hundred.
extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
  std::string_view text(reinterpret_cast<const char*>(data), size);
  for (int pieces = 0; pieces < 100 && !text.empty(); ++pieces) {
    const std::size_t end = std::min(text.find_first_of("[]{},:\n"), text.size());
    if (end > 0) read_as_everything(text.substr(0, end));
    text.remove_prefix(std::min(end + 1, text.size()));
  }
  return 0;
}
