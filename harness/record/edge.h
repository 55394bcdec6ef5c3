// The two directions a net can move in.

#ifndef GATEDYNO_RECORD_EDGE_H_
#define GATEDYNO_RECORD_EDGE_H_

#include <string_view>

namespace gatedyno {

enum class Edge { kRise, kFall };

constexpr Edge Opposite(Edge edge) {
  return edge == Edge::kRise ? Edge::kFall : Edge::kRise;
}
constexpr std::string_view EdgeName(Edge edge) {
  return edge == Edge::kRise ? "rise" : "fall";
}

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_EDGE_H_
