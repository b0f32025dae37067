#include "core/section_table.hpp"

#include <algorithm>
#include <cctype>
#include <cmath>
#include <utility>

#include <fmt/format.h>

#include "core/csv.hpp"
#include "core/section_data.hpp"
#include "core/text.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kLongestName = 40;
constexpr std::string_view kTimes = "\xC3\x97";  // ×

// Without blanks, in capitals, every × a plain X.
std::string folded(std::string_view size) {
  std::string result;
  for (std::size_t at = 0; at < size.size(); ++at) {
    if (size.substr(at, kTimes.size()) == kTimes) {
      result += 'X';
      at += kTimes.size() - 1;
    } else if (std::isspace(static_cast<unsigned char>(size[at])) == 0) {
      result += static_cast<char>(std::toupper(static_cast<unsigned char>(size[at])));
    }
  }
  return result;
}

// Digits with at most one point: no sign, no exponent, no word that stands for a number.
std::optional<double> plain_number(std::string_view text) {
  if (text.find_first_not_of("0123456789.") != std::string_view::npos) return std::nullopt;
  const auto value = read_number(text);
  if (!value || *value <= 0.0) return std::nullopt;
  return value;
}

// What two ways to write a size have in common.
std::string key_of(std::string_view size) {
  const auto designation = designation_of(size);
  if (!designation) return folded(size);
  return fmt::format("{}{}", designation->family, fmt::join(designation->numbers, "X"));
}

// The rows of a table of our own, in mm as the names are, each with what its first numbers are called.
template <typename Visit>
void for_each_row(std::string_view text, Visit visit) {
  FaultList faults("section table");
  const CsvTable table = parse_csv(text, faults);
  for (const auto& row : table.rows) {
    std::vector<double> numbers;
    numbers.reserve(row.size());
    for (const CsvCell& cell : row) numbers.push_back(read_number(cell.text).value_or(0.0));
    visit(row, numbers);
  }
  faults.throw_if_any();
}

SectionSize named(std::string name, const SectionProperties& properties) {
  return {std::move(name), properties.area, properties.radius, properties.perimeter, std::nullopt};
}

// How far apart two sizes are, by the ratios of the numbers that both have.
double distance(const std::vector<double>& a, const std::vector<double>& b) {
  double sum = 0.0;
  for (std::size_t i = 0; i < std::min(a.size(), b.size()); ++i) {
    const double step = std::log(a[i] / b[i]);
    sum += step * step;
  }
  return sum;
}

}  // namespace

std::optional<Designation> designation_of(std::string_view size) {
  if (size.size() > kLongestName) return std::nullopt;
  const std::string text = folded(size);
  const std::size_t digits = std::min(text.find_first_of("0123456789."), text.size());
  Designation result{text.substr(0, digits), {}};
  const auto letter = [](char c) { return std::isalpha(static_cast<unsigned char>(c)) != 0; };
  if (digits == 0 || !std::all_of(result.family.begin(), result.family.end(), letter)) return std::nullopt;
  for (std::size_t at = digits; at <= text.size();) {
    const std::size_t end = std::min(text.find('X', at), text.size());
    const auto number = plain_number(std::string_view(text).substr(at, end - at));
    if (!number) return std::nullopt;
    result.numbers.push_back(*number);
    at = end + 1;
  }
  const bool equal_sided = result.family == "L" || result.family == "SHS";
  if (equal_sided && result.numbers.size() == 2) {
    result.numbers.insert(result.numbers.begin(), result.numbers.front());
  }
  return result;
}

SectionTable SectionTable::built_in() {
  constexpr double mm = 1e-3;
  SectionTable table;
  for_each_row(section_data::equal_angles(), [&](const auto& row, const auto& n) {
    const AngleDimensions angle{n[0] * mm, n[1] * mm, n[2] * mm, 0.5 * n[2] * mm};
    SectionSize size = named(fmt::format("L {0}x{0}x{1}", row[0].text, row[1].text), single_angle(angle));
    size.angle = angle;
    table.add(std::move(size));
  });
  for_each_row(section_data::circular_hollow(), [&](const auto& row, const auto& n) {
    table.add(
        named(fmt::format("CHS {}x{}", row[0].text, row[1].text), circular_hollow(n[0] * mm, n[1] * mm)));
  });
  for_each_row(section_data::square_hollow(), [&](const auto& row, const auto& n) {
    table.add(
        named(fmt::format("SHS {0}x{0}x{1}", row[0].text, row[1].text), square_hollow(n[0] * mm, n[1] * mm)));
  });
  return table;
}

bool SectionTable::add(SectionSize size) {
  const bool fresh = index_.emplace(key_of(size.name), sizes_.size()).second;
  if (fresh) sizes_.push_back(std::move(size));
  return fresh;
}

const SectionSize* SectionTable::find(std::string_view size) const {
  const auto found = index_.find(key_of(size));
  return found == index_.end() ? nullptr : &sizes_[found->second];
}

std::vector<std::string> SectionTable::families() const {
  std::vector<std::string> result;
  for (const SectionSize& size : sizes_) {
    const auto designation = designation_of(size.name);
    if (!designation) continue;
    if (std::find(result.begin(), result.end(), designation->family) == result.end()) {
      result.push_back(designation->family);
    }
  }
  return result;
}

std::vector<std::string> SectionTable::nearest_to(const Designation& wanted) const {
  constexpr std::size_t most = 3;
  std::vector<std::pair<double, std::size_t>> found;
  for (std::size_t i = 0; i < sizes_.size(); ++i) {
    const auto designation = designation_of(sizes_[i].name);
    if (!designation || designation->family != wanted.family) continue;
    found.emplace_back(distance(designation->numbers, wanted.numbers), i);
  }
  std::sort(found.begin(), found.end());
  std::vector<std::string> names;
  for (const auto& [far, i] : found) {
    if (names.size() < most) names.push_back(sizes_[i].name);
  }
  return names;
}

Message SectionTable::unknown(std::string_view size) const {
  if (const auto wanted = designation_of(size)) {
    const auto close = nearest_to(*wanted);
    return close.empty() ? wording::size_family_unknown(wanted->family, families())
                         : wording::size_unknown(size, close);
  }
  std::vector<std::string> names;
  for (const SectionSize& known : sizes_) names.push_back(known.name);
  const auto close = nearest(size, names);
  return close ? wording::size_unknown(size, {*close}) : wording::size_not_read(size);
}

}  // namespace swaymark
