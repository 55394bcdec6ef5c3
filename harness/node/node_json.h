// The node file's JSON as a ProcessNode.

#ifndef GATEDYNO_NODE_NODE_JSON_H_
#define GATEDYNO_NODE_NODE_JSON_H_

#include <filesystem>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/node/process_node.h"

namespace gatedyno {

// REQUIRES: `json` satisfies the node schema.  Fails on what a schema cannot
// say: a corner of an unknown process, a polarity without device, two processes
// or corners of one name.
Result<ProcessNode> NodeFromJson(const nlohmann::json& json,
                                 const std::filesystem::path& file);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_NODE_JSON_H_
