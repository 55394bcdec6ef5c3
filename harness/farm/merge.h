// Takes what tasks published of a share back to who asked for it.

#ifndef GATEDYNO_FARM_MERGE_H_
#define GATEDYNO_FARM_MERGE_H_

#include <filesystem>
#include <span>
#include <vector>

#include "harness/base/result.h"
#include "harness/sim/runner.h"

namespace gatedyno {

// Calls `on_outcome` for each job of the share that one of `results` has and
// that is not marked in `delivered` yet, and marks it; `delivered` grows to the
// jobs of the share.  Returns how many that were.  A result that cannot be read
// is renamed to end in ".spoilt", and counts as if it had never been there.
Result<size_t> MergeShare(const std::filesystem::path& share,
                          std::span<const std::filesystem::path> results,
                          const SimRunner::OnOutcome& on_outcome,
                          std::vector<bool>* delivered);

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_MERGE_H_
