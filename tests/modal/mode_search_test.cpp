#include "modal/mode_search.hpp"

#include "tests/support/models.hpp"

namespace swaymark::test {

namespace {

ModeSet search(const Model& model, const ModeTarget& target) {
  return find_modes(model.problem(), model.stiffness(), model.mass(), model.drive, target);
}

ModeTarget count_of(Index count) {
  ModeTarget target;
  target.count = count;
  return target;
}

ModeTarget share_of(double share, std::vector<Index> directions) {
  ModeTarget target;
  target.mass_share = share;
  target.share_directions = std::move(directions);
  return target;
}

ModeTarget up_to(double omega) {
  ModeTarget target;
  target.omega_up_to = omega;
  return target;
}

double share(const ModeSet& set, Index direction, Index modes) {
  return set.participation.col(direction).head(modes).squaredNorm() / set.moving(direction);
}

Model irregular() {
  std::mt19937 random(61);
  return model_of(random_truss(3, 30, random));
}

// Masses on springs of their own side by side: frequencies at will.
Model side_by_side(const std::vector<double>& masses) {
  Tower tower = bare_tower(1);
  tower.materials.front().density = 0.0;
  for (const double mass : masses) {
    const std::size_t ground = add_node(tower, {0.0, 0.0, 0.0});
    const std::size_t free = add_node(tower, {1.0, 0.0, 0.0});
    fix(tower, ground);
    add_bar(tower, ground, free);
    carry(tower, free, mass);
  }
  return model_of(tower);
}

}  // namespace

TEST_CASE("a target by count gives the lowest modes in that number") {
  const Model model = irregular();
  const Oracle oracle = oracle_of(model);
  for (const Index count : {1, 2, 7, 40, 90}) {
    const ModeSet set = search(model, count_of(count));
    REQUIRE(set.modes.status == ModesStatus::complete);
    CHECK(set.reached);
    CHECK(set.modes.count() == count);
    CHECK(set.participation.rows() == count);
    CHECK(set.available == 90);
    check_same_modes(set.modes, oracle, model.mass());
  }
}

TEST_CASE("every count of modes can be had however close the next mode lies") {
  // Frequencies 0.5 % and 0.005 % apart.
  const Model model = side_by_side({100.0, 99.0, 90.0, 89.99, 80.0});
  for (Index count = 1; count <= 5; ++count) {
    INFO(count << " modes");
    const ModeSet set = search(model, count_of(count));
    CHECK(set.modes.status == ModesStatus::complete);
    CHECK(set.modes.count() == count);
  }
}

TEST_CASE("a count beyond the modes there are gives all") {
  const Model model = model_of(rod(5, 10.0, MassScheme::consistent));
  const ModeSet set = search(model, count_of(50));
  CHECK(set.modes.status == ModesStatus::complete);
  CHECK(set.modes.count() == 5);
  CHECK(set.available == 5);
  CHECK(set.reached);  // none is missing
}

TEST_CASE("a target by frequency gives every mode at or below it") {
  const Model model = irregular();
  const Oracle oracle = oracle_of(model);
  for (const Index last : {0, 3, 11, 50}) {
    const double between = 0.5 * (oracle.omega(last) + oracle.omega(last + 1));
    const ModeSet set = search(model, up_to(between));
    CHECK(set.modes.status == ModesStatus::complete);
    CHECK(set.modes.count() == last + 1);
  }
}

TEST_CASE("a mode exactly at the frequency asked for belongs to the set") {
  const Model model = model_of(rod(8, 10.0, MassScheme::consistent));
  const Modes all = model.problem().lowest(8);
  for (Index j = 0; j < 8; ++j) {
    INFO("mode " << j + 1);
    CHECK(search(model, up_to(all.omega(j))).modes.count() == j + 1);
    CHECK(search(model, up_to(all.omega(j) * (1.0 - 1e-6))).modes.count() == std::max<Index>(j, 1));
  }
}

TEST_CASE("both copies of a pair exactly at the frequency asked for belong to the set") {
  const Model model = model_of(regular_mast({}));
  const Modes all = model.problem().lowest(4);
  const ModeSet set = search(model, up_to(all.omega(0)));
  CHECK(set.modes.count() == 2);
}

TEST_CASE("a frequency below the first mode still gives one mode") {
  const Model model = irregular();
  const ModeSet set = search(model, up_to(1e-3));
  CHECK(set.modes.count() == 1);
  CHECK(set.reached);
}

TEST_CASE("a frequency above the last mode gives all modes") {
  const Model model = model_of(rod(5, 10.0, MassScheme::consistent));
  // The square of the last is beyond the range of numbers, so that nothing can be counted below it.
  for (const double omega : {1e9, 1e100, 1e200}) {
    INFO(omega);
    const ModeSet set = search(model, up_to(omega));
    CHECK(set.modes.count() == 5);
    CHECK(set.reached);
  }
}

TEST_CASE("a target by mass share gives the fewest modes that hold it in every direction") {
  const Model model = irregular();
  for (const double wanted : {0.5, 0.9, 0.99}) {
    INFO("share " << wanted);
    const ModeSet set = search(model, share_of(wanted, {0, 1, 2}));
    const Index count = set.modes.count();
    REQUIRE(set.modes.status == ModesStatus::complete);
    CHECK(set.reached);
    double least_with = 1.0;
    double least_without = 1.0;
    for (Index k = 0; k < 3; ++k) {
      least_with = std::min(least_with, share(set, k, count));
      least_without = std::min(least_without, share(set, k, count - 1));
    }
    CHECK(least_with >= wanted - 1e-9);
    CHECK(least_without < wanted);
  }
}

TEST_CASE("only the directions asked for count towards the mass share") {
  const Model model = irregular();
  const ModeSet set = search(model, share_of(0.9, {1}));
  CHECK(share(set, 1, set.modes.count()) >= 0.9 - 1e-9);
  CHECK(share(set, 1, set.modes.count() - 1) < 0.9);
}

TEST_CASE("a mass share of one is reached by all modes that move") {
  for (const int elements : {1, 5, 40}) {
    const Model model = model_of(rod(elements, 10.0, MassScheme::consistent));
    const ModeSet set = search(model, share_of(1.0, {0}));
    CHECK(set.modes.status == ModesStatus::complete);
    CHECK(set.reached);
    CHECK_THAT(share(set, 0, set.modes.count()), is_near(1.0, kSolved));
  }
  const Model truss = irregular();
  const ModeSet set = search(truss, share_of(1.0, {0, 1, 2}));
  CHECK(set.reached);
  CHECK_THAT(share(set, 2, set.modes.count()), is_near(1.0, kSolved));
}

TEST_CASE("a set chosen by mass share does not end within a repeated pair") {
  Mast mast;
  mast.panels = 8;
  const Model model = model_of(regular_mast(mast));
  // Shares met by the first sway shape alone in its own direction.
  for (const Index direction : {0, 1}) {
    const ModeSet set = search(model, share_of(0.3, {direction}));
    CHECK(set.modes.count() == 2);
    CHECK_THAT(set.modes.omega(1), is_near(set.modes.omega(0), kTwoSolvers));
  }
}

TEST_CASE("a set chosen by count takes the whole of a repeated pair and says so") {
  const Model model = model_of(regular_mast({}));
  const ModeSet half = search(model, count_of(1));
  CHECK(half.modes.count() == 2);
  CHECK(half.copies_added == 1);
  CHECK(half.modes.usable());
  const ModeSet whole = search(model, count_of(2));
  CHECK(whole.modes.count() == 2);
  CHECK(whole.copies_added == 0);
}

TEST_CASE("of several conditions all hold") {
  const Model model = irregular();
  const Oracle oracle = oracle_of(model);
  const double tenth = 0.5 * (oracle.omega(9) + oracle.omega(10));
  ModeTarget target = count_of(4);
  target.omega_up_to = tenth;
  CHECK(search(model, target).modes.count() == 10);
  target.count = 15;
  CHECK(search(model, target).modes.count() == 15);
  target.mass_share = 0.95;
  target.share_directions = {0, 1, 2};
  const Index by_share = search(model, share_of(0.95, {0, 1, 2})).modes.count();
  REQUIRE(by_share > 15);
  CHECK(search(model, target).modes.count() == by_share);
  target.omega_covered = 0.5 * (oracle.omega(by_share + 4) + oracle.omega(by_share + 5));
  CHECK(search(model, target).modes.count() == by_share + 5);
}

TEST_CASE("a covered frequency brings every mode up to it") {
  const Model model = irregular();
  const Oracle oracle = oracle_of(model);
  ModeTarget target = count_of(2);
  target.omega_covered = 0.5 * (oracle.omega(7) + oracle.omega(8));
  const ModeSet set = search(model, target);
  CHECK(set.modes.count() == 8);
  REQUIRE(set.modes.certificate.has_value());
  CHECK(set.modes.certificate->below == 8);
  CHECK(set.modes.certificate->omega >= *target.omega_covered);
  CHECK(set.modes.certificate->omega < oracle.omega(8));
}

TEST_CASE("a direction in which nothing moves asks for no modes") {
  // A rod along x in the plane whose nodes are held in z.
  Tower tower = rod(6, 10.0, MassScheme::lumped);
  tower.dimensions = 2;
  for (Support& support : tower.supports) support.fixed[2] = true;
  for (std::size_t node = 1; node < tower.nodes.size(); ++node) {
    Support held;
    held.node = node;
    held.fixed[2] = true;
    tower.supports.push_back(held);
  }
  const Model model = model_of(tower);
  const ModeSet set = search(model, share_of(0.9, {0, 1}));
  CHECK(set.moving(1) == 0.0);
  CHECK(set.reached);
  CHECK(share(set, 0, set.modes.count()) >= 0.9);
}

TEST_CASE("a search of a stiffness that is not positive definite ends with that status") {
  SparseMatrix stiffness(1, 1);
  stiffness.insert(0, 0) = -1.0;
  SparseMatrix mass(1, 1);
  mass.setIdentity();
  const ModeSet set =
      find_modes(Eigenproblem(stiffness, mass), stiffness, mass, Eigen::MatrixXd::Ones(1, 1), count_of(1));
  CHECK(set.modes.status == ModesStatus::not_positive_definite);
}

}  // namespace swaymark::test
