// Two-level minimisation: a function as an OR of products of pins.
//
// Quine (1952) and McCluskey (1956): all prime implicants by merging pairs
// that differ in one input; then the essential ones, then the one that covers
// most of what is left.  The last step is greedy, so that a cover can be
// larger than the smallest on a cyclic table.

#ifndef GATEDYNO_NETWORK_MINIMISE_H_
#define GATEDYNO_NETWORK_MINIMISE_H_

#include <vector>

#include "harness/network/truth_table.h"

namespace gatedyno {

// The inputs outside `free` hold the values in `value`; those in `free` (whose
// bits in `value` are 0) do not matter.
struct Product {
  InputVector value = 0;
  InputVector free = 0;

  bool covers(InputVector vector) const { return (vector & ~free) == value; }
  bool operator==(const Product&) const = default;
  // Some order, for sets.
  bool operator<(const Product& other) const {
    return free != other.free ? free < other.free : value < other.value;
  }
};

std::vector<Product> PrimeImplicants(const TruthTable& table);

// Empty for the constant 0.
std::vector<Product> MinimalCover(const TruthTable& table);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_MINIMISE_H_
