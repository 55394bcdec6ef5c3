// A deck that never converges costs its own point and no other, and can be
// looked at in the morning.

#include <string>
#include <vector>

#include <boost/process.hpp>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/deck/sim_settings.h"
#include "harness/flow/work_desk.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

namespace bp = boost::process;
using testing::HasSubstr;

Job RcJob(double resistance_ohm) {
  Job job;
  job.key = "rc" + std::to_string(resistance_ohm);
  job.label = "rc";
  job.deck = "* rc\nv1 in 0 pulse(0 1 1n 1f 1f 1 2)\nr1 in out " +
             std::to_string(resistance_ohm) +
             "\nc1 out 0 1p\n.tran 50p 12n 0 50p\n.end\n";
  job.settings = SettingsLadder(RungFor(kDefaultAccuracy));
  job.intervals = {
      {"half", {"in", 0.5, Edge::kRise, 1}, {"out", 0.5, Edge::kRise, 1}}};
  job.stop_s = 12e-9;
  return job;
}

// A voltage that is 1 exactly when it is not: no operating point, and no step
// small enough.
Job HopelessJob() {
  Job job = RcJob(1000);
  job.key = "feed";
  job.label = "contradiction";
  job.deck.insert(job.deck.find(".tran"), "b1 x 0 v = v(x) > 0.5 ? 0 : 1\n");
  return job;
}

std::map<std::string, Outcome> Simulate(const std::vector<Job>& jobs,
                                        const std::filesystem::path& file) {
  PoolOptions options;
  options.worker_program = GATEDYNO_BIN_DIR "/gatedyno-worker";
  Result<WorkerPool> pool = WorkerPool::Make(options);
  EXPECT_TRUE(pool.ok());
  Result<Store> store = Store::Open(file);
  EXPECT_TRUE(store.ok()) << store.error().message;
  WorkDesk desk(&*pool, &*store, {});
  std::map<std::string, Outcome> outcomes;
  for (const Job& job : jobs) {
    desk.Ask(job, [&outcomes, key = job.key](const Outcome& outcome) {
      outcomes[key] = outcome;
    });
  }
  const Status done = desk.Work([] { return false; });
  EXPECT_TRUE(done.ok()) << done.error().message;
  return outcomes;
}

TEST(BadDeckTest, CostsItsOwnPointOnly) {
  const TemporaryFolder folder;
  std::vector<Job> good;
  for (int i = 1; i <= 20; ++i) {
    good.push_back(RcJob(100.0 * i));
  }
  const auto quiet = Simulate(good, folder.path() / "quiet.db");
  std::vector<Job> all = good;
  all.insert(all.begin() + 7, HopelessJob());
  const auto disturbed = Simulate(all, folder.path() / "night.db");
  for (const auto& [key, outcome] : quiet) {
    EXPECT_TRUE(outcome.measured());
    EXPECT_EQ(disturbed.at(key).values_s, outcome.values_s) << key;
  }
  const Outcome& hopeless = disturbed.at("feed");
  EXPECT_EQ(hopeless.ending, Ending::kFailed);
  EXPECT_THAT(hopeless.message, HasSubstr("imestep too small"));
  EXPECT_EQ(hopeless.rung, 2);  // The last: all were tried.

  // By a part of its key; in words, and as a deck for any simulator.
  bp::ipstream out;
  EXPECT_EQ(bp::system(GATEDYNO_BIN_DIR "/gatedyno",
                       "replay",
                       "fee",
                       "--store",
                       (folder.path() / "night.db").string(),
                       bp::std_out > out),
            3);
  const std::string text(std::istreambuf_iterator<char>(out), {});
  EXPECT_THAT(text, HasSubstr("contradiction"));
  EXPECT_THAT(text, HasSubstr("imestep too small"));
}

}  // namespace
}  // namespace gatedyno
