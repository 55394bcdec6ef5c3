#include "harness/record/job.h"

#include <algorithm>
#include <cassert>

namespace gatedyno {

size_t RungCount(const Job& job) {
  return std::max(job.settings.size(), size_t{1});
}

std::string DeckText(const Job& job, size_t rung) {
  assert(rung < RungCount(job));
  if (job.settings.empty()) {
    return job.deck;
  }
  const size_t title_end = std::min(job.deck.find('\n'), job.deck.size() - 1);
  std::string text = job.deck;
  text.insert(title_end + 1, job.settings[rung]);
  return text;
}

}  // namespace gatedyno
