#include "harness/compare/trouble.h"

#include "harness/compare/figure.h"

namespace gatedyno {
namespace {

// Of the arc as a whole: no line, no uncertainty, or a verdict kept by a
// gatedyno that did not say of which figure.
Trouble WholeArc(const Comparison& row) {
  return {.kind = row.verdict == Verdict::kBeyond ? TroubleKind::kBeyond
                                                  : TroubleKind::kNotMeasured,
          .quantity = std::nullopt,
          .text = row.reason};
}

}  // namespace

std::string_view TroubleKindName(TroubleKind kind) {
  switch (kind) {
    case TroubleKind::kBeyond:
      return "beyond";
    case TroubleKind::kTooUncertain:
      return "too uncertain";
    case TroubleKind::kNotMeasured:
      return "not measured";
  }
  return "";
}

std::vector<Trouble> TroublesOf(const Comparison& row) {
  if (row.verdict == Verdict::kWithin) {
    return {};
  }
  std::vector<Trouble> troubles;
  for (const Quantity quantity : {Quantity::kEffort, Quantity::kParasitic}) {
    const Figure figure = FigureOf(row, quantity);
    if (!row.line || !figure.expanded) {
      return {WholeArc(row)};
    }
    if (IsBeyond(figure)) {
      troubles.push_back(
          {TroubleKind::kBeyond, quantity, DescribeBeyond(figure)});
    } else if (IsTooUncertain(figure)) {
      troubles.push_back(
          {TroubleKind::kTooUncertain, quantity, DescribeTooUncertain(figure)});
    }
  }
  if (troubles.empty()) {
    troubles.push_back(WholeArc(row));
  }
  return troubles;
}

}  // namespace gatedyno
