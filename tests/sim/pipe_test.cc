#include "harness/sim/pipe.h"

#include <string>

#include <fcntl.h>
#include <gtest/gtest.h>

#include "harness/sim/sigpipe_guard.h"

namespace gatedyno {
namespace {

TEST(PipeTest, BothEndsAreKeptFromOtherChildren) {
  const Result<Pipe> pipe = MakePipe();
  ASSERT_TRUE(pipe.ok());
  for (const Descriptor* end : {&pipe->read_end, &pipe->write_end}) {
    EXPECT_GE(end->get(), 3);
    EXPECT_TRUE(::fcntl(end->get(), F_GETFD) & FD_CLOEXEC);
  }
}

TEST(PipeTest, MovesWhatFitsAndSaysWhenTheOtherEndIsGone) {
  Result<Pipe> pipe = MakePipe();
  ASSERT_TRUE(pipe.ok());
  ASSERT_TRUE(SetNonBlocking(pipe->read_end).ok());
  ASSERT_TRUE(SetNonBlocking(pipe->write_end).ok());

  std::string received;
  EXPECT_EQ(ReadAvailable(pipe->read_end, &received), PipeState::kOpen);
  EXPECT_EQ(received, "");

  const std::string sent(1'000'000, 'x');  // More than a pipe holds.
  std::string queued = sent;
  while (!queued.empty()) {
    ASSERT_EQ(WriteAvailable(pipe->write_end, &queued), PipeState::kOpen);
    ASSERT_EQ(ReadAvailable(pipe->read_end, &received), PipeState::kOpen);
  }
  EXPECT_EQ(received, sent);

  pipe->write_end.Close();
  EXPECT_EQ(ReadAvailable(pipe->read_end, &received), PipeState::kEnded);
}

TEST(PipeTest, WritingToNobodyEndsThePipeAndNotTheProgram) {
  const SigpipeGuard guard;
  Result<Pipe> pipe = MakePipe();
  ASSERT_TRUE(pipe.ok());
  ASSERT_TRUE(SetNonBlocking(pipe->write_end).ok());
  pipe->read_end.Close();
  std::string queued = "text";
  EXPECT_EQ(WriteAvailable(pipe->write_end, &queued), PipeState::kEnded);
  EXPECT_EQ(queued, "text");
}

}  // namespace
}  // namespace gatedyno
