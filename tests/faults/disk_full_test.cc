// The disk is full in the middle of the night; in the morning there is room.

#include <cerrno>
#include <cstring>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <sys/mount.h>

#include "tests/faults/night.h"

namespace gatedyno {
namespace {

using testing::HasSubstr;

// A small disk of its own, where this process may mount one.
class SmallDisk {
 public:
  SmallDisk(const std::filesystem::path& folder, const char* size)
      : folder_(folder),
        mounted_(::mount("tmpfs",
                         folder.c_str(),
                         "tmpfs",
                         0,
                         (std::string("size=") + size).c_str()) == 0) {}
  ~SmallDisk() {
    if (mounted_) {
      ::umount2(folder_.c_str(), MNT_DETACH);
    }
  }
  SmallDisk(const SmallDisk&) = delete;
  SmallDisk& operator=(const SmallDisk&) = delete;

  bool mounted() const { return mounted_; }
  bool Grow(const char* size) {
    return ::mount("tmpfs",
                   folder_.c_str(),
                   "tmpfs",
                   MS_REMOUNT,
                   (std::string("size=") + size).c_str()) == 0;
  }

 private:
  std::filesystem::path folder_;
  bool mounted_;
};

TEST(DiskFullTest, EndsInWordsAndGoesOnWhenThereIsRoom) {
  constexpr int kOwnFault = 4;
  const TemporaryFolder folder;
  SmallDisk disk(folder.path(), "900k");
  if (!disk.mounted()) {
    GTEST_SKIP() << "mounting a small disk takes root: "
                 << std::strerror(errno);
  }
  const auto store = folder.path() / "night.db";
  {
    Night night(store);
    EXPECT_EQ(night.Wait(), kOwnFault);
    EXPECT_THAT(night.Words(), HasSubstr("night.db: "));
    EXPECT_THAT(night.Words(), HasSubstr("no room left to write"));
  }
  ASSERT_TRUE(disk.Grow("60m"));
  const Points kept = PointsIn(store);
  EXPECT_GT(kept.size(), 20U);
  EXPECT_LT(kept.size(), Undisturbed().size());
  Night second(store);
  EXPECT_LE(second.Wait(), 1) << second.Words();
  EXPECT_EQ(PointsIn(store), Undisturbed());
}

}  // namespace
}  // namespace gatedyno
