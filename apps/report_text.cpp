#include "apps/report_text.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <numeric>

#include <fmt/format.h>

#include "apps/report_parts.hpp"
#include "apps/table.hpp"
#include "core/quantity.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kWidth = 88;       // of running text
constexpr std::size_t kMostListed = 10;  // bars and nodes in the report; all are in the CSV and JSON

using Align = Table::Align;

std::string figure(double value, int decimals) {
  // No minus sign before a rounded zero.
  const std::string text = fmt::format("{:.{}f}", value, decimals);
  const bool zero = text.find_first_not_of("-0.") == std::string::npos;
  return zero && text.starts_with('-') ? text.substr(1) : text;
}

std::string percent(double ratio) { return figure(100.0 * ratio, 1); }
std::string kilo(double value) { return figure(value / 1000.0, 2); }

// Enough digits for towers of ten grams as of ten thousand tonnes.
std::string kilograms(double mass) { return figure(mass, std::abs(mass) < 100.0 ? 3 : 1); }

std::string section_head(const std::string& words) { return "\n" + words + "\n"; }

class TextReport {
 public:
  TextReport(const Analysis& analysis, const TextStyle& style) : a_(analysis), style_(style) {}

  std::string write() {
    head();
    model();
    ledger();
    modes();
    if (a_.scope == Scope::check) {
      bands();
      if (a_.seismic) seismic();
      checks();
    }
    notes();
    limits();
    return out_;
  }

 private:
  void head() {
    const Provenance& p = a_.provenance;
    out_ += a_.tower.title.empty() ? "Tower without a title\n" : a_.tower.title + "\n";
    out_ += fmt::format("  file     {}\n  sha256   {}\n", p.file, p.sha256);
    out_ += fmt::format("  date     {}, swaymark {}\n", p.date, p.version);
    if (a_.scope != Scope::check) return;
    const auto failed =
        std::count_if(a_.verdicts.begin(), a_.verdicts.end(), [](const Verdict& v) { return !v.met; });
    out_ += "\n";
    if (failed == 0) {
      out_ += fmt::format("{} All {} checks are met.\n", word(true), a_.verdicts.size());
      return;
    }
    out_ += fmt::format("{} {} of {} checks {} not met:\n", word(false), failed, a_.verdicts.size(),
                        failed == 1 ? "is" : "are");
    for (const Verdict& verdict : a_.verdicts) {
      if (!verdict.met) out_ += wrapped(verdict.check + ": " + verdict.detail, "  ", kWidth);
    }
  }

  std::string word(bool met) const {
    const std::string text = met ? "met" : "NOT MET";
    if (!style_.colour) return text;
    return fmt::format("\x1b[{}m{}\x1b[0m", met ? "32" : "1;31", text);
  }

  void model() {
    const Tower& tower = a_.tower;
    out_ += section_head("MODEL");
    out_ += fmt::format("  {} dimension{}, {} nodes, {} bars, {} free degrees of freedom, {} mass matrix\n",
                        tower.dimensions, tower.dimensions == 1 ? "" : "s", tower.nodes.size(),
                        tower.bars.size(), a_.assembly.dofs.free_count(), name_of(tower.mass_scheme));
  }

  void ledger() {
    out_ += section_head("MASS BY ORIGIN");
    Table table({{{"origin"}, Align::left},
                 {{"on"}, Align::left},
                 {{"label"}, Align::left},
                 {{"mass", "[kg]"}, Align::right},
                 {{"centre x", "[m]"}, Align::right},
                 {{"y", "[m]"}, Align::right},
                 {{"z", "[m]"}, Align::right}});
    for (const LedgerEntry& entry : a_.ledger.entries) {
      table.add({std::string(name_of(entry.origin)), entry.group.empty() ? "nodes" : entry.group, entry.label,
                 kilograms(entry.mass), figure(entry.centre.x(), 2), figure(entry.centre.y(), 2),
                 figure(entry.centre.z(), 2)});
    }
    table.add({"total", "", "", kilograms(a_.ledger.total()), "", "", ""});
    out_ += table.text();
    std::string moving;
    const auto& axes = a_.assembly.dofs.axes();
    for (std::size_t k = 0; k < axes.size(); ++k) {
      moving += fmt::format("{}{} {}", k > 0 ? ", " : "", name_of(axes[k]),
                            kilograms(a_.set.moving(static_cast<Index>(k))));
    }
    out_ += wrapped(fmt::format("Moving mass [kg]: {}. At nodes with a fixed axis: {} kg.", moving,
                                kilograms(a_.ledger.at_supports)),
                    "  ", kWidth);
  }

  void modes() {
    out_ += section_head("MODES");
    const auto& axes = a_.assembly.dofs.axes();
    std::vector<Table::Column> columns{
        {{"mode"}, Align::right}, {{"frequency", "[Hz]"}, Align::right}, {{"period", "[s]"}, Align::right}};
    const bool damped = a_.damping.size() > 0;
    if (damped) columns.push_back({{"damping", "[%]"}, Align::right});
    for (const Axis axis : axes)
      columns.push_back(
          {{axis == axes.front() ? "mass" : "", fmt::format("{} [%]", name_of(axis))}, Align::right});
    for (const Axis axis : axes)
      columns.push_back(
          {{axis == axes.front() ? "running" : "sum", fmt::format("{} [%]", name_of(axis))}, Align::right});
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
    out_ += "  mass: effective modal mass as a share of the moving mass of its direction\n";
    const Modes& m = a_.set.modes;
    std::string words =
        m.certificate
            ? fmt::format("Exactly {} modes lie below {:.4g} Hz, counted by a factorisation of its own. ",
                          m.certificate->below, m.certificate->omega / (2.0 * std::numbers::pi))
            : std::string("The modes could not be counted. ");
    words += fmt::format("Largest residual |K phi - w2 M phi| / |K phi|: {:.1e}.", m.residual.maxCoeff());
    out_ += wrapped(words, "  ", kWidth);
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

  void seismic() {
    const SeismicResult& s = *a_.seismic;
    out_ += section_head("SEISMIC RESPONSE");
    out_ += wrapped(
        fmt::format("Modes combined by {}, directions by {}, missing mass {}, ordinates times {:.4g}.",
                    name_of(s.statement.modes), name_of(s.statement.directions),
                    s.statement.missing_mass ? "added" : "not added", s.statement.factor),
        "  ", kWidth);
    ordinates();
    base();
    bars();
    displacements();
    reactions_at_supports();
  }

  void ordinates() {
    out_ += section_head("Spectral acceleration and modal base shear");
    std::vector<Table::Column> columns{{{"mode"}, Align::right}, {{"period", "[s]"}, Align::right}};
    for (const DirectionResult& d : a_.seismic->directions) {
      columns.push_back({{fmt::format("Sa {}", name_of(d.axis)), "[g]"}, Align::right});
      columns.push_back({{fmt::format("shear {}", name_of(d.axis)), "[kN]"}, Align::right});
    }
    Table table(columns);
    for (Index j = 0; j < a_.mode_count(); ++j) {
      std::vector<std::string> cells{std::to_string(j + 1), figure(1.0 / a_.frequency(j), 4)};
      for (const DirectionResult& d : a_.seismic->directions) {
        cells.push_back(figure(d.acceleration(j) / kStandardGravity, 4));
        cells.push_back(kilo(d.modal_base_shear(j)));
      }
      table.add(cells);
    }
    std::vector<std::string> rigid{"rigid", figure(0.0, 4)};
    for (const DirectionResult& d : a_.seismic->directions) {
      rigid.push_back(figure(d.zero_period_acceleration / kStandardGravity, 4));
      const auto place = static_cast<Index>(
          std::find(a_.assembly.dofs.axes().begin(), a_.assembly.dofs.axes().end(), d.axis) -
          a_.assembly.dofs.axes().begin());
      rigid.push_back(kilo(d.missing_mass_ratio * a_.set.moving(place) * d.zero_period_acceleration));
    }
    if (a_.seismic->statement.missing_mass) table.add(rigid);
    out_ += table.text();
  }

  void base() {
    out_ += section_head("At the base");
    Table table({{{"direction"}, Align::left},
                 {{"spectrum"}, Align::left},
                 {{"base shear", "[kN]"}, Align::right},
                 {{"overturning", "[kNm]"}, Align::right},
                 {{"missing mass", "[%]"}, Align::right}});
    for (const DirectionResult& d : a_.seismic->directions) {
      table.add({std::string(name_of(d.axis)), d.spectrum, kilo(d.base_shear),
                 d.overturning_moment ? kilo(*d.overturning_moment) : "-", percent(d.missing_mass_ratio)});
    }
    out_ += table.text();
  }

  // The places of the largest values, largest first, ties in the order of the file.
  static std::vector<std::size_t> ranked(const std::vector<double>& values) {
    std::vector<std::size_t> order(values.size());
    std::iota(order.begin(), order.end(), std::size_t{0});
    std::stable_sort(order.begin(), order.end(),
                     [&](std::size_t a, std::size_t b) { return values[a] > values[b] * (1.0 + 1e-9); });
    order.resize(std::min(order.size(), kMostListed));
    return order;
  }

  void bars() {
    const SeismicResult& s = *a_.seismic;
    std::vector<double> largest;
    for (Index b = 0; b < s.bar_force.size(); ++b) {
      const Extremes e = bar_extremes(s.bar_gravity(b), s.bar_force(b));
      largest.push_back(std::max(e.tension, e.compression));
    }
    const auto order = ranked(largest);
    out_ += section_head(
        fmt::format("Most loaded bars ({} of {}; gravity +/- seismic)", order.size(), largest.size()));
    Table table({{{"bar"}, Align::left},
                 {{"gravity", "[kN]"}, Align::right},
                 {{"seismic", "[kN]"}, Align::right},
                 {{"tension", "[kN]"}, Align::right},
                 {{"compression", "[kN]"}, Align::right}});
    for (const std::size_t b : order) {
      const auto row = static_cast<Index>(b);
      const Extremes e = bar_extremes(s.bar_gravity(row), s.bar_force(row));
      table.add({a_.tower.bar_name(b), kilo(s.bar_gravity(row)), kilo(s.bar_force(row)), kilo(e.tension),
                 kilo(e.compression)});
    }
    out_ += table.text();
  }

  void displacements() {
    const Eigen::MatrixXd all = node_displacements(a_);
    std::vector<double> sizes;
    for (Index i = 0; i < all.rows(); ++i) sizes.push_back(all.row(i).maxCoeff());
    const auto order = ranked(sizes);
    out_ += section_head(fmt::format("Largest seismic displacements ({} of {} nodes; each axis by itself)",
                                     order.size(), sizes.size()));
    std::vector<Table::Column> columns{{{"node"}, Align::left}};
    for (const Axis axis : a_.assembly.dofs.axes())
      columns.push_back({{std::string(name_of(axis)), "[mm]"}, Align::right});
    Table table(columns);
    for (const std::size_t node : order) {
      std::vector<std::string> cells{a_.tower.nodes[node].name};
      for (const Axis axis : a_.assembly.dofs.axes())
        cells.push_back(figure(1000.0 * all(static_cast<Index>(node), index_of(axis)), 2));
      table.add(cells);
    }
    out_ += table.text();
  }

  void reactions_at_supports() {
    const auto reactions = node_reactions(a_);
    const bool gravity = has_gravity(a_.assembly);
    const std::size_t shown = std::min<std::size_t>(reactions.size(), 2 * kMostListed);
    out_ += section_head(
        shown == reactions.size()
            ? "Reactions on the tower, z up"
            : fmt::format("Reactions on the tower, z up ({} of {} supports)", shown, reactions.size()));
    std::vector<Table::Column> columns{{{"node"}, Align::left}};
    for (const Axis axis : a_.assembly.dofs.axes()) {
      if (gravity) columns.push_back({{"gravity", fmt::format("{} [kN]", name_of(axis))}, Align::right});
      columns.push_back({{"seismic", fmt::format("{} [kN]", name_of(axis))}, Align::right});
    }
    if (gravity) {
      columns.push_back({{"down", "[kN]"}, Align::right});
      columns.push_back({{"uplift", "[kN]"}, Align::right});
    }
    Table table(columns);
    const auto cell = [](const std::optional<double>& value) {
      return value ? kilo(*value) : std::string("-");
    };
    for (std::size_t i = 0; i < shown; ++i) {
      const NodeReaction& r = reactions[i];
      std::vector<std::string> cells{a_.tower.nodes[r.node].name};
      for (const Axis axis : a_.assembly.dofs.axes()) {
        const auto k = static_cast<std::size_t>(axis);
        if (gravity) cells.push_back(cell(r.gravity[k]));
        cells.push_back(cell(r.seismic[k]));
      }
      if (gravity) {
        cells.push_back(cell(r.push));
        cells.push_back(cell(r.uplift));
      }
      table.add(cells);
    }
    out_ += table.text();
    if (gravity)
      out_ += "  down: largest push on the ground; uplift: largest pull, both of gravity +/- seismic\n";
  }

  void checks() {
    out_ += section_head("CHECKS");
    std::size_t widest = 0;
    for (const Verdict& verdict : a_.verdicts) widest = std::max(widest, columns_of(verdict.check));
    for (const Verdict& verdict : a_.verdicts) {
      const std::string plain = verdict.met ? "met" : "NOT MET";
      const std::string lead = fmt::format("  {:<7}  {}{}  ", plain, verdict.check,
                                           std::string(widest - columns_of(verdict.check), ' '));
      std::string text = wrapped(verdict.detail, lead, std::max<std::size_t>(kWidth, columns_of(lead) + 30));
      out_ += text.replace(2, plain.size(), word(verdict.met));
    }
  }

  void notes() {
    if (a_.notes.empty()) return;
    out_ += section_head("NOTES");
    for (const std::string& note : a_.notes) out_ += wrapped(note, "  - ", kWidth);
  }

  void limits() {
    out_ += section_head("LIMITS OF THE METHOD");
    out_ += wrapped(
        "Linear elastic model; bars carry axial force only: no bending of members or joints. Tension-only "
        "bracing, guys, gusty "
        "wind, buckling and foundations beyond springs are not in it. Combined seismic values are peaks "
        "without signs that need "
        "not occur together.",
        "  ", kWidth);
    out_ += wrapped(
        "This is a screening aid. It defers to the codes in force at the place and to a licensed engineer, "
        "who answers for the "
        "structure.",
        "  ", kWidth);
  }

  const Analysis& a_;
  TextStyle style_;
  std::string out_;
};

std::string motion_words(const Tower& tower, const Mechanism::Motion& motion) {
  std::string parts;
  for (const Axis axis : tower.axes()) {
    const double value = motion.direction[index_of(axis)];
    if (std::abs(value) < 1e-6) continue;
    parts += fmt::format("{}{} {}", parts.empty() ? "" : ", ", name_of(axis), figure(value, 3));
  }
  return fmt::format("node {}: {}", tower.nodes[motion.node].name, parts);
}

}  // namespace

std::string text_report(const Analysis& analysis, const TextStyle& style) {
  return TextReport(analysis, style).write();
}

std::string mechanism_text(const Analysis& analysis) {
  constexpr std::size_t most_mechanisms = 20;
  constexpr std::size_t most_nodes = 6;
  const auto& list = analysis.mechanisms.mechanisms;
  std::string out =
      fmt::format("{}: the tower can move without straining a bar, in {}{} way{}; hold it as said below\n",
                  analysis.provenance.file, analysis.mechanisms.complete ? "" : "at least ", list.size(),
                  list.size() == 1 ? "" : "s");
  const auto held = analysis.assembly.dofs.fixed_count();
  out += fmt::format("  {} bars + {} fixed and {} sprung degrees of freedom against {} in all\n",
                     analysis.tower.bars.size(), held, (analysis.assembly.springs.array() > 0.0).count(),
                     analysis.assembly.dofs.dof_count());
  for (std::size_t i = 0; i < std::min(list.size(), most_mechanisms); ++i) {
    const Mechanism& mechanism = list[i];
    out += fmt::format("  {}. {}\n", i + 1, mechanism.kind);
    for (std::size_t n = 0; n < std::min(mechanism.motion.size(), most_nodes); ++n) {
      out += "       " + motion_words(analysis.tower, mechanism.motion[n]) + "\n";
    }
    if (mechanism.motion.size() > most_nodes)
      out += fmt::format("       and {} more nodes\n", mechanism.motion.size() - most_nodes);
    for (const std::string& cure : mechanism.cures) out += wrapped(cure, "     cure: ", 100);
  }
  if (list.size() > most_mechanisms) out += fmt::format("  ... and {} more\n", list.size() - most_mechanisms);
  return out;
}

}  // namespace swaymark
