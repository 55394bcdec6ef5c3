// The jobs of one task: a file, one JSON text a line, as the workers take them.

#ifndef GATEDYNO_FARM_SHARE_FILE_H_
#define GATEDYNO_FARM_SHARE_FILE_H_

#include <filesystem>
#include <fstream>
#include <optional>
#include <string>

#include "harness/base/result.h"
#include "harness/record/job.h"

namespace gatedyno {

class ShareWriter {
 public:
  static Result<ShareWriter> Create(const std::filesystem::path& path);

  // `text` is what JobText() of sim/protocol.h made.
  void Add(const std::string& text);
  // Fails, naming the file, if any line did not reach it.
  Status Close();

 private:
  explicit ShareWriter(std::filesystem::path path);

  std::filesystem::path path_;
  std::ofstream out_;
};

class ShareReader {
 public:
  static Result<ShareReader> Open(const std::filesystem::path& path);

  // None at the end.  Fails, naming file and line, at a line that is no job.
  Result<std::optional<Job>> Next();

 private:
  explicit ShareReader(std::filesystem::path path);

  std::filesystem::path path_;
  std::ifstream in_;
  int line_ = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_SHARE_FILE_H_
