#include "apps/scenario_figures.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "apps/report_parts.hpp"

namespace swaymark {

namespace {

constexpr Index kModesShown = 3;
constexpr std::string_view kSloshing = "liquid";  // the character of such a mode

using Value = std::optional<double>;

// A row that holds what `value_of` gives for each state that has modes.
template <typename ValueOf>
FigureRow row_of(const Study& study, std::string name, std::string unit, bool compared, ValueOf value_of) {
  FigureRow row{std::move(name), std::move(unit), {}, compared};
  for (const Analysis* state : study.states())
    row.values.push_back(state != nullptr ? Value(value_of(*state)) : std::nullopt);
  return row;
}

void add_where_any(FigureRow row, std::vector<FigureRow>& rows) {
  const bool any =
      std::any_of(row.values.begin(), row.values.end(), [](const Value& v) { return v.has_value(); });
  if (any) rows.push_back(std::move(row));
}

// The frequency of the n-th mode, from 0, whose character is the word, or is not.
Value nth_mode(const Analysis& a, Index n, std::string_view word, bool is) {
  for (Index j = 0; j < a.mode_count(); ++j) {
    if ((a.character[static_cast<std::size_t>(j)] == word) == is && n-- == 0) return a.frequency(j);
  }
  return std::nullopt;
}

const DirectionResult* along(const Analysis& a, Axis axis) {
  if (!a.seismic) return nullptr;
  for (const DirectionResult& direction : a.seismic->directions) {
    if (direction.axis == axis) return &direction;
  }
  return nullptr;
}

void add_masses(const Study& study, std::vector<FigureRow>& rows) {
  rows.push_back(
      row_of(study, "total mass", "kg", false, [](const Analysis& a) { return a.ledger.total(); }));
  const auto axes = study.stated.tower.axes();
  for (std::size_t k = 0; k < axes.size(); ++k) {
    rows.push_back(row_of(study, fmt::format("moving mass {}", name_of(axes[k])), "kg", false,
                          [&](const Analysis& a) { return a.set.moving(static_cast<Index>(k)); }));
  }
}

// Sloshing is set apart, so that the tower's own modes are compared with each other in every state.
void add_frequencies(const Study& study, std::vector<FigureRow>& rows) {
  const std::string liquid(kSloshing);
  FigureRow sloshing = row_of(study, "first sloshing", "Hz", true,
                              [&](const Analysis& a) { return nth_mode(a, 0, liquid, true); });
  const bool any = std::any_of(sloshing.values.begin(), sloshing.values.end(),
                               [](const Value& v) { return v.has_value(); });
  for (Index j = 0; j < kModesShown; ++j) {
    add_where_any(row_of(study, fmt::format("{} {}", any ? "tower's mode" : "mode", j + 1), "Hz", true,
                         [&](const Analysis& a) { return nth_mode(a, j, liquid, false); }),
                  rows);
  }
  add_where_any(row_of(study, "first torsion", "Hz", true,
                       [](const Analysis& a) { return nth_mode(a, 0, "torsion", true); }),
                rows);
  add_where_any(std::move(sloshing), rows);
}

void add_base(const Study& study, std::vector<FigureRow>& rows) {
  for (const Axis axis : study.stated.tower.axes()) {
    add_where_any(row_of(study, fmt::format("base shear {}", name_of(axis)), "N", true,
                         [&](const Analysis& a) -> Value {
                           const DirectionResult* direction = along(a, axis);
                           return direction != nullptr ? Value(direction->base_shear) : std::nullopt;
                         }),
                  rows);
  }
  for (const Axis axis : study.stated.tower.axes()) {
    add_where_any(row_of(study, fmt::format("overturning {}", name_of(axis)), "N m", false,
                         [&](const Analysis& a) -> Value {
                           const DirectionResult* direction = along(a, axis);
                           return direction != nullptr ? direction->overturning_moment : std::nullopt;
                         }),
                  rows);
  }
}

std::string outcome_of(const Analysis& a, const Verdict& verdict) {
  for (std::size_t b = 0; b < a.bands.size(); ++b) {
    if ("band " + band_name(a.tower.bands[b]) == verdict.check)
      return std::string(name_of(a.bands[b].verdict));
  }
  return verdict.met ? "met" : "NOT MET";
}

}  // namespace

std::optional<double> FigureRow::change(std::size_t state) const {
  if (state == 0 || !values[0] || !values[state] || *values[0] == 0.0) return std::nullopt;
  return (*values[state] - *values[0]) / *values[0];
}

std::vector<FigureRow> figure_rows(const Study& study) {
  std::vector<FigureRow> rows;
  add_masses(study, rows);
  add_frequencies(study, rows);
  add_base(study, rows);
  return rows;
}

std::vector<OutcomeRow> outcome_rows(const Study& study) {
  std::vector<OutcomeRow> rows;
  const auto states = study.states();
  for (std::size_t s = 0; s < states.size(); ++s) {
    if (states[s] == nullptr) continue;
    for (const Verdict& verdict : states[s]->verdicts) {
      auto row =
          std::find_if(rows.begin(), rows.end(), [&](const auto& r) { return r.check == verdict.check; });
      if (row == rows.end())
        row = rows.insert(rows.end(), {verdict.check, std::vector<std::string>(states.size())});
      row->outcomes[s] = outcome_of(*states[s], verdict);
    }
  }
  return rows;
}

std::size_t unmet(const Analysis& analysis) {
  return static_cast<std::size_t>(std::count_if(analysis.verdicts.begin(), analysis.verdicts.end(),
                                                [](const Verdict& verdict) { return !verdict.met; }));
}

}  // namespace swaymark
