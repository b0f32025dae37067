#pragma once

#include <cstddef>
#include <cstdint>

/// The entry of a fuzzer; it must return for every input, and abort where the code under test misbehaves.
extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size);
