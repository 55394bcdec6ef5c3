#include "harness/farm/share_file.h"

#include <fstream>

#include <gtest/gtest.h>

#include "harness/sim/protocol.h"
#include "tests/farm/farm_bench.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

TEST(ShareFileTest, GivesBackTheJobs) {
  const TemporaryFolder folder;
  const std::filesystem::path path = folder.path() / "share-0.jobs";
  std::vector<Job> jobs = DeedJobs(3);
  jobs[1].deck += "\n\"quoted\"\n\ttabbed\n";
  jobs[2].stop_s = 1.0 / 3.0e9;
  jobs[2].settings = {".options a\n", ".options b\n"};
  Result<ShareWriter> writer = ShareWriter::Create(path);
  ASSERT_TRUE(writer.ok());
  for (const Job& job : jobs) {
    writer->Add(*JobText(job));
  }
  ASSERT_TRUE(writer->Close().ok());
  Result<ShareReader> reader = ShareReader::Open(path);
  ASSERT_TRUE(reader.ok());
  for (const Job& job : jobs) {
    const auto read = reader->Next();
    ASSERT_TRUE(read.ok() && read->has_value());
    EXPECT_EQ(**read, job);
  }
  const auto end = reader->Next();
  ASSERT_TRUE(end.ok());
  EXPECT_FALSE(end->has_value());
}

TEST(ShareFileTest, NamesFileAndLineOfWhatIsNoJob) {
  TemporaryFolder folder;
  const std::filesystem::path path =
      folder.Write("share-0.jobs", *JobText(DeedJob("echo", 0)) + "\n{oops\n");
  Result<ShareReader> reader = ShareReader::Open(path);
  ASSERT_TRUE(reader.ok());
  EXPECT_TRUE(reader->Next().ok());
  const auto bad = reader->Next();
  ASSERT_FALSE(bad.ok());
  EXPECT_EQ(bad.error().message, path.string() + ":2: not a job: '{oops'");
}

TEST(ShareFileTest, NamesAFileThatCannotBeUsed) {
  const auto writer = ShareWriter::Create("/nowhere/share-0.jobs");
  ASSERT_FALSE(writer.ok());
  EXPECT_EQ(writer.error().message,
            "/nowhere/share-0.jobs: cannot be written: No such file or "
            "directory");
  const auto reader = ShareReader::Open("/nowhere/share-0.jobs");
  ASSERT_FALSE(reader.ok());
  EXPECT_EQ(reader.error().message,
            "/nowhere/share-0.jobs: cannot be read: No such file or "
            "directory");
  Result<ShareWriter> full = ShareWriter::Create("/dev/full");
  ASSERT_TRUE(full.ok());
  full->Add("{}");
  const Status closed = full->Close();
  ASSERT_FALSE(closed.ok());
  EXPECT_EQ(closed.error().message,
            "/dev/full: cannot be written: No space left on device");
}

}  // namespace
}  // namespace gatedyno
