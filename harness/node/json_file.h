// JSON files that a schema rules.

#ifndef GATEDYNO_NODE_JSON_FILE_H_
#define GATEDYNO_NODE_JSON_FILE_H_

#include <filesystem>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"

namespace gatedyno {

// Reads `path` and checks it against the schema in `schema_path`.  A file that
// is no JSON fails with its line and column.
Result<nlohmann::json> ReadJsonFile(const std::filesystem::path& path,
                                    const std::filesystem::path& schema_path);

}  // namespace gatedyno

#endif  // GATEDYNO_NODE_JSON_FILE_H_
