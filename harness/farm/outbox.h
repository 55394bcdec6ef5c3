// What a task has done and not yet published: a store on the local disk.

#ifndef GATEDYNO_FARM_OUTBOX_H_
#define GATEDYNO_FARM_OUTBOX_H_

#include <filesystem>
#include <mutex>
#include <optional>

#include "harness/base/result.h"
#include "harness/farm/round_folder.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/store/store.h"

namespace gatedyno {

// All of it may be called from any thread.
class Outbox {
 public:
  // `scratch` is a folder on the local disk that outlives the outbox.
  Outbox(RoundFolder round, int share, std::filesystem::path scratch);

  // Fails also once a publication has failed, with its reason.
  Status Add(const Job& job, const Outcome& outcome);

  // Makes a new result file of what was added since the last one, if anything
  // was.  After a failure the next call tries it again.
  Status Publish();

 private:
  std::filesystem::path LocalFile() const;

  const RoundFolder round_;
  const int share_;
  const std::filesystem::path scratch_;
  std::mutex mutex_;
  std::optional<Store> store_;  // Of what came since the last publication.
  int number_ = 1;              // Of the next publication.
  bool waiting_ = false;        // The local file is there to be published.
  Status last_ = Ok();
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_OUTBOX_H_
