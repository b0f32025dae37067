#pragma once

#include <cstdint>
#include <exception>
#include <string>
#include <vector>

namespace swaymark {

/// A point in one of the files a tower was read from. Lines and columns count from 1; 0 means unknown.
struct Place {
  std::uint32_t line = 0;
  std::uint32_t column = 0;
  std::uint32_t file = 0;  ///< 0: the file that is read; else one it names, as FaultList::add_file counts

  [[nodiscard]] bool known() const { return line > 0; }
};

/// What is wrong, and what would cure it; each a clause without a full stop.
struct Message {
  std::string what;
  std::string cure;
};

/// One fault of the input, with where it stands.
struct Fault {
  std::string file;
  Place place;
  Message message;
};

/// `file:line:column: what; cure`
[[nodiscard]] std::string to_string(const Fault& fault);

/// The input is refused (exit status 3). Holds every fault that was found, in the order of the file.
class InputError : public std::exception {
 public:
  explicit InputError(std::vector<Fault> faults);
  [[nodiscard]] const std::vector<Fault>& faults() const { return faults_; }
  [[nodiscard]] const char* what() const noexcept override { return text_.c_str(); }

 private:
  std::vector<Fault> faults_;
  std::string text_;
};

/// The computation cannot be done for this tower (exit status 4).
class ComputationError : public std::exception {
 public:
  explicit ComputationError(Message message);
  [[nodiscard]] const Message& message() const { return message_; }
  [[nodiscard]] const char* what() const noexcept override { return text_.c_str(); }

 private:
  Message message_;
  std::string text_;
};

/// Collects faults so that one run reports all of them.
class FaultList {
 public:
  explicit FaultList(std::string file) : files_{std::move(file)} {}
  /// A place in a file that is not known by its number is shown in the first.
  void add(Place place, Message message) {
    faults_.push_back({files_[place.file < files_.size() ? place.file : 0], place, std::move(message)});
  }
  /// Makes another file known. \return what Place::file is in it.
  std::uint32_t add_file(std::string file);
  /// By Place::file.
  [[nodiscard]] const std::vector<std::string>& files() const { return files_; }
  /// Those of another file that the file names.
  void take(FaultList other);
  [[nodiscard]] bool empty() const { return faults_.empty(); }
  [[nodiscard]] std::size_t size() const { return faults_.size(); }
  /// \throws InputError with the faults sorted by place, if there are any; those of other files come last.
  void throw_if_any();

 private:
  std::vector<std::string> files_;
  std::vector<Fault> faults_;
};

}  // namespace swaymark
