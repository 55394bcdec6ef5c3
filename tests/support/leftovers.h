// What a test must not leave behind: open files and children.

#ifndef GATEDYNO_TESTS_SUPPORT_LEFTOVERS_H_
#define GATEDYNO_TESTS_SUPPORT_LEFTOVERS_H_

#include <cerrno>
#include <filesystem>
#include <iterator>

#include <sys/wait.h>

namespace gatedyno {

// The one that lists them is not counted twice: it is open in every call.
inline long OpenDescriptors() {
  const std::filesystem::directory_iterator open("/proc/self/fd");
  return std::distance(begin(open), end(open));
}

// Children that run, or that nobody reaped.
inline bool HasChildren() {
  siginfo_t info = {};
  return ::waitid(P_ALL, 0, &info, WEXITED | WNOHANG | WNOWAIT) == 0;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_LEFTOVERS_H_
