// The two figures of an arc that the hand method predicts.

#ifndef GATEDYNO_RECORD_QUANTITY_H_
#define GATEDYNO_RECORD_QUANTITY_H_

#include <string_view>

namespace gatedyno {

enum class Quantity { kEffort, kParasitic };

constexpr std::string_view QuantityName(Quantity quantity) {
  return quantity == Quantity::kEffort ? "effort" : "parasitic";
}
constexpr std::string_view QuantitySymbol(Quantity quantity) {
  return quantity == Quantity::kEffort ? "g" : "p";
}

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_QUANTITY_H_
