#include "apps/report_json.hpp"

#include <algorithm>
#include <numbers>

#include <nlohmann/json.hpp>

#include "apps/report_parts.hpp"
#include "core/liquid.hpp"

namespace swaymark {

namespace {

using Json = nlohmann::ordered_json;

Json by_axis(const Tower& tower, const Eigen::Vector3d& values) {
  Json object = Json::object();
  for (const Axis axis : tower.axes()) object[std::string(name_of(axis))] = values[index_of(axis)];
  return object;
}

// Values of one row of a matrix whose column k belongs to the tower's k-th axis.
Json by_place(const Tower& tower, const Eigen::VectorXd& values) {
  Json object = Json::object();
  const auto axes = tower.axes();
  for (std::size_t k = 0; k < axes.size(); ++k)
    object[std::string(name_of(axes[k]))] = values(static_cast<Index>(k));
  return object;
}

Json by_axis(const std::array<std::optional<double>, 3>& values) {
  Json object = Json::object();
  for (const Axis axis : kAllAxes) {
    if (values[static_cast<std::size_t>(axis)])
      object[std::string(name_of(axis))] = *values[static_cast<std::size_t>(axis)];
  }
  return object;
}

Json mode_numbers(const std::vector<Index>& modes) {
  Json list = Json::array();
  for (const Index mode : modes) list.push_back(mode + 1);
  return list;
}

Json liquids(const Tower& tower) {
  Json list = Json::array();
  for (const Liquid& liquid : tower.liquids) {
    const LiquidSplit split = split_liquid(liquid);
    Json row{{"label", liquid.label}, {"mass", split.mass}, {"impulsive", split.impulsive}};
    if (!liquid.rigid) {
      row["convective"] = split.convective;
      row["spring"] = split.spring;
      row["frequency"] = split.omega / (2.0 * std::numbers::pi);
    }
    list.push_back(std::move(row));
  }
  return list;
}

Json mass(const Analysis& a) {
  Json object{{"bars", a.ledger.bars}, {"carried", a.ledger.carried}, {"total", a.ledger.total()}};
  if (a.set.moving.size() > 0) object["moving"] = by_place(a.tower, a.set.moving);
  object["at_supports"] = a.ledger.at_supports;
  Json entries = Json::array();
  for (const LedgerEntry& entry : a.ledger.entries) {
    Json row{{"origin", name_of(entry.origin)}};
    if (!entry.label.empty()) row["label"] = entry.label;
    if (!entry.group.empty()) row["group"] = entry.group;
    row["mass"] = entry.mass;
    row["centre"] = Json::array({entry.centre.x(), entry.centre.y(), entry.centre.z()});
    entries.push_back(std::move(row));
  }
  object["ledger"] = std::move(entries);
  if (!a.tower.liquids.empty()) object["liquids"] = liquids(a.tower);
  return object;
}

Json shape(const Analysis& a, Index mode) {
  Json object = Json::object();
  const Eigen::VectorXd all = a.assembly.dofs.expand(a.set.modes.shapes.col(mode));
  const std::size_t axes = a.assembly.dofs.axes().size();
  for (std::size_t node = 0; node < a.tower.nodes.size(); ++node) {
    Json values = Json::array();
    for (std::size_t k = 0; k < axes; ++k) values.push_back(all(a.assembly.dofs.dof(node, k)));
    object[a.tower.nodes[node].name] = std::move(values);
  }
  return object;
}

Json modes(const Analysis& a, bool shapes) {
  Json list = Json::array();
  for (Index j = 0; j < a.mode_count(); ++j) {
    Json mode{{"mode", j + 1}, {"frequency", a.frequency(j)}, {"period", 1.0 / a.frequency(j)}};
    if (a.damping.size() > 0) mode["damping"] = a.damping(j);
    mode["character"] = a.character[static_cast<std::size_t>(j)];
    const Eigen::VectorXd gamma = a.set.participation.row(j).transpose();
    mode["participation"] = by_place(a.tower, gamma);
    mode["effective_mass"] = by_place(a.tower, gamma.array().square());
    mode["effective_mass_ratio"] = by_axis(a.tower, Eigen::Vector3d(a.mass_ratio.row(j).transpose()));
    mode["residual"] = a.set.modes.residual(j);
    if (shapes) mode["shape"] = shape(a, j);
    list.push_back(std::move(mode));
  }
  return list;
}

Json completeness(const Modes& modes) {
  Json object{{"certified", modes.status == ModesStatus::complete}};
  if (modes.certificate) {
    object["modes_below"] = modes.certificate->below;
    object["frequency"] = modes.certificate->omega / (2.0 * std::numbers::pi);
  }
  return object;
}

Json bands(const Analysis& a) {
  Json list = Json::array();
  for (std::size_t b = 0; b < a.bands.size(); ++b) {
    const BandStatement& band = a.tower.bands[b];
    Json row{{"label", band.label}};
    if (band.harmonic > 0) row["harmonic"] = band.harmonic;
    row["from"] = band.from;
    row["to"] = band.to;
    row["verdict"] = name_of(a.bands[b].verdict);
    std::vector<Index> concerned = a.bands[b].inside;
    concerned.insert(concerned.end(), a.bands[b].close.begin(), a.bands[b].close.end());
    std::sort(concerned.begin(), concerned.end());
    row["modes"] = mode_numbers(concerned);
    list.push_back(std::move(row));
  }
  return list;
}

Json directions(const SeismicResult& s) {
  Json object = Json::object();
  for (const DirectionResult& d : s.directions) {
    Json row{{"spectrum", d.spectrum}, {"base_shear", d.base_shear}};
    if (d.overturning_moment) row["overturning_moment"] = *d.overturning_moment;
    if (d.moves) row["missing_mass_ratio"] = d.missing_mass_ratio;
    Json per_mode = Json::array();
    for (Index j = 0; j < d.acceleration.size(); ++j) {
      per_mode.push_back(
          {{"mode", j + 1}, {"acceleration", d.acceleration(j)}, {"base_shear", d.modal_base_shear(j)}});
    }
    row["per_mode"] = std::move(per_mode);
    object[std::string(name_of(d.axis))] = std::move(row);
  }
  return object;
}

Json seismic(const Analysis& a) {
  const SeismicResult& s = *a.seismic;
  const bool gravity = has_gravity(a.assembly);
  Json object{{"modes", name_of(s.statement.modes)},
              {"directions", name_of(s.statement.directions)},
              {"by_direction", directions(s)}};
  Json bars = Json::array();
  for (Index b = 0; b < s.bar_force.size(); ++b) {
    Json row{{"bar", a.tower.bar_name(static_cast<std::size_t>(b))}};
    if (gravity) row["gravity"] = s.bar_gravity(b);
    const Extremes extremes = bar_extremes(s.bar_gravity(b), s.bar_force(b));
    row["seismic"] = s.bar_force(b);
    row["tension"] = extremes.tension;
    row["compression"] = extremes.compression;
    bars.push_back(std::move(row));
  }
  object["bars"] = std::move(bars);
  const Eigen::MatrixXd displacements = node_displacements(a);
  Json nodes = Json::array();
  for (std::size_t node = 0; node < a.tower.nodes.size(); ++node) {
    const Eigen::Vector3d values = displacements.row(static_cast<Index>(node)).transpose();
    nodes.push_back({{"node", a.tower.nodes[node].name}, {"displacement", by_axis(a.tower, values)}});
  }
  object["nodes"] = std::move(nodes);
  Json reactions = Json::array();
  for (const NodeReaction& reaction : node_reactions(a)) {
    Json row{{"node", a.tower.nodes[reaction.node].name}};
    if (gravity) row["gravity"] = by_axis(reaction.gravity);
    row["seismic"] = by_axis(reaction.seismic);
    if (reaction.uplift) row["uplift"] = *reaction.uplift;
    reactions.push_back(std::move(row));
  }
  object["reactions"] = std::move(reactions);
  return object;
}

Json base_study(const BaseStudy& study) {
  Json list = Json::array();
  for (const BaseStudy::Row& row : study.rows) {
    Json item = Json::object();
    if (row.stiffness) item["stiffness"] = *row.stiffness;
    item["frequencies"] = row.frequencies;
    if (row.bound) item["bound"] = *row.bound;
    list.push_back(std::move(item));
  }
  return list;
}

Json verdicts(const Analysis& a) {
  Json list = Json::array();
  for (const Verdict& verdict : a.verdicts) {
    list.push_back({{"check", verdict.check}, {"met", verdict.met}, {"detail", verdict.detail}});
  }
  return list;
}

Json motion_of(const Tower& tower, const FreeMotion& motion) {
  Json nodes = Json::object();
  for (const FreeMotion::Part& part : motion.parts)
    nodes[tower.nodes[part.node].name] = by_axis(tower, part.direction);
  return nodes;
}

// `motion` is the first of its kind; all of them follow where there are several.
Json mechanisms(const Analysis& a) {
  Json list = Json::array();
  for (const Mechanism& mechanism : a.mechanisms.mechanisms) {
    Json entry = {{"kind", mechanism.kind},
                  {"count", mechanism.count()},
                  {"motion", motion_of(a.tower, mechanism.motions.front())},
                  {"cures", mechanism.cures}};
    if (mechanism.count() > 1) {
      entry["motions"] = Json::array();
      for (const FreeMotion& motion : mechanism.motions)
        entry["motions"].push_back(motion_of(a.tower, motion));
    }
    list.push_back(std::move(entry));
  }
  return list;
}

// Of one state of the tower.
void add_result(const Analysis& a, bool shapes, Json& root) {
  root["model"] = {{"dimensions", a.tower.dimensions},
                   {"nodes", stated_nodes(a.tower)},
                   {"bars", a.tower.bars.size()},
                   {"free_dofs", a.assembly.dofs.free_count()}};
  root["mass"] = mass(a);
  root["mass_matrix"] = name_of(a.tower.mass_scheme);
  if (a.mechanisms.any()) {
    root["mechanisms"] = mechanisms(a);
  } else {
    root["modes"] = modes(a, shapes);
    root["completeness"] = completeness(a.set.modes);
    if (!a.bands.empty()) root["bands"] = bands(a);
    if (a.seismic) root["seismic"] = seismic(a);
    if (a.base_study) root["base_study"] = base_study(*a.base_study);
    if (a.scope == Scope::check) root["verdicts"] = verdicts(a);
  }
  root["notes"] = a.notes;
}

Json report(const Analysis& a, bool shapes) {
  Json root{{"swaymark", a.provenance.version}, {"title", a.tower.title}};
  root["input"] = {{"file", a.provenance.file}, {"sha256", a.provenance.sha256}, {"date", a.provenance.date}};
  add_result(a, shapes, root);
  return root;
}

// A file name is bytes, and JSON is UTF-8: what does not fit is replaced.
std::string text_of(const Json& root) {
  return root.dump(2, ' ', false, Json::error_handler_t::replace) + "\n";
}

}  // namespace

std::string json_report(const Analysis& analysis, bool shapes) { return text_of(report(analysis, shapes)); }

std::string json_report(const Study& study, bool shapes) {
  Json root = report(study.stated, shapes);
  for (const ScenarioResult& scenario : study.scenarios) {
    Json object{{"label", scenario.label}};
    if (scenario.analysis) {
      add_result(*scenario.analysis, shapes, object);
    } else {
      object["failure"] = scenario.failure;
    }
    root["scenarios"].push_back(std::move(object));
  }
  return text_of(root);
}

}  // namespace swaymark
