#include "tests/bench/target.h"

#include <string>

#include <fmt/format.h>

namespace gatedyno {
namespace {

void PrintLine(std::string_view what, double value, std::string_view remark) {
  fmt::print("  {:<52} {:>10.4g}{}{}\n",
             what,
             value,
             remark.empty() ? "" : "  ",
             remark);
}

bool Judge(std::string_view what,
           double value,
           bool good,
           std::string_view bound,
           double limit) {
  PrintLine(what,
            value,
            fmt::format("({} {:g}){}", bound, limit, good ? "" : "  MISSED"));
  return good;
}

}  // namespace

bool AtMost(std::string_view what, double value, double limit) {
  return Judge(what, value, value <= limit, "at most", limit);
}

bool AtLeast(std::string_view what, double value, double limit) {
  return Judge(what, value, value >= limit, "at least", limit);
}

void Figure(std::string_view what, double value, std::string_view remark) {
  PrintLine(what, value, remark);
}

}  // namespace gatedyno
