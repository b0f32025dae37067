#include "spectrum/band.hpp"

#include "tests/support/matchers.hpp"

namespace swaymark::test {

namespace {

BandStatement rotor(double margin = 0.25) {
  BandStatement band;
  band.label = "rotor";
  band.from = 2.0;
  band.to = 4.0;
  band.margin = margin;  // 1.5 to 5: exact in binary
  return band;
}

// Modes that all take a tenth of the mass in every direction.
BandResult examine(const BandStatement& band, const Eigen::VectorXd& frequency) {
  return examine_band(band, frequency, Eigen::MatrixXd::Constant(frequency.size(), 3, 0.1));
}

BandVerdict verdict_at(double frequency, double margin = 0.25) {
  return examine(rotor(margin), Eigen::VectorXd::Constant(1, frequency)).verdict;
}

BandVerdict verdict_with(BandDirection direction, const Eigen::RowVector3d& mass_ratio) {
  BandStatement band = rotor();
  band.direction = direction;
  return examine_band(band, Eigen::VectorXd::Constant(1, 3.0), mass_ratio).verdict;
}

using List = std::vector<Index>;

}  // namespace

TEST_CASE("a mode within a band is inside and so is one at either end") {
  CHECK(verdict_at(3.0) == BandVerdict::inside);
  CHECK(verdict_at(2.0) == BandVerdict::inside);
  CHECK(verdict_at(4.0) == BandVerdict::inside);
}

TEST_CASE("a mode outside a band is close to the edge of the margin and clear past it") {
  CHECK(verdict_at(std::nextafter(2.0, 0.0)) == BandVerdict::close);
  CHECK(verdict_at(std::nextafter(4.0, 9.0)) == BandVerdict::close);
  CHECK(verdict_at(1.5) == BandVerdict::close);
  CHECK(verdict_at(5.0) == BandVerdict::close);
  CHECK(verdict_at(std::nextafter(1.5, 0.0)) == BandVerdict::clear);
  CHECK(verdict_at(std::nextafter(5.0, 9.0)) == BandVerdict::clear);
}

TEST_CASE("a band without a margin has nothing close to it") {
  CHECK(verdict_at(2.0, 0.0) == BandVerdict::inside);
  CHECK(verdict_at(4.0, 0.0) == BandVerdict::inside);
  CHECK(verdict_at(std::nextafter(2.0, 0.0), 0.0) == BandVerdict::clear);
  CHECK(verdict_at(std::nextafter(4.0, 9.0), 0.0) == BandVerdict::clear);
}

TEST_CASE("a band that begins at zero catches the lowest modes") {
  BandStatement band = rotor();
  band.from = 0.0;
  CHECK(examine(band, Eigen::VectorXd::Constant(1, 0.001)).verdict == BandVerdict::inside);
}

TEST_CASE("a band reaches to the end of its margin") { CHECK(band_reach(rotor()) == 5.0); }

TEST_CASE("modes are sorted into inside and close and the worst of them is the verdict") {
  Eigen::VectorXd frequency(6);
  frequency << 1.0, 1.6, 2.5, 3.5, 4.5, 6.0;
  const BandResult all = examine(rotor(), frequency);
  CHECK(all.verdict == BandVerdict::inside);
  CHECK(all.inside == List{2, 3});
  CHECK(all.close == List{1, 4});
  CHECK(all.slight.empty());
  const BandResult outer = examine(rotor(), Eigen::Vector3d(1.0, 1.6, 6.0));
  CHECK(outer.verdict == BandVerdict::close);
  CHECK(outer.close == List{1});
}

TEST_CASE("a band without modes near it is clear") {
  const BandResult none = examine(rotor(), Eigen::VectorXd(0));
  CHECK(none.verdict == BandVerdict::clear);
  CHECK(none.inside.empty());
  CHECK(none.close.empty());
}

TEST_CASE("a mode counts from one percent of the moving mass on") {
  for (const double frequency : {1.6, 3.0}) {
    const Eigen::VectorXd one = Eigen::VectorXd::Constant(1, frequency);
    const BandResult counts = examine_band(rotor(), one, Eigen::RowVector3d(0.01, 0.0, 0.0));
    CHECK(counts.verdict == (frequency < 2.0 ? BandVerdict::close : BandVerdict::inside));
    CHECK(counts.slight.empty());
    const double less = std::nextafter(0.01, 0.0);
    const BandResult slight = examine_band(rotor(), one, Eigen::RowVector3d(less, 0.0, 0.0));
    CHECK(slight.verdict == BandVerdict::clear);
    CHECK(slight.slight == List{0});
    CHECK(slight.inside.empty());
    CHECK(slight.close.empty());
  }
}

TEST_CASE("a slight mode far from the band is not mentioned") {
  const Eigen::VectorXd far = Eigen::VectorXd::Constant(1, 9.0);
  CHECK(examine_band(rotor(), far, Eigen::RowVector3d::Zero()).slight.empty());
}

TEST_CASE("a slight mode inside does not hide one that counts and is close") {
  Eigen::MatrixXd ratio = Eigen::MatrixXd::Constant(2, 3, 0.1);
  ratio.row(1).setZero();
  const BandResult result = examine_band(rotor(), Eigen::Vector2d(1.6, 3.0), ratio);
  CHECK(result.verdict == BandVerdict::close);
  CHECK(result.close == List{0});
  CHECK(result.slight == List{1});
}

TEST_CASE("a band with a direction looks at the mass along that axis only") {
  const auto inside = BandVerdict::inside;
  const auto clear = BandVerdict::clear;
  const std::vector<BandDirection> axes{BandDirection::x, BandDirection::y, BandDirection::z};
  for (std::size_t band = 0; band < 3; ++band) {
    for (std::size_t mode = 0; mode < 3; ++mode) {
      INFO("band along " << band << " and mode along " << mode);
      const Eigen::RowVector3d ratio = Eigen::RowVector3d::Unit(static_cast<Index>(mode));
      CHECK(verdict_with(axes[band], ratio) == (band == mode ? inside : clear));
    }
  }
}

TEST_CASE("a horizontal band looks at x and y but not at z") {
  CHECK(verdict_with(BandDirection::horizontal, {0.5, 0.0, 0.0}) == BandVerdict::inside);
  CHECK(verdict_with(BandDirection::horizontal, {0.0, 0.5, 0.0}) == BandVerdict::inside);
  CHECK(verdict_with(BandDirection::horizontal, {0.0, 0.0, 1.0}) == BandVerdict::clear);
}

TEST_CASE("a band in any direction looks at every axis and that is the default") {
  CHECK(BandStatement{}.direction == BandDirection::any);
  for (Index axis = 0; axis < 3; ++axis)
    CHECK(verdict_with(BandDirection::any, Eigen::RowVector3d::Unit(axis)) == BandVerdict::inside);
  CHECK(verdict_with(BandDirection::any, {0.003, 0.003, 0.003}) == BandVerdict::clear);
}

TEST_CASE("verdicts of bands have the names of the results file") {
  CHECK(name_of(BandVerdict::clear) == "clear");
  CHECK(name_of(BandVerdict::close) == "close");
  CHECK(name_of(BandVerdict::inside) == "inside");
}

TEST_CASE("a mode along a diagonal counts as much as the same one along an axis") {
  CHECK(verdict_with(BandDirection::horizontal, {0.014, 0.0, 0.0}) == BandVerdict::inside);
  CHECK(verdict_with(BandDirection::horizontal, {0.007, 0.007, 0.0}) == BandVerdict::inside);
  CHECK(verdict_with(BandDirection::any, {0.004, 0.004, 0.004}) == BandVerdict::inside);
}

}  // namespace swaymark::test
