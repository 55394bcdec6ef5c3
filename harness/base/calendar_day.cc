#include "harness/base/calendar_day.h"

#include <algorithm>
#include <charconv>
#include <chrono>
#include <cstddef>

namespace gatedyno {
namespace {

// REQUIRES: digits only.
int Number(std::string_view digits) {
  int number = 0;
  std::from_chars(digits.data(), digits.data() + digits.size(), number);
  return number;
}

bool HasTheForm(std::string_view text) {
  constexpr std::string_view kForm = "dddd-dd-dd";
  return std::equal(text.begin(),
                    text.end(),
                    kForm.begin(),
                    kForm.end(),
                    [](char c, char form) {
                      return form == 'd' ? c >= '0' && c <= '9' : c == form;
                    });
}

}  // namespace

bool IsCalendarDay(std::string_view text) {
  if (!HasTheForm(text)) {
    return false;
  }
  constexpr size_t kMonth = 5;
  constexpr size_t kDay = 8;
  const int year = Number(text.substr(0, 4));
  const auto month = static_cast<unsigned>(Number(text.substr(kMonth, 2)));
  const auto day = static_cast<unsigned>(Number(text.substr(kDay, 2)));
  return std::chrono::year_month_day(std::chrono::year(year),
                                     std::chrono::month(month),
                                     std::chrono::day(day))
      .ok();
}

}  // namespace gatedyno
