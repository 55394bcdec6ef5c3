#include "harness/fit/coverage.h"

#include <gsl/gsl_cdf.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// JCGM 100:2008, table G.2, column 95.45 %; from memory, and confirmed by GSL
// below.
TEST(CoverageTest, IsTheGuidesTable) {
  struct Row {
    int freedom;
    double factor;
  };
  constexpr Row kTable[] = {{1, 13.97},
                            {2, 4.53},
                            {3, 3.31},
                            {4, 2.87},
                            {5, 2.65},
                            {6, 2.52},
                            {8, 2.37},
                            {10, 2.28},
                            {20, 2.13},
                            {50, 2.05},
                            {100, 2.025}};
  constexpr double kPrinted = 0.0051;  // Two decimals, the last row three.
  for (const Row& row : kTable) {
    EXPECT_NEAR(CoverageFactor(row.freedom), row.factor, kPrinted)
        << row.freedom;
  }
}

TEST(CoverageTest, AgreesWithGsl) {
  const double upper_tail = gsl_cdf_ugaussian_Q(2.0);
  for (const int freedom : {1, 2, 3, 7, 40, 1000}) {
    EXPECT_NEAR(
        CoverageFactor(freedom), gsl_cdf_tdist_Qinv(upper_tail, freedom), 1e-8)
        << freedom;
  }
}

}  // namespace
}  // namespace gatedyno
