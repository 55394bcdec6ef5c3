#include "harness/sim/attempt.h"

namespace gatedyno {
namespace {

bool Climbs(Mishap mishap, int losses) {
  switch (mishap) {
    case Mishap::kRefused:
    case Mishap::kCrashed:
      return true;
    case Mishap::kSilent:
      return losses > 1;
    case Mishap::kTakenAway:
      return false;
  }
  return false;
}

}  // namespace

std::optional<Attempt> NextAttempt(Attempt attempt,
                                   Mishap mishap,
                                   int losses_before_aside) {
  const bool lost_a_worker = mishap != Mishap::kRefused;
  attempt.losses += lost_a_worker ? 1 : 0;
  const bool on_last_rung = attempt.rung + 1 >= RungCount(attempt.job);
  if (attempt.losses >= losses_before_aside ||
      (mishap == Mishap::kRefused && on_last_rung)) {
    return std::nullopt;
  }
  if (Climbs(mishap, attempt.losses) && !on_last_rung) {
    ++attempt.rung;
  }
  return attempt;
}

}  // namespace gatedyno
