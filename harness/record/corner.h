// A corner: process, voltage and temperature.

#ifndef GATEDYNO_RECORD_CORNER_H_
#define GATEDYNO_RECORD_CORNER_H_

#include <string>

namespace gatedyno {

struct Corner {
  std::string name;
  std::string process;  // Names one of the node's processes.
  double supply_v = 0.0;
  double temperature_c = 25.0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_CORNER_H_
