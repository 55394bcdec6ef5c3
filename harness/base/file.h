// Whole-file reading and writing, with errors that name the file.

#ifndef GATEDYNO_BASE_FILE_H_
#define GATEDYNO_BASE_FILE_H_

#include <filesystem>
#include <string>
#include <string_view>

#include "harness/base/result.h"

namespace gatedyno {

Result<std::string> ReadFile(const std::filesystem::path& path);

// Writes aside and renames, so that a reader never sees half a file.  Makes
// the parent folders that are missing.
Status WriteFile(const std::filesystem::path& path, std::string_view text);

}  // namespace gatedyno

#endif  // GATEDYNO_BASE_FILE_H_
