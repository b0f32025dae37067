#include "core/error.hpp"

#include <algorithm>
#include <iterator>
#include <tuple>

#include <fmt/format.h>

namespace swaymark {

namespace {

std::string joined(const Message& message) {
  return message.cure.empty() ? message.what : fmt::format("{}; {}", message.what, message.cure);
}

}  // namespace

std::string to_string(const Fault& fault) {
  if (!fault.place.known()) return fmt::format("{}: {}", fault.file, joined(fault.message));
  return fmt::format("{}:{}:{}: {}", fault.file, fault.place.line, fault.place.column, joined(fault.message));
}

InputError::InputError(std::vector<Fault> faults) : faults_(std::move(faults)) {
  for (const Fault& fault : faults_) {
    if (!text_.empty()) text_ += '\n';
    text_ += to_string(fault);
  }
}

ComputationError::ComputationError(Message message) : message_(std::move(message)), text_(joined(message_)) {}

std::uint32_t FaultList::add_file(std::string file) {
  files_.push_back(std::move(file));
  return static_cast<std::uint32_t>(files_.size() - 1);
}

void FaultList::take(FaultList other) {
  std::move(other.faults_.begin(), other.faults_.end(), std::back_inserter(faults_));
}

void FaultList::throw_if_any() {
  if (faults_.empty()) return;
  std::stable_sort(faults_.begin(), faults_.end(), [this](const Fault& a, const Fault& b) {
    const bool a_elsewhere = a.file != files_.front();
    const bool b_elsewhere = b.file != files_.front();
    return std::tie(a_elsewhere, a.file, a.place.line, a.place.column) <
           std::tie(b_elsewhere, b.file, b.place.line, b.place.column);
  });
  throw InputError(std::move(faults_));
}

}  // namespace swaymark
