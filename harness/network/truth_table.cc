#include "harness/network/truth_table.h"

namespace gatedyno {

TruthTable Complement(const TruthTable& table) {
  TruthTable complement = {table.inputs, {}};
  for (InputVector v = 0; v < table.rows(); ++v) {
    complement.high[v] = !table.at(v);
  }
  return complement;
}

bool IsSelfDual(const TruthTable& table) {
  const InputVector last = table.rows() - 1;
  for (InputVector v = 0; v < table.rows(); ++v) {
    if (table.at(v) == table.at(last - v)) {
      return false;
    }
  }
  return true;
}

bool DependsOn(const TruthTable& table, int input) {
  for (InputVector v = 0; v < table.rows(); ++v) {
    if (table.toggles(v, input)) {
      return true;
    }
  }
  return false;
}

}  // namespace gatedyno
