#include "tests/support/beside.hpp"

#include <algorithm>
#include <stdexcept>
#include <vector>

#include <fmt/format.h>

#include "core/tower_file.hpp"

namespace swaymark::test {

namespace {

// Places agree to a nanometre: far below any tolerance of a drawing, far above rounding.
std::string place_of(const Eigen::Vector3d& position) {
  return fmt::format("{:.9f} {:.9f} {:.9f}", position.x() + 0.0, position.y() + 0.0, position.z() + 0.0);
}

std::vector<std::string> nodes_of(const Tower& tower) {
  std::vector<std::string> lines;
  for (const Node& node : tower.nodes) lines.push_back(place_of(node.position));
  std::sort(lines.begin(), lines.end());
  return lines;
}

std::vector<std::string> bars_of(const Tower& tower, bool names) {
  std::vector<std::string> lines;
  for (std::size_t b = 0; b < tower.bars.size(); ++b) {
    const Bar& bar = tower.bars[b];
    std::string from = place_of(tower.nodes[bar.from].position);
    std::string to = place_of(tower.nodes[bar.to].position);
    if (to < from) std::swap(from, to);
    lines.push_back(fmt::format("{} to {} in {} of {} {}{}", from, to, tower.groups[bar.group].name,
                                tower.section_of(bar).name, tower.material_of(bar).name,
                                names ? " as " + tower.bar_name(b) : ""));
  }
  std::sort(lines.begin(), lines.end());
  return lines;
}

std::string first_difference(const std::vector<std::string>& a, const std::vector<std::string>& b) {
  for (std::size_t i = 0; i < std::max(a.size(), b.size()); ++i) {
    const std::string left = i < a.size() ? a[i] : "nothing";
    const std::string right = i < b.size() ? b[i] : "nothing";
    if (left != right) return fmt::format("{} against {}", left, right);
  }
  return {};
}

}  // namespace

Tower tower_beside(std::string_view text, const Files& files) {
  return read_tower(text, "tower.yaml", [&](const std::string& path) {
    const auto found = files.find(path);
    if (found == files.end()) throw std::runtime_error("the test has no file " + path);
    return found->second;
  });
}

std::string refusal_beside(std::string_view text, const Files& files) {
  std::string result;
  try {
    static_cast<void>(tower_beside(text, files));
  } catch (const InputError& error) {
    for (const Fault& fault : error.faults()) {
      result += fmt::format("{}{}:{}:{} {}", result.empty() ? "" : "\n", fault.file, fault.place.line,
                            fault.place.column, fault.message.what);
    }
  }
  return result;
}

std::string difference(const Tower& a, const Tower& b, bool bar_names) {
  const std::string nodes = first_difference(nodes_of(a), nodes_of(b));
  return nodes.empty() ? first_difference(bars_of(a, bar_names), bars_of(b, bar_names)) : nodes;
}

}  // namespace swaymark::test
