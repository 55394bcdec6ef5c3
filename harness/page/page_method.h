// How the run was measured, so that the page can be made again.

#ifndef GATEDYNO_PAGE_PAGE_METHOD_H_
#define GATEDYNO_PAGE_PAGE_METHOD_H_

#include <string>

#include "harness/record/run_result.h"
#include "harness/report/run_source.h"

namespace gatedyno {

// Node, simulator, settings, accuracy promised and checked, versions, date.
std::string MethodList(const RunResult& result, const RunSource& source);

// The plan, indented where it is JSON.
std::string PlanText(const RunSource& source);

// Warnings and jobs that failed; empty where there are none.
std::string TroubleLists(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_METHOD_H_
