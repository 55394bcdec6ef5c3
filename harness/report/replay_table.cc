#include "harness/report/replay_table.h"

#include <algorithm>
#include <optional>
#include <string_view>

#include <fmt/format.h>

#include "harness/report/number_text.h"
#include "harness/report/time_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

constexpr size_t kIndent = 4;

std::string EndingText(const Outcome& outcome) {
  const std::string_view name = EndingName(outcome.ending);
  return outcome.message.empty() ? std::string(name)
                                 : fmt::format("{}: {}", name, outcome.message);
}

std::string LastEnding(const StoredJob& stored) {
  if (!stored.outcome) {
    return "has not ended yet";
  }
  const Outcome& outcome = *stored.outcome;
  return fmt::format("{} at rung {}, {}{}{}",
                     EndingName(outcome.ending),
                     outcome.rung,
                     TimeText(stored.ended),
                     outcome.message.empty() ? "" : ": ",
                     outcome.message);
}

std::optional<double> ValueOf(const Outcome& outcome, const std::string& name) {
  const auto found = outcome.values_s.find(name);
  return found == outcome.values_s.end() ? std::nullopt
                                         : std::optional(found->second);
}

std::string TimeOrDash(std::optional<double> value_s) {
  return value_s ? Picoseconds(*value_s) : "-";
}

std::string DifferenceText(std::optional<double> now_s,
                           std::optional<double> stored_s) {
  constexpr double kPercent = 100.0;
  if (!now_s || !stored_s) {
    return "-";
  }
  if (*now_s == *stored_s) {
    return "same";
  }
  return *stored_s == 0.0
             ? "-"
             : fmt::format("{:+.2g} %",
                           (*now_s - *stored_s) / *stored_s * kPercent);
}

size_t NameColumn(const Job& job) {
  constexpr std::string_view kHead = "interval";
  // What is longer is written out, and its figures stand further right.
  constexpr size_t kWidest = 40;
  size_t widest = kHead.size();
  for (const Interval& interval : job.intervals) {
    widest = std::max(widest, interval.name.size());
  }
  return std::min(widest, kWidest);
}

std::string RowText(size_t column,
                    std::string_view name,
                    std::string_view now,
                    std::string_view stored,
                    std::string_view difference) {
  return Wrap(fmt::format("  {:<{}}  {:>10}  {:>10}  {:>10}",
                          name,
                          column,
                          now,
                          stored,
                          difference),
              kIndent) +
         '\n';
}

}  // namespace

std::string StoredJobText(const StoredJob& stored) {
  return fmt::format("{}\n{}\n{}\n",
                     Wrap(stored.job.label),
                     Wrap("  key " + stored.job.key, kIndent),
                     Wrap("  " + LastEnding(stored), kIndent));
}

std::string ReplayTable(const StoredJob& stored,
                        size_t rung,
                        const Outcome& again) {
  std::string text = fmt::format("again at rung {}:\n", rung);
  if (!again.measured()) {
    return text + Wrap("  " + EndingText(again), kIndent) + '\n';
  }
  const size_t column = NameColumn(stored.job);
  const Outcome none;
  const Outcome& before = stored.outcome ? *stored.outcome : none;
  text += RowText(column, "interval", "now", "stored", "difference");
  for (const Interval& interval : stored.job.intervals) {
    const std::optional<double> now_s = ValueOf(again, interval.name);
    const std::optional<double> stored_s = ValueOf(before, interval.name);
    text += RowText(column,
                    interval.name,
                    TimeOrDash(now_s),
                    TimeOrDash(stored_s),
                    DifferenceText(now_s, stored_s));
  }
  return text;
}

}  // namespace gatedyno
