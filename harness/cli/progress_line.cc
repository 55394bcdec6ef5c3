#include "harness/cli/progress_line.h"

#include <cstdio>
#include <utility>

#include <fmt/format.h>
#include <sys/ioctl.h>
#include <unistd.h>

#include "harness/report/pace.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

constexpr std::chrono::milliseconds kBetweenLive{100};
constexpr std::chrono::seconds kBetweenPlain{30};
constexpr const char* kWipe = "\r\x1b[K";

std::optional<size_t> ColumnsOfStandardError() {
  constexpr size_t kUsual = 80;  // Of a terminal that does not say.
  if (::isatty(STDERR_FILENO) == 0) {
    return std::nullopt;
  }
  struct winsize size {};
  const bool says =
      ::ioctl(STDERR_FILENO, TIOCGWINSZ, &size) == 0 && size.ws_col > 0;
  return says ? size.ws_col : kUsual;
}

void WriteToStandardError(std::string_view text) {
  fmt::print(stderr, "{}", text);
  std::fflush(stderr);
}

}  // namespace

ProgressOutput OnStandardError() {
  return {.columns = &ColumnsOfStandardError,
          .write = &WriteToStandardError,
          .now = &std::chrono::steady_clock::now};
}

ProgressLine::ProgressLine(ProgressOutput output)
    : output_(std::move(output)), began_(output_.now()), written_(began_) {}

ProgressLine::~ProgressLine() {
  if (has_live_) {
    output_.write(kWipe);
  } else if (has_plain_ && has_unwritten_) {
    WritePlain(output_.now());
  }
}

void ProgressLine::Show(const RunProgress& progress) {
  const Time now = output_.now();
  shown_ = progress;
  has_unwritten_ = true;
  // Not asked for the width on each call.
  if (now - written_ < kBetweenLive) {
    return;
  }
  const std::optional<size_t> columns = output_.columns();
  if (columns) {
    WriteLive(*columns, now);
  } else if (now - written_ >= kBetweenPlain) {
    WritePlain(now);
  }
}

std::string ProgressLine::Text(Time now) const {
  std::string text = JobsText(shown_);
  const std::chrono::duration<double> session = now - began_;
  if (const auto rate = JobsPerSecond(shown_, session.count())) {
    text += ", " + RateText(*rate);
    if (const auto left_s = SecondsLeft(shown_, *rate)) {
      text += fmt::format(", {} left", DurationText(*left_s));
    }
  }
  text += fmt::format(", {} failed", shown_.jobs.failed);
  return shown_.current.empty() ? text : text + ", " + shown_.current;
}

void ProgressLine::WriteLive(size_t columns, Time now) {
  // A line that ends in the last column would begin the next.
  const std::string line = OneLine(Text(now), columns - 1);
  output_.write(kWipe + line);
  written_ = now;
  has_live_ = true;
  has_unwritten_ = false;
}

void ProgressLine::WritePlain(Time now) {
  constexpr size_t kAsLongAsItIs = 10'000;
  output_.write(OneLine(Text(now), kAsLongAsItIs) + '\n');
  written_ = now;
  has_plain_ = true;
  has_unwritten_ = false;
}

}  // namespace gatedyno
