#include "apps/report_base.hpp"

#include <algorithm>
#include <numbers>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_parts.hpp"
#include "apps/table.hpp"
#include "core/liquid.hpp"

namespace swaymark {

std::string base_study_section(const Analysis& a) {
  const BaseStudy& study = *a.base_study;
  std::size_t most = 0;
  for (const BaseStudy::Row& row : study.rows) most = std::max(most, row.frequencies.size());
  std::vector<Table::Column> columns{{{"each support", "[kN/mm]"}, Table::Align::right}};
  for (std::size_t j = 0; j < most; ++j)
    columns.push_back({{fmt::format("f{}", j + 1), "[Hz]"}, Table::Align::right});
  columns.push_back({{"f1 of rigid", "[%]"}, Table::Align::right});
  columns.push_back({{"bound f1", "[Hz]"}, Table::Align::right});
  Table table(columns);
  const double rigid = study.rows.back().frequencies.front();
  for (const BaseStudy::Row& row : study.rows) {
    std::vector<std::string> cells{row.stiffness ? fmt::format("{:.4g}", 1e-6 * *row.stiffness) : "rigid"};
    for (std::size_t j = 0; j < most; ++j)
      cells.push_back(j < row.frequencies.size() ? figure(row.frequencies[j], 3) : "-");
    cells.push_back(percent(row.frequencies.front() / rigid));
    cells.push_back(row.bound ? figure(*row.bound, 3) : "-");
    table.add(cells);
  }
  std::string out = section_head("STIFFNESS OF THE BASE");
  out += table.text();
  return out +
         wrapped(fmt::format("{} fixed along {} on a spring each, all else as stated. Bound: 1/f2 = "
                             "1/f2 rigid + 1/f2 of the springs under the rigid tower; no f1 lies below.",
                             counted(static_cast<Index>(study.supports), "support"), name_of(study.axis)),
                 "  ", kTextWidth);
}

std::string pad_words(const Pad& pad) {
  return fmt::format("a pad of {:.4g} x {:.4g} m, G = {:.4g} MPa, nu = {:.3g}", pad.length, pad.width,
                     1e-6 * pad.shear_modulus, pad.poisson);
}

std::string liquids_text(const Tower& tower) {
  std::string out;
  for (const Liquid& liquid : tower.liquids) {
    const LiquidSplit split = split_liquid(liquid);
    std::string words =
        fmt::format("Liquid{}{}, radius {:.4g} m, depth {:.4g} m: {} kg", liquid.label.empty() ? "" : " ",
                    liquid.label, liquid.radius, liquid.depth, kilograms(split.mass, split.mass));
    if (liquid.rigid) {
      words += ", all of it moving with the nodes";
    } else {
      words += fmt::format("; impulsive {} kg, convective {} kg on {:.4g} kN/m, {} Hz by itself",
                           kilograms(split.impulsive, split.mass), kilograms(split.convective, split.mass),
                           1e-3 * split.spring, figure(split.omega / (2.0 * std::numbers::pi), 3));
    }
    out += wrapped(words, "  ", kTextWidth);
  }
  return out;
}

}  // namespace swaymark
