#include "harness/sim/worker_process.h"

#include <algorithm>
#include <array>
#include <csignal>
#include <cstring>
#include <system_error>
#include <thread>
#include <utility>

#include <boost/process/args.hpp>
#include <boost/process/child.hpp>
#include <boost/process/error.hpp>
#include <boost/process/exe.hpp>
#include <boost/process/extend.hpp>
#include <boost/process/posix.hpp>
#include <fmt/format.h>
#include <sys/wait.h>

#include "harness/sim/pipe.h"

namespace gatedyno {

namespace bp = boost::process;

struct WorkerProcess::Child {
  bp::child process;
};

namespace {

// Enough for a signal handler's or the loader's last words.
constexpr size_t kComplaintBytes = 1000;

// After a failed exec the library (1.81) reaps only a child that is already
// gone, which is a race.
constexpr auto kReapFailedChild = [](auto& executor, const std::error_code&) {
  if (executor.pid > 0) {
    ::waitpid(executor.pid, nullptr, 0);
  }
};

bp::child Spawn(const std::filesystem::path& program,
                const std::vector<std::string>& arguments,
                const std::array<int, 3>& standard,
                std::error_code* failed) {
  return bp::child(bp::exe = program.string(),
                   bp::args = arguments,
                   bp::posix::fd.bind(STDIN_FILENO, standard[0]),
                   bp::posix::fd.bind(STDOUT_FILENO, standard[1]),
                   bp::posix::fd.bind(STDERR_FILENO, standard[2]),
                   bp::extend::on_error = kReapFailedChild,
                   *failed);
}

std::string DescribeEnd(int wait_status) {
  if (!WIFSIGNALED(wait_status)) {
    return fmt::format("left with exit code {}", WEXITSTATUS(wait_status));
  }
  const int signal = WTERMSIG(wait_status);
  const char* name = ::sigabbrev_np(signal);
  return name != nullptr ? fmt::format("was killed by SIG{}", name)
                         : fmt::format("was killed by signal {}", signal);
}

bool IsTakenAway(int wait_status) {
  constexpr std::array<int, 4> kFromOutside = {
      SIGKILL, SIGTERM, SIGINT, SIGHUP};
  return WIFSIGNALED(wait_status) &&
         std::find(kFromOutside.begin(),
                   kFromOutside.end(),
                   WTERMSIG(wait_status)) != kFromOutside.end();
}

// The end of `text` as one line.
std::string OneLine(std::string_view text) {
  std::string line;
  for (const char c : text) {
    if (c != '\n' && c != '\r') {
      line.push_back(c);
    } else if (!line.empty() && !line.ends_with("; ")) {
      line.append("; ");
    }
  }
  if (line.ends_with("; ")) {
    line.resize(line.size() - 2);
  }
  return line;
}

}  // namespace

Result<std::unique_ptr<WorkerProcess>> WorkerProcess::Start(
    const std::filesystem::path& program,
    const std::vector<std::string>& arguments) {
  std::array<Pipe, 3> pipes;
  for (Pipe& pipe : pipes) {
    Result<Pipe> made = MakePipe();
    if (!made.ok()) {
      return Forward(made);
    }
    pipe = std::move(*made);
  }
  auto& [input, output, complaints] = pipes;
  for (const Descriptor* ours :
       {&input.write_end, &output.read_end, &complaints.read_end}) {
    if (const Status set = SetNonBlocking(*ours); !set.ok()) {
      return Forward(set);
    }
  }
  std::error_code failed;
  bp::child process = Spawn(program,
                            arguments,
                            {input.read_end.get(),
                             output.write_end.get(),
                             complaints.write_end.get()},
                            &failed);
  if (failed) {
    return Unavailable(fmt::format(
        "{}: cannot be started: {}", program.string(), failed.message()));
  }
  auto worker = std::unique_ptr<WorkerProcess>(new WorkerProcess);
  worker->child_ = std::make_unique<Child>(Child{std::move(process)});
  worker->input_ = std::move(input.write_end);
  worker->output_ = std::move(output.read_end);
  worker->complaints_ = std::move(complaints.read_end);
  return worker;
}

WorkerProcess::~WorkerProcess() {
  Finish(std::chrono::milliseconds(0));
}

void WorkerProcess::Send(std::string_view text) {
  queued_ += EncodeFrame(text);
}

void WorkerProcess::AppendWatched(std::vector<pollfd>* watched) const {
  if (input_.is_open() && !queued_.empty()) {
    watched->push_back({input_.get(), POLLOUT, 0});
  }
  for (const Descriptor* end : {&output_, &complaints_}) {
    if (end->is_open()) {
      watched->push_back({end->get(), POLLIN, 0});
    }
  }
}

void WorkerProcess::Exchange() {
  WriteQueued();
  ReadFrames();
  ReadComplaints();
}

void WorkerProcess::WriteQueued() {
  // A worker that stopped reading has died or will: its output says so.
  if (input_.is_open() &&
      WriteAvailable(input_, &queued_) == PipeState::kEnded) {
    input_.Close();
  }
}

void WorkerProcess::ReadFrames() {
  if (!output_.is_open()) {
    return;
  }
  std::string bytes;
  if (ReadAvailable(output_, &bytes) == PipeState::kEnded) {
    output_.Close();
  }
  frames_.Append(bytes);
}

void WorkerProcess::ReadComplaints() {
  if (!complaints_.is_open()) {
    return;
  }
  if (ReadAvailable(complaints_, &complaint_tail_) == PipeState::kEnded) {
    complaints_.Close();
  }
  if (complaint_tail_.size() > kComplaintBytes) {
    complaint_tail_.erase(0, complaint_tail_.size() - kComplaintBytes);
  }
}

Result<std::optional<std::string>> WorkerProcess::Receive() {
  Result<std::optional<std::string>> next = frames_.Next();
  if (next.ok() && !next->has_value() && output_ended()) {
    if (const Status whole = frames_.CheckEnd(); !whole.ok()) {
      return Forward(whole);
    }
  }
  return next;
}

ProcessEnd WorkerProcess::Finish(std::chrono::milliseconds grace) {
  using Clock = std::chrono::steady_clock;
  constexpr std::chrono::milliseconds kPause(1);
  CloseInput();
  const Clock::time_point give_up = Clock::now() + grace;
  std::error_code failed;
  while (child_->process.running(failed)) {
    if (Clock::now() >= give_up) {
      ::kill(child_->process.id(), SIGKILL);
      child_->process.wait(failed);
      break;
    }
    ReadComplaints();  // A worker with much to say must not block on it.
    std::this_thread::sleep_for(kPause);
  }
  ReadComplaints();
  const int wait_status = child_->process.native_exit_code();
  ProcessEnd end{DescribeEnd(wait_status), IsTakenAway(wait_status)};
  if (const std::string complaint = OneLine(complaint_tail_);
      !complaint.empty()) {
    end.words += ": " + complaint;
  }
  return end;
}

pid_t WorkerProcess::pid() const {
  return child_->process.id();
}

}  // namespace gatedyno
