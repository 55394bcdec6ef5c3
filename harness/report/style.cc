#include "harness/report/style.h"

#include <cstdlib>
#include <string_view>

#include <fmt/color.h>
#include <unistd.h>

namespace gatedyno {
namespace {

bool IsSet(const char* name) {
  // The program sets no environment variables, so no other thread can.
  const char* value = std::getenv(name);  // NOLINT(concurrency-mt-unsafe)
  return value != nullptr && *value != '\0';
}

bool IsDumb() {
  const char* term = std::getenv("TERM");  // NOLINT(concurrency-mt-unsafe)
  return term != nullptr && std::string_view(term) == "dumb";
}

fmt::text_style StyleOf(Verdict verdict) {
  switch (verdict) {
    case Verdict::kWithin:
      return fmt::fg(fmt::terminal_color::cyan);
    case Verdict::kBeyond:
      return fmt::fg(fmt::terminal_color::magenta) | fmt::emphasis::bold;
    case Verdict::kNotMeasured:
      return fmt::emphasis::reverse;
  }
  return {};
}

}  // namespace

bool TakesColour(int descriptor) {
  return ::isatty(descriptor) != 0 && !IsSet("NO_COLOR") && !IsDumb();
}

std::string Style::Heading(std::string_view text) const {
  return colour_ ? fmt::format(fmt::emphasis::bold, "{}", text)
                 : std::string(text);
}

std::string Style::Quiet(std::string_view text) const {
  return colour_ ? fmt::format(fmt::emphasis::faint, "{}", text)
                 : std::string(text);
}

std::string Style::OfVerdict(Verdict verdict, std::string_view text) const {
  return colour_ ? fmt::format(StyleOf(verdict), "{}", text)
                 : std::string(text);
}

}  // namespace gatedyno
