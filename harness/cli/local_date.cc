#include "harness/cli/local_date.h"

#include <ctime>

#include <fmt/chrono.h>

namespace gatedyno {

std::string LocalDate() {
  return fmt::format("{:%Y-%m-%d}", fmt::localtime(std::time(nullptr)));
}

}  // namespace gatedyno
