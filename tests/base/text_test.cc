#include "harness/base/text.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(Text, LowersAsciiLettersOnly) {
  EXPECT_EQ(ToLower(""), "");
  EXPECT_EQ(ToLower("NMos_1 [A]@Z"), "nmos_1 [a]@z");
  EXPECT_EQ(ToLower("\xC3\x84"), "\xC3\x84");
}

TEST(Text, ComparesWithoutCase) {
  EXPECT_TRUE(EqualsIgnoringCase("", ""));
  EXPECT_TRUE(EqualsIgnoringCase("Vdd", "vDD"));
  EXPECT_FALSE(EqualsIgnoringCase("vdd", "vdda"));
  EXPECT_FALSE(EqualsIgnoringCase("vdd", "vss"));
  // One bit apart, as a letter and its other case are.
  EXPECT_FALSE(EqualsIgnoringCase("@", "`"));
}

}  // namespace
}  // namespace gatedyno
