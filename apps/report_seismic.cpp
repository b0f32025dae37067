#include "apps/report_seismic.hpp"

#include <algorithm>
#include <numeric>

#include <fmt/format.h>

#include "apps/figure.hpp"
#include "apps/report_parts.hpp"
#include "apps/table.hpp"
#include "core/quantity.hpp"

namespace swaymark {

namespace {

constexpr std::size_t kMostListed = 10;  // bars and nodes in the report; all are in the CSV and JSON

using Align = Table::Align;

class SeismicSection {
 public:
  explicit SeismicSection(const Analysis& analysis) : a_(analysis) {}

  std::string write() {
    const SeismicStatement& s = a_.seismic->statement;
    out_ += section_head("SEISMIC RESPONSE");
    out_ += wrapped(
        fmt::format("Modes combined by {}, directions by {}, missing mass {}, ordinates times {:.4g}.",
                    name_of(s.modes), name_of(s.directions), s.missing_mass ? "added" : "not added",
                    s.factor),
        "  ", kTextWidth);
    ordinates();
    base();
    bars();
    displacements();
    reactions_at_supports();
    return out_;
  }

 private:
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
  static std::vector<std::size_t> ranked(std::vector<double> values) {
    std::transform(values.begin(), values.end(), values.begin(), nine_digits);
    std::vector<std::size_t> order(values.size());
    std::iota(order.begin(), order.end(), std::size_t{0});
    std::stable_sort(order.begin(), order.end(),
                     [&](std::size_t a, std::size_t b) { return values[a] > values[b]; });
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
                 {{"between nodes"}, Align::left},
                 {{"gravity", "[kN]"}, Align::right},
                 {{"seismic", "[kN]"}, Align::right},
                 {{"tension", "[kN]"}, Align::right},
                 {{"compression", "[kN]"}, Align::right}});
    for (const std::size_t b : order) {
      const auto row = static_cast<Index>(b);
      const Extremes e = bar_extremes(s.bar_gravity(row), s.bar_force(row));
      table.add({a_.tower.bar_name(b), bar_ends(a_.tower, b), kilo(s.bar_gravity(row)),
                 kilo(s.bar_force(row)), kilo(e.tension), kilo(e.compression)});
    }
    out_ += table.text();
  }

  void displacements() {
    const Eigen::MatrixXd all = node_displacements(a_);
    std::vector<double> sizes;
    for (Index i = 0; i < all.rows(); ++i) sizes.push_back(all.row(i).maxCoeff());
    auto order = ranked(sizes);
    std::erase_if(order, [&](std::size_t node) { return sizes[node] == 0.0; });  // held, or at rest
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

  const Analysis& a_;
  std::string out_;
};

}  // namespace

std::string seismic_section(const Analysis& analysis) { return SeismicSection(analysis).write(); }

}  // namespace swaymark
