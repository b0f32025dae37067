#pragma once

namespace swaymark {

/// The program from its arguments to its exit status; reports every error on standard error and throws
/// nothing.
[[nodiscard]] int run(int argc, const char* const* argv);

}  // namespace swaymark
