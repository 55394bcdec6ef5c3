// Another process holds the store, longer than SQLite is told to wait.

#include <chrono>
#include <thread>

#include <SQLiteCpp/SQLiteCpp.h>
#include <gtest/gtest.h>

#include "tests/faults/night.h"

namespace gatedyno {
namespace {

TEST(LockedTest, TheNightWaitsForTheStore) {
  constexpr std::chrono::seconds kHeld(7);  // The busy timeout is 5 s.
  const TemporaryFolder folder;
  const auto store = folder.path() / "night.db";
  Night night(store);
  std::this_thread::sleep_for(std::chrono::milliseconds(700));
  {
    SQLite::Database other(store.string(), SQLite::OPEN_READWRITE, 5000);
    const SQLite::Transaction held(other,
                                   SQLite::TransactionBehavior::IMMEDIATE);
    std::this_thread::sleep_for(kHeld);
    EXPECT_TRUE(night.running());
  }
  EXPECT_LE(night.Wait(), 1) << night.Words();
  EXPECT_EQ(PointsIn(store), Undisturbed());
}

}  // namespace
}  // namespace gatedyno
