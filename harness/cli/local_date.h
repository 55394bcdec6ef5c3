// What day it is where the program runs: exemptions end on days.

#ifndef GATEDYNO_CLI_LOCAL_DATE_H_
#define GATEDYNO_CLI_LOCAL_DATE_H_

#include <string>

namespace gatedyno {

// "2026-12-02", by this machine's clock and zone.
std::string LocalDate();

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_LOCAL_DATE_H_
