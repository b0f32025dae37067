#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <unordered_map>
#include <vector>

#include "core/error.hpp"
#include "core/section_properties.hpp"

namespace swaymark {

/// A size as a catalogue lists it, SI.
struct SectionSize {
  std::string name;                      ///< as the table writes it: `L 80x80x8`
  double area = 0.0;                     ///< [m2] > 0
  std::optional<double> radius;          ///< smallest radius of gyration [m]
  std::optional<double> perimeter;       ///< [m]
  std::optional<AngleDimensions> angle;  ///< of an equal angle whose dimensions are known
};

/// A size taken apart: `CHS 168.3x6.3` is the family CHS with 168.3 and 6.3 [mm, as the trade writes sizes].
struct Designation {
  std::string family;           ///< letters, in capitals
  std::vector<double> numbers;  ///< at least one, above zero
};

/// Letters, then numbers with x or × between them; case and blanks do not count. The short `L 80x8` and
/// `SHS 100x5` stand for `L 80x80x8` and `SHS 100x100x5`. Nothing if the text is written otherwise.
[[nodiscard]] std::optional<Designation> designation_of(std::string_view size);

/// Sizes of sections by name.
class SectionTable {
 public:
  /// Equal angles L (EN 10056-1), circular and square hollow sections CHS and SHS (EN 10210-2, hot-finished):
  /// dimensions from data/sections, properties by section_properties.
  [[nodiscard]] static SectionTable built_in();

  /// \return false, and the table stays as it is, if it has a size of that name already.
  bool add(SectionSize size);
  /// The size, however it is written (see designation_of); nullptr if there is none.
  [[nodiscard]] const SectionSize* find(std::string_view size) const;
  /// Why find() found nothing: names the nearest sizes of the family (by ratio, at most three), or the
  /// families, or the nearest name by spelling.
  [[nodiscard]] Message unknown(std::string_view size) const;

  /// Sizes are missing that could not be read; an unknown one may be one of them, and is no fault.
  void leave_open() { open_ = true; }
  [[nodiscard]] bool is_open() const { return open_; }

  [[nodiscard]] const std::vector<SectionSize>& sizes() const& { return sizes_; }
  const std::vector<SectionSize>& sizes() && = delete;  // it would not outlive the table

 private:
  [[nodiscard]] std::vector<std::string> families() const;
  [[nodiscard]] std::vector<std::string> nearest_to(const Designation& wanted) const;

  std::vector<SectionSize> sizes_;
  std::unordered_map<std::string, std::size_t> index_;  ///< by the name as find() compares it
  bool open_ = false;
};

}  // namespace swaymark
