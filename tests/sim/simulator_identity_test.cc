#include "harness/sim/simulator_identity.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/support/leftovers.h"

namespace gatedyno {
namespace {

// Failures are in worker_pool_test.cc, beside the pool's own.
TEST(SimulatorIdentityTest, IsWhatTheWorkerSaysInItsHello) {
  const long descriptors = OpenDescriptors();
  const Result<Hello> hello = AskWorker(FAKE_WORKER);
  ASSERT_TRUE(hello.ok()) << hello.error().message;
  EXPECT_EQ(hello->worker, "fake");
  const Result<std::string> identity = SimulatorIdentity(FAKE_WORKER);
  ASSERT_TRUE(identity.ok()) << identity.error().message;
  EXPECT_EQ(*identity, "none");
  EXPECT_FALSE(HasChildren());
  EXPECT_EQ(OpenDescriptors(), descriptors);
}

TEST(SimulatorIdentityTest, NamesAProgramThatDoesNotExist) {
  const Result<std::string> identity = SimulatorIdentity("/nowhere/worker");
  ASSERT_FALSE(identity.ok());
  EXPECT_EQ(identity.error().message,
            "/nowhere/worker: cannot be started: No such file or directory");
}

}  // namespace
}  // namespace gatedyno
