#include "tests/support/ngspice_batch.h"

#include <atomic>
#include <cctype>
#include <filesystem>
#include <sstream>
#include <string>
#include <system_error>

#include <boost/process.hpp>
#include <fmt/format.h>
#include <gtest/gtest.h>
#include <unistd.h>

#include "harness/base/file.h"

namespace gatedyno {
namespace {

namespace bp = boost::process;

// Tests of one build run side by side in processes of their own.
std::filesystem::path UniqueStem() {
  static std::atomic<int> count = 0;
  return std::filesystem::path(testing::TempDir()) /
         fmt::format("ngspice_batch_{}_{}", getpid(), count++);
}

// The simulator's exit code alone cannot be trusted: an unknown model or a
// failed .meas still ends with 0.
bool IsComplaint(std::string_view line) {
  for (const std::string_view word :
       {"Error", "ERROR", "Fatal", "fatal", "failed", "aborted"}) {
    if (line.find(word) != std::string_view::npos) {
      return true;
    }
  }
  return false;
}

// "Error on line 3 or its substitute:" is followed by the line and the reason.
constexpr int kComplaintLines = 3;

// "name = value", and nothing that looks like it: the closing lines about
// memory ("Stack = 0 bytes.") begin with a capital.
void ReadMeasure(const std::string& line, BatchMeasures& measures) {
  std::istringstream words(line);
  std::string name;
  std::string equals;
  double value = 0.0;
  if (words >> name >> equals >> value && equals == "=" &&
      std::isupper(static_cast<unsigned char>(name.front())) == 0) {
    measures[name] = value;
  }
}

Result<BatchMeasures> ReadLog(const std::string& log, int exit_code) {
  BatchMeasures measures;
  std::string complaints;
  std::istringstream lines(log);
  int lines_to_keep = 0;
  for (std::string line; std::getline(lines, line);) {
    if (IsComplaint(line)) {
      lines_to_keep = kComplaintLines;
    }
    if (lines_to_keep-- > 0) {
      complaints += line + "\n";
    }
    ReadMeasure(line, measures);
  }
  if (complaints.empty() && exit_code != 0) {
    complaints = fmt::format("exit code {}\n", exit_code);
  }
  if (complaints.empty() && measures.empty()) {
    complaints = "no .meas result\n";
  }
  if (!complaints.empty()) {
    return BadInput(complaints);
  }
  return measures;
}

}  // namespace

Result<BatchMeasures> RunBatch(std::string_view deck) {
  const std::filesystem::path stem = UniqueStem();
  const std::string deck_path = stem.string() + ".sp";
  const std::string log_path = stem.string() + ".log";
  if (const Status written = WriteFile(deck_path, deck); !written.ok()) {
    return Forward(written);
  }
  const auto program = bp::search_path("ngspice");
  if (program.empty()) {
    return Unavailable("ngspice: not found on PATH");
  }
  std::error_code failure;
  // -n: the user's start-up file has no say in a test.
  const int exit_code = bp::system(program,
                                   "-n",
                                   "-b",
                                   deck_path,
                                   (bp::std_out & bp::std_err) > log_path,
                                   bp::std_in < bp::null,
                                   failure);
  if (failure) {
    return Unavailable("ngspice: " + failure.message());
  }
  const Result<std::string> log = ReadFile(log_path);
  if (!log.ok()) {
    return Forward(log);
  }
  Result<BatchMeasures> measures = ReadLog(*log, exit_code);
  if (!measures.ok()) {
    return BadInput(fmt::format("{}: {}", log_path, measures.error().message));
  }
  std::filesystem::remove(deck_path, failure);
  std::filesystem::remove(log_path, failure);
  return measures;
}

}  // namespace gatedyno
