#include "harness/netlist/passive_value.h"

#include <cmath>

#include "harness/netlist/geometry.h"

namespace gatedyno {

Parsed<double> EvaluatePassive(const PassiveLine& line,
                               double copies,
                               ParameterSource& parameters) {
  if (line.multiplicity) {
    Parsed<double> own =
        EvaluatePositive(*line.multiplicity, "a multiplicity", parameters);
    if (!own.ok()) {
      return own;
    }
    copies *= *own;
  }
  Parsed<double> one = Evaluate(line.value.expression, parameters);
  if (!one.ok()) {
    return one;
  }
  const double together = line.is_capacitor ? *one * copies : *one / copies;
  if (line.is_capacitor && (together < 0.0 || !std::isfinite(together))) {
    return WrongValue(
        line.value, "a capacitance in farads, not negative", *one);
  }
  if (!line.is_capacitor && (together <= 0.0 || !std::isnormal(together))) {
    return WrongValue(line.value, "a resistance in ohms, above zero", *one);
  }
  return together;
}

}  // namespace gatedyno
