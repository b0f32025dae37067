#include "core/tower_file_lattice.hpp"

#include <array>

#include <fmt/format.h>

#include "core/lattice.hpp"
#include "core/lattice_loose.hpp"
#include "core/wording_lattice.hpp"

namespace swaymark {

namespace {

constexpr double kLeast = 1e-3;  // [m]: nodes nearer than this were meant to be one
constexpr double kMost = 1e6;    // [m]: as coordinates
constexpr std::size_t kMostNodes = 1'000'000;
constexpr int kMostRepeats = 250'000;

class LatticeReader {
 public:
  LatticeReader(const PartNames& parts, FaultList& faults) : parts_(parts), faults_(faults) {}

  std::optional<LatticeStatement> read(const YamlNode& node, int dimensions) {
    const std::size_t before = faults_.size();
    if (dimensions != 3) faults_.add(node.place, wording::lattice_needs_space(dimensions));
    MapView view(node, "the lattice", faults_);
    if (!view.is_map()) return std::nullopt;
    LatticeStatement lattice;
    if (const YamlNode* plan = view.require("plan", "plan: square")) {
      const auto choice = read_choice(*plan, "plan", {"square", "triangle"}, faults_);
      if (choice) lattice.plan = *choice == 0 ? LatticePlan::square : LatticePlan::triangle;
    }
    lattice.width = read_width(view, "width: 4.0 m");
    if (const YamlNode* material = view.find("material")) {
      material_ = parts_.materials.find(*material, faults_);
    }
    material_missing_ = !view.has("material");
    lattice.base_horizontals = read_section(view, "base_horizontals");
    read_panels(view, lattice);
    view.refuse_unknown();
    if (faults_.size() > before) return std::nullopt;
    check_size(node.place, lattice);
    if (faults_.size() > before) return std::nullopt;
    check_patterns(lattice);
    if (faults_.size() > before) return std::nullopt;
    return lattice;
  }

 private:
  double read_width(MapView& view, std::string_view example) {
    const YamlNode* node = view.require("width", example);
    if (node == nullptr) return 1.0;
    const auto width = read_value(*node, "width", Quantity::length, Range::not_negative, faults_);
    if (width && *width < kLeast) faults_.add(node->place, wording::legs_meet(node->text, kLeast));
    if (width && *width > kMost) faults_.add(node->place, wording::too_far_away(node->text));
    return width.value_or(1.0);
  }

  double read_height(MapView& view) {
    const YamlNode* node = view.require("height", "height: 3.0 m");
    if (node == nullptr) return 1.0;
    const auto height = read_value(*node, "height", Quantity::length, Range::positive, faults_);
    if (height && *height < kLeast) faults_.add(node->place, wording::panel_too_low(node->text, kLeast));
    return height.value_or(1.0);
  }

  std::optional<std::size_t> read_section(MapView& view, std::string_view key) {
    const YamlNode* node = view.find(key);
    if (node == nullptr) return std::nullopt;
    return parts_.sections.find(*node, faults_);
  }

  std::size_t required_section(MapView& view, std::string_view key, std::string_view example) {
    const YamlNode* node = view.require(key, example);
    if (node == nullptr) return 0;
    return parts_.sections.find(*node, faults_).value_or(0);
  }

  void read_panels(MapView& view, LatticeStatement& lattice) {
    const YamlNode* panels = view.require(
        "panels", "panels: [{height: 3 m, width: 2 m, bracing: X, legs: leg, diagonals: brace}]");
    if (panels == nullptr) return;
    const auto* items = read_list(*panels, "panels", "panels", faults_);
    if (items == nullptr) return;
    for (const YamlNode& item : *items) read_panel(item, lattice);
  }

  void read_panel(const YamlNode& item, LatticeStatement& lattice) {
    MapView view(item, "a panel", faults_);
    if (!view.is_map()) return;
    LatticePanel panel;
    panel.place = item.place;
    panel.height = read_height(view);
    panel.width = read_width(view, "width: 2.0 m");
    if (const YamlNode* repeat = view.find("repeat")) {
      const auto count = read_whole_number(*repeat, "repeat", kMostRepeats, faults_);
      panel.repeat = static_cast<std::size_t>(count.value_or(1));
    }
    if (const YamlNode* bracing = view.require("bracing", "bracing: X")) {
      constexpr std::array patterns{Bracing::x, Bracing::single, Bracing::alternating, Bracing::k,
                                    Bracing::k_down};
      std::vector<std::string> words;
      words.reserve(patterns.size());
      for (const Bracing pattern : patterns) words.emplace_back(name_of(pattern));
      const auto choice = read_choice(*bracing, "bracing", words, faults_);
      if (choice) panel.bracing = patterns[*choice];
      panel.bracing_place = bracing->place;
    }
    panel.legs = required_section(view, "legs", "legs: leg");
    panel.diagonals = required_section(view, "diagonals", "diagonals: brace");
    panel.horizontals = read_section(view, "horizontals");
    panel.plan_bracing = read_plan_bracing(view);
    panel.material = material_.value_or(0);
    if (const YamlNode* material = view.find("material")) {
      panel.material = parts_.materials.find(*material, faults_).value_or(0);
    } else if (material_missing_ && !view.has("material")) {
      faults_.add(item.place, wording::lattice_without_material());
    }
    view.refuse_unknown();
    lattice.panels.push_back(panel);
  }

  // A section alone is one diagonal a level.
  std::optional<PlanBracing> read_plan_bracing(MapView& panel) {
    const YamlNode* node = panel.find("plan_bracing");
    if (node == nullptr) return std::nullopt;
    PlanBracing bracing;
    bracing.place = node->place;
    if (node->kind != YamlNode::Kind::map) {
      bracing.section = parts_.sections.find(*node, faults_).value_or(0);
      return bracing;
    }
    MapView view(*node, "'plan_bracing'", faults_);
    bracing.section = required_section(view, "section", "section: strut");
    if (const YamlNode* pattern = view.find("pattern")) {
      constexpr std::array patterns{PlanPattern::diagonal, PlanPattern::crossed, PlanPattern::diamond};
      const auto choice = read_choice(*pattern, "pattern", {"diagonal", "crossed", "diamond"}, faults_);
      if (choice) bracing.pattern = patterns[*choice];
    }
    view.refuse_unknown();
    return bracing;
  }

  void check_size(Place place, const LatticeStatement& lattice) {
    double height = 0.0;
    double levels = 1.0;
    bool mid_nodes = false;
    for (const LatticePanel& panel : lattice.panels) {
      levels += static_cast<double>(panel.repeat);
      height += static_cast<double>(panel.repeat) * panel.height;
      mid_nodes = mid_nodes || panel.bracing == Bracing::k || panel.bracing == Bracing::k_down;
    }
    const double nodes = levels * static_cast<double>(lattice.corners()) * (mid_nodes ? 2.0 : 1.0);
    if (height > kMost) faults_.add(place, wording::lattice_too_high(height, kMost));
    if (nodes > static_cast<double>(kMostNodes)) {
      faults_.add(place, wording::lattice_too_many_nodes(nodes, kMostNodes));
    }
  }

  // What a pattern needs of its own panel and of the one below. Each panel is looked at once, however often
  // it is repeated.
  void check_patterns(const LatticeStatement& lattice) {
    const LatticePanel* below = nullptr;
    for (std::size_t i = 0; i < lattice.panels.size(); ++i) {
      const LatticePanel& panel = lattice.panels[i];
      const LatticePanel* above = i + 1 < lattice.panels.size() ? &lattice.panels[i + 1] : nullptr;
      if (panel.bracing == Bracing::k && !panel.horizontals) {
        faults_.add(panel.bracing_place, wording::k_without_horizontals());
      }
      if (panel.bracing == Bracing::k_down) {
        const bool foot =
            below != nullptr ? below->horizontals.has_value() : lattice.base_horizontals.has_value();
        const bool between = panel.repeat == 1 || panel.horizontals;
        if (!foot) {
          faults_.add(panel.bracing_place, wording::k_down_without_horizontals(below == nullptr));
        } else if (!between) {
          faults_.add(panel.bracing_place, wording::k_without_horizontals());
        }
      }
      if (panel.plan_bracing) check_plan_bracing(lattice.plan, panel, above);
      below = &panel;
    }
  }

  void check_plan_bracing(LatticePlan plan, const LatticePanel& panel, const LatticePanel* above) {
    const PlanBracing& bracing = *panel.plan_bracing;
    if (bracing.pattern != PlanPattern::diamond) {
      if (plan == LatticePlan::triangle) faults_.add(bracing.place, wording::triangle_is_rigid_in_plan());
      return;
    }
    // The topmost of repeated 'K down' panels has mid nodes at its top only from the panel above.
    const bool everywhere =
        panel.bracing == Bracing::k || ((panel.bracing == Bracing::k_down || panel.repeat == 1) &&
                                        above != nullptr && above->bracing == Bracing::k_down);
    if (!everywhere) faults_.add(bracing.place, wording::diamond_without_mid_nodes());
  }

  const PartNames& parts_;
  FaultList& faults_;
  std::optional<std::size_t> material_;
  bool material_missing_ = false;
};

// The names `top`, `base` and `L3`: the corners of a level.
void add_level_names(const Lattice& lattice, std::size_t first, NameTable& names) {
  const auto corners = [&](const LatticeLevel& level) {
    std::vector<std::size_t> nodes = level.corners;
    for (std::size_t& node : nodes) node += first;
    return nodes;
  };
  for (std::size_t i = 0; i < lattice.levels.size(); ++i) {
    names.add_several(fmt::format("L{}", i), corners(lattice.levels[i]));
  }
  names.add_several("base", corners(lattice.levels.front()));
  names.add_several("top", corners(lattice.levels.back()));
}

void add_nodes(Lattice& lattice, Place at, NameTable& names, Tower& tower, FaultList& faults) {
  const std::size_t first = tower.nodes.size();
  add_level_names(lattice, first, names);
  for (const Node& node : tower.nodes) {
    if (names.means_several(node.name)) faults.add(node.place, wording::name_reserved("node", node.name));
  }
  tower.nodes.reserve(first + lattice.nodes.size());
  for (Node& node : lattice.nodes) {
    if (const auto known = names.place_of(node.name)) {
      faults.add(*known, wording::name_generated("node", node.name, at));
    }
    names.add(node.name, tower.nodes.size(), node.place);
    tower.nodes.push_back(std::move(node));
  }
}

// A group has the section and material of its first bar; bars that differ have their own.
void add_bars(const Lattice& lattice, std::size_t first_node, Place at, NameTable& names, Tower& tower) {
  for (const LatticeMember member : kLatticeMembers) {
    const std::size_t index = tower.groups.size();
    std::size_t number = 0;
    for (const LatticeBar& bar : lattice.bars) {
      if (bar.member != member) continue;
      if (number == 0) {
        tower.groups.push_back({std::string(name_of(member)), bar.section, bar.material, at});
        names.add(tower.groups.back().name, index, at);
      }
      const Group& group = tower.groups.back();
      Bar added{index, first_node + bar.from, first_node + bar.to, ++number, bar.place};
      if (bar.section != group.section) added.section = bar.section;
      if (bar.material != group.material) added.material = bar.material;
      tower.bars.push_back(added);
    }
  }
}

}  // namespace

void read_lattice(MapView& file, PartNames& parts, NameTable& groups, Tower& tower) {
  const YamlNode* node = file.find("lattice");
  FaultList& faults = file.faults();
  std::optional<LatticeStatement> statement;
  if (node != nullptr) statement = LatticeReader(parts, faults).read(*node, tower.dimensions);
  if (!statement) {
    if (file.has("lattice")) {
      parts.nodes.leave_open();
      groups.leave_open();
    }
    return;
  }
  Lattice lattice = build_lattice(*statement);
  const std::size_t first = tower.nodes.size();
  tower.lattice_leaves_loose = loose_nodes(*statement, lattice);
  for (LooseNodes& loose : tower.lattice_leaves_loose) {
    for (std::size_t& index : loose.nodes) index += first;
  }
  add_nodes(lattice, node->place, parts.nodes, tower, faults);
  add_bars(lattice, first, node->place, groups, tower);
}

}  // namespace swaymark
