#include "apps/output_file.hpp"

#include <algorithm>
#include <filesystem>

#include <catch2/catch.hpp>
#include <sys/stat.h>
#include <unistd.h>

#include "tests/support/files.hpp"

namespace swaymark::test {

namespace fs = std::filesystem;

namespace {

// The names of all that lies in a folder, sorted.
std::vector<std::string> names_in(const fs::path& folder) {
  std::vector<std::string> names;
  for (const auto& entry : fs::directory_iterator(folder)) names.push_back(entry.path().filename().string());
  std::sort(names.begin(), names.end());
  return names;
}

using Names = std::vector<std::string>;

void write_one(const std::string& target, const std::string& text) {
  OutputFiles files;
  files.stage(target, text);
  files.commit();
}

unsigned permissions_of(const fs::path& file) {
  return static_cast<unsigned>(fs::status(file).permissions());
}

}  // namespace

TEST_CASE("a committed file holds its text and nothing else is left beside it") {
  const ScratchFolder folder;
  write_one((folder.path() / "r.json").string(), "{}\n");
  CHECK(bytes_of(folder.path() / "r.json") == "{}\n");
  CHECK(names_in(folder.path()) == Names{"r.json"});
}

TEST_CASE("a file that was staged and not committed is not there") {
  const ScratchFolder folder;
  const std::string known = folder.write("known.json", "before");
  {
    OutputFiles files;
    files.stage((folder.path() / "new.json").string(), "after");
    files.stage(known, "after");
    CHECK(bytes_of(known) == "before");
  }
  CHECK(names_in(folder.path()) == Names{"known.json"});
  CHECK(bytes_of(known) == "before");
}

TEST_CASE("a failure on the way leaves every target as it was and nothing beside") {
  const ScratchFolder folder;
  const std::string known = folder.write("known.json", "before");
  const auto write_both = [&] {
    OutputFiles files;
    files.stage_folder((folder.path() / "sheets").string());
    files.stage(known, "after");
    files.stage((folder.path() / "missing" / "r.json").string(), "after");
    files.commit();
  };
  CHECK_THROWS_AS(write_both(), FileError);
  CHECK(names_in(folder.path()) == Names{"known.json"});
  CHECK(bytes_of(known) == "before");
}

TEST_CASE("an existing file is replaced whole and keeps its permissions") {
  const ScratchFolder folder;
  const std::string known = folder.write("known.json", "a much longer text than the new one");
  fs::permissions(known, fs::perms(0640));
  write_one(known, "short");
  CHECK(bytes_of(known) == "short");
  CHECK(permissions_of(known) == 0640);
}

TEST_CASE("a new file has the permissions that the umask leaves") {
  const ScratchFolder folder;
  const mode_t before = umask(027);
  write_one((folder.path() / "r.json").string(), "{}");
  umask(before);
  CHECK(permissions_of(folder.path() / "r.json") == 0640);
}

TEST_CASE("a link keeps pointing where it points and what it points to is replaced") {
  const ScratchFolder folder;
  const std::string real = folder.write("real.json", "before");
  fs::create_symlink("real.json", folder.path() / "link.json");
  fs::create_symlink("later.json", folder.path() / "dangling.json");
  write_one((folder.path() / "link.json").string(), "after");
  write_one((folder.path() / "dangling.json").string(), "new");
  CHECK(fs::is_symlink(folder.path() / "link.json"));
  CHECK(bytes_of(real) == "after");
  CHECK(fs::is_symlink(folder.path() / "dangling.json"));
  CHECK(bytes_of(folder.path() / "later.json") == "new");
}

TEST_CASE("a target that is a folder is refused") {
  const ScratchFolder folder;
  CHECK_THROWS_WITH(write_one(folder.path().string(), "text"), Catch::Contains("Is a directory"));
}

TEST_CASE("a target in a missing folder is refused with what would cure it") {
  const ScratchFolder folder;
  CHECK_THROWS_WITH(
      write_one((folder.path() / "missing" / "r.json").string(), "text"),
      Catch::Contains("No such file or directory") && Catch::Contains("; check that the folder"));
}

TEST_CASE("a target where nobody may make files is refused") {
  CHECK_THROWS_AS(write_one("/proc/swaymark-results.json", "text"), FileError);
}

TEST_CASE("two outputs with the same target are refused however they are named") {
  const ScratchFolder folder;
  fs::create_symlink("modes.csv", folder.path() / "link.csv");
  const std::string target = (folder.path() / "modes.csv").string();
  for (const std::string& other :
       {target, folder.path().string() + "/./modes.csv", (folder.path() / "link.csv").string()}) {
    INFO(other);
    OutputFiles files;
    files.stage(target, "one");
    CHECK_THROWS_WITH(files.stage(other, "two"), Catch::Contains("twice"));
  }
  CHECK(names_in(folder.path()) == Names{"link.csv"});
}

TEST_CASE("a new folder is made for a committed file and removed again with one that is not") {
  const ScratchFolder folder;
  const fs::path sheets = folder.path() / "sheets";
  {
    OutputFiles files;
    files.stage_folder(sheets.string());
    files.stage((sheets / "modes.csv").string(), "mode");
  }
  CHECK(names_in(folder.path()).empty());
  OutputFiles files;
  files.stage_folder(sheets.string());
  files.stage((sheets / "modes.csv").string(), "mode");
  files.commit();
  CHECK(bytes_of(sheets / "modes.csv") == "mode");
}

TEST_CASE("a folder that is there is used and never removed") {
  const ScratchFolder folder;
  folder.write("other.txt", "not ours");
  {
    OutputFiles files;
    files.stage_folder(folder.path().string());
  }
  CHECK(names_in(folder.path()) == Names{"other.txt"});
}

TEST_CASE("a folder is refused where a file has its name or its parent is missing") {
  const ScratchFolder folder;
  const std::string file = folder.write("taken", "a file");
  OutputFiles files;
  CHECK_THROWS_AS(files.stage_folder(file), FileError);
  CHECK_THROWS_AS(files.stage_folder((folder.path() / "a" / "b").string()), FileError);
  CHECK(names_in(folder.path()) == Names{"taken"});
}

TEST_CASE("a device that takes nothing is a failure and keeps the other targets from being written") {
  const ScratchFolder folder;
  const auto write_both = [&] {
    OutputFiles files;
    files.stage("/dev/full", "text");
    files.stage((folder.path() / "r.json").string(), "text");
    files.commit();
  };
  CHECK_THROWS_WITH(write_both(), Catch::Contains("/dev/full") && Catch::Contains("No space left"));
  CHECK(names_in(folder.path()).empty());
}

TEST_CASE("a device that takes everything is written directly and stays a device") {
  CHECK_NOTHROW(write_one("/dev/null", "text"));
  CHECK(fs::is_character_file("/dev/null"));
}

TEST_CASE("a file is read byte by byte and not much further than asked") {
  const ScratchFolder folder;
  const std::string text("a\0\r\n\xff", 5);
  CHECK(read_file(folder.write("odd", text), 100) == text);
  CHECK(read_file(folder.write("empty", ""), 100).empty());
  const std::string start = read_file("/dev/zero", 1000);
  CHECK(start.size() > 1000);
  CHECK(start.size() < 1'000'000);
}

TEST_CASE("what cannot be read is refused with its name and the reason") {
  const ScratchFolder folder;
  CHECK_THROWS_WITH(read_file((folder.path() / "none.yaml").string(), 100),
                    Catch::Contains("none.yaml: cannot open: No such file or directory; "));
  CHECK_THROWS_WITH(read_file(folder.path().string(), 100), Catch::Contains("Is a directory"));
  // Its first page is never mapped, so that reading it fails for everybody.
  CHECK_THROWS_WITH(read_file("/proc/self/mem", 100), Catch::Contains("cannot read"));
  if (geteuid() != 0) {
    const std::string closed = folder.write("closed.yaml", "text");
    fs::permissions(closed, fs::perms::none);
    CHECK_THROWS_WITH(read_file(closed, 100), Catch::Contains("Permission denied"));
  }
}

}  // namespace swaymark::test
