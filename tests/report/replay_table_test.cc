#include "harness/report/replay_table.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/report/terminal_text.h"

namespace gatedyno {
namespace {

StoredJob Stored() {
  StoredJob stored;
  stored.job.key = "0123456789abcdef0123456789abcdef";
  stored.job.label = "nand2 a->y h=4 typical";
  stored.job.intervals = {{"delay_rise", {}, {}},
                          {"delay_fall", {}, {}},
                          {"slew", {}, {}},
                          {"skew", {}, {}}};
  // 2026-03-01 21:30:02 UTC.
  stored.ended = 1'772'400'602'000;
  stored.outcome = Outcome{.ending = Ending::kMeasured,
                           .values_s = {{"delay_rise", 12.345e-12},
                                        {"delay_fall", 100e-12},
                                        {"skew", 0.0}},
                           .message = "",
                           .simulator_s = 0.01,
                           .rung = 1};
  return stored;
}

TEST(ReplayTableTest, TheJobAndHowItEnded) {
  StoredJob stored = Stored();
  const std::string head =
      "nand2 a->y h=4 typical\n"
      "  key 0123456789abcdef0123456789abcdef\n";
  EXPECT_EQ(StoredJobText(stored),
            head + "  measured at rung 1, 2026-03-01 21:30:02 UTC\n");
  stored.outcome->ending = Ending::kFailed;
  stored.outcome->message = "timestep too small";
  EXPECT_EQ(StoredJobText(stored),
            head +
                "  failed at rung 1, 2026-03-01 21:30:02 UTC: timestep too "
                "small\n");
  stored.outcome.reset();
  EXPECT_EQ(StoredJobText(stored), head + "  has not ended yet\n");
}

TEST(ReplayTableTest, EachIntervalBesideTheStoredOne) {
  Outcome again = *Stored().outcome;
  again.values_s = {{"delay_rise", 12.345e-12},
                    {"delay_fall", 101.5e-12},
                    {"slew", 9e-12},
                    {"skew", 1e-15}};
  EXPECT_EQ(ReplayTable(Stored(), 2, again),
            "again at rung 2:\n"
            "  interval           now      stored  difference\n"
            "  delay_rise    12.35 ps    12.35 ps        same\n"
            "  delay_fall    101.5 ps    100.0 ps      +1.5 %\n"
            "  slew          9.000 ps           -           -\n"
            "  skew          0.001 ps    0.000 ps           -\n");
}

TEST(ReplayTableTest, WhatWasNotMeasuredBeforeMayBeNow) {
  StoredJob stored = Stored();
  const Outcome again = *stored.outcome;
  stored.job.intervals.resize(1);
  stored.outcome = Outcome{};
  const std::string table =
      "again at rung 0:\n"
      "  interval           now      stored  difference\n"
      "  delay_rise    12.35 ps           -           -\n";
  EXPECT_EQ(ReplayTable(stored, 0, again), table);
  stored.outcome.reset();
  EXPECT_EQ(ReplayTable(stored, 0, again), table);
}

TEST(ReplayTableTest, OrTheSimulatorsWords) {
  Outcome again;
  again.ending = Ending::kTimedOut;
  again.message = "no reply within 30 s";
  EXPECT_EQ(ReplayTable(Stored(), 0, again),
            "again at rung 0:\n  timed out: no reply within 30 s\n");
}

TEST(ReplayTableTest, FitsTheTerminal) {
  StoredJob stored = Stored();
  stored.job.label = std::string(150, 'l');
  stored.outcome->message = std::string(300, 'm') + "\x1b[31m";
  stored.job.intervals[0].name = std::string(120, 'i');
  Outcome again = *Stored().outcome;
  const std::string text =
      StoredJobText(stored) + ReplayTable(stored, 0, again);
  ExpectFits(text);
  EXPECT_EQ(text.find('\x1b'), std::string::npos);
}

}  // namespace
}  // namespace gatedyno
