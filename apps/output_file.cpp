#include "apps/output_file.hpp"

#include <algorithm>
#include <cerrno>
#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <memory>
#include <system_error>

#include <fmt/format.h>
#include <sys/stat.h>
#include <unistd.h>

namespace swaymark {

namespace fs = std::filesystem;

namespace {

struct CloseFile {
  // The unique_ptr is the owner that the rule wants to see.
  void operator()(std::FILE* file) const { std::fclose(file); }  // NOLINT(cppcoreguidelines-owning-memory)
};
using File = std::unique_ptr<std::FILE, CloseFile>;

[[noreturn]] void fail(const std::string& name, std::string_view action, int code, std::string_view cure) {
  throw FileError(
      fmt::format("{}: cannot {}: {}; {}", name, action, std::generic_category().message(code), cure));
}

void write_all(File file, std::string_view text, const std::string& name) {
  constexpr std::string_view cure = "make room, or write elsewhere";
  if (std::fwrite(text.data(), 1, text.size(), file.get()) != text.size()) fail(name, "write", errno, cure);
  if (std::fflush(file.get()) != 0) fail(name, "write", errno, cure);
  if (std::fclose(file.release()) != 0) fail(name, "write", errno, cure);
}

// Where a link points in the end, whether a file is there or not.
fs::path pointed_at(fs::path target) {
  constexpr int most_links = 40;  // as many as the kernel follows
  std::error_code error;
  for (int i = 0; i < most_links && fs::is_symlink(fs::symlink_status(target, error)); ++i) {
    const fs::path next = fs::read_symlink(target, error);
    if (error) break;
    target = target.parent_path() / next;
  }
  return target;
}

// The permissions that a new file has, which mkstemp does not give.
mode_t common_permissions() {
  const mode_t mask = umask(0);
  umask(mask);
  return 0666U & ~mask;
}

}  // namespace

std::string read_file(const std::string& name, std::size_t limit) {
  const bool standard = name == "-";
  std::error_code ignored;
  if (!standard && fs::is_directory(name, ignored)) fail(name, "read", EISDIR, "name a tower file");
  File opened(standard ? nullptr : std::fopen(name.c_str(), "rb"));
  std::FILE* file = standard ? stdin : opened.get();
  if (file == nullptr) fail(name, "open", errno, "check the name and the permissions");
  std::string text;
  std::string block(std::size_t{1} << 16U, '\0');
  while (text.size() <= limit) {
    const std::size_t got = std::fread(block.data(), 1, block.size(), file);
    text.append(block, 0, got);
    if (got < block.size()) break;
  }
  if (std::ferror(file) != 0) fail(name, "read", errno, "check the file");
  return text;
}

OutputFiles::~OutputFiles() {
  std::error_code ignored;
  for (const Staged& staged : staged_) {
    if (!staged.beside.empty()) fs::remove(staged.beside, ignored);
  }
  // Only if empty: what another program put there is not ours to remove.
  for (; !made_folders_.empty(); made_folders_.pop_back()) fs::remove(made_folders_.back(), ignored);
}

void OutputFiles::stage(const std::string& target, std::string text) {
  std::error_code error;
  const fs::file_status status = fs::status(target, error);
  if (fs::is_directory(status)) fail(target, "write", EISDIR, "name a file");
  // A link keeps pointing where it points: its target is what is replaced.
  const fs::path real = pointed_at(target);
  const fs::path place = fs::weakly_canonical(real, error);
  if (!place.empty() && std::find(places_.begin(), places_.end(), place.string()) != places_.end())
    throw FileError(fmt::format("{}: would be written twice; name two files", target));
  places_.push_back(place.string());
  if (fs::exists(status) && !fs::is_regular_file(status)) {
    staged_.push_back({target, "", std::move(text)});
    return;
  }
  std::string beside = (real.parent_path() / fmt::format(".{}.XXXXXX", real.filename().string())).string();
  const int descriptor = mkstemp(beside.data());
  if (descriptor < 0) fail(target, "write", errno, "check that the folder exists and may be written to");
  staged_.push_back({real.string(), beside, {}});
  mode_t permissions = common_permissions();
  if (fs::exists(status)) permissions = static_cast<mode_t>(status.permissions()) & 0777U;
  static_cast<void>(fchmod(descriptor, permissions));
  File file(fdopen(descriptor, "wb"));
  if (!file) fail(target, "write", errno, "try again");
  write_all(std::move(file), text, target);
}

void OutputFiles::stage_folder(const std::string& folder) {
  std::error_code error;
  if (fs::is_directory(folder, error)) return;
  if (!fs::create_directory(folder, error)) {
    const int code = error ? error.value() : EEXIST;
    fail(folder, "make the folder", code, "name a folder whose parent exists");
  }
  made_folders_.push_back(folder);
}

void OutputFiles::commit() {
  for (Staged& staged : staged_) {
    if (staged.beside.empty()) {
      File file(std::fopen(staged.target.c_str(), "wb"));
      if (!file) fail(staged.target, "write", errno, "check the permissions");
      write_all(std::move(file), staged.text, staged.target);
      continue;
    }
    if (std::rename(staged.beside.c_str(), staged.target.c_str()) != 0)
      fail(staged.target, "write", errno, "check the folder");
    staged.beside.clear();
    staged.target.clear();
  }
  staged_.clear();
  made_folders_.clear();
}

void write_standard_output(std::string_view text) {
  constexpr std::string_view cure = "check where the output goes";
  if (std::fwrite(text.data(), 1, text.size(), stdout) != text.size())
    fail("standard output", "write", errno, cure);
  if (std::fflush(stdout) != 0) fail("standard output", "write", errno, cure);
}

}  // namespace swaymark
