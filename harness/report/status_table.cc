#include "harness/report/status_table.h"

#include <optional>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "harness/record/run_progress_json.h"
#include "harness/report/pace.h"
#include "harness/report/time_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

using nlohmann::json;

constexpr UnixMilliseconds kPerSecond = 1000;
constexpr size_t kIndent = 4;

std::string Between(UnixMilliseconds from, UnixMilliseconds to) {
  return DurationText(static_cast<double>(to - from) /
                      static_cast<double>(kPerSecond));
}

// As a shell takes it for one word.
std::string Quoted(const std::string& word) {
  constexpr std::string_view kPlain =
      "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789_-./+:@%,";
  if (!word.empty() && word.find_first_not_of(kPlain) == std::string::npos) {
    return word;
  }
  std::string quoted = "'";
  for (const char c : word) {
    quoted += c == '\'' ? std::string("'\\''") : std::string(1, c);
  }
  return quoted + "'";
}

class StatusWriter {
 public:
  StatusWriter(const StoreView& view, const Style& style)
      : view_(view), style_(style) {}

  std::string Text() {
    for (const RunStatus& status : StatusOfRuns(view_)) {
      text_ += text_.empty() ? "" : "\n";
      AddRun(status);
    }
    if (text_.empty()) {
      text_ = Wrap(fmt::format("{}: no runs", view_.store)) + '\n';
    }
    return std::move(text_);
  }

 private:
  void AddLine(const std::string& line) {
    text_ += Wrap("  " + line, kIndent) + '\n';
  }

  void AddHeading(const RunStatus& status) {
    const std::string heading =
        Wrap(fmt::format("run {}{}{}, {}",
                         status.record.id,
                         status.title.empty() ? "" : ": ",
                         status.title,
                         RunStateName(status.state)),
             kIndent);
    text_ += style_.Heading(heading) + '\n';
  }

  void AddRun(const RunStatus& status) {
    AddHeading(status);
    AddTimes(status);
    AddProgress(status);
    if (status.state == RunState::kStopped) {
      AddLine(fmt::format(
          "to go on: 'gatedyno run' with the same plan and options and --store "
          "{}",
          Quoted(view_.store)));
    }
  }

  void AddTimes(const RunStatus& status) {
    const RunRecord& run = status.record;
    AddLine(fmt::format("started {}, {} ago",
                        TimeText(run.started),
                        Between(run.started, view_.now)));
    if (run.session_started != run.started) {
      AddLine(fmt::format("gone on with {}, {} ago",
                          TimeText(run.session_started),
                          Between(run.session_started, view_.now)));
    }
    if (run.finished) {
      AddLine(fmt::format("finished {}, after {}",
                          TimeText(*run.finished),
                          Between(run.session_started, *run.finished)));
    } else if (IsSilent(status)) {
      AddLine(fmt::format("last sign of life {}, {} ago",
                          TimeText(run.progressed),
                          Between(run.progressed, view_.now)));
    }
  }

  // A run notes its progress every few seconds, if jobs end.
  bool IsSilent(const RunStatus& status) const {
    constexpr UnixMilliseconds kLong = 60 * kPerSecond;
    return status.state == RunState::kStopped ||
           view_.now - status.record.progressed >= kLong;
  }

  void AddProgress(const RunStatus& status) {
    if (!status.record.progress) {
      return;
    }
    const RunProgress& progress = *status.record.progress;
    AddLine(fmt::format("{} done, {} of them taken from stores, {} failed",
                        JobsText(progress),
                        progress.jobs.reused,
                        progress.jobs.failed));
    if (status.jobs_per_s) {
      AddLine(RateText(*status.jobs_per_s) +
              (status.left_s
                   ? fmt::format(", {} left", DurationText(*status.left_s))
                   : ""));
    }
    AddLine(
        fmt::format("{} of {} arcs ended", progress.arcs_ended, progress.arcs) +
        (progress.current.empty() || status.record.finished
             ? ""
             : "; last job " + progress.current));
  }

  const StoreView& view_;
  const Style& style_;
  std::string text_;
};

json OrNull(std::optional<double> value) {
  return value ? json(*value) : json(nullptr);
}

json RunToJson(const RunStatus& status) {
  const RunRecord& run = status.record;
  return {
      {"run", run.id},
      {"title", status.title},
      {"state", RunStateName(status.state)},
      {"node", run.info.node},
      {"program", run.info.program_version},
      {"simulator", run.info.simulator_version},
      {"started", IsoTimeText(run.started)},
      {"session_started", IsoTimeText(run.session_started)},
      {"progressed", IsoTimeText(run.progressed)},
      {"finished",
       run.finished ? json(IsoTimeText(*run.finished)) : json(nullptr)},
      {"progress",
       run.progress ? RunProgressToJson(*run.progress) : json(nullptr)},
      {"jobs_per_s", OrNull(status.jobs_per_s)},
      {"left_s", OrNull(status.left_s)},
  };
}

}  // namespace

std::string StatusTable(const StoreView& view, const Style& style) {
  return StatusWriter(view, style).Text();
}

json StatusToJson(const StoreView& view) {
  json runs = json::array();
  for (const RunStatus& status : StatusOfRuns(view)) {
    runs.push_back(RunToJson(status));
  }
  return {{"format", "gatedyno-status/1"},
          {"store", view.store},
          {"runs", std::move(runs)}};
}

}  // namespace gatedyno
