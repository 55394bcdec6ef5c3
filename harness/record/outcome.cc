#include "harness/record/outcome.h"

namespace gatedyno {

std::string_view EndingName(Ending ending) {
  switch (ending) {
    case Ending::kMeasured:
      return "measured";
    case Ending::kFailed:
      return "failed";
    case Ending::kTimedOut:
      return "timed out";
    case Ending::kCrashed:
      return "crashed";
  }
  return "";
}

}  // namespace gatedyno
