// The independent way of running a deck reports what went wrong: a card test
// must not pass because the simulator measured nothing.

#include "tests/support/ngspice_batch.h"

#include <filesystem>
#include <string>
#include <system_error>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using testing::HasSubstr;

TEST(RunBatch, ReturnsEveryMeasureInLowerCase) {
  const auto measures = RunBatch(
      "* divider\nv1 a 0 0\nr1 a b 1k\nr2 b 0 3k\n.options num_threads=1\n"
      ".dc v1 0 2 0.5\n.meas dc Mid find v(b) at=1\n"
      ".meas dc at_half when v(b)=0.75\n.end\n");
  ASSERT_TRUE(measures.ok()) << measures.error().message;
  EXPECT_THAT(*measures,
              testing::UnorderedElementsAre(
                  testing::Pair("mid", testing::DoubleNear(0.75, 1e-9)),
                  testing::Pair("at_half", testing::DoubleNear(1.0, 1e-9))));
}

struct FailureCase {
  const char* what;
  const char* deck;
  const char* words;  // The simulator's, or ours.
};
constexpr FailureCase kFailures[] = {
    {"a failed measure",
     "* t\nv1 a 0 0\nr1 a 0 1k\n.dc v1 0 1 0.5\n"
     ".meas dc fine find i(v1) at=0.5\n.meas dc never when v(a)=7\n.end\n",
     "never"},
    {"an unknown model",
     "* t\nv1 a 0 1\nm1 a a 0 0 nosuch w=1u l=1u\n.dc v1 0 1 0.5\n"
     ".meas dc on find i(v1) at=0.5\n.end\n",
     "nosuch"},
    {"a missing include",
     "* t\n.include \"/nonexistent/card.sp\"\nv1 a 0 1\nr1 a 0 1\n"
     ".dc v1 0 1 0.5\n.meas dc on find i(v1) at=0.5\n.end\n",
     "/nonexistent/card.sp"},
    {"nothing measured",
     "* t\nv1 a 0 1\nr1 a 0 1\n.dc v1 0 1 0.5\n.print dc v(a)\n.end\n",
     "no .meas result"},
};

// The log a failure names and the deck beside it.
void RemoveKeptFiles(const std::string& message) {
  std::filesystem::path kept = message.substr(0, message.find(": "));
  std::error_code ignored;
  std::filesystem::remove(kept, ignored);
  std::filesystem::remove(kept.replace_extension(".sp"), ignored);
}

TEST(RunBatch, FailsWithTheSimulatorsWords) {
  for (const FailureCase& row : kFailures) {
    const auto measures = RunBatch(row.deck);
    ASSERT_FALSE(measures.ok()) << row.what;
    EXPECT_THAT(measures.error().message, HasSubstr(row.words)) << row.what;
    EXPECT_THAT(measures.error().message, HasSubstr(".log: ")) << row.what;
    RemoveKeptFiles(measures.error().message);
  }
}

}  // namespace
}  // namespace gatedyno
