#include "core/mass_ledger.hpp"

#include "core/ice.hpp"
#include "core/liquid.hpp"

namespace swaymark {

namespace {

// Sums masses and their moments.
class Collector {
 public:
  void add(double mass, const Eigen::Vector3d& at) {
    mass_ += mass;
    moment_ += mass * at;
  }
  [[nodiscard]] LedgerEntry entry(MassOrigin origin, std::string label, std::string group) const {
    LedgerEntry entry{origin, std::move(label), std::move(group), mass_, Eigen::Vector3d::Zero()};
    if (mass_ > 0.0) entry.centre = moment_ / mass_;
    return entry;
  }

 private:
  double mass_ = 0.0;
  Eigen::Vector3d moment_ = Eigen::Vector3d::Zero();
};

Eigen::Vector3d middle(const Tower& tower, const Bar& bar) {
  return 0.5 * (tower.nodes[bar.from].position + tower.nodes[bar.to].position);
}

template <typename MassOfBar>
LedgerEntry along_bars(const Tower& tower, MassOrigin origin, const std::string& label,
                       std::optional<std::size_t> group, MassOfBar mass) {
  Collector collector;
  for (std::size_t b = 0; b < tower.bars.size(); ++b) {
    if (!group || tower.bars[b].group == *group) collector.add(mass(b), middle(tower, tower.bars[b]));
  }
  return collector.entry(origin, label, group ? tower.groups[*group].name : "all");
}

LedgerEntry at_nodes(const Tower& tower, MassOrigin origin, const std::string& label,
                     const std::vector<std::size_t>& nodes, double total) {
  Collector collector;
  for (const std::size_t node : nodes)
    collector.add(total / static_cast<double>(nodes.size()), tower.nodes[node].position);
  return collector.entry(origin, label, "");
}

double mass_at_supports(const Tower& tower, const Assembly& assembly) {
  double sum = 0.0;
  const Eigen::VectorXd weights = assembly.mass_all * rigid_translation(assembly.dofs, Axis::x);
  for (const Support& support : tower.supports) {
    const bool held = support.fixed[0] || support.fixed[1] || support.fixed[2];
    if (held) sum += weights(assembly.dofs.dof(support.node, 0));
  }
  return sum;
}

}  // namespace

std::string_view name_of(MassOrigin origin) {
  switch (origin) {
    case MassOrigin::bars:
      return "bars";
    case MassOrigin::allowance:
      return "allowance";
    case MassOrigin::linear:
      return "linear";
    case MassOrigin::discrete:
      return "discrete";
    case MassOrigin::ice:
      return "ice";
    case MassOrigin::liquid:
      return "liquid";
  }
  return "";
}

MassLedger mass_ledger(const Tower& tower, const Assembly& assembly) {
  MassLedger ledger;
  const auto& bars = assembly.bars;
  for (std::size_t g = 0; g < tower.groups.size(); ++g) {
    ledger.entries.push_back(
        along_bars(tower, MassOrigin::bars, "", g, [&](std::size_t b) { return bars[b].own_mass; }));
    ledger.bars += ledger.entries.back().mass;
  }
  for (const Allowance& allowance : tower.allowances) {
    ledger.entries.push_back(along_bars(tower, MassOrigin::allowance, allowance.label, allowance.group,
                                        [&](std::size_t b) { return allowance.share * bars[b].own_mass; }));
  }
  for (const LineMass& line : tower.line_masses) {
    ledger.entries.push_back(along_bars(tower, MassOrigin::linear, line.label, line.group,
                                        [&](std::size_t b) { return line.per_length * bars[b].length; }));
  }
  for (const NodeMass& mass : tower.node_masses) {
    ledger.entries.push_back(at_nodes(tower, MassOrigin::discrete, mass.label, mass.nodes, mass.total));
  }
  for (const IceMass& ice : tower.ice) {
    ledger.entries.push_back(along_bars(tower, MassOrigin::ice, ice.label, ice.group, [&](std::size_t b) {
      return ice_on_bar(tower, ice, tower.bars[b], bars[b].length);
    }));
  }
  for (const Liquid& liquid : tower.liquids) {
    ledger.entries.push_back(
        at_nodes(tower, MassOrigin::liquid, liquid.label, liquid.nodes, split_liquid(liquid).mass));
  }
  for (const LedgerEntry& entry : ledger.entries) {
    if (entry.origin != MassOrigin::bars) ledger.carried += entry.mass;
  }
  ledger.at_supports = mass_at_supports(tower, assembly);
  return ledger;
}

}  // namespace swaymark
