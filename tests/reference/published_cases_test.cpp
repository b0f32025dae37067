#include "modal/factorisation.hpp"
#include "tests/reference/cases.hpp"

namespace swaymark::test {

namespace {

// The published masses of the bars agree within this (data/reference/README.md).
constexpr double kPublishedMass = 1e-3;

int check_frequencies(const Json& data, const Analysis& analysis) {
  const Json& published = data.at("frequencies");
  if (published.empty()) return 0;
  const auto tolerance = data.at("frequency_tolerance").get<double>();
  REQUIRE(analysis.mode_count() >= static_cast<Index>(published.size()));
  int checks = 0;
  for (std::size_t j = 0; j < published.size(); ++j) {
    if (published[j].is_null()) continue;
    INFO("mode " << j + 1);
    CHECK_THAT(analysis.frequency(static_cast<Index>(j)), is_near(published[j].get<double>(), tolerance));
    ++checks;
  }
  return checks;
}

int check_mass(const Json& data, const Analysis& analysis) {
  if (!data.contains("mass") || data.at("mass").is_null()) return 0;
  CHECK_THAT(analysis.ledger.bars,
             is_near(data.at("mass").get<double>(), data.value("tolerance_rel", kPublishedMass)));
  return 1;
}

std::size_t node_named(const Tower& tower, const std::string& name) {
  for (std::size_t i = 0; i < tower.nodes.size(); ++i) {
    if (tower.nodes[i].name == name) return i;
  }
  throw std::logic_error("no node " + name);
}

std::size_t bar_named(const Tower& tower, const std::string& name) {
  for (std::size_t i = 0; i < tower.bars.size(); ++i) {
    if (tower.bar_name(i) == name) return i;
  }
  throw std::logic_error("no bar " + name);
}

int check_statics(const Json& data, const Analysis& analysis) {
  if (!data.contains("static_checks")) return 0;
  const Tower& tower = analysis.tower;
  const DofMap& dofs = analysis.assembly.dofs;
  const auto tolerance = data.at("tolerance_rel").get<double>();
  const auto free = [&](const Json& node, std::size_t place) {
    return dofs.free(dofs.dof(node_named(tower, std::to_string(node.get<int>())), place));
  };
  int checks = 0;
  for (const Json& statics : data.at("static_checks")) {
    Eigen::VectorXd load = Eigen::VectorXd::Zero(dofs.free_count());
    for (const Json& at : statics.at("load")) {
      for (std::size_t place = 0; place < dofs.axes().size(); ++place) {
        load(free(at.at("node"), place)) = at.at("force_N")[place].get<double>();
      }
    }
    const Eigen::VectorXd u = Factorisation(analysis.assembly.stiffness).solve(load);
    const Eigen::VectorXd force = analysis.assembly.axial * u;
    for (const Json& published : statics.at("published_displacements")) {
      const auto place = published.at("dof").get<std::size_t>() - 1;
      CHECK(name_of(dofs.axes()[place]) == published.at("axis").get<std::string>());
      CHECK_THAT(u(free(published.at("node"), place)),
                 is_near(published.at("value_m").get<double>(), tolerance));
      ++checks;
    }
    for (const Json& published : statics.at("published_stresses")) {
      const std::size_t bar = bar_named(tower, published.at("bar").get<std::string>());
      const double area = tower.section_of(tower.bars[bar]).area;
      CHECK_THAT(std::abs(force(static_cast<Index>(bar))) / area,
                 is_near(published.at("value_Pa").get<double>(), tolerance));
      ++checks;
    }
  }
  return checks;
}

}  // namespace

TEST_CASE("every reference case gives its published frequencies and mass and statics") {
  int towers = 0;
  for (const std::string& name : reference_names()) {
    const Json data = reference_data(name);
    if (!data.contains("tower")) continue;
    INFO(source_of(data));
    CHECK(data.at("case").get<std::string>() == name);
    const Analysis analysis = analysed(reference_tower(data));
    const int checks =
        check_frequencies(data, analysis) + check_mass(data, analysis) + check_statics(data, analysis);
    CHECK(checks > 0);
    ++towers;
  }
  CHECK(towers > 0);
}

TEST_CASE("every reference case says its source and standing and keys that are checked") {
  const std::vector<std::string> known{"case", "tower", "citation", "table", "provenance", "standing",
                                       "notes", "frequencies", "frequency_tolerance", "mass", "tolerance_rel",
                                       // in this file
                                       "static_checks",
                                       // in the files of their own
                                       "base_excitation", "published_effective_masses_over_m_3_decimals",
                                       "modal_contribution_factors", "what", "formula", "rho_equal_damping",
                                       "four_storey_building"};
  for (const std::string& name : reference_names()) {
    const Json data = reference_data(name);
    INFO(name);
    CHECK_FALSE(data.at("citation").get<std::string>().empty());
    for (const auto& [key, value] : data.items()) {
      INFO(key << " is checked by no test");
      CHECK(std::find(known.begin(), known.end(), key) != known.end());
    }
  }
}

TEST_CASE("the sway of the square seventy-two bar towers is an exact pair") {
  for (const std::string name : {"truss72_kaveh_zolghadr_css", "truss72_sedaghati_2002"}) {
    const Json data = reference_data(name);
    INFO(source_of(data));
    const Analysis analysis = analysed(reference_tower(data));
    CHECK_THAT(analysis.frequency(1), is_near(analysis.frequency(0), kSolved));
    // x and y take the same effective mass, each in a shape of its own.
    CHECK_THAT(analysis.mass_ratio.topRows(2).col(0).sum(),
               is_near(analysis.mass_ratio.topRows(2).col(1).sum(), kSolved));
  }
}

}  // namespace swaymark::test
