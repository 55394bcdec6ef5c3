// What keeps an arc from being within, one by one, so that an exemption can
// speak for each.

#ifndef GATEDYNO_COMPARE_TROUBLE_H_
#define GATEDYNO_COMPARE_TROUBLE_H_

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/record/comparison.h"
#include "harness/record/quantity.h"

namespace gatedyno {

enum class TroubleKind { kBeyond, kTooUncertain, kNotMeasured };

// "beyond", "too uncertain", "not measured".
std::string_view TroubleKindName(TroubleKind kind);

struct Trouble {
  TroubleKind kind = TroubleKind::kNotMeasured;
  std::optional<Quantity> quantity;  // None: the arc as a whole.
  std::string text;                  // As Comparison::reason would say it.
};

// Empty for an arc that is within, and only for that.  Of an arc that is
// beyond in one figure, doubt about the other is a trouble of its own, though
// the verdict does not say so.
std::vector<Trouble> TroublesOf(const Comparison& row);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_TROUBLE_H_
