#include "harness/report/json_report.h"

#include "harness/record/run_result_json.h"

namespace gatedyno {

std::string JsonReport(const RunResult& result) {
  constexpr int kIndent = 1;
  return RunResultToJson(result).dump(
             kIndent, ' ', false, nlohmann::json::error_handler_t::replace) +
         "\n";
}

}  // namespace gatedyno
