// From a standard uncertainty u to an interval to rely on, U = k u.
//
// k is the two-sided Student's t quantile for 95.45 %, the probability within
// two sigma of a normal distribution, so k falls to 2 as the points grow:
//
//   points of a line   3      4     5     6     7     12    many
//   k                  13.97  4.53  3.31  2.87  2.65  2.28  2.00
//
// Source: the Guide to the expression of uncertainty in measurement (JCGM
// 100:2008), G.3 and table G.2.

#ifndef GATEDYNO_FIT_COVERAGE_H_
#define GATEDYNO_FIT_COVERAGE_H_

namespace gatedyno {

// REQUIRES: degrees_of_freedom >= 1.  A line through n points has n - 2.
double CoverageFactor(int degrees_of_freedom);

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_COVERAGE_H_
