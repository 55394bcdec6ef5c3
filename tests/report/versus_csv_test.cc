#include "harness/report/versus_csv.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "tests/report/sample_versus.h"

namespace gatedyno {
namespace {

std::vector<std::string> Lines(const std::string& text) {
  std::vector<std::string> lines;
  size_t from = 0;
  for (size_t to = text.find("\r\n"); to != std::string::npos;
       to = text.find("\r\n", from)) {
    lines.push_back(text.substr(from, to - from));
    from = to + 2;
  }
  return lines;
}

TEST(VersusCsvTest, EveryArcOfBothAndOfEither) {
  SampleVersus sample;
  sample.b.comparisons[2].effort.u = 0.0;
  sample.PairUp();
  // Full digits: (1.8 - 1.5) / 1.5 in doubles is not quite 0.2.
  EXPECT_EQ(
      Lines(VersusCsv(sample.versus)),
      (std::vector<std::string>{
          "cell,pin,output,edge,side,corner_a,g_hand_a,g_a,g_u_a,p_hand_tau_a,"
          "p_a,p_u_a,verdict_a,corner_b,g_hand_b,g_b,g_u_b,p_hand_tau_b,p_b,"
          "p_u_b,verdict_b,g_change,g_change_expanded,p_change,"
          "p_change_expanded,finding",
          "inv,a,y,fall,b=1,typical,1,1,0,1,1,0,within,typical,1,1,0,1,1.25,0,"
          "within,0,0,0.25,0,changed",
          "inv,a,y,rise,b=1,typical,1,1,0,1,1,0,within,typical,1,1,0,1,1,0,"
          "within,0,0,0,0,alike",
          "nand2,a,y,fall,b=1,typical,1,1.5,0,1,2,0,within,typical,1.25,1.8,0,"
          "1,2,0,beyond,0.20000000000000004,0,0,0,changed",
          "nand2,a,y,rise,b=1,typical,1,1.5,0,1,2,0,within,typical,1,,,1,,,"
          "not measured,,,,,not measured",
          "nor2,a,y,fall,b=1,typical,1,1.5,0,1,2,0,within,,,,,,,,,,,,,only in "
          "A",
          "nor3,a,y,fall,b=1,,,,,,,,,typical,1,1.7,0,1,3,0,within,,,,,only in "
          "B"}));
}

}  // namespace
}  // namespace gatedyno
