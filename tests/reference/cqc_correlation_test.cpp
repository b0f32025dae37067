#include "spectrum/combine_modes.hpp"
#include "tests/reference/cases.hpp"

namespace swaymark::test {

TEST_CASE("CQC correlations of equal damping are those of the table") {
  const Json data = reference_data("cqc_correlation");
  const Json& table = data.at("rho_equal_damping");
  INFO(data.at("citation").get<std::string>() << " (" << table.at("standing").get<std::string>() << ")");
  const auto tolerance = table.at("tolerance_abs").get<double>();
  const auto ratios = table.at("r").get<std::vector<double>>();
  int checks = 0;
  for (const auto& [damping, row] : table.at("values").items()) {
    const double zeta = std::stod(damping);
    for (std::size_t i = 0; i < ratios.size(); ++i) {
      INFO("damping " << damping << ", r = " << ratios[i]);
      CHECK_THAT(cqc_correlation(1.0, ratios[i], zeta, zeta),
                 is_near(row.at(i).get<double>(), 0.0, tolerance));
      CHECK_THAT(cqc_correlation(ratios[i], 1.0, zeta, zeta),
                 is_near(row.at(i).get<double>(), 0.0, tolerance));
      ++checks;
    }
  }
  CHECK(checks >= 26);  // 2 % and 5 % at the least
  CHECK(table.at("values").contains("0.02"));
  CHECK(table.at("values").contains("0.05"));
}

TEST_CASE("swapping two modes changes no CQC correlation at unequal damping") {
  for (const double ratio : {0.3, 0.8, 0.97, 1.0}) {
    for (const double damping : {0.01, 0.05, 0.2}) {
      CHECK_THAT(cqc_correlation(3.0, 3.0 * ratio, 0.02, damping),
                 is_near(cqc_correlation(3.0 * ratio, 3.0, damping, 0.02), kRoundoff));
    }
  }
}

TEST_CASE("the modes of the four-storey building are correlated as published") {
  const Json data = reference_data("cqc_correlation");
  const Json& building = data.at("four_storey_building");
  INFO(building.at("citation").get<std::string>()
       << " (" << building.at("standing").get<std::string>() << ")");
  const auto values = building.at("omega").get<std::vector<double>>();
  const Eigen::VectorXd omega =
      Eigen::Map<const Eigen::VectorXd>(values.data(), static_cast<Index>(values.size()));
  const Eigen::MatrixXd rho = correlation_matrix(
      omega, Eigen::VectorXd::Constant(omega.size(), building.at("damping").get<double>()));
  const auto tolerance = building.at("tolerance_abs").get<double>();
  int checks = 0;
  for (const Json& entry : building.at("rho")) {
    const Index i = entry.at("pair")[0].get<Index>() - 1;
    const Index j = entry.at("pair")[1].get<Index>() - 1;
    INFO("modes " << i + 1 << " and " << j + 1);
    CHECK_THAT(rho(i, j), is_near(entry.at("value").get<double>(), 0.0, tolerance));
    CHECK(rho(i, j) == rho(j, i));
    ++checks;
  }
  CHECK(checks > 0);
}

}  // namespace swaymark::test
