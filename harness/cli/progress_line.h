// How far a run is, on standard error: one live line on a terminal; elsewhere,
// as in the log of an overnight run, a plain line now and then.

#ifndef GATEDYNO_CLI_PROGRESS_LINE_H_
#define GATEDYNO_CLI_PROGRESS_LINE_H_

#include <chrono>
#include <cstddef>
#include <functional>
#include <optional>
#include <string>
#include <string_view>

#include "harness/record/run_progress.h"

namespace gatedyno {

// Where the line goes, and what time it is.
struct ProgressOutput {
  // Width of the terminal at this moment; none where it is no terminal.
  std::function<std::optional<size_t>()> columns;
  std::function<void(std::string_view text)> write;
  std::function<std::chrono::steady_clock::time_point()> now;
};

ProgressOutput OnStandardError();

class ProgressLine {
 public:
  // The session begins: rates count from here.
  explicit ProgressLine(ProgressOutput output = OnStandardError());
  // On a terminal the line is wiped.  In a log the end gets a line, if there
  // has been one before: a run of seconds leaves none.
  ~ProgressLine();
  ProgressLine(const ProgressLine&) = delete;
  ProgressLine& operator=(const ProgressLine&) = delete;

  // Cheap enough to be called after every job: on a terminal the line changes
  // ten times a second at most, a log gets a line every 30 s.
  void Show(const RunProgress& progress);

 private:
  using Time = std::chrono::steady_clock::time_point;

  // "12 of 80 jobs, 41/s, 1 min 40 s left, 0 failed, nand2 a->y h=4 typical"
  std::string Text(Time now) const;
  void WriteLive(size_t columns, Time now);
  void WritePlain(Time now);

  ProgressOutput output_;
  Time began_;
  Time written_;                // When a line was written last, or `began_`.
  RunProgress shown_;           // As of the last call.
  bool has_live_ = false;       // There is a line to wipe.
  bool has_plain_ = false;      // There has been a line.
  bool has_unwritten_ = false;  // `shown_` is newer than the last line.
};

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_PROGRESS_LINE_H_
