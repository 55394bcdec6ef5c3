#include "harness/compare/figure.h"

#include <cmath>

#include <fmt/format.h>

namespace gatedyno {

Figure FigureOf(const Comparison& row, Quantity quantity) {
  if (quantity == Quantity::kEffort) {
    return {.quantity = quantity,
            .hand = row.estimate.effort,
            .measured = row.effort,
            .difference = row.effort_difference,
            .expanded = row.effort_difference_expanded,
            .tolerance = row.tolerance.effort};
  }
  return {.quantity = quantity,
          .hand = row.hand_parasitic,
          .measured = row.parasitic,
          .difference = row.parasitic_difference,
          .expanded = row.parasitic_difference_expanded,
          .tolerance = row.tolerance.parasitic};
}

bool IsBeyond(const Figure& figure) {
  return figure.expanded &&
         std::abs(figure.difference) - *figure.expanded > figure.tolerance;
}

bool IsTooUncertain(const Figure& figure) {
  return figure.expanded && *figure.expanded > figure.tolerance;
}

std::string DescribeBeyond(const Figure& figure) {
  return fmt::format(
      "{} {:.2f} against {:.2f} by hand: {:+.1f} % (allowed {:g} "
      "%)",
      QuantitySymbol(figure.quantity),
      figure.measured.value,
      figure.hand,
      100.0 * figure.difference,
      100.0 * figure.tolerance);
}

std::string DescribeTooUncertain(const Figure& figure) {
  return fmt::format(
      "{} is too uncertain to tell: {:+.1f} % with an "
      "uncertainty of {:.1f} % (allowed {:g} %)",
      QuantitySymbol(figure.quantity),
      100.0 * figure.difference,
      100.0 * figure.expanded.value_or(0.0),
      100.0 * figure.tolerance);
}

}  // namespace gatedyno
