#include "harness/base/file.h"

#include <filesystem>
#include <iterator>
#include <string>

#include <gtest/gtest.h>

#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

TEST(File, ReadsWhatItWrote) {
  TemporaryFolder folder;
  const std::filesystem::path path = folder.path() / "new/folder/file.txt";
  const std::string text("a\r\nb\0c", 6);
  ASSERT_TRUE(WriteFile(path, text).ok());
  const Result<std::string> read = ReadFile(path);
  ASSERT_TRUE(read.ok()) << read.error().message;
  EXPECT_EQ(*read, text);
}

TEST(File, ReplacesTheWholeAndLeavesNothingAside) {
  TemporaryFolder folder;
  const std::filesystem::path path = folder.path() / "file.txt";
  ASSERT_TRUE(WriteFile(path, "a longer text").ok());
  ASSERT_TRUE(WriteFile(path, "short").ok());
  EXPECT_EQ(*ReadFile(path), "short");
  const std::filesystem::directory_iterator entries(folder.path());
  EXPECT_EQ(std::distance(begin(entries), end(entries)), 1);
}

TEST(File, NamesTheFileItCannotRead) {
  TemporaryFolder folder;
  const std::string missing = (folder.path() / "missing").string();
  const Result<std::string> read = ReadFile(missing);
  ASSERT_FALSE(read.ok());
  EXPECT_EQ(read.error().kind, ErrorKind::kBadInput);
  EXPECT_EQ(read.error().message,
            missing + ": cannot be read: No such file or directory");
}

TEST(File, SaysThatAFolderIsNoFile) {
  TemporaryFolder folder;
  const Result<std::string> read = ReadFile(folder.path());
  ASSERT_FALSE(read.ok());
  EXPECT_EQ(read.error().message,
            folder.path().string() + ": is a folder, not a file");
}

TEST(File, NamesTheFileItCannotWrite) {
  TemporaryFolder folder;
  const std::filesystem::path file = folder.Write("file.txt", "text");
  const std::string below = (file / "below").string();
  const Status written = WriteFile(below, "text");
  ASSERT_FALSE(written.ok());
  EXPECT_EQ(written.error().kind, ErrorKind::kUnavailable);
  EXPECT_EQ(written.error().message,
            below + ": cannot be written: Not a directory");
}

// A folder in the way: the file aside was written and must go again.
TEST(File, CleansUpWhenItCannotRename) {
  TemporaryFolder folder;
  const std::filesystem::path taken = folder.path() / "taken";
  std::filesystem::create_directory(taken);
  const Status written = WriteFile(taken, "text");
  ASSERT_FALSE(written.ok());
  EXPECT_EQ(written.error().message,
            taken.string() + ": cannot be written: Is a directory");
  const std::filesystem::directory_iterator entries(folder.path());
  EXPECT_EQ(std::distance(begin(entries), end(entries)), 1);
}

}  // namespace
}  // namespace gatedyno
