#include "apps/report_summary.hpp"

#include <algorithm>
#include <vector>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_parts.hpp"
#include "apps/table.hpp"

namespace swaymark {

namespace {

using Rows = std::vector<std::pair<std::string, std::string>>;

void lowest_modes(const Analysis& a, Rows& rows) {
  constexpr Index shown = 3;
  std::string words;
  for (Index j = 0; j < std::min(shown, a.mode_count()); ++j) {
    words += fmt::format("{}{} Hz ({})", j > 0 ? ", " : "", figure(a.frequency(j), 3),
                         a.character[static_cast<std::size_t>(j)]);
  }
  rows.emplace_back(a.mode_count() == 1 ? "frequency" : "lowest frequencies", words);
}

void base_figures(const SeismicResult& s, Rows& rows) {
  std::string shear;
  std::string overturning;
  for (const DirectionResult& d : s.directions) {
    shear += fmt::format("{}{} {} kN", shear.empty() ? "" : ", ", name_of(d.axis), kilo(d.base_shear));
    if (!d.overturning_moment) continue;
    overturning += fmt::format("{}{} {} kNm", overturning.empty() ? "" : ", ", name_of(d.axis),
                               kilo(*d.overturning_moment));
  }
  rows.emplace_back("base shear", shear);
  if (!overturning.empty()) rows.emplace_back("overturning", overturning);
}

void bar_figures(const Analysis& a, Rows& rows) {
  const SeismicResult& s = *a.seismic;
  Index pressed = -1;
  Index pulled = -1;
  Extremes largest;
  for (Index b = 0; b < s.bar_force.size(); ++b) {
    const Extremes e = bar_extremes(s.bar_gravity(b), s.bar_force(b));
    if (nine_digits(e.compression) > nine_digits(largest.compression)) {
      largest.compression = e.compression;
      pressed = b;
    }
    if (nine_digits(e.tension) > nine_digits(largest.tension)) {
      largest.tension = e.tension;
      pulled = b;
    }
  }
  const auto words = [&](Index bar, double force) {
    const auto b = static_cast<std::size_t>(bar);
    return fmt::format("{} kN in {} ({})", kilo(force), a.tower.bar_name(b), bar_ends(a.tower, b));
  };
  if (pressed >= 0) rows.emplace_back("largest compression", words(pressed, largest.compression));
  if (pulled >= 0) rows.emplace_back("largest tension", words(pulled, largest.tension));
}

void uplift(const Analysis& a, Rows& rows) {
  double largest = 0.0;
  std::size_t lifted = 0;
  std::size_t held = 0;
  std::string where;
  for (const NodeReaction& reaction : node_reactions(a)) {
    if (!reaction.uplift) continue;
    ++held;
    if (*reaction.uplift <= 0.0) continue;
    ++lifted;
    if (*reaction.uplift <= largest) continue;
    largest = *reaction.uplift;
    where = a.tower.nodes[reaction.node].name;
  }
  if (held == 0) return;
  rows.emplace_back("uplift", lifted == 0 ? std::string("none")
                                          : fmt::format("{} kN at node {}; {} of {} supports lift",
                                                        kilo(largest), where, lifted, held));
}

}  // namespace

std::string summary_section(const Analysis& a) {
  Rows rows;
  lowest_modes(a, rows);
  if (a.seismic) {
    base_figures(*a.seismic, rows);
    bar_figures(a, rows);
    uplift(a, rows);
  }
  std::string out = section_head("FIGURES TO LOOK AT FIRST");
  for (const auto& [name, words] : rows) out += wrapped(words, fmt::format("  {:<20}  ", name), kTextWidth);
  return out;
}

}  // namespace swaymark
