#include "core/lattice_loose.hpp"

#include <algorithm>
#include <array>

#include <Eigen/Eigenvalues>
#include <fmt/format.h>

namespace swaymark {

namespace {

// A direction open to within this much of the unit stiffness around a node, as the mechanism search takes it.
constexpr double kOpen = 1e-10;

// The mid nodes whose bars, plan bracing left aside, lie in one plane.
std::vector<bool> flat_mid_nodes(const Lattice& lattice) {
  std::vector<Eigen::Matrix3d> stiffness(lattice.nodes.size(), Eigen::Matrix3d::Zero());
  for (const LatticeBar& bar : lattice.bars) {
    if (bar.member == LatticeMember::plan_bracing) continue;
    const Eigen::Vector3d along =
        (lattice.nodes[bar.to].position - lattice.nodes[bar.from].position).normalized();
    stiffness[bar.from] += along * along.transpose();
    stiffness[bar.to] += along * along.transpose();
  }
  std::vector<bool> flat(lattice.nodes.size(), false);
  for (const LatticeLevel& level : lattice.levels) {
    for (const std::size_t node : level.mid_nodes) {
      const Eigen::SelfAdjointEigenSolver<Eigen::Matrix3d> solver(stiffness[node], Eigen::EigenvaluesOnly);
      flat[node] = solver.eigenvalues()(0) <= kOpen * solver.eigenvalues()(2);
    }
  }
  return flat;
}

bool has_diamond(const LatticeLevel& level) {
  return level.panel != nullptr && level.panel->plan_bracing &&
         level.panel->plan_bracing->pattern == PlanPattern::diamond;
}

// How many faces of the panel under a level may move within their planes: at most, since bars in plan link
// their motions.
std::size_t slack_faces(const Lattice& lattice, std::size_t number) {
  const LatticePanel& panel = *lattice.levels[number].panel;
  const bool needs_horizontal = panel.bracing == Bracing::single || panel.bracing == Bracing::alternating ||
                                panel.bracing == Bracing::k_down;
  if (!needs_horizontal || panel.horizontals) return 0;
  // X-bracing passes the distance between its top corners down to its bottom corners.
  for (std::size_t above = number + 1; above < lattice.levels.size(); ++above) {
    const LatticePanel& next = *lattice.levels[above].panel;
    if (next.bracing != Bracing::x) break;
    if (next.horizontals) return 0;
  }
  return lattice.levels[number].corners.size();
}

std::string plural(std::size_t count, std::string_view one, std::string_view many) {
  return fmt::format("{} {}", count, count == 1 ? one : many);
}

class Search {
 public:
  Search(const LatticeStatement& statement, const Lattice& lattice)
      : square_(statement.plan == LatticePlan::square), lattice_(lattice) {}

  std::vector<LooseNodes> run() {
    collect();
    if (!base_.nodes.empty()) about_base();
    if (!mids_.nodes.empty()) about_mids();
    if (!diamonds_.nodes.empty()) about_diamonds();
    for (std::size_t i = 0; i < slack_.size(); ++i) {
      if (slack_[i].motions > 0) about_slack(slack_[i], kSlack[i]);
    }
    return std::move(found_);
  }

 private:
  static constexpr std::array kSlack{Bracing::single, Bracing::alternating, Bracing::k_down};

  void collect() {
    const std::vector<bool> flat = flat_mid_nodes(lattice_);
    for (std::size_t number = 0; number < lattice_.levels.size(); ++number) {
      const LatticeLevel& level = lattice_.levels[number];
      const bool diamond = has_diamond(level);
      if (!level.mid_nodes.empty() && flat[level.mid_nodes.front()] && !(diamond && !square_)) {
        LooseNodes& loose = number == 0 ? base_ : diamond ? diamonds_ : mids_;
        loose.nodes.insert(loose.nodes.end(), level.mid_nodes.begin(), level.mid_nodes.end());
        loose.motions += diamond ? 1 : level.mid_nodes.size();
      }
      if (number == 0) continue;
      const std::size_t faces = slack_faces(lattice_, number);
      if (faces == 0) continue;
      const auto kind = std::find(kSlack.begin(), kSlack.end(), level.panel->bracing) - kSlack.begin();
      LooseNodes& loose = slack_[static_cast<std::size_t>(kind)];
      loose.nodes.insert(loose.nodes.end(), level.corners.begin(), level.corners.end());
      loose.motions += faces;
    }
  }

  [[nodiscard]] std::string name(std::size_t node) const { return lattice_.nodes[node].name; }

  // "L1.m1 ... L6.m4"
  [[nodiscard]] std::string range(const LooseNodes& loose) const {
    return fmt::format("{} ... {}", name(loose.nodes.front()), name(loose.nodes.back()));
  }

  // An example of the bar from a mid node to a corner out of its face.
  [[nodiscard]] std::string hip(const LooseNodes& loose) const {
    const std::string mid = name(loose.nodes.front());
    return fmt::format("{} to {}.3", mid, mid.substr(0, mid.find('.')));
  }

  [[nodiscard]] std::string across(const LooseNodes& loose) const {
    return fmt::format(
        "a bar between two opposite mid nodes of each level, such as {} to {}, under 'members'",
        name(loose.nodes[0]), name(loose.nodes[2]));
  }

  void about_base() {
    base_.what = fmt::format("the mid nodes at the base, {}, are free square to their faces", range(base_));
    base_.cures = {
        "hold each of them square to its face by a support",
        fmt::format("or join each to a corner out of its face by a bar under 'members', such as {}",
                    hip(base_))};
    found_.push_back(std::move(base_));
  }

  void about_mids() {
    mids_.what = fmt::format("{} mid nodes of K-bracing, {}, are free square to their faces",
                             mids_.nodes.size(), range(mids_));
    const std::string diamond = "'plan_bracing: {section: ..., pattern: diamond}' at these levels";
    mids_.cures = {square_ ? fmt::format("{}, and {}", diamond, across(mids_)) : diamond,
                   fmt::format("or a bar from each of them to a corner out of its face under 'members', such "
                               "as {}",
                               hip(mids_)),
                   "or 'bracing: X'"};
    found_.push_back(std::move(mids_));
  }

  void about_diamonds() {
    diamonds_.what = fmt::format(
        "plan bracing in a diamond at {} leaves one motion a level, {}: two opposite mid nodes move "
        "out while the others move in",
        plural(diamonds_.motions, "level", "levels"), range(diamonds_));
    diamonds_.cures = {across(diamonds_)};
    found_.push_back(std::move(diamonds_));
  }

  void about_slack(LooseNodes& loose, Bracing bracing) {
    const std::size_t levels = loose.nodes.size() / lattice_.levels[0].corners.size();
    loose.what = fmt::format(
        "bracing '{}' without horizontals leaves the corners of {}, {}, free to move within the faces, in up "
        "to "
        "{}",
        name_of(bracing), plural(levels, "level", "levels"), range(loose),
        plural(loose.motions, "way", "ways"));
    loose.cures = {"'horizontals' in these panels", "or 'bracing: X' in these panels"};
    found_.push_back(std::move(loose));
  }

  bool square_;
  const Lattice& lattice_;
  LooseNodes base_;
  LooseNodes mids_;
  LooseNodes diamonds_;
  std::array<LooseNodes, kSlack.size()> slack_;
  std::vector<LooseNodes> found_;
};

}  // namespace

std::vector<LooseNodes> loose_nodes(const LatticeStatement& statement, const Lattice& lattice) {
  return Search(statement, lattice).run();
}

}  // namespace swaymark
