#include "harness/farm/command.h"

#include <csignal>
#include <system_error>
#include <utility>

#include <boost/process/args.hpp>
#include <boost/process/child.hpp>
#include <boost/process/error.hpp>
#include <boost/process/exe.hpp>
#include <boost/process/extend.hpp>
#include <boost/process/io.hpp>
#include <boost/process/posix.hpp>
#include <boost/process/search_path.hpp>
#include <fmt/format.h>
#include <poll.h>
#include <sys/wait.h>
#include <unistd.h>

#include "harness/sim/pipe.h"
#include "harness/sim/poll_until.h"

namespace gatedyno {

namespace bp = boost::process;

namespace {

using Clock = std::chrono::steady_clock;

// One of the command's output streams, as far as it has come.
struct Stream {
  Pipe pipe;
  std::string text;

  void Read() {
    if (pipe.read_end.is_open() &&
        ReadAvailable(pipe.read_end, &text) == PipeState::kEnded) {
      pipe.read_end.Close();
    }
  }
};

// Ctrl-C is meant for this program, which then ends its tasks in order: an
// sbatch ended by it half way would leave some nobody knows of.
constexpr auto kLeaveGroup = [](auto& /*executor*/) { ::setpgid(0, 0); };

Status Open(Stream* stream) {
  Result<Pipe> pipe = MakePipe();
  if (!pipe.ok()) {
    return Forward(pipe);
  }
  stream->pipe = std::move(*pipe);
  return SetNonBlocking(stream->pipe.read_end);
}

// Until the command is gone; what it leaves behind may keep its streams open.
// False once `deadline` has passed.
bool HearOut(bp::child* child,
             Stream* output,
             Stream* complaints,
             Clock::time_point deadline) {
  constexpr std::chrono::milliseconds kPause(10);
  std::error_code ignored;
  bool running = true;
  while (running) {
    running = child->running(ignored);
    std::vector<pollfd> watched;
    for (Stream* stream : {output, complaints}) {
      stream->Read();
      if (stream->pipe.read_end.is_open()) {
        watched.push_back({stream->pipe.read_end.get(), POLLIN, 0});
      }
    }
    const Clock::time_point now = Clock::now();
    if (now >= deadline) {
      return false;
    }
    if (running) {
      PollUntil(&watched, std::min(deadline, now + kPause));
    }
  }
  return true;
}

int ExitCode(int wait_status) {
  constexpr int kSignalled = 128;  // As a shell has it.
  return WIFSIGNALED(wait_status) ? kSignalled + WTERMSIG(wait_status)
                                  : WEXITSTATUS(wait_status);
}

}  // namespace

Result<CommandEnd> RunCommand(const std::string& program,
                              const std::vector<std::string>& arguments,
                              std::chrono::milliseconds limit) {
  const auto file = bp::search_path(program);
  if (file.empty()) {
    return Unavailable(fmt::format("{}: not found on PATH", program));
  }
  Stream output;
  Stream complaints;
  for (Stream* stream : {&output, &complaints}) {
    if (const Status opened = Open(stream); !opened.ok()) {
      return Forward(opened);
    }
  }
  std::error_code failed;
  bp::child child(
      bp::exe = file.string(),
      bp::args = arguments,
      bp::std_in < bp::null,
      bp::posix::fd.bind(STDOUT_FILENO, output.pipe.write_end.get()),
      bp::posix::fd.bind(STDERR_FILENO, complaints.pipe.write_end.get()),
      bp::extend::on_exec_setup = kLeaveGroup,
      failed);
  if (failed) {
    return Unavailable(fmt::format(
        "{}: cannot be started: {}", file.string(), failed.message()));
  }
  output.pipe.write_end.Close();
  complaints.pipe.write_end.Close();
  const bool ended =
      HearOut(&child, &output, &complaints, Clock::now() + limit);
  if (!ended) {
    ::kill(-child.id(), SIGKILL);  // And what it started.
  }
  child.wait(failed);
  if (!ended) {
    return Unavailable(
        fmt::format("{}: gave no answer in {:g} s",
                    program,
                    std::chrono::duration<double>(limit).count()));
  }
  return CommandEnd{ExitCode(child.native_exit_code()),
                    std::move(output.text),
                    std::move(complaints.text)};
}

}  // namespace gatedyno
