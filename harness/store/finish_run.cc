#include "harness/store/finish_run.h"

#include <cstddef>
#include <optional>
#include <string>

#include <nlohmann/json.hpp>

#include "harness/record/comparison_json.h"
#include "harness/record/run_result_json.h"

namespace gatedyno {
namespace {

// A name that is not UTF-8 must not keep a night's results out of the store.
std::string Text(const nlohmann::json& json) {
  return json.dump(-1, ' ', false, nlohmann::json::error_handler_t::replace);
}

}  // namespace

Status FinishRun(RunId run, const RunResult& result, Store* store) {
  size_t next = 0;
  return store->FinishRun(
      run, Text(RunHeadToJson(result)), [&]() -> std::optional<std::string> {
        if (next == result.comparisons.size()) {
          return std::nullopt;
        }
        return Text(ComparisonToJson(result.comparisons[next++]));
      });
}

}  // namespace gatedyno
