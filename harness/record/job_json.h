// Jobs and outcomes as JSON: the worker's protocol and the store's columns.

#ifndef GATEDYNO_RECORD_JOB_JSON_H_
#define GATEDYNO_RECORD_JOB_JSON_H_

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"

namespace gatedyno {

nlohmann::json JobToJson(const Job& job);
Result<Job> JobFromJson(const nlohmann::json& json);

nlohmann::json OutcomeToJson(const Outcome& outcome);
Result<Outcome> OutcomeFromJson(const nlohmann::json& json);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_JOB_JSON_H_
