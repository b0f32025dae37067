#include "apps/report_csv.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "apps/report_parts.hpp"
#include "apps/scenario_figures.hpp"

namespace swaymark {

namespace {

// One CSV file. A cell is quoted where it must be; a number is written in the shortest form that reads back
// the same.
class Sheet {
 public:
  explicit Sheet(std::string name, std::initializer_list<std::string_view> header) : name_(std::move(name)) {
    for (const std::string_view cell : header) add(cell);
  }
  void add(std::string_view cell) {
    if (cells_++ > 0) line_ += ',';
    if (cell.find_first_of(",\"\r\n") == std::string_view::npos) {
      line_ += cell;
      return;
    }
    line_ += '"';
    for (const char c : cell) line_ += c == '"' ? std::string("\"\"") : std::string(1, c);
    line_ += '"';
  }
  void add(double value) { add(fmt::format("{}", value)); }
  void add(const std::optional<double>& value) { add(value ? fmt::format("{}", *value) : std::string()); }
  void end_row() {
    text_ += line_ + "\n";
    line_.clear();
    cells_ = 0;
  }
  [[nodiscard]] NamedText take() { return {name_ + ".csv", std::move(text_)}; }

 private:
  std::string name_;
  std::string text_;
  std::string line_;
  int cells_ = 0;
};

NamedText modes_sheet(const Analysis& a) {
  Sheet sheet("modes", {"mode", "frequency [Hz]", "period [s]", "damping", "character", "residual"});
  const auto& axes = a.assembly.dofs.axes();
  for (const Axis axis : axes) sheet.add(fmt::format("participation {} [sqrt(kg)]", name_of(axis)));
  for (const Axis axis : axes) sheet.add(fmt::format("effective mass {} [kg]", name_of(axis)));
  for (const Axis axis : axes) sheet.add(fmt::format("effective mass ratio {}", name_of(axis)));
  sheet.end_row();
  for (Index j = 0; j < a.mode_count(); ++j) {
    sheet.add(std::to_string(j + 1));
    sheet.add(a.frequency(j));
    sheet.add(1.0 / a.frequency(j));
    sheet.add(a.damping.size() > 0 ? std::optional<double>(a.damping(j)) : std::nullopt);
    sheet.add(a.character[static_cast<std::size_t>(j)]);
    sheet.add(a.set.modes.residual(j));
    for (Index k = 0; k < a.set.participation.cols(); ++k) sheet.add(a.set.participation(j, k));
    for (Index k = 0; k < a.set.participation.cols(); ++k) sheet.add(std::pow(a.set.participation(j, k), 2));
    for (const Axis axis : axes) sheet.add(a.mass_ratio(j, index_of(axis)));
    sheet.end_row();
  }
  return sheet.take();
}

NamedText ledger_sheet(const Analysis& a) {
  Sheet sheet("ledger", {"origin", "group", "label", "mass [kg]", "x [m]", "y [m]", "z [m]"});
  sheet.end_row();
  for (const LedgerEntry& entry : a.ledger.entries) {
    sheet.add(name_of(entry.origin));
    sheet.add(entry.group);
    sheet.add(entry.label);
    sheet.add(entry.mass);
    for (const double coordinate : entry.centre) sheet.add(coordinate);
    sheet.end_row();
  }
  return sheet.take();
}

NamedText bands_sheet(const Analysis& a) {
  Sheet sheet("bands", {"band", "harmonic", "from [Hz]", "to [Hz]", "margin", "direction", "verdict",
                        "modes inside", "modes within margin"});
  sheet.end_row();
  const auto numbers = [](const std::vector<Index>& modes) {
    std::string text;
    for (const Index mode : modes) text += fmt::format("{}{}", text.empty() ? "" : " ", mode + 1);
    return text;
  };
  for (std::size_t b = 0; b < a.bands.size(); ++b) {
    const BandStatement& band = a.tower.bands[b];
    sheet.add(band.label);
    sheet.add(band.harmonic > 0 ? std::to_string(band.harmonic) : std::string());
    sheet.add(band.from);
    sheet.add(band.to);
    sheet.add(band.margin);
    sheet.add(name_of(band.direction));
    sheet.add(name_of(a.bands[b].verdict));
    sheet.add(numbers(a.bands[b].inside));
    sheet.add(numbers(a.bands[b].close));
    sheet.end_row();
  }
  return sheet.take();
}

NamedText ordinates_sheet(const Analysis& a) {
  Sheet sheet("ordinates",
              {"direction", "spectrum", "mode", "period [s]", "acceleration [m/s2]", "base shear [N]"});
  sheet.end_row();
  for (const DirectionResult& d : a.seismic->directions) {
    for (Index j = 0; j < a.mode_count(); ++j) {
      sheet.add(name_of(d.axis));
      sheet.add(d.spectrum);
      sheet.add(std::to_string(j + 1));
      sheet.add(1.0 / a.frequency(j));
      sheet.add(d.acceleration(j));
      sheet.add(d.modal_base_shear(j));
      sheet.end_row();
    }
  }
  return sheet.take();
}

NamedText base_sheet(const Analysis& a) {
  Sheet sheet("base",
              {"direction", "spectrum", "base shear [N]", "overturning moment [N m]", "missing mass ratio"});
  sheet.end_row();
  for (const DirectionResult& d : a.seismic->directions) {
    sheet.add(name_of(d.axis));
    sheet.add(d.spectrum);
    sheet.add(d.base_shear);
    sheet.add(d.overturning_moment);
    sheet.add(d.missing_mass_ratio);
    sheet.end_row();
  }
  return sheet.take();
}

NamedText bars_sheet(const Analysis& a) {
  const SeismicResult& s = *a.seismic;
  Sheet sheet("bars", {"bar", "from", "to", "gravity [N]", "seismic [N]", "tension [N]", "compression [N]"});
  sheet.end_row();
  for (std::size_t b = 0; b < a.tower.bars.size(); ++b) {
    const auto row = static_cast<Index>(b);
    const Extremes extremes = bar_extremes(s.bar_gravity(row), s.bar_force(row));
    sheet.add(a.tower.bar_name(b));
    sheet.add(a.tower.nodes[a.tower.bars[b].from].name);
    sheet.add(a.tower.nodes[a.tower.bars[b].to].name);
    sheet.add(s.bar_gravity(row));
    sheet.add(s.bar_force(row));
    sheet.add(extremes.tension);
    sheet.add(extremes.compression);
    sheet.end_row();
  }
  return sheet.take();
}

NamedText nodes_sheet(const Analysis& a) {
  Sheet sheet("nodes", {"node"});
  for (const Axis axis : a.tower.axes()) sheet.add(fmt::format("displacement {} [m]", name_of(axis)));
  sheet.end_row();
  const Eigen::MatrixXd displacements = node_displacements(a);
  for (std::size_t node = 0; node < a.tower.nodes.size(); ++node) {
    sheet.add(a.tower.nodes[node].name);
    for (const Axis axis : a.tower.axes()) sheet.add(displacements(static_cast<Index>(node), index_of(axis)));
    sheet.end_row();
  }
  return sheet.take();
}

NamedText reactions_sheet(const Analysis& a) {
  Sheet sheet("reactions", {"node"});
  for (const Axis axis : a.tower.axes()) sheet.add(fmt::format("gravity {} [N]", name_of(axis)));
  for (const Axis axis : a.tower.axes()) sheet.add(fmt::format("seismic {} [N]", name_of(axis)));
  sheet.add("uplift [N]");
  sheet.end_row();
  for (const NodeReaction& reaction : node_reactions(a)) {
    sheet.add(a.tower.nodes[reaction.node].name);
    for (const Axis axis : a.tower.axes()) sheet.add(reaction.gravity[static_cast<std::size_t>(axis)]);
    for (const Axis axis : a.tower.axes()) sheet.add(reaction.seismic[static_cast<std::size_t>(axis)]);
    sheet.add(reaction.uplift);
    sheet.end_row();
  }
  return sheet.take();
}

// An empty stiffness is that of a rigid support.
NamedText base_study_sheet(const Analysis& a) {
  std::size_t most = 0;
  for (const BaseStudy::Row& row : a.base_study->rows) most = std::max(most, row.frequencies.size());
  Sheet sheet("base_study", {"stiffness [N/m]"});
  for (std::size_t j = 0; j < most; ++j) sheet.add(fmt::format("frequency {} [Hz]", j + 1));
  sheet.add("bound [Hz]");
  sheet.end_row();
  for (const BaseStudy::Row& row : a.base_study->rows) {
    sheet.add(row.stiffness);
    for (std::size_t j = 0; j < most; ++j)
      sheet.add(j < row.frequencies.size() ? std::optional<double>(row.frequencies[j]) : std::nullopt);
    sheet.add(row.bound);
    sheet.end_row();
  }
  return sheet.take();
}

NamedText verdicts_sheet(const Analysis& a) {
  Sheet sheet("verdicts", {"check", "met", "detail"});
  sheet.end_row();
  for (const Verdict& verdict : a.verdicts) {
    sheet.add(verdict.check);
    sheet.add(verdict.met ? "true" : "false");
    sheet.add(verdict.detail);
    sheet.end_row();
  }
  return sheet.take();
}

NamedText shapes_sheet(const Analysis& a) {
  Sheet sheet("shapes", {"mode", "node"});
  for (const Axis axis : a.tower.axes()) sheet.add(fmt::format("{} [1/sqrt(kg)]", name_of(axis)));
  sheet.end_row();
  const Eigen::MatrixXd all = a.assembly.dofs.expand(a.set.modes.shapes);
  for (Index j = 0; j < a.mode_count(); ++j) {
    for (std::size_t node = 0; node < a.tower.nodes.size(); ++node) {
      sheet.add(std::to_string(j + 1));
      sheet.add(a.tower.nodes[node].name);
      for (std::size_t k = 0; k < a.tower.axes().size(); ++k) sheet.add(all(a.assembly.dofs.dof(node, k), j));
      sheet.end_row();
    }
  }
  return sheet.take();
}

std::string name_with_unit(const FigureRow& row) { return fmt::format("{} [{}]", row.name, row.unit); }

NamedText scenarios_sheet(const Study& study) {
  Sheet sheet("scenarios", {"scenario", "figure", "value", "change"});
  sheet.end_row();
  const auto rows = figure_rows(study);
  const auto labels = study.labels();
  const auto states = study.states();
  for (std::size_t s = 0; s < labels.size(); ++s) {
    for (const FigureRow& row : rows) {
      if (!row.values[s]) continue;
      sheet.add(labels[s]);
      sheet.add(name_with_unit(row));
      sheet.add(row.values[s]);
      sheet.add(row.change(s));
      sheet.end_row();
    }
    if (states[s] != nullptr) continue;
    for (const char* cell : {labels[s].c_str(), "not computed", "", ""}) sheet.add(std::string_view(cell));
    sheet.end_row();
  }
  return sheet.take();
}

NamedText scenario_checks_sheet(const Study& study) {
  Sheet sheet("scenario_checks", {"scenario", "check", "outcome"});
  sheet.end_row();
  const auto rows = outcome_rows(study);
  const auto labels = study.labels();
  for (std::size_t s = 0; s < labels.size(); ++s) {
    for (const OutcomeRow& row : rows) {
      if (row.outcomes[s].empty()) continue;
      for (const std::string& cell : {labels[s], row.check, row.outcomes[s]}) sheet.add(cell);
      sheet.end_row();
    }
  }
  return sheet.take();
}

}  // namespace

std::vector<NamedText> csv_report(const Analysis& a, bool shapes) {
  std::vector<NamedText> sheets{modes_sheet(a), ledger_sheet(a)};
  if (!a.bands.empty()) sheets.push_back(bands_sheet(a));
  if (a.seismic) {
    for (const auto sheet : {ordinates_sheet, base_sheet, bars_sheet, nodes_sheet, reactions_sheet})
      sheets.push_back(sheet(a));
  }
  if (a.base_study) sheets.push_back(base_study_sheet(a));
  if (a.scope == Scope::check) sheets.push_back(verdicts_sheet(a));
  if (shapes) sheets.push_back(shapes_sheet(a));
  return sheets;
}

std::vector<NamedText> csv_report(const Study& study, bool shapes) {
  std::vector<NamedText> sheets;
  if (!study.stated.mechanisms.any()) sheets = csv_report(study.stated, shapes);
  if (study.scenarios.empty()) return sheets;
  sheets.push_back(scenarios_sheet(study));
  if (study.stated.scope == Scope::check) sheets.push_back(scenario_checks_sheet(study));
  return sheets;
}

}  // namespace swaymark
