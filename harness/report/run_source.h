// Where a run that is reported on is kept.

#ifndef GATEDYNO_REPORT_RUN_SOURCE_H_
#define GATEDYNO_REPORT_RUN_SOURCE_H_

#include <string>

#include "harness/store/run_record.h"

namespace gatedyno {

struct RunSource {
  std::string store;  // File name without its folder.
  RunId run = 0;
  std::string plan;        // As run, JSON.
  std::string today = {};  // "2026-12-02": what exemptions expire by.
};

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_RUN_SOURCE_H_
