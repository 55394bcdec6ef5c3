// Texts we emit, held against files of tests/golden/.
//
// Re-approve after a change that is meant:
//   GATEDYNO_APPROVE=1 ctest --preset dev -R Golden; git diff tests/golden

#ifndef GATEDYNO_TESTS_SUPPORT_GOLDEN_H_
#define GATEDYNO_TESTS_SUPPORT_GOLDEN_H_

#include <cstdlib>
#include <filesystem>
#include <string>

#include <gtest/gtest.h>

#include "harness/base/file.h"

namespace gatedyno {

// Replaces every `from` by `to`: what differs from machine to machine.
inline std::string Masked(std::string text,
                          const std::string& from,
                          const std::string& to) {
  for (size_t at = text.find(from); at != std::string::npos;
       at = text.find(from, at + to.size())) {
    text.replace(at, from.size(), to);
  }
  return text;
}

inline void ExpectGolden(const std::string& name, const std::string& text) {
  const std::filesystem::path file =
      std::filesystem::path(GATEDYNO_SOURCE_DIR) / "tests/golden" / name;
  // Nothing else of a test program changes the environment.
  if (std::getenv("GATEDYNO_APPROVE") != nullptr) {  // NOLINT(concurrency-*)
    const Status written = WriteFile(file, text);
    ASSERT_TRUE(written.ok()) << written.error().message;
    return;
  }
  const Result<std::string> golden = ReadFile(file);
  ASSERT_TRUE(golden.ok()) << golden.error().message;
  EXPECT_EQ(text, *golden) << "differs from " << file;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_GOLDEN_H_
