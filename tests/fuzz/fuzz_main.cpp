// Runs a fuzzer without a fuzzing engine: every file named on the command line, and then a fixed number of
// seeded mutations of them, so that each run is the same. An engine brings a main of its own in place of this
// one.
#include "tests/fuzz/fuzz_main.hpp"

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <iostream>
#include <iterator>
#include <random>
#include <string>
#include <vector>

namespace {

constexpr int kMutations = 2000;
constexpr std::size_t kLongest = 20'000;  // bytes: longer files cost time and teach nothing new

void run(const std::string& input) {
  LLVMFuzzerTestOneInput(reinterpret_cast<const std::uint8_t*>(input.data()), input.size());
}

std::size_t below(std::size_t end, std::mt19937& random) {
  return std::uniform_int_distribution<std::size_t>(0, end - 1)(random);
}

// One change: a byte, a piece cut out, doubled or taken from another file, or a token that readers stumble
// over.
void mutate(std::string& text, const std::vector<std::string>& seeds, std::mt19937& random) {
  static const std::vector<std::string> tokens{"[",
                                               "]",
                                               "{",
                                               "}",
                                               ":",
                                               ",",
                                               "-",
                                               "&a ",
                                               "*a",
                                               "!!",
                                               "'",
                                               "\"",
                                               "\n",
                                               "\t",
                                               "# ",
                                               "---\n",
                                               "~",
                                               "nan",
                                               "1e999",
                                               "-1",
                                               "0",
                                               "% ",
                                               " kip",
                                               " g",
                                               " degC",
                                               "m/s2",
                                               "<<: ",
                                               "? ",
                                               "\xFF",
                                               "\xC3",
                                               std::string(1, '\0')};
  const std::size_t at = below(text.size() + 1, random);
  const std::size_t length = std::min(below(40, random) + 1, text.size() - at);
  switch (below(5, random)) {
    case 0:
      if (at < text.size()) text[at] = static_cast<char>(below(256, random));
      break;
    case 1:
      text.erase(at, length);
      break;
    case 2:
      text.insert(below(text.size() + 1, random), text.substr(at, length));
      break;
    case 3: {
      const std::string& other = seeds[below(seeds.size(), random)];
      const std::size_t from = below(other.size() + 1, random);
      text.insert(at, other.substr(from, below(60, random)));
      break;
    }
    default:
      text.insert(at, tokens[below(tokens.size(), random)]);
  }
}

}  // namespace

int main(int argc, char** argv) {
  std::vector<std::string> seeds;
  for (int i = 1; i < argc; ++i) {
    std::vector<std::filesystem::path> files{argv[i]};
    if (std::filesystem::is_directory(argv[i])) {
      files.clear();
      for (const auto& entry : std::filesystem::directory_iterator(argv[i])) {
        if (entry.is_regular_file()) files.push_back(entry.path());
      }
      std::sort(files.begin(), files.end());
    }
    for (const auto& file : files) {
      std::ifstream stream(file, std::ios::binary);
      if (!stream) {
        std::cerr << "cannot read " << file << '\n';
        return 1;
      }
      seeds.emplace_back(std::istreambuf_iterator<char>(stream), std::istreambuf_iterator<char>());
    }
  }
  if (seeds.empty()) {
    std::cerr << "name the files or folders to start from\n";
    return 1;
  }
  for (const std::string& seed : seeds) run(seed);
  std::erase_if(seeds, [](const std::string& seed) { return seed.size() > kLongest; });
  std::mt19937 random(20'011);
  for (int i = 0; i < kMutations && !seeds.empty(); ++i) {
    std::string text = seeds[below(seeds.size(), random)];
    const std::size_t changes = below(4, random) + 1;
    for (std::size_t k = 0; k < changes; ++k) mutate(text, seeds, random);
    run(text);
  }
  std::cout << "read " << argc - 1 << " places and " << kMutations << " mutations\n";
  return 0;
}
