#include "harness/record/comparison.h"

namespace gatedyno {

std::string_view VerdictName(Verdict verdict) {
  switch (verdict) {
    case Verdict::kWithin:
      return "within";
    case Verdict::kBeyond:
      return "beyond";
    case Verdict::kNotMeasured:
      return "not measured";
  }
  return "";
}

std::string_view DriveName(Drive drive) {
  return drive == Drive::kMatched ? "matched" : "self";
}

}  // namespace gatedyno
