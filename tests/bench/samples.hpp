#pragma once

#include <algorithm>
#include <cstddef>
#include <vector>

namespace swaymark::bench {

/// Repeated times of one thing [ms]. The median stands for it: other work on the machine only ever adds.
class Samples {
 public:
  void add(double milliseconds) { values_.push_back(milliseconds); }

  [[nodiscard]] double median() const {
    std::vector<double> sorted = values_;
    std::sort(sorted.begin(), sorted.end());
    const std::size_t half = sorted.size() / 2;
    return sorted.size() % 2 == 1 ? sorted[half] : 0.5 * (sorted[half - 1] + sorted[half]);
  }
  [[nodiscard]] double least() const { return *std::min_element(values_.begin(), values_.end()); }
  [[nodiscard]] double most() const { return *std::max_element(values_.begin(), values_.end()); }

 private:
  std::vector<double> values_;
};

}  // namespace swaymark::bench
