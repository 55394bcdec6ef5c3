#include "harness/farm/round_draft.h"

#include <utility>

namespace gatedyno {

RoundDraft::RoundDraft(RoundFolder folder, size_t jobs_per_share)
    : folder_(std::move(folder)), jobs_per_share_(jobs_per_share) {}

bool RoundDraft::last_share_full() const {
  return share_sizes_.empty() || share_sizes_.back() == jobs_per_share_;
}

Status RoundDraft::Add(const std::string& text) {
  if (last_share_full()) {
    if (Status closed = Close(); !closed.ok()) {
      return closed;
    }
    Result<ShareWriter> writer = ShareWriter::Create(
        folder_.ShareFile(static_cast<int>(share_sizes_.size())));
    if (!writer.ok()) {
      return Forward(writer);
    }
    writer_.emplace(std::move(*writer));
    share_sizes_.push_back(0);
  }
  writer_->Add(text);
  ++share_sizes_.back();
  ++job_count_;
  return Ok();
}

Status RoundDraft::Close() {
  Status closed = writer_ ? writer_->Close() : Ok();
  writer_.reset();
  return closed;
}

}  // namespace gatedyno
