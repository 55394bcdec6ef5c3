// An exemption: arcs that may differ from their hand numbers all the same, for
// a reason somebody stands for, until a date.
//
// It changes no number and no verdict; the release decision passes over what it
// covers, and every report shows it.

#ifndef GATEDYNO_RECORD_EXEMPTION_H_
#define GATEDYNO_RECORD_EXEMPTION_H_

#include <optional>
#include <string>

#include "harness/record/arc_pattern.h"
#include "harness/record/quantity.h"

namespace gatedyno {

struct Exemption {
  ArcPattern where;
  std::optional<Quantity> quantity;  // None: g and p, and not measured.
  std::string reason;
  std::string author;
  std::string expires;  // The last day it holds: "2027-03-31".

  bool operator==(const Exemption&) const = default;
};

// `today` is written as `expires` is: "2026-12-02".
inline bool IsExpired(const Exemption& exemption, const std::string& today) {
  return exemption.expires < today;
}

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_EXEMPTION_H_
