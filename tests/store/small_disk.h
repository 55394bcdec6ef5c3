// Work in a child process, and a small disk of the child's own.

#ifndef GATEDYNO_TESTS_STORE_SMALL_DISK_H_
#define GATEDYNO_TESTS_STORE_SMALL_DISK_H_

#include <filesystem>
#include <string>

#include <gtest/gtest.h>
#include <sched.h>
#include <sys/mount.h>
#include <sys/wait.h>
#include <unistd.h>

namespace gatedyno {

// How the child ends when the system does not let it have a disk, as it does
// only the superuser.
inline constexpr int kNoDiskHere = 99;

// What `work` returned in the child: what limits its files, or mounts disks,
// concerns a whole process.
inline int ExitOf(int (*work)(const std::filesystem::path& path),
                  const std::filesystem::path& path) {
  const pid_t child = ::fork();
  if (child == 0) {
    ::_exit(work(path));
  }
  int status = 0;
  EXPECT_EQ(::waitpid(child, &status, 0), child);
  EXPECT_TRUE(WIFEXITED(status));
  return WEXITSTATUS(status);
}

// Gone with the process; no other sees it.
inline bool MountDisk(const std::filesystem::path& folder,
                      const char* options) {
  return ::unshare(CLONE_NEWNS) == 0 &&
         ::mount(nullptr, "/", nullptr, MS_REC | MS_PRIVATE, nullptr) == 0 &&
         ::mount("tmpfs", folder.c_str(), "tmpfs", 0, options) == 0;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_STORE_SMALL_DISK_H_
