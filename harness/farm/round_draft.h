// A round while it is being filled with jobs.

#ifndef GATEDYNO_FARM_ROUND_DRAFT_H_
#define GATEDYNO_FARM_ROUND_DRAFT_H_

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/farm/round_folder.h"
#include "harness/farm/share_file.h"

namespace gatedyno {

// Jobs go straight to the shared folder; none is kept in memory.
class RoundDraft {
 public:
  RoundDraft(RoundFolder folder, size_t jobs_per_share);

  // `text` is what JobText() of sim/protocol.h made.
  Status Add(const std::string& text);
  // Nothing is added any more.
  Status Close();

  const RoundFolder& folder() const { return folder_; }
  size_t job_count() const { return job_count_; }
  // Shares begun.
  const std::vector<size_t>& share_sizes() const { return share_sizes_; }
  // The next job would begin one more.
  bool last_share_full() const;

 private:
  RoundFolder folder_;
  size_t jobs_per_share_;
  size_t job_count_ = 0;
  std::vector<size_t> share_sizes_;
  std::optional<ShareWriter> writer_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_ROUND_DRAFT_H_
