#include "core/lattice.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

namespace swaymark {

namespace {

// The corner of a level in plan, for a width of 1.
Eigen::Vector3d unit_corner(LatticePlan plan, std::size_t corner) {
  if (plan == LatticePlan::square) {
    return {corner == 1 || corner == 2 ? 0.5 : -0.5, corner < 2 ? -0.5 : 0.5, 0.0};
  }
  const double inner = 0.5 / std::sqrt(3.0);  // radius of the inscribed circle
  if (corner == 2) return {0.0, 2.0 * inner, 0.0};
  return {corner == 0 ? -0.5 : 0.5, -inner, 0.0};
}

class Builder {
 public:
  explicit Builder(const LatticeStatement& statement) : statement_(statement) {
    lattice_.levels = lattice_levels(statement);
  }

  Lattice build() {
    for (std::size_t level = 0; level < lattice_.levels.size(); ++level) add_nodes(level);
    add_base();
    for (std::size_t level = 1; level < lattice_.levels.size(); ++level) {
      add_faces(level);
      add_plan_bracing(lattice_.levels[level]);
    }
    std::stable_sort(lattice_.bars.begin(), lattice_.bars.end(),
                     [](const LatticeBar& a, const LatticeBar& b) { return a.member < b.member; });
    return std::move(lattice_);
  }

 private:
  void add_nodes(std::size_t number) {
    LatticeLevel& level = lattice_.levels[number];
    const Place place = level.panel != nullptr ? level.panel->place : statement_.panels.front().place;
    const auto add = [&](std::string name, const Eigen::Vector3d& position) {
      lattice_.nodes.push_back({std::move(name), position, place});
      return lattice_.nodes.size() - 1;
    };
    const Eigen::Vector3d up{0.0, 0.0, level.height};
    const std::size_t count = statement_.corners();
    for (std::size_t k = 0; k < count; ++k) {
      level.corners.push_back(
          add(fmt::format("L{}.{}", number, k + 1), level.width * unit_corner(statement_.plan, k) + up));
    }
    if (!has_mid_nodes(lattice_.levels, number)) return;
    for (std::size_t k = 0; k < count; ++k) {
      const Eigen::Vector3d middle =
          0.5 * (unit_corner(statement_.plan, k) + unit_corner(statement_.plan, (k + 1) % count));
      level.mid_nodes.push_back(add(fmt::format("L{}.m{}", number, k + 1), level.width * middle + up));
    }
  }

  void add_bar(LatticeMember member, const LatticePanel& panel, std::size_t section, std::size_t from,
               std::size_t to) {
    lattice_.bars.push_back({member, from, to, section, panel.material, panel.place});
  }

  void add_horizontal(const LatticePanel& panel, std::size_t section, const LatticeLevel& level,
                      std::size_t face) {
    const std::size_t from = level.corners[face];
    const std::size_t to = level.corners[(face + 1) % level.corners.size()];
    if (level.mid_nodes.empty()) {
      add_bar(LatticeMember::horizontals, panel, section, from, to);
    } else {
      add_bar(LatticeMember::horizontals, panel, section, from, level.mid_nodes[face]);
      add_bar(LatticeMember::horizontals, panel, section, level.mid_nodes[face], to);
    }
  }

  void add_base() {
    if (!statement_.base_horizontals) return;
    for (std::size_t face = 0; face < statement_.corners(); ++face) {
      add_horizontal(statement_.panels.front(), *statement_.base_horizontals, lattice_.levels[0], face);
    }
  }

  void add_faces(std::size_t number) {
    const LatticeLevel& bottom = lattice_.levels[number - 1];
    const LatticeLevel& top = lattice_.levels[number];
    const LatticePanel& panel = *top.panel;
    const std::size_t count = statement_.corners();
    for (std::size_t k = 0; k < count; ++k) {
      add_bar(LatticeMember::legs, panel, panel.legs, bottom.corners[k], top.corners[k]);
    }
    for (std::size_t face = 0; face < count; ++face) {
      add_diagonals(panel, number, face);
      if (panel.horizontals) add_horizontal(panel, *panel.horizontals, top, face);
    }
  }

  void add_diagonals(const LatticePanel& panel, std::size_t number, std::size_t face) {
    const LatticeLevel& bottom = lattice_.levels[number - 1];
    const LatticeLevel& top = lattice_.levels[number];
    const std::size_t next = (face + 1) % bottom.corners.size();
    const auto add = [&](std::size_t from, std::size_t to) {
      add_bar(LatticeMember::diagonals, panel, panel.diagonals, from, to);
    };
    switch (panel.bracing) {
      case Bracing::x:
        add(bottom.corners[face], top.corners[next]);
        add(bottom.corners[next], top.corners[face]);
        break;
      case Bracing::single:
        add(bottom.corners[face], top.corners[next]);
        break;
      case Bracing::alternating:
        if (number % 2 == 1) {
          add(bottom.corners[face], top.corners[next]);
        } else {
          add(bottom.corners[next], top.corners[face]);
        }
        break;
      case Bracing::k:
        add(bottom.corners[face], top.mid_nodes[face]);
        add(bottom.corners[next], top.mid_nodes[face]);
        break;
      case Bracing::k_down:
        add(bottom.mid_nodes[face], top.corners[face]);
        add(bottom.mid_nodes[face], top.corners[next]);
        break;
    }
  }

  void add_plan_bracing(const LatticeLevel& level) {
    const auto& bracing = level.panel->plan_bracing;
    if (!bracing) return;
    const auto add = [&](std::size_t from, std::size_t to) {
      add_bar(LatticeMember::plan_bracing, *level.panel, bracing->section, from, to);
    };
    if (bracing->pattern == PlanPattern::diamond) {
      const auto& mids = level.mid_nodes;
      for (std::size_t k = 0; k < mids.size(); ++k) add(mids[k], mids[(k + 1) % mids.size()]);
      return;
    }
    add(level.corners[0], level.corners[2]);
    if (bracing->pattern == PlanPattern::crossed) add(level.corners[1], level.corners[3]);
  }

  const LatticeStatement& statement_;
  Lattice lattice_;
};

}  // namespace

std::string_view name_of(LatticeMember member) {
  switch (member) {
    case LatticeMember::legs:
      return "legs";
    case LatticeMember::diagonals:
      return "diagonals";
    case LatticeMember::horizontals:
      return "horizontals";
    case LatticeMember::plan_bracing:
      return "plan bracing";
  }
  return "";
}

std::string_view name_of(Bracing bracing) {
  switch (bracing) {
    case Bracing::x:
      return "X";
    case Bracing::single:
      return "single";
    case Bracing::alternating:
      return "alternating";
    case Bracing::k:
      return "K";
    case Bracing::k_down:
      return "K down";
  }
  return "";
}

std::vector<LatticeLevel> lattice_levels(const LatticeStatement& statement) {
  std::vector<LatticeLevel> levels{{0.0, statement.width, nullptr, {}, {}}};
  for (const LatticePanel& panel : statement.panels) {
    const double foot = levels.back().height;
    const double wide = levels.back().width;
    for (std::size_t i = 1; i <= panel.repeat; ++i) {
      const double share = static_cast<double>(i) / static_cast<double>(panel.repeat);
      levels.push_back({foot + static_cast<double>(i) * panel.height,
                        (1.0 - share) * wide + share * panel.width,
                        &panel,
                        {},
                        {}});
    }
  }
  return levels;
}

bool has_mid_nodes(const std::vector<LatticeLevel>& levels, std::size_t level) {
  const LatticePanel* below = levels[level].panel;
  const LatticePanel* above = level + 1 < levels.size() ? levels[level + 1].panel : nullptr;
  return (below != nullptr && below->bracing == Bracing::k) ||
         (above != nullptr && above->bracing == Bracing::k_down);
}

Lattice build_lattice(const LatticeStatement& statement) { return Builder(statement).build(); }

}  // namespace swaymark
