#pragma once

#include <exception>
#include <string>
#include <string_view>
#include <vector>

namespace swaymark {

/// A file cannot be read or written (exit status 5).
class FileError : public std::exception {
 public:
  explicit FileError(std::string text) : text_(std::move(text)) {}
  [[nodiscard]] const char* what() const noexcept override { return text_.c_str(); }

 private:
  std::string text_;
};

/// The bytes of a file; "-" is standard input. Reading stops past `limit` bytes: the caller refuses such a
/// file. \throws FileError
[[nodiscard]] std::string read_file(const std::string& name, std::size_t limit);

/// Files to be written together. Each is written beside its target first; commit() renames them all, so that
/// a target is complete or as it was. Whatever was not committed is removed again.
class OutputFiles {
 public:
  OutputFiles() = default;
  OutputFiles(const OutputFiles&) = delete;
  OutputFiles& operator=(const OutputFiles&) = delete;
  ~OutputFiles();

  /// \throws FileError. A target that is no regular file (a pipe, a device) is kept until commit() and
  /// written then.
  void stage(const std::string& target, std::string text);
  /// Makes the folder if it is not there; it is removed again unless committed.
  void stage_folder(const std::string& folder);
  /// \throws FileError
  void commit();

 private:
  struct Staged {
    std::string target;
    std::string beside;  ///< empty where the text is written directly
    std::string text;
  };
  std::vector<Staged> staged_;
  std::vector<std::string> places_;  ///< of all targets, whatever way they were named
  std::vector<std::string> made_folders_;
};

/// Writes to standard output and makes sure that it arrived.
/// \throws FileError
void write_standard_output(std::string_view text);

}  // namespace swaymark
