#include "harness/farm/outbox.h"

#include <system_error>
#include <utility>

#include <fmt/format.h>

#include "harness/farm/result_file.h"

namespace gatedyno {

Outbox::Outbox(RoundFolder round, int share, std::filesystem::path scratch)
    : round_(std::move(round)), share_(share), scratch_(std::move(scratch)) {}

std::filesystem::path Outbox::LocalFile() const {
  return scratch_ / fmt::format("outbox-{}.db", number_);
}

Status Outbox::Add(const Job& job, const Outcome& outcome) {
  const std::lock_guard lock(mutex_);
  if (!last_.ok()) {
    return last_;
  }
  if (!store_) {
    Result<Store> store = Store::Open(LocalFile());
    if (!store.ok()) {
      return Forward(store);
    }
    store_.emplace(std::move(*store));
    waiting_ = true;
  }
  return store_->SaveOutcome(job, outcome);
}

Status Outbox::Publish() {
  const std::lock_guard lock(mutex_);
  if (!waiting_) {
    return Ok();
  }
  // Closed, a store is a single file.
  store_.reset();
  last_ = PublishStore(LocalFile(), round_.NewResult(share_, number_));
  if (last_.ok()) {
    std::error_code ignored;
    std::filesystem::remove(LocalFile(), ignored);
    waiting_ = false;
    ++number_;
  }
  return last_;
}

}  // namespace gatedyno
