// Checks a JSON value against a JSON Schema (draft 7) and words what is wrong.

#ifndef GATEDYNO_NODE_JSON_SCHEMA_H_
#define GATEDYNO_NODE_JSON_SCHEMA_H_

#include <string>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"

namespace gatedyno {

// `file` is what the message calls the value's file.  A failure reads
// "plan.json: /fanouts/0: expected number, more than 0; got 0": the JSON
// pointer of the first place that is wrong, what was expected there, and what
// was found.
Status CheckJson(const nlohmann::json& value,
                 const nlohmann::json& schema,
                 const std::string& file);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_JSON_SCHEMA_H_
