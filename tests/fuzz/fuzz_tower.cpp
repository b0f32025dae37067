// Whatever a tower file holds, reading it ends with a tower or with faults that can be shown.
#include <cstdlib>
#include <iostream>

#include "core/tower_file.hpp"
#include "tests/fuzz/fuzz_main.hpp"

extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
  const std::string_view text(reinterpret_cast<const char*>(data), size);
  try {
    const swaymark::Tower tower = swaymark::read_tower(text, "fuzz.yaml");
    if (tower.nodes.empty() && !tower.bars.empty()) std::abort();
  } catch (const swaymark::InputError& error) {
    if (error.faults().empty()) std::abort();
    for (const swaymark::Fault& fault : error.faults()) {
      if (fault.message.what.empty() || fault.message.cure.empty()) std::abort();
    }
  } catch (const std::exception& error) {
    std::cerr << "not an input error: " << error.what() << "\nfor the input\n" << text << '\n';
    std::abort();
  }
  return 0;
}
