#include "core/yaml_document.hpp"

#include <algorithm>
#include <istream>
#include <streambuf>
#include <unordered_map>

#include <fmt/format.h>
#include <yaml-cpp/depthguard.h>
#include <yaml-cpp/eventhandler.h>
#include <yaml-cpp/exceptions.h>
#include <yaml-cpp/mark.h>
#include <yaml-cpp/parser.h>

#include "core/text.hpp"
#include "core/wording.hpp"

namespace swaymark {

namespace {

// Turns the parser's marks, whose columns count bytes, into places, whose columns count characters. Marks
// come nearly in order, so that it goes on from the one before.
class PlaceFinder {
 public:
  explicit PlaceFinder(std::string_view text) : text_(text) {}

  Place operator()(const YAML::Mark& mark) {
    if (mark.is_null() || mark.line < 0 || mark.column < 0) return {};
    if (mark.line < line_) *this = PlaceFinder(text_);
    for (; line_ < mark.line; ++line_) {
      const std::size_t end = text_.find('\n', begin_);
      begin_ = end == std::string_view::npos ? text_.size() : end + 1;
      byte_ = 0;
      characters_ = 0;
    }
    if (mark.column < byte_) byte_ = characters_ = 0;
    for (; byte_ < mark.column; ++byte_) {
      const std::size_t at = begin_ + static_cast<std::size_t>(byte_);
      const bool goes_on = at < text_.size() && (static_cast<unsigned char>(text_[at]) & 0xC0U) == 0x80U;
      if (!goes_on) ++characters_;
    }
    return {static_cast<std::uint32_t>(line_ + 1), static_cast<std::uint32_t>(characters_ + 1)};
  }

 private:
  std::string_view text_;
  std::size_t begin_ = 0;  // of the line
  int line_ = 0;
  int byte_ = 0;
  int characters_ = 0;
};

// A stream over the text itself, without a copy.
class TextBuffer : public std::streambuf {
 public:
  explicit TextBuffer(std::string_view text) {
    char* begin = const_cast<char*>(text.data());  // NOLINT: streambuf wants char*, it is only read
    setg(begin, begin, begin + text.size());
  }
};

// Builds the tree from the parser's events and stops at the first event past a limit, so that neither deep
// nesting nor aliases of aliases cost more than the limit allows.
class TreeBuilder : public YAML::EventHandler {
 public:
  TreeBuilder(std::string file, const YamlLimits& limits, PlaceFinder& place_of)
      : file_(std::move(file)), limits_(limits), place_of_(place_of) {}

  YamlNode take_root() { return std::move(root_); }
  [[nodiscard]] Place start() const { return start_; }

  void OnDocumentStart(const YAML::Mark& mark) override { start_ = place_of_(mark); }
  void OnDocumentEnd() override {}

  void OnNull(const YAML::Mark& mark, YAML::anchor_t anchor) override {
    add(make(YamlNode::Kind::null, mark), anchor, 1);
  }
  void OnScalar(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                const std::string& value) override {
    refuse_tag(mark, tag);
    // A long text counts as several values: aliases of it cannot fill the memory within the limit.
    constexpr std::size_t bytes_per_value = 32;
    const std::size_t before = nodes_;
    nodes_ += value.size() / bytes_per_value;
    YamlNode node = make(YamlNode::Kind::scalar, mark);
    node.text = value;
    add(std::move(node), anchor, nodes_ - before);
  }
  void OnAlias(const YAML::Mark& mark, YAML::anchor_t anchor) override {
    const auto found = anchors_.find(anchor);
    if (found == anchors_.end()) refuse(mark, wording::alias_to_itself());
    aliased_ += found->second.size;
    if (aliased_ > limits_.aliased) refuse(mark, wording::aliases_too_large(limits_.aliased));
    if (open_.size() + found->second.height > limits_.depth) refuse(mark, wording::too_deep(limits_.depth));
    YamlNode copy = found->second.node;
    copy.place = place_of_(mark);
    attach(std::move(copy), found->second.height);
  }
  void OnSequenceStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                       YAML::EmitterStyle::value /*style*/) override {
    open(YamlNode::Kind::sequence, mark, tag, anchor);
  }
  void OnMapStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor,
                  YAML::EmitterStyle::value /*style*/) override {
    open(YamlNode::Kind::map, mark, tag, anchor);
  }
  void OnSequenceEnd() override { close(); }
  void OnMapEnd() override { close(); }

 private:
  struct Open {
    YamlNode node;
    YAML::anchor_t anchor = 0;
    std::size_t nodes_before = 0;
    std::size_t height = 1;  // levels of nesting from here down
  };
  struct Anchored {
    YamlNode node;
    std::size_t size = 0;
    std::size_t height = 0;
  };

  [[noreturn]] void refuse(const YAML::Mark& mark, Message message) {
    throw InputError({{file_, place_of_(mark), std::move(message)}});
  }
  void refuse_tag(const YAML::Mark& mark, const std::string& tag) {
    if (!tag.empty() && tag != "?" && tag != "!") refuse(mark, wording::tag_not_used(tag));
  }
  void check_size(const YAML::Mark& mark) {
    if (nodes_ > limits_.nodes) refuse(mark, wording::too_many_values(limits_.nodes));
  }
  YamlNode make(YamlNode::Kind kind, const YAML::Mark& mark) {
    ++nodes_;
    check_size(mark);
    YamlNode node;
    node.kind = kind;
    node.place = place_of_(mark);
    return node;
  }
  void open(YamlNode::Kind kind, const YAML::Mark& mark, const std::string& tag, YAML::anchor_t anchor) {
    refuse_tag(mark, tag);
    if (open_.size() >= limits_.depth) refuse(mark, wording::too_deep(limits_.depth));
    const std::size_t before = nodes_ + aliased_;
    open_.push_back({make(kind, mark), anchor, before, 1});
  }
  void close() {
    Open done = std::move(open_.back());
    open_.pop_back();
    if (done.anchor != 0) {
      const std::size_t size = nodes_ + aliased_ - done.nodes_before;
      nodes_ += size;  // the copy kept for the aliases counts too
      if (nodes_ > limits_.nodes)
        throw InputError({{file_, done.node.place, wording::too_many_values(limits_.nodes)}});
      anchors_[done.anchor] = {done.node, size, done.height};
    }
    attach(std::move(done.node), done.height);
  }
  void add(YamlNode node, YAML::anchor_t anchor, std::size_t size) {
    if (anchor != 0) anchors_[anchor] = {node, size, 0};
    attach(std::move(node), 0);
  }
  void attach(YamlNode node, std::size_t height) {
    if (open_.empty()) {
      root_ = std::move(node);
    } else {
      open_.back().node.items.push_back(std::move(node));
      open_.back().height = std::max(open_.back().height, height + 1);
    }
  }

  std::string file_;
  YamlLimits limits_;
  PlaceFinder& place_of_;
  Place start_;
  std::size_t nodes_ = 0;
  std::size_t aliased_ = 0;
  std::vector<Open> open_;
  std::unordered_map<YAML::anchor_t, Anchored> anchors_;
  YamlNode root_;
};

// Where more brackets stand open than any document has, counted without regard to quotes and comments. The
// parser itself would first read ahead to the end of the file, with a cost for every bracket.
std::optional<Place> too_many_open(std::string_view text, std::size_t limit) {
  std::size_t open = 0;
  Place place{1, 0};
  for (const char c : text) {
    ++place.column;
    if (c == '\n') place = {place.line + 1, 0};
    if (c == '[' || c == '{') ++open;
    if ((c == ']' || c == '}') && open > 0) --open;
    if (open > limit) return place;
  }
  return std::nullopt;
}

// Keys must be scalars and stand once in their map.
void check_keys(const YamlNode& node, FaultList& faults) {
  if (node.kind == YamlNode::Kind::map) {
    std::unordered_map<std::string_view, Place> seen;
    for (std::size_t i = 0; i + 1 < node.items.size(); i += 2) {
      const YamlNode& key = node.items[i];
      if (key.kind != YamlNode::Kind::scalar) {
        faults.add(key.place.known() ? key.place : node.place, wording::key_is_no_word(key.description()));
        continue;
      }
      const auto [first, fresh] = seen.emplace(key.text, key.place);
      if (!fresh) faults.add(key.place, wording::key_twice(key.text, first->second));
    }
  }
  for (const YamlNode& item : node.items) check_keys(item, faults);
}

}  // namespace

std::string YamlNode::description() const {
  switch (kind) {
    case Kind::null:
      return "nothing";
    case Kind::scalar:
      return fmt::format("'{}'", excerpt(text));
    case Kind::sequence:
      return "a list";
    case Kind::map:
      return "a map";
  }
  return {};
}

YamlNode parse_yaml(std::string_view text, const std::string& file, FaultList& faults,
                    const YamlLimits& limits) {
  const auto refuse = [&](Place place, Message message) {
    throw InputError({{file, place, std::move(message)}});
  };
  if (text.size() > limits.bytes) refuse({}, wording::file_too_long(text.size(), limits.bytes));
  if (text.starts_with("\xEF\xBB\xBF")) text.remove_prefix(3);  // a byte-order mark says nothing in UTF-8
  if (const auto place = first_invalid_character(text)) refuse(*place, wording::invalid_character());

  if (const auto place = too_many_open(text, limits.open_brackets))
    refuse(*place, wording::too_deep(limits.depth));

  TextBuffer buffer(text);
  std::istream stream(&buffer);
  PlaceFinder place_of(text);
  TreeBuilder builder(file, limits, place_of);
  try {
    YAML::Parser parser(stream);
    if (!parser.HandleNextDocument(builder)) refuse({1, 1}, wording::empty_file());
    TreeBuilder next(file, limits, place_of);
    if (parser.HandleNextDocument(next)) refuse(next.start(), wording::several_documents());
  } catch (const YAML::DeepRecursion& error) {
    refuse(place_of(error.mark), wording::too_deep(limits.depth));
  } catch (const YAML::Exception& error) {
    refuse(place_of(error.mark), wording::not_yaml(error.msg));
  }
  YamlNode root = builder.take_root();
  check_keys(root, faults);
  return root;
}

}  // namespace swaymark
