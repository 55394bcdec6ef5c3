// Truth tables of up to twelve inputs.

#ifndef GATEDYNO_NETWORK_TRUTH_TABLE_H_
#define GATEDYNO_NETWORK_TRUTH_TABLE_H_

#include <bitset>
#include <cstddef>

#include "harness/network/levels.h"

namespace gatedyno {

// 2^12 rows is what a switch-level sweep does in well under a second; no cell
// of a library has more inputs.
constexpr int kMaxInputs = 12;

// A set of input vectors, by their number.
using VectorSet = std::bitset<(std::size_t{1} << kMaxInputs)>;

struct TruthTable {
  int inputs = 0;
  VectorSet high;  // The vectors at which the function is 1.

  InputVector rows() const { return InputVector{1} << inputs; }
  bool at(InputVector vector) const { return high[vector]; }
  // Whether changing `input` at `vector` changes the function.
  bool toggles(InputVector vector, int input) const {
    return at(vector) != at(Toggled(vector, input));
  }
  bool operator==(const TruthTable&) const = default;
};

TruthTable Complement(const TruthTable& table);

// f(!a, !b, ...) = !f(a, b, ...).
bool IsSelfDual(const TruthTable& table);

// Whether the function changes at all with `input`.
bool DependsOn(const TruthTable& table, int input);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_TRUTH_TABLE_H_
