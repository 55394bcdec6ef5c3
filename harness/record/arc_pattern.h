// Arcs named by pattern: what a plan's tolerance rules and exemptions are for.

#ifndef GATEDYNO_RECORD_ARC_PATTERN_H_
#define GATEDYNO_RECORD_ARC_PATTERN_H_

#include <optional>
#include <string>

#include "harness/record/arc.h"

namespace gatedyno {

// Names with * and ?, as a shell reads them; letter case counts.
struct ArcPattern {
  std::string cells = "*";
  std::string pins = "*";  // The input that moves.
  std::string outputs = "*";
  std::string corners = "*";
  std::optional<Edge> edge;  // Of the output; none: both.

  bool operator==(const ArcPattern&) const = default;
};

bool Covers(const ArcPattern& pattern,
            const Arc& arc,
            const std::string& corner);

// "nor*, pin a, rise, corner slow_*": only what narrows it; "every arc" where
// nothing does.
std::string DescribePattern(const ArcPattern& pattern);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_ARC_PATTERN_H_
