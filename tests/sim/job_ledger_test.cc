#include "harness/sim/job_ledger.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

std::vector<size_t> TakeAll(JobLedger* ledger) {
  std::vector<size_t> jobs;
  while (const auto job = ledger->Take()) {
    jobs.push_back(*job);
  }
  return jobs;
}

TEST(JobLedgerTest, GivesJobsInOrder) {
  JobLedger ledger(3, 1);
  EXPECT_EQ(ledger.waiting(), 3U);
  EXPECT_EQ(TakeAll(&ledger), (std::vector<size_t>{0, 1, 2}));
  EXPECT_EQ(ledger.waiting(), 0U);
  EXPECT_EQ(ledger.unended(), 3U);
  ledger.MarkEnded();
  EXPECT_EQ(ledger.unended(), 2U);
}

TEST(JobLedgerTest, RunsUnstartedJobsNext) {
  JobLedger ledger(4, 1);
  ledger.Take();
  ledger.Take();
  ledger.Take();
  const size_t unstarted[] = {1, 2};
  ledger.GiveBack(unstarted);
  EXPECT_EQ(TakeAll(&ledger), (std::vector<size_t>{1, 2, 3}));
}

TEST(JobLedgerTest, SetsAJobAsideAtTheLastDeathAllowed) {
  JobLedger ledger(3, 3);
  ledger.Take();
  EXPECT_FALSE(ledger.Blame(0));
  // Blamed jobs wait behind those that did no harm.
  EXPECT_EQ(TakeAll(&ledger), (std::vector<size_t>{1, 2, 0}));
  EXPECT_FALSE(ledger.Blame(0));
  EXPECT_FALSE(ledger.Blame(1));
  EXPECT_TRUE(ledger.Blame(0));
  EXPECT_EQ(TakeAll(&ledger), (std::vector<size_t>{0, 1}));
}

TEST(JobLedgerTest, AnEmptyRunIsOver) {
  JobLedger ledger(0, 1);
  EXPECT_EQ(ledger.unended(), 0U);
  EXPECT_FALSE(ledger.Take().has_value());
}

}  // namespace
}  // namespace gatedyno
