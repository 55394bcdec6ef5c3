// An arc: what is estimated, measured and compared.

#ifndef GATEDYNO_RECORD_ARC_H_
#define GATEDYNO_RECORD_ARC_H_

#include <string>
#include <vector>

#include "harness/record/edge.h"

namespace gatedyno {

// A constant on one of the inputs that do not move.
struct SideInput {
  std::string pin;
  bool high = false;

  bool operator==(const SideInput&) const = default;
};

struct Arc {
  std::string cell;
  std::string pin;  // The input that moves.
  std::string output;
  Edge input_edge = Edge::kRise;
  Edge edge = Edge::kFall;      // Of the output.
  std::vector<SideInput> side;  // In pin order.

  bool inverting() const { return input_edge != edge; }
  bool operator==(const Arc&) const = default;
};

// "a->y fall".
std::string DescribeArc(const Arc& arc);

// "b=1 c=0".
std::string DescribeSide(const Arc& arc);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_ARC_H_
