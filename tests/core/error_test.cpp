#include "core/error.hpp"

#include <catch2/catch.hpp>

namespace swaymark::test {

TEST_CASE("a fault reads as file then line then column then what and cure") {
  const Fault fault{"tower.yaml", {12, 9}, {"nodes '1' and '2' stand at the same place", "keep one"}};
  CHECK(to_string(fault) == "tower.yaml:12:9: nodes '1' and '2' stand at the same place; keep one");
}

TEST_CASE("a fault without a place names the file alone") {
  CHECK(to_string({"tower.yaml", {}, {"the file is empty", "begin"}}) ==
        "tower.yaml: the file is empty; begin");
}

TEST_CASE("a fault without a cure ends after what is wrong") {
  CHECK(to_string({"a.yaml", {1, 2}, {"wrong", ""}}) == "a.yaml:1:2: wrong");
}

TEST_CASE("a refused input shows every fault on a line of its own") {
  const InputError error({{"a.yaml", {1, 1}, {"one", "x"}}, {"a.yaml", {2, 1}, {"two", "y"}}});
  CHECK(error.faults().size() == 2);
  CHECK(std::string(error.what()) == "a.yaml:1:1: one; x\na.yaml:2:1: two; y");
}

TEST_CASE("a computation that cannot be done says what and what would cure it") {
  const ComputationError error({"no modes were found", "fix fewer nodes"});
  CHECK(std::string(error.what()) == "no modes were found; fix fewer nodes");
  CHECK(error.message().what == "no modes were found");
  CHECK(error.message().cure == "fix fewer nodes");
}

TEST_CASE("collected faults come out in the order of the file") {
  FaultList faults("a.yaml");
  faults.add({3, 1}, {"third", ""});
  faults.add({1, 7}, {"second", ""});
  faults.add({1, 2}, {"first", ""});
  faults.add({3, 1}, {"fourth", ""});  // the same place: as it was added
  REQUIRE(faults.size() == 4);
  try {
    faults.throw_if_any();
    FAIL("nothing was thrown");
  } catch (const InputError& error) {
    std::string order;
    for (const Fault& fault : error.faults()) order += fault.message.what + ' ';
    CHECK(order == "first second third fourth ");
    CHECK(error.faults().front().file == "a.yaml");
  }
}

TEST_CASE("faults of another file follow those of the file that names it") {
  FaultList faults("b.yaml");
  FaultList other("a.csv");
  other.add({2, 1}, {"fourth", ""});
  other.add({1, 1}, {"third", ""});
  faults.take(std::move(other));
  faults.add({9, 1}, {"second", ""});
  faults.add({3, 1}, {"first", ""});
  CHECK(faults.size() == 4);
  try {
    faults.throw_if_any();
    FAIL("nothing was thrown");
  } catch (const InputError& error) {
    CHECK(std::string(error.what()) ==
          "b.yaml:3:1: first\nb.yaml:9:1: second\na.csv:1:1: third\na.csv:2:1: fourth");
  }
}

TEST_CASE("no faults let the reading go on") {
  FaultList faults("a.yaml");
  CHECK(faults.empty());
  CHECK_NOTHROW(faults.throw_if_any());
}

TEST_CASE("a fault is shown in the file that its place counts") {
  FaultList faults("tower.yaml");
  const std::uint32_t nodes = faults.add_file("nodes.csv");
  const std::uint32_t bars = faults.add_file("bars.csv");
  faults.add({7, 1, bars}, {"odd", "cure"});
  faults.add({9, 2, nodes}, {"odd", "cure"});
  faults.add({3, 4}, {"odd", "cure"});
  faults.add({5, 6, 99}, {"odd", "cure"});  // of no file that is known
  CHECK(faults.files() == std::vector<std::string>{"tower.yaml", "nodes.csv", "bars.csv"});
  try {
    faults.throw_if_any();
    FAIL("nothing was thrown");
  } catch (const InputError& error) {
    CHECK(std::string(error.what()) ==
          "tower.yaml:3:4: odd; cure\ntower.yaml:5:6: odd; cure\nbars.csv:7:1: odd; cure\nnodes.csv:9:2: "
          "odd; cure");
  }
}

}  // namespace swaymark::test
