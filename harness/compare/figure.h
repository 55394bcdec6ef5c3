// One of the two figures of an arc, g or p, hand and measured.

#ifndef GATEDYNO_COMPARE_FIGURE_H_
#define GATEDYNO_COMPARE_FIGURE_H_

#include <optional>
#include <string>

#include "harness/record/comparison.h"
#include "harness/record/quantity.h"

namespace gatedyno {

inline constexpr Quantity kQuantities[] = {Quantity::kEffort,
                                           Quantity::kParasitic};

struct Figure {
  Quantity quantity = Quantity::kEffort;
  double hand = 0.0;  // p in tau.
  Measured measured;
  double difference = 0.0;         // (measured - hand) / hand.
  std::optional<double> expanded;  // U of the difference; none when unknown.
  double tolerance = 0.0;
};

// Meaningless but for hand and tolerance where the row has no line.
Figure FigureOf(const Comparison& row, Quantity quantity);

// |d| - U > T.  False where U is unknown.
bool IsBeyond(const Figure& figure);

// U > T: nothing can be said.  False where U is unknown.
bool IsTooUncertain(const Figure& figure);

// "p 2.56 against 5.01 by hand: -48.8 % (allowed 35 %)".
std::string DescribeBeyond(const Figure& figure);

// "g is too uncertain to tell: -2.8 % with an uncertainty of 87.6 % (allowed
// 25 %)".
std::string DescribeTooUncertain(const Figure& figure);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_FIGURE_H_
