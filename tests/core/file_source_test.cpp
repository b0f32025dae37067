#include "core/file_source.hpp"

#include <stdexcept>

#include <catch2/catch.hpp>

namespace swaymark::test {

TEST_CASE("a file is looked for beside the file that names it") {
  CHECK(path_beside("tower.yaml", "table.csv") == "table.csv");
  CHECK(path_beside("site/tower.yaml", "table.csv") == "site/table.csv");
  CHECK(path_beside("site/tower.yaml", "../table.csv") == "site/../table.csv");
  CHECK(path_beside("site/tower.yaml", "/tables/table.csv") == "/tables/table.csv");
  CHECK(path_beside("standard input", "table.csv") == "table.csv");
}

TEST_CASE("a fetched file comes with the path it was asked for by") {
  FaultList faults("site/tower.yaml");
  const auto other = fetch(
      "site/tower.yaml", "table.csv", [](const std::string& path) { return "bytes of " + path; }, {3, 7},
      faults);
  REQUIRE(other);
  CHECK(other->path == "site/table.csv");
  CHECK(other->text == "bytes of site/table.csv");
  CHECK(faults.empty());
}

TEST_CASE("without a source a named file is a fault at its name") {
  FaultList faults("tower.yaml");
  CHECK_FALSE(fetch("tower.yaml", "table.csv", {}, {3, 7}, faults));
  try {
    faults.throw_if_any();
    FAIL("nothing was thrown");
  } catch (const InputError& error) {
    CHECK(std::string(error.what()) ==
          "tower.yaml:3:7: the file 'table.csv' is out of reach here: only the tower file itself was given; "
          "write its content into the tower file");
  }
}

TEST_CASE("what a source throws reaches its caller") {
  FaultList faults("tower.yaml");
  const FileSource none = [](const std::string&) -> std::string { throw std::runtime_error("no such file"); };
  CHECK_THROWS_WITH(fetch("tower.yaml", "table.csv", none, {3, 7}, faults), "no such file");
}

}  // namespace swaymark::test
