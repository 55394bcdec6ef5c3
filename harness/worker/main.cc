// The program gatedyno-worker: does jobs until its input ends.

#include <charconv>
#include <csignal>
#include <cstdint>
#include <cstdio>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <sys/prctl.h>
#include <sys/resource.h>
#include <unistd.h>

#include "harness/sim/protocol.h"
#include "harness/worker/channel.h"
#include "harness/worker/measure.h"
#include "harness/worker/session.h"

namespace gatedyno {
namespace {

constexpr int kExitFine = 0;
constexpr int kExitFailed = 1;
constexpr int kExitMisused = 2;

int Complain(int exit_code, std::string_view message) {
  fmt::print(stderr, "gatedyno-worker: {}\n", message);
  return exit_code;
}

// Dies with the program that started it, leaves no core files, and is not
// ended by the Ctrl-C meant for that program, which ends its jobs in order.
void TieToParent() {
  ::prctl(PR_SET_PDEATHSIG, SIGKILL);
  const rlimit no_core = {0, 0};
  ::setrlimit(RLIMIT_CORE, &no_core);
  std::signal(SIGINT, SIG_IGN);
  std::signal(SIGPIPE, SIG_IGN);
}

Status LimitMemory(std::string_view argument, std::string_view value) {
  rlim_t bytes = 0;
  const auto [end, failed] =
      std::from_chars(value.data(), value.data() + value.size(), bytes);
  if (failed != std::errc() || end != value.data() + value.size()) {
    return BadInput(fmt::format("{}: expected a number of bytes", argument));
  }
  const rlimit limit = {bytes, bytes};
  if (::setrlimit(RLIMIT_AS, &limit) != 0) {
    return Unavailable(fmt::format("{}: refused by the system", argument));
  }
  return Ok();
}

int PrintVersion() {
  const Result<std::unique_ptr<Session>> session = Session::Start();
  if (!session.ok()) {
    return Complain(kExitFailed, session.error().message);
  }
  fmt::print(
      "gatedyno-worker {} ({})\n", GATEDYNO_VERSION, (*session)->simulator());
  return kExitFine;
}

Status DoJobs(Channel* channel, Session* session) {
  while (true) {
    const Result<std::optional<std::string>> text = channel->Receive();
    if (!text.ok()) {
      return Forward(text);
    }
    if (!text->has_value()) {
      return Ok();
    }
    const Result<Job> job = ParseJob(**text);
    if (!job.ok()) {
      return Forward(job);
    }
    const Outcome outcome = RunJob(*job, session);
    const bool leaving = !session->usable();
    Status sent = channel->Send(ReplyText({outcome, leaving}));
    if (!sent.ok() || leaving) {
      return sent;
    }
  }
}

int Serve() {
  TieToParent();
  Result<Channel> channel = Channel::TakeStandard();
  if (!channel.ok()) {
    return Complain(kExitFailed, channel.error().message);
  }
  const Result<std::unique_ptr<Session>> session = Session::Start();
  if (!session.ok()) {
    return Complain(kExitFailed, session.error().message);
  }
  Hello hello;
  hello.worker = GATEDYNO_VERSION;
  hello.simulator = (*session)->simulator();
  Status status = channel->Send(HelloText(hello));
  if (status.ok()) {
    status = DoJobs(&*channel, session->get());
  }
  return status.ok() ? kExitFine
                     : Complain(kExitFailed, status.error().message);
}

int Main(const std::vector<std::string_view>& arguments) {
  constexpr std::string_view kMemoryLimit = "--memory-limit-bytes=";
  for (const std::string_view argument : arguments) {
    if (argument == "--version") {
      return PrintVersion();
    }
    if (!argument.starts_with(kMemoryLimit)) {
      return Complain(kExitMisused,
                      fmt::format("{}: no such option", argument));
    }
    const Status limited =
        LimitMemory(argument, argument.substr(kMemoryLimit.size()));
    if (!limited.ok()) {
      return Complain(kExitMisused, limited.error().message);
    }
  }
  if (::isatty(STDIN_FILENO) == 1) {
    return Complain(kExitMisused,
                    "started by gatedyno, to read jobs from its standard "
                    "input; by hand it only answers --version");
  }
  return Serve();
}

}  // namespace
}  // namespace gatedyno

int main(int argc, char** argv) {
  return gatedyno::Main({argv + 1, argv + argc});
}
