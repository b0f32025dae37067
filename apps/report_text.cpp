#include "apps/report_text.hpp"

#include <algorithm>
#include <numbers>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_base.hpp"
#include "apps/report_model.hpp"
#include "apps/report_parts.hpp"
#include "apps/report_scenarios.hpp"
#include "apps/report_seismic.hpp"
#include "apps/report_summary.hpp"
#include "apps/table.hpp"

namespace swaymark {

namespace {

using Align = Table::Align;

class TextReport {
 public:
  TextReport(const Analysis& analysis, const Study* study, const TextStyle& style)
      : a_(analysis), study_(study), style_(style) {}

  std::string write() {
    head();
    if (study_ != nullptr && a_.scope == Scope::check) out_ += scenario_line(*study_);
    out_ += summary_section(a_);
    out_ += model_section(a_);
    ledger();
    modes();
    if (a_.scope == Scope::check) {
      bands();
      if (a_.seismic) out_ += seismic_section(a_);
      if (a_.base_study) out_ += base_study_section(a_);
      checks();
    }
    notes();
    if (study_ != nullptr) out_ += scenario_section(*study_);
    limits();
    return out_;
  }

  std::string write_scenarios_alone() {
    name();
    out_ += scenario_section(*study_);
    limits();
    return out_;
  }

 private:
  void name() {
    const Provenance& p = a_.provenance;
    out_ += a_.tower.title.empty() ? "Tower without a title\n" : a_.tower.title + "\n";
    out_ += fmt::format("  file     {}\n  sha256   {}\n", p.file, p.sha256);
    out_ += fmt::format("  date     {}, swaymark {}\n", p.date, p.version);
  }

  void head() {
    name();
    if (a_.scope != Scope::check) return;
    const auto failed =
        std::count_if(a_.verdicts.begin(), a_.verdicts.end(), [](const Verdict& v) { return !v.met; });
    const auto warnings = std::count_if(a_.notes.begin(), a_.notes.end(),
                                        [](const std::string& note) { return note.starts_with("WARNING"); });
    out_ += "\n";
    if (warnings > 0) out_ += fmt::format("{}: see NOTES.\n", counted(warnings, "warning"));
    if (failed == 0) {
      out_ += fmt::format("All {} checks are {}.\n", a_.verdicts.size(), word(true));
      return;
    }
    out_ += fmt::format("{} of {} checks {} {}:\n", failed, a_.verdicts.size(), failed == 1 ? "is" : "are",
                        word(false));
    for (const Verdict& verdict : a_.verdicts) {
      if (!verdict.met) out_ += wrapped(verdict.check + ": " + verdict.detail, "  ", kTextWidth);
    }
  }

  [[nodiscard]] std::string word(bool met) const {
    std::string text = met ? "met" : "NOT MET";
    if (!style_.colour) return text;
    return fmt::format("\x1b[{}m{}\x1b[0m", met ? "32" : "1;31", text);
  }

  void ledger() {
    out_ += section_head("MASS BY ORIGIN");
    const double total = a_.ledger.total();
    Table table({{{"origin"}, Align::left},
                 {{"on"}, Align::left},
                 {{"label"}, Align::left},
                 {{"mass", "[kg]"}, Align::right},
                 {{"centre x", "[m]"}, Align::right},
                 {{"y", "[m]"}, Align::right},
                 {{"z", "[m]"}, Align::right}});
    for (const LedgerEntry& entry : a_.ledger.entries) {
      table.add({std::string(name_of(entry.origin)), entry.group.empty() ? "nodes" : entry.group, entry.label,
                 kilograms(entry.mass, total), figure(entry.centre.x(), 2), figure(entry.centre.y(), 2),
                 figure(entry.centre.z(), 2)});
    }
    table.add({"total", "", "", kilograms(total, total), "", "", ""});
    out_ += table.text();
    std::string moving;
    const auto& axes = a_.assembly.dofs.axes();
    for (std::size_t k = 0; k < axes.size(); ++k) {
      moving += fmt::format("{}{} {}", k > 0 ? ", " : "", name_of(axes[k]),
                            kilograms(a_.set.moving(static_cast<Index>(k)), total));
    }
    out_ += wrapped(fmt::format("Moving mass [kg]: {}. At nodes with a fixed axis: {} kg.", moving,
                                kilograms(a_.ledger.at_supports, total)),
                    "  ", kTextWidth);
  }

  void modes() {
    out_ += section_head("MODES");
    const auto& axes = a_.assembly.dofs.axes();
    std::vector<Table::Column> columns{
        {{"mode"}, Align::right}, {{"frequency", "[Hz]"}, Align::right}, {{"period", "[s]"}, Align::right}};
    const bool damped = a_.damping.size() > 0;
    if (damped) columns.push_back({{"damping", "[%]"}, Align::right});
    for (const char* head : {"mass", "sum"}) {
      for (const Axis axis : axes)
        columns.push_back({{head, fmt::format("{} [%]", name_of(axis))}, Align::right});
    }
    columns.push_back({{"character"}, Align::left});
    Table table(columns);
    Eigen::RowVectorXd sum = Eigen::RowVectorXd::Zero(3);
    for (Index j = 0; j < a_.mode_count(); ++j) {
      sum += a_.mass_ratio.row(j);
      std::vector<std::string> cells{std::to_string(j + 1), figure(a_.frequency(j), 3),
                                     figure(1.0 / a_.frequency(j), 4)};
      if (damped) cells.push_back(figure(100.0 * a_.damping(j), 2));
      for (const Axis axis : axes) cells.push_back(percent(a_.mass_ratio(j, index_of(axis))));
      for (const Axis axis : axes) cells.push_back(percent(sum(index_of(axis))));
      cells.push_back(a_.character[static_cast<std::size_t>(j)]);
      table.add(cells);
    }
    out_ += table.text();
    out_ += "  mass: effective modal mass as a share of the moving mass of its direction; sum: running sum\n";
    const Modes& m = a_.set.modes;
    std::string words =
        m.certificate ? fmt::format("Exactly {} below {:.4g} Hz, counted by a factorisation of its own. ",
                                    counted(m.certificate->below, "mode"),
                                    m.certificate->omega / (2.0 * std::numbers::pi))
                      : std::string("The modes could not be counted. ");
    words += fmt::format("Largest residual |K phi - w2 M phi| / |K phi|: {:.1e}.", m.residual.maxCoeff());
    out_ += wrapped(words, "  ", kTextWidth);
  }

  void bands() {
    if (a_.tower.bands.empty()) return;
    out_ += section_head("EXCITATION BANDS");
    Table table({{{"band"}, Align::left},
                 {{"from", "[Hz]"}, Align::right},
                 {{"to", "[Hz]"}, Align::right},
                 {{"margin", "[%]"}, Align::right},
                 {{"direction"}, Align::left},
                 {{"verdict"}, Align::left},
                 {{"modes inside"}, Align::left},
                 {{"within margin"}, Align::left}});
    const auto listed = [](const std::vector<Index>& modes) {
      return modes.empty() ? std::string("-") : mode_list(modes);
    };
    for (std::size_t b = 0; b < a_.bands.size(); ++b) {
      const BandStatement& band = a_.tower.bands[b];
      table.add({band_name(band), figure(band.from, 3), figure(band.to, 3), figure(100.0 * band.margin, 1),
                 std::string(name_of(band.direction)), std::string(name_of(a_.bands[b].verdict)),
                 listed(a_.bands[b].inside), listed(a_.bands[b].close)});
    }
    out_ += table.text();
    out_ += fmt::format(
        "  A mode counts if it takes {:.0f} % of the moving mass or more in the band's direction.\n",
        100.0 * kCountsForBand);
  }

  void checks() {
    out_ += section_head("CHECKS");
    std::size_t widest = 0;
    for (const Verdict& verdict : a_.verdicts) widest = std::max(widest, columns_of(verdict.check));
    for (const Verdict& verdict : a_.verdicts) {
      const std::string plain = verdict.met ? "met" : "NOT MET";
      const std::string lead = fmt::format("  {:<7}  {}{}  ", plain, verdict.check,
                                           std::string(widest - columns_of(verdict.check), ' '));
      std::string text =
          wrapped(verdict.detail, lead, std::max<std::size_t>(kTextWidth, columns_of(lead) + 30));
      out_ += text.replace(2, plain.size(), word(verdict.met));
    }
  }

  void notes() {
    if (a_.notes.empty()) return;
    out_ += section_head("NOTES");
    for (const std::string& note : a_.notes) out_ += wrapped(note, "  - ", kTextWidth);
  }

  void limits() {
    out_ += section_head("LIMITS OF THE METHOD");
    out_ += wrapped(
        "Linear elastic model; bars carry axial force only: no bending of members or joints. Tension-only "
        "bracing, guys, gusty "
        "wind, buckling and foundations beyond springs are not in it. Combined seismic values are peaks "
        "without signs that need "
        "not occur together.",
        "  ", kTextWidth);
    out_ += wrapped(
        "This is a screening aid. It defers to the codes in force at the place and to a licensed engineer, "
        "who answers for the "
        "structure.",
        "  ", kTextWidth);
  }

  const Analysis& a_;
  const Study* study_;  // nothing where the tower has no scenarios
  TextStyle style_;
  std::string out_;
};

}  // namespace

std::string text_report(const Analysis& analysis, const TextStyle& style) {
  return TextReport(analysis, nullptr, style).write();
}

std::string text_report(const Study& study, const TextStyle& style) {
  if (study.scenarios.empty()) return text_report(study.stated, style);
  TextReport report(study.stated, &study, style);
  return study.stated.mechanisms.any() ? report.write_scenarios_alone() : report.write();
}

}  // namespace swaymark
