#include "harness/sim/worker_process.h"

#include <string>

#include <gtest/gtest.h>
#include <poll.h>

#include "harness/sim/protocol.h"
#include "harness/sim/sigpipe_guard.h"
#include "tests/support/leftovers.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

constexpr std::chrono::milliseconds kGrace(2000);

// Waits until the worker's next text or the end of its output.
std::string Await(WorkerProcess* worker) {
  while (true) {
    const Result<std::optional<std::string>> text = worker->Receive();
    if (!text.ok()) {
      return text.error().message;
    }
    if (text->has_value()) {
      return **text;
    }
    if (worker->output_ended()) {
      return "(end)";
    }
    std::vector<pollfd> watched;
    worker->AppendWatched(&watched);
    ::poll(watched.data(), watched.size(), -1);
    worker->Exchange();
  }
}

class WorkerProcessTest : public testing::Test {
 protected:
  void TearDown() override {
    EXPECT_FALSE(HasChildren());
    EXPECT_EQ(OpenDescriptors(), descriptors_before_);
  }

  // A program that is this shell script.
  std::unique_ptr<WorkerProcess> StartScript(std::string_view body) {
    auto worker = WorkerProcess::Start(folder_.WriteScript("w", body), {"arg"});
    EXPECT_TRUE(worker.ok());
    return std::move(*worker);
  }

  long descriptors_before_ = OpenDescriptors();
  SigpipeGuard guard_;
  TemporaryFolder folder_;
};

TEST_F(WorkerProcessTest, PassesFramesBothWays) {
  auto worker = StartScript("exec cat");
  const std::string large(300'000, 'x');  // More than two pipes hold.
  worker->Send("first");
  worker->Send(large);
  EXPECT_EQ(Await(worker.get()), "first");
  EXPECT_EQ(Await(worker.get()), large);
  worker->CloseInput();
  EXPECT_EQ(Await(worker.get()), "(end)");
  EXPECT_EQ(worker->Finish(kGrace).words, "left with exit code 0");
}

struct EndRow {
  std::string script;
  std::string end;
};

TEST_F(WorkerProcessTest, SaysHowItEnded) {
  const EndRow rows[] = {
      {"exit 3", "left with exit code 3"},
      {"echo no licence >&2; exit 1", "left with exit code 1: no licence"},
      {"kill -SEGV $$", "was killed by SIGSEGV"},
      {"printf 'a\\n\\nb\\n' >&2; kill -ABRT $$",
       "was killed by SIGABRT: a; b"},
      {"echo \"$1\" >&2", "left with exit code 0: arg"},
  };
  for (const EndRow& row : rows) {
    auto worker = StartScript(row.script);
    EXPECT_EQ(Await(worker.get()), "(end)");
    EXPECT_EQ(worker->Finish(kGrace).words, row.end);
    EXPECT_EQ(worker->Finish(kGrace).words, row.end);
  }
}

TEST_F(WorkerProcessTest, KillsWhatDoesNotLeave) {
  auto worker = StartScript("exec sleep 1000");
  EXPECT_EQ(worker->Finish(std::chrono::milliseconds(20)).words,
            "was killed by SIGKILL");
}

TEST_F(WorkerProcessTest, OneThatIsDroppedIsKilledAndReaped) {
  StartScript("exec sleep 1000");
}

TEST_F(WorkerProcessTest, KeepsTheEndOfALongComplaint) {
  auto worker = StartScript(
      "i=0; while [ $i -lt 20000 ]; do echo line $i >&2; i=$((i+1)); done");
  const std::string end = worker->Finish(std::chrono::seconds(20)).words;
  EXPECT_TRUE(end.starts_with("left with exit code 0: ")) << end;
  EXPECT_TRUE(end.ends_with("line 19998; line 19999")) << end;
  EXPECT_LT(end.size(), 1500U);
}

TEST_F(WorkerProcessTest, SaysThatAFrameWasCutShort) {
  auto worker = StartScript("printf '\\005\\000\\000\\000ab'");
  EXPECT_EQ(Await(worker.get()),
            "the stream ended after 2 of a frame's 5 bytes");
}

TEST_F(WorkerProcessTest, WritingToOneThatStoppedReadingHarmsNobody) {
  auto worker = StartScript("exec <&-; sleep 0.05; exit 4");
  worker->Send(std::string(300'000, 'x'));
  EXPECT_EQ(Await(worker.get()), "(end)");
  EXPECT_EQ(worker->Finish(kGrace).words, "left with exit code 4");
}

// The descriptors a fresh worker holds, as a list.
std::string DescriptorsOf(WorkerProcess* worker) {
  EXPECT_EQ(Await(worker), "(end)");
  return worker->Finish(kGrace).words;
}

TEST_F(WorkerProcessTest, InheritsNothingOfAnotherWorker) {
  const std::string_view list = "ls /proc/self/fd >&2";
  const std::string alone = DescriptorsOf(StartScript(list).get());
  const auto other = StartScript("exec sleep 1000");
  EXPECT_EQ(DescriptorsOf(StartScript(list).get()), alone);
}

struct RefusedRow {
  std::string name;
  std::string reason;
};

TEST_F(WorkerProcessTest, NamesAProgramThatCannotBeExecuted) {
  folder_.Write("not_executable", "text");
  const auto no_format = folder_.Write("no_format", "\x7f not a program");
  std::filesystem::permissions(no_format, std::filesystem::perms::owner_all);
  const RefusedRow rows[] = {
      {"missing", "No such file or directory"},
      {"not_executable", "Permission denied"},
      {"no_format", "Exec format error"},
  };
  for (const RefusedRow& row : rows) {
    const std::string program = (folder_.path() / row.name).string();
    const auto worker = WorkerProcess::Start(program, {});
    ASSERT_FALSE(worker.ok());
    EXPECT_EQ(worker.error().kind, ErrorKind::kUnavailable);
    EXPECT_EQ(worker.error().message,
              program + ": cannot be started: " + row.reason);
    EXPECT_FALSE(HasChildren());
  }
}

}  // namespace
}  // namespace gatedyno
