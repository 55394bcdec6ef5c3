#include "harness/report/status_table.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/report/store_view.h"
#include "tests/report/terminal_text.h"

namespace gatedyno {
namespace {

const Style kNoColour(false);
const Style kColour(true);

constexpr const char* kThree =
    R"(run 1: arbiter on p45, finished
  started 2026-03-01 11:30:02 UTC, 10 h ago
  finished 2026-03-01 11:50:02 UTC, after 20 min
  2400 of 2400 jobs done, 0 of them taken from stores, 0 failed
  2.0/s
  96 of 96 arcs ended

run 2, stopped
  started 2026-03-01 20:00:02 UTC, 1 h 30 min ago
  last sign of life 2026-03-01 20:00:02 UTC, 1 h 30 min ago
  to go on: 'gatedyno run' with the same plan and options and --store library.db

run 3: whole library, all corners, running
  started 2026-03-01 20:30:02 UTC, 1 h ago
  gone on with 2026-03-01 21:20:02 UTC, 10 min ago
  2180 of 5600 jobs done, 1000 of them taken from stores, 3 failed
  2.0/s, 28 min 20 s left
  34 of 240 arcs ended; last job nand2 a->y h=4 slow_hot
)";

TEST(StatusTableTest, ABlockARun) {
  EXPECT_EQ(StatusTable(ViewOfThree(), kNoColour), kThree);
  EXPECT_EQ(Plain(StatusTable(ViewOfThree(), kColour)), kThree);
}

TEST(StatusTableTest, ARunThatFellSilent) {
  StoreView view = ViewOfThree();
  view.runs = {view.runs[2]};
  view.now += 5 * kMinute;
  EXPECT_NE(StatusTable(view, kNoColour)
                .find("  last sign of life 2026-03-01 21:29:52 UTC, 5 min 10 s "
                      "ago\n"),
            std::string::npos);
}

TEST(StatusTableTest, AStoppedRunSaysHowToGoOn) {
  struct Case {
    const char* store;
    const char* word;
  };
  constexpr Case kCases[] = {
      {"runs.db", "--store runs.db\n"},
      {"/data/all-nodes/runs_2.db", "--store /data/all-nodes/runs_2.db\n"},
      {"my runs.db", "--store 'my runs.db'\n"},
      {"it's $HOME.db", "--store 'it'\\''s $HOME.db'\n"},
  };
  for (const Case& tried : kCases) {
    StoreView view = ViewOfThree();
    view.runs = {view.runs[2]};
    view.locked = false;
    view.store = tried.store;
    const std::string table = StatusTable(view, kNoColour);
    EXPECT_TRUE(table.ends_with(tried.word)) << table;
    // How fast it was, but not when it would end.
    EXPECT_NE(table.find("\n  2.0/s\n"), std::string::npos) << table;
  }
}

TEST(StatusTableTest, AStoreWithoutRuns) {
  StoreView view;
  view.store = "new.db";
  EXPECT_EQ(StatusTable(view, kNoColour), "new.db: no runs\n");
}

TEST(StatusTableTest, FitsTheTerminal) {
  StoreView view = ViewOfThree();
  view.store = std::string(150, 's') + ".db";
  view.runs[1].info.plan =
      R"({"title": ")" + std::string(120, 't') + " \\u001b[31m" + "\"}";
  view.runs[2].progress->current = std::string(300, 'c');
  const std::string table = StatusTable(view, kNoColour);
  ExpectFits(table);
  EXPECT_EQ(table.find('\x1b'), std::string::npos);
}

TEST(StatusTableTest, JsonSaysTheSame) {
  using nlohmann::json;
  const json status = StatusToJson(ViewOfThree());
  EXPECT_EQ(status["format"], "gatedyno-status/1");
  EXPECT_EQ(status["store"], "library.db");
  ASSERT_EQ(status["runs"].size(), 3U);
  EXPECT_EQ(status["runs"][2], json::parse(R"({
              "run": 3,
              "title": "whole library, all corners",
              "state": "running",
              "node": "p45",
              "program": "gatedyno 0.1.0",
              "simulator": "simulator 1",
              "started": "2026-03-01T20:30:02Z",
              "session_started": "2026-03-01T21:20:02Z",
              "progressed": "2026-03-01T21:29:52Z",
              "finished": null,
              "progress": {
                "jobs": {"wanted": 4000, "reused": 1000, "simulated": 1180,
                         "failed": 3},
                "expected_jobs": 5600, "arcs_ended": 34, "arcs": 240,
                "current": "nand2 a->y h=4 slow_hot"},
              "jobs_per_s": 2.0,
              "left_s": 1700.0})"));
  EXPECT_EQ(status["runs"][0]["finished"], "2026-03-01T11:50:02Z");
  EXPECT_EQ(status["runs"][1]["state"], "stopped");
  EXPECT_TRUE(status["runs"][1]["progress"].is_null());
  EXPECT_TRUE(status["runs"][1]["jobs_per_s"].is_null());
}

}  // namespace
}  // namespace gatedyno
