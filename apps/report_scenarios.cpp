#include "apps/report_scenarios.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_mechanism.hpp"
#include "apps/report_parts.hpp"
#include "apps/scenario_figures.hpp"
#include "apps/table.hpp"

namespace swaymark {

namespace {

using Cells = std::vector<std::string>;  // of one row, by state

struct Row {
  std::string name;
  Cells cells;
};

// A label as lines of a heading, no longer than a column of figures needs to be where its words allow.
Cells heading_of(const std::string& label) {
  constexpr std::size_t width = 12;
  Cells lines;
  const std::string text = wrapped(label, "", width);
  for (std::size_t begin = 0; begin < text.size();) {
    const std::size_t end = text.find('\n', begin);
    lines.push_back(text.substr(begin, end - begin));
    begin = end + 1;
  }
  return lines;
}

std::size_t widest(const Cells& cells) {
  std::size_t width = 0;
  for (const std::string& cell : cells) width = std::max(width, columns_of(cell));
  return width;
}

// The states of one block after another: as many as fit beside the names and the tower as stated.
std::vector<std::vector<std::size_t>> blocks_of(const std::vector<Row>& rows,
                                                const std::vector<Cells>& headings) {
  constexpr std::size_t page = 80;
  constexpr std::size_t gap = 2;
  std::vector<std::size_t> widths;
  for (std::size_t s = 0; s < headings.size(); ++s) {
    std::size_t width = widest(headings[s]);
    for (const Row& row : rows) width = std::max(width, columns_of(row.cells[s]));
    widths.push_back(width + gap);
  }
  std::size_t fixed = 0;
  for (const Row& row : rows) fixed = std::max(fixed, columns_of(row.name));
  fixed += gap + widths[0];
  std::vector<std::vector<std::size_t>> blocks;
  std::size_t used = page + 1;
  for (std::size_t s = 1; s < headings.size(); ++s) {
    if (used + widths[s] > page) {
      blocks.push_back({0});
      used = fixed;
    }
    blocks.back().push_back(s);
    used += widths[s];
  }
  return blocks;
}

std::string side_by_side(const std::string& head, const std::vector<Row>& rows, const Study& study) {
  std::vector<Cells> headings;
  for (const std::string& label : study.labels()) headings.push_back(heading_of(label));
  std::string out;
  for (const auto& block : blocks_of(rows, headings)) {
    std::vector<Table::Column> columns{{{head}, Table::Align::left}};
    for (const std::size_t state : block) columns.push_back({headings[state], Table::Align::right});
    Table table(columns);
    for (const Row& row : rows) {
      Cells cells{row.name};
      for (const std::size_t state : block) cells.push_back(row.cells[state]);
      table.add(cells);
    }
    out += (out.empty() ? "" : "\n") + table.text();
  }
  return out;
}

std::string figure_text(const FigureRow& row, double value) {
  if (row.unit == "kg") return kilograms(value, value);
  if (row.unit == "Hz") return figure(value, 3);
  return kilo(value);
}

std::vector<Row> figures(const Study& study) {
  std::vector<Row> rows;
  for (const FigureRow& figures : figure_rows(study)) {
    const std::string unit = figures.unit == "N" ? "kN" : figures.unit == "N m" ? "kNm" : figures.unit;
    Row row{fmt::format("{} [{}]", figures.name, unit), {}};
    Row change{"  change [%]", {}};
    for (std::size_t s = 0; s < figures.values.size(); ++s) {
      row.cells.push_back(figures.values[s] ? figure_text(figures, *figures.values[s]) : "-");
      const auto shift = figures.change(s);
      const std::string text = shift ? figure(100.0 * *shift, 1) : s == 0 ? "" : "-";
      change.cells.push_back(shift && !text.starts_with('-') && text != "0.0" ? "+" + text : text);
    }
    rows.push_back(std::move(row));
    if (figures.compared) rows.push_back(std::move(change));
  }
  return rows;
}

std::vector<Row> outcomes(const Study& study) {
  std::vector<Row> rows;
  for (const OutcomeRow& check : outcome_rows(study)) {
    Row row{check.check, check.outcomes};
    for (std::string& cell : row.cells) {
      if (cell.empty()) cell = "-";
    }
    rows.push_back(std::move(row));
  }
  Row count{"not met", {}};
  for (const Analysis* state : study.states())
    count.cells.push_back(state != nullptr ? fmt::format("{} of {}", unmet(*state), state->verdicts.size())
                                           : "not computed");
  rows.push_back(std::move(count));
  return rows;
}

std::string joined(const Cells& words) { return fmt::format("{}", fmt::join(words, ", ")); }

std::string stated_keys(const Study& study) {
  std::size_t width = 0;
  for (const ScenarioResult& scenario : study.scenarios) width = std::max(width, columns_of(scenario.label));
  std::string out;
  for (const ScenarioResult& scenario : study.scenarios) {
    const std::string blanks(width - columns_of(scenario.label), ' ');
    out += wrapped("states " + joined(scenario.keys), fmt::format("  {}{}  ", scenario.label, blanks),
                   kTextWidth);
  }
  return out;
}

std::string unmet_checks(const Study& study) {
  std::string out;
  for (const ScenarioResult& scenario : study.scenarios) {
    if (!scenario.computed()) {
      const std::string why =
          scenario.analysis ? "the tower can move without straining a bar" : scenario.failure;
      out += wrapped(fmt::format("{}: not computed: {}", scenario.label, why), "  ", kTextWidth);
      continue;
    }
    for (const Verdict& verdict : scenario.analysis->verdicts) {
      if (verdict.met) continue;
      out +=
          wrapped(fmt::format("{}: {}: {}", scenario.label, verdict.check, verdict.detail), "  ", kTextWidth);
    }
  }
  return out.empty() ? out : "\nNot met in the scenarios\n" + out;
}

// Those of the tower as stated stand under NOTES.
std::string warnings(const Study& study) {
  std::string out;
  for (const ScenarioResult& scenario : study.scenarios) {
    if (!scenario.computed()) continue;
    for (const std::string& note : scenario.analysis->notes) {
      if (note.starts_with("WARNING"))
        out += wrapped(fmt::format("{}: {}", scenario.label, note), "  ", kTextWidth);
    }
  }
  return out.empty() ? out : "\nWarnings in the scenarios\n" + out;
}

}  // namespace

std::string scenario_section(const Study& study) {
  std::string out = section_head("SCENARIOS");
  out += stated_keys(study) + "\n" + side_by_side("", figures(study), study);
  out += "  change: against the tower as stated; -: not among what was computed\n";
  if (study.stated.scope == Scope::check) {
    out += "\n" + side_by_side("check", outcomes(study), study);
    out += unmet_checks(study);
  }
  out += warnings(study);
  return out;
}

std::string scenario_line(const Study& study) {
  const auto total = study.scenarios.size();
  const auto bad = std::count_if(study.scenarios.begin(), study.scenarios.end(), [](const auto& scenario) {
    return !scenario.computed() || unmet(*scenario.analysis) > 0;
  });
  if (bad == 0)
    return fmt::format("All checks are met in {}.\n", total == 1   ? "the scenario, too"
                                                      : total == 2 ? "both scenarios"
                                                                   : fmt::format("all {} scenarios", total));
  return fmt::format("{} of {} miss{} a check or cannot be computed: see SCENARIOS.\n", bad,
                     counted(static_cast<Index>(total), "scenario"), bad == 1 ? "es" : "");
}

std::string scenario_failures(const Study& study) {
  std::string out;
  for (const ScenarioResult& scenario : study.scenarios) {
    if (scenario.computed()) continue;
    out += scenario.analysis
               ? fmt::format("scenario '{}': {}", scenario.label, mechanism_text(*scenario.analysis))
               : fmt::format("swaymark: scenario '{}': {}\n", scenario.label, scenario.failure);
  }
  return out;
}

}  // namespace swaymark
