#include "harness/report/style.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/report/terminal_text.h"

namespace gatedyno {
namespace {

constexpr Verdict kVerdicts[] = {
    Verdict::kWithin, Verdict::kBeyond, Verdict::kNotMeasured};

TEST(StyleTest, LeavesTextAsItIsUnlessAsked) {
  const Style style(false);
  EXPECT_EQ(style.Heading("x"), "x");
  EXPECT_EQ(style.Quiet("x"), "x");
  for (const Verdict verdict : kVerdicts) {
    EXPECT_EQ(style.OfVerdict(verdict, "x"), "x");
  }
}

TEST(StyleTest, EndsEveryEmphasisItBegins) {
  const Style style(true);
  for (const std::string& text :
       {style.Heading("x"),
        style.Quiet("x"),
        style.OfVerdict(Verdict::kWithin, "x"),
        style.OfVerdict(Verdict::kBeyond, "x"),
        style.OfVerdict(Verdict::kNotMeasured, "x")}) {
    EXPECT_EQ(text.front(), '\x1b');
    EXPECT_TRUE(text.ends_with("x\x1b[0m")) << Plain(text);
    EXPECT_EQ(Plain(text), "x");
  }
}

TEST(StyleTest, VerdictsAreToldApart) {
  const Style style(true);
  EXPECT_NE(style.OfVerdict(Verdict::kWithin, "x"),
            style.OfVerdict(Verdict::kBeyond, "x"));
  EXPECT_NE(style.OfVerdict(Verdict::kBeyond, "x"),
            style.OfVerdict(Verdict::kNotMeasured, "x"));
}

}  // namespace
}  // namespace gatedyno
