// A store with a run in each state, as `gatedyno status` would find it.

#ifndef GATEDYNO_TESTS_REPORT_STORE_VIEW_H_
#define GATEDYNO_TESTS_REPORT_STORE_VIEW_H_

#include "harness/report/run_status.h"

namespace gatedyno {

// 2026-03-01 21:30:02 UTC, by date(1).
inline constexpr UnixMilliseconds kEvening = 1'772'400'602'000;
inline constexpr UnixMilliseconds kMinute = 60'000;

inline RunInfo InfoOf(const char* plan) {
  return {.plan = plan,
          .node = "p45",
          .program_version = "gatedyno 0.1.0",
          .simulator_version = "simulator 1"};
}

// 1 finished, 2 stopped, 3 gone on with after a pause and running.
inline StoreView ViewOfThree() {
  const RunRecord finished = {
      .id = 1,
      .info = InfoOf(R"({"title": "arbiter on p45"})"),
      .started = kEvening - 600 * kMinute,
      .session_started = kEvening - 600 * kMinute,
      .progressed = kEvening - 580 * kMinute,
      .finished = kEvening - 580 * kMinute,
      .progress = RunProgress{
          .jobs = {.wanted = 2400, .reused = 0, .simulated = 2400, .failed = 0},
          .expected_jobs = 2400,
          .arcs_ended = 96,
          .arcs = 96,
          .current = "nor3 c->y h=6 typical"}};
  const RunRecord stopped = {.id = 2,
                             .info = InfoOf("{}"),
                             .started = kEvening - 90 * kMinute,
                             .session_started = kEvening - 90 * kMinute,
                             .progressed = kEvening - 90 * kMinute,
                             .finished = {},
                             .progress = {}};
  const RunRecord running = {
      .id = 3,
      .info = InfoOf(R"({"title": "whole library, all corners"})"),
      .started = kEvening - 60 * kMinute,
      .session_started = kEvening - 10 * kMinute,
      .progressed = kEvening - kMinute / 6,
      .finished = {},
      .progress = RunProgress{.jobs = {.wanted = 4000,
                                       .reused = 1000,
                                       .simulated = 1180,
                                       .failed = 3},
                              .expected_jobs = 5600,
                              .arcs_ended = 34,
                              .arcs = 240,
                              .current = "nand2 a->y h=4 slow_hot"}};
  return {.store = "library.db",
          .runs = {finished, stopped, running},
          .locked = true,
          .now = kEvening};
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_REPORT_STORE_VIEW_H_
