// What a store keeps of a run, an execution of a plan.
//
// A run may take several sessions: one is stopped or dies, the next goes on
// with what the store does not have yet.

#ifndef GATEDYNO_STORE_RUN_RECORD_H_
#define GATEDYNO_STORE_RUN_RECORD_H_

#include <chrono>
#include <cstdint>
#include <optional>
#include <string>
#include <vector>

#include "harness/record/run_progress.h"

namespace gatedyno {

using UnixMilliseconds = std::int64_t;  // Since 1970, UTC.

inline UnixMilliseconds UnixNow() {
  return std::chrono::duration_cast<std::chrono::milliseconds>(
             std::chrono::system_clock::now().time_since_epoch())
      .count();
}

using RunId = std::int64_t;  // Counts from 1 in each store.

// What a run is told of when it begins.
struct RunInfo {
  std::string plan;  // JSON text.
  std::string node;
  std::string program_version;
  std::string simulator_version;
};

struct RunRecord {
  RunId id = 0;
  RunInfo info;
  UnixMilliseconds started = 0;
  UnixMilliseconds session_started = 0;  // Of the newest session.
  UnixMilliseconds progressed = 0;       // The last sign of life.
  std::optional<UnixMilliseconds> finished;
  // As last noted; its counts are those of the newest session.
  std::optional<RunProgress> progress;
};

// What a run gave, as JSON texts.
struct RunText {
  std::string head;
  std::vector<std::string> rows;  // One comparison each.
};

}  // namespace gatedyno

#endif  // GATEDYNO_STORE_RUN_RECORD_H_
