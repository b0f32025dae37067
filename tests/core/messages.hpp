#pragma once

#include <vector>

#include "core/error.hpp"

/// What holds for every sentence of the house.
namespace swaymark::test {

/// Each says what is wrong and what would cure it, without a full stop, on one line, and no longer than a
/// page is wide a few times, whatever words of a file it carries.
void check_sentences(const std::vector<Message>& messages);

}  // namespace swaymark::test
