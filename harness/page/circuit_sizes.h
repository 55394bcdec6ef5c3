// Widths and lengths of a cell's transistors as a report has them: in one unit
// throughout.

#ifndef GATEDYNO_PAGE_CIRCUIT_SIZES_H_
#define GATEDYNO_PAGE_CIRCUIT_SIZES_H_

#include <string>

#include "harness/record/circuit.h"

namespace gatedyno {

class CircuitSizes {
 public:
  // Nanometres, or micrometres where a width is 10 um or more.
  explicit CircuitSizes(const Circuit& circuit);

  const std::string& unit() const { return unit_; }  // "nm", "um" with a mu.
  // "45", when all devices have it; empty when lengths differ.
  const std::string& common_length() const { return common_length_; }

  std::string Number(double metres) const;  // "360"; six digits that count.
  // "360 nm", "360/60 nm" where lengths differ.
  std::string Beside(const CircuitDevice& device) const;

 private:
  std::string unit_ = "nm";
  double per_metre_ = 1e9;
  std::string common_length_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_CIRCUIT_SIZES_H_
