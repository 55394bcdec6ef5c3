#include "harness/farm/slurm.h"

#include <charconv>
#include <optional>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "harness/farm/array_indices.h"
#include "harness/farm/command.h"

namespace gatedyno {
namespace {

// TERM to the task alone, this long before its time limit; Slurm looks every
// half minute, so it may come that much earlier.
constexpr const char* kEarlyNotice = "--signal=B:TERM@30";

// Queue name, index, array, reason.
constexpr const char* kQueueFormat = "%j|%K|%F|%r";
constexpr std::string_view kFailedToLaunch = "launch failed requeued held";

std::string_view TakeLine(std::string_view* text) {
  const size_t end = text->find('\n');
  const std::string_view line = text->substr(0, end);
  text->remove_prefix(end == std::string_view::npos ? text->size() : end + 1);
  return line;
}

std::string_view Trim(std::string_view text) {
  constexpr const char* kBlank = " \t\r\n";
  const size_t first = text.find_first_not_of(kBlank);
  if (first == std::string_view::npos) {
    return {};
  }
  return text.substr(first, text.find_last_not_of(kBlank) - first + 1);
}

std::optional<int> WholeNumber(std::string_view text) {
  int number = 0;
  const auto [end, failed] =
      std::from_chars(text.data(), text.data() + text.size(), number);
  const bool whole = failed == std::errc() && end == text.data() + text.size();
  return whole ? std::optional(number) : std::nullopt;
}

std::optional<QueuedTask> ParseTask(std::string_view line) {
  std::vector<std::string_view> fields;
  constexpr size_t kFields = 4;
  while (fields.size() + 1 < kFields) {
    const size_t bar = line.find('|');
    if (bar == std::string_view::npos) {
      return std::nullopt;
    }
    fields.push_back(line.substr(0, bar));
    line.remove_prefix(bar + 1);
  }
  const auto index = WholeNumber(fields[1]);
  if (!index) {
    return std::nullopt;
  }
  return QueuedTask{std::string(fields[0]),
                    *index,
                    std::string(fields[2]),
                    line.find(kFailedToLaunch) != std::string_view::npos};
}

}  // namespace

Result<std::string> Slurm::Ask(
    const std::string& program,
    const std::vector<std::string>& arguments) const {
  Result<CommandEnd> end = RunCommand(program, arguments, limit_);
  if (!end.ok()) {
    return Unavailable(fmt::format(
        "{}; the farm needs Slurm's commands, and a cluster that answers, on "
        "the machine that runs gatedyno",
        end.error().message));
  }
  if (end->exit_code != 0) {
    const std::string_view words = Trim(end->complaints);
    return Unavailable(
        fmt::format("{} failed with exit code {}: {}",
                    program,
                    end->exit_code,
                    words.empty() ? "it gave no reason" : words));
  }
  return std::move(end->output);
}

Result<int> Slurm::MaxArraySize() const {
  const auto config = Ask("scontrol", {"show", "config"});
  if (!config.ok()) {
    return Forward(config);
  }
  for (std::string_view text = *config; !text.empty();) {
    const std::string_view line = TakeLine(&text);
    const size_t equals = line.find('=');
    if (equals != std::string_view::npos &&
        Trim(line.substr(0, equals)) == "MaxArraySize") {
      const auto size = WholeNumber(Trim(line.substr(equals + 1)));
      if (size && *size < 1) {
        return Unavailable(
            "this Slurm takes no task arrays (MaxArraySize = 0)");
      }
      if (size) {
        return *size;
      }
    }
  }
  return Unavailable("scontrol show config names no MaxArraySize");
}

Result<std::string> Slurm::Submit(const ArrayRequest& request) const {
  std::vector<std::string> arguments = {
      kEarlyNotice, "--nodes=1", "--ntasks=1", "--requeue"};
  arguments.insert(
      arguments.end(), request.arguments.begin(), request.arguments.end());
  // After the user's: of an option given twice the last one counts.
  for (const std::string& own : {std::string("--parsable"),
                                 "--job-name=" + request.queue_name,
                                 "--array=" + ArrayIndices(request.indices),
                                 "--output=" + request.log_pattern,
                                 "--error=" + request.log_pattern,
                                 std::string("--open-mode=append"),
                                 std::string("--chdir=/"),
                                 "--wrap=" + request.command}) {
    arguments.push_back(own);
  }
  const auto answer = Ask("sbatch", arguments);
  if (!answer.ok()) {
    return answer;
  }
  // "17", or "17;cluster".
  const std::string_view line = Trim(*answer);
  const std::string_view number = line.substr(0, line.find(';'));
  if (!WholeNumber(number)) {
    return Unavailable(fmt::format("sbatch named no job: it said '{}'", line));
  }
  return std::string(number);
}

Result<std::vector<QueuedTask>> Slurm::Queue(
    std::span<const std::string> queue_names) const {
  const auto answer =
      Ask("squeue",
          {"--noheader",
           "--array",
           fmt::format("--name={}", fmt::join(queue_names, ",")),
           fmt::format("--format={}", kQueueFormat)});
  if (!answer.ok()) {
    return Forward(answer);
  }
  std::vector<QueuedTask> tasks;
  for (std::string_view text = *answer; !text.empty();) {
    const std::string_view line = Trim(TakeLine(&text));
    if (line.empty()) {
      continue;
    }
    auto task = ParseTask(line);
    if (!task) {
      return Unavailable(
          fmt::format("squeue: '{}' is no task of an array", line));
    }
    tasks.push_back(std::move(*task));
  }
  return tasks;
}

Status Slurm::Cancel(std::span<const std::string> queue_names) const {
  for (const std::string& name : queue_names) {
    const auto answer = Ask("scancel", {"--name=" + name});
    if (!answer.ok()) {
      return Forward(answer);
    }
  }
  return Ok();
}

Status Slurm::CancelTask(const QueuedTask& task) const {
  const auto answer =
      Ask("scancel", {fmt::format("{}_{}", task.array, task.index)});
  return answer.ok() ? Ok() : Forward(answer);
}

}  // namespace gatedyno
