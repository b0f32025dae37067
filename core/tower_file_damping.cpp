#include "core/tower_file_damping.hpp"

namespace swaymark {

void read_damping(MapView& file, Tower& tower) {
  const YamlNode* node = file.find("damping");
  if (node == nullptr) return;
  const std::vector<YamlNode> single{*node};
  const auto* items = &single;
  if (node->kind == YamlNode::Kind::sequence) {
    items = read_list(*node, "damping", "damping ratios", file.faults());
  }
  if (items == nullptr) return;
  for (const YamlNode& item : *items) {
    const auto ratio = read_value(item, "damping", Quantity::fraction, Range::below_one, file.faults());
    if (ratio) tower.damping.push_back(*ratio);
  }
}

}  // namespace swaymark
