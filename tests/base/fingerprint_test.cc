#include "harness/base/fingerprint.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// XXH3, 128 bits, of the empty input: the value that every implementation
// gives (from memory).
TEST(Fingerprint, IsXxh3) {
  EXPECT_EQ(Fingerprint(""), "99aa06d3014798d86001c324468d497f");
}

TEST(Fingerprint, TellsContentsApart) {
  EXPECT_EQ(Fingerprint("w=90n").size(), 32U);
  EXPECT_EQ(Fingerprint("w=90n"), Fingerprint("w=90n"));
  EXPECT_NE(Fingerprint("w=90n"), Fingerprint("w=91n"));
  EXPECT_NE(Fingerprint("w=90n"), Fingerprint("w=90n\n"));
}

}  // namespace
}  // namespace gatedyno
