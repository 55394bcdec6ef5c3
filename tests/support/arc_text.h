// An arc in one line, side vector included, for readable test tables.

#ifndef GATEDYNO_TESTS_SUPPORT_ARC_TEXT_H_
#define GATEDYNO_TESTS_SUPPORT_ARC_TEXT_H_

#include <string>

#include "harness/record/arc.h"

namespace gatedyno {

// "rise a->y fall b=1 c=0": input edge, arc, side vector.
inline std::string ArcText(const Arc& arc) {
  std::string text = std::string(EdgeName(arc.input_edge));
  text += " " + DescribeArc(arc);
  return arc.side.empty() ? text : text + " " + DescribeSide(arc);
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_ARC_TEXT_H_
