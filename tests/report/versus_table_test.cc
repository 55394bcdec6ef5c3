#include "harness/report/versus_table.h"

#include <string>

#include <gtest/gtest.h>

#include "harness/report/wrap.h"
#include "tests/report/sample_versus.h"

namespace gatedyno {
namespace {

// B/A: tau 5 / 2, FO4 5 (4 + 1.25) / (2 (4 + 1)), p_inv 1.25.
TEST(VersusTableTest, SaysAllOfIt) {
  const SampleVersus sample;
  EXPECT_EQ(
      VersusTable(sample.view(), Style(false)),
      "A: gates of an interrupt arbiter; node p45, run 1 of first.db, begun "
      "2026-12-01T08:00:00Z\n"
      "B: gates of an interrupt arbiter; node p65, run 3 of second.db, begun "
      "2026-12-02T08:00:00Z\n"
      "Of A, not compared: corner slow_hot.\n"
      "\n"
      "corner typical\n"
      "                   A           B     B / A\n"
      "  tau       2.000 ps    5.000 ps     2.500\n"
      "  FO4       10.00 ps    26.25 ps     2.625\n"
      "  p_inv        1.000       1.250     1.250\n"
      "\n"
      "change of       arcs      mean   deviation   within 10 %\n"
      "  g                3    +6.7 %        12 %             2\n"
      "  p, in tau        3    +8.3 %        14 %             2\n"
      "  p, in p_inv      3     -13 %        12 %             1\n"
      "largest of g: nand2 a->y fall at typical: 1.500 in A, 1.800 in B, +20 % "
      "±2.8 % (by hand g 1.000,\n"
      "              1.250)\n"
      "              inv a->y fall at typical: 1.000 in A, 1.000 in B, +0.0 % "
      "±0.0 %\n"
      "              inv a->y rise at typical: 1.000 in A, 1.000 in B, +0.0 % "
      "±0.0 %\n"
      "largest of p: inv a->y fall at typical: 1.00 in A, 1.25 in B, +25 % "
      "±0.0 "
      "%\n"
      "              inv a->y rise at typical: 1.00 in A, 1.00 in B, +0.0 % "
      "±0.0 "
      "%\n"
      "              nand2 a->y fall at typical: 2.00 in A, 2.00 in B, +0.0 % "
      "±0.0 %\n"
      "\n"
      "g of 2 of 3 arcs agrees within 10 %: it changes by +6.7 % on average, "
      "standard deviation 12 %; 2\n"
      "  arcs changed by more than their uncertainty, and 2 verdicts differ.\n"
      "4 arcs in both: 2 changed, 1 alike, 1 not measured; 2 verdicts differ; "
      "only in A: 1 arc, only in B:\n"
      "  1 arc\n"
      "Predictive device models are not a foundry's. Release decisions belong "
      "to qualified models and to\n"
      "people. What changes from node to node, tau first of all, compares two "
      "predictive cards, not two\n"
      "factories.\n");
}

TEST(VersusTableTest, NoLineIsTooWide) {
  SampleVersus sample;
  const std::string name(150, 'w');
  for (RunResult* run : {&sample.a, &sample.b}) {
    run->facts.title = run->facts.node = name;
    run->calibrations[0].corner.name = name;
    for (Comparison& row : run->comparisons) {
      row.arc.cell = row.arc.pin = row.corner = name;
    }
  }
  sample.PairUp();
  const std::string text = VersusTable(sample.view(), Style(false));
  size_t from = 0;
  for (size_t to = text.find('\n'); to != std::string::npos;
       to = text.find('\n', from)) {
    EXPECT_LE(ColumnsOf(text.substr(from, to - from)), kColumns);
    from = to + 1;
  }
}

TEST(VersusTableTest, WithoutTau) {
  SampleVersus sample;
  sample.b.calibrations.clear();
  sample.PairUp();
  const std::string text = VersusTable(sample.view(), Style(false));
  EXPECT_NE(text.find("corner typical\n  without tau on both sides\n"),
            std::string::npos);
  EXPECT_NE(text.find("  p, in p_inv      0         -           -"),
            std::string::npos);
}

}  // namespace
}  // namespace gatedyno
