// A worker without a simulator, for the pool's tests.  The deck's first line
// says what it does with the job; see kDeeds.

#include <csignal>
#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <map>
#include <string>
#include <string_view>
#include <thread>

#include <fmt/format.h>
#include <unistd.h>

#include "harness/base/result.h"
#include "harness/sim/frame.h"
#include "harness/sim/protocol.h"

namespace gatedyno {
namespace {

constexpr int kFakeExitCode = 3;

void Write(std::string_view bytes) {
  std::fwrite(bytes.data(), 1, bytes.size(), stdout);
  std::fflush(stdout);
}

// A number that depends on the deck alone.
double ValueOf(const std::string& deck) {
  double value = 0.0;
  for (const char c : deck) {
    value = value * 0.5 + c;
  }
  return value;
}

Reply Answer(const Job& job) {
  Reply reply;
  reply.outcome.ending = Ending::kMeasured;
  reply.outcome.values_s = {{"value", ValueOf(job.deck)},
                            {"worker", static_cast<double>(::getpid())}};
  return reply;
}

void Echo(const Job& job) {
  Write(EncodeFrame(ReplyText(Answer(job))));
}

void Leave(const Job& job) {
  Reply reply = Answer(job);
  reply.leaving = true;
  Write(EncodeFrame(ReplyText(reply)));
  std::_Exit(0);
}

// Without core files, and past any handler a sanitizer installed.
[[noreturn]] void DieBy(int signal) {
  std::signal(signal, SIG_DFL);
  ::raise(signal);
  std::abort();
}

void Crash(const Job& /*job*/) {
  DieBy(SIGSEGV);
}

void CrashWithWords(const Job& /*job*/) {
  std::fputs("malloc(): corrupted top size\nsecond line\n", stderr);
  DieBy(SIGABRT);
}

// The job's label names a file: missing, it is made and the worker dies.
void CrashOnce(const Job& job) {
  if (std::filesystem::exists(job.label)) {
    Echo(job);
    return;
  }
  std::ofstream(job.label) << "crashed\n";
  DieBy(SIGKILL);
}

void Hang(const Job& /*job*/) {
  while (true) {
    ::pause();
  }
}

void Exit(const Job& /*job*/) {
  std::_Exit(kFakeExitCode);
}

void Babble(const Job& /*job*/) {
  Write("Note: no compatibility mode selected!\n");
}

void SendHalfAFrame(const Job& job) {
  const std::string frame = EncodeFrame(ReplyText(Answer(job)));
  Write(std::string_view(frame).substr(0, 10));
  std::_Exit(0);
}

void SendNoJson(const Job& /*job*/) {
  Write(EncodeFrame("hello?"));
}

void SendNoOutcome(const Job& /*job*/) {
  Write(EncodeFrame("{}"));
}

void ReplyTwice(const Job& job) {
  Echo(job);
  Echo(job);
}

// More on standard error than a pipe holds, then the answer.
void Chatter(const Job& job) {
  for (int i = 0; i < 20'000; ++i) {
    std::fputs("a line of chatter\n", stderr);
  }
  Echo(job);
}

void Doze(const Job& job) {
  std::this_thread::sleep_for(std::chrono::milliseconds(20));
  Echo(job);
}

// Measures only with the settings "careful".
void RefuseUnlessCareful(const Job& job) {
  if (job.settings.at(0) == "careful\n") {
    Echo(job);
    return;
  }
  const std::string settings = job.settings.at(0);
  Reply reply;
  reply.outcome.message =
      "refused with " + settings.substr(0, settings.find('\n'));
  Write(EncodeFrame(ReplyText(reply)));
}

using Deed = void (*)(const Job& job);
const std::map<std::string_view, Deed>& Deeds() {
  static const auto& deeds = *new std::map<std::string_view, Deed>{
      {"echo", Echo},
      {"leave", Leave},
      {"crash", Crash},
      {"crash with words", CrashWithWords},
      {"crash once", CrashOnce},
      {"hang", Hang},
      {"exit", Exit},
      {"babble", Babble},
      {"half a frame", SendHalfAFrame},
      {"no json", SendNoJson},
      {"no outcome", SendNoOutcome},
      {"reply twice", ReplyTwice},
      {"chatter", Chatter},
      {"doze", Doze},
      {"refuse unless careful", RefuseUnlessCareful},
  };
  return deeds;
}

void Do(const std::string& text) {
  const Result<Job> job = ParseJob(text);
  if (!job.ok()) {
    std::_Exit(1);
  }
  const std::string deed = job->deck.substr(0, job->deck.find('\n'));
  const auto found = Deeds().find(deed);
  if (found == Deeds().end()) {
    std::_Exit(1);
  }
  found->second(*job);
}

int Main() {
  Hello hello;
  hello.worker = "fake";
  hello.simulator = "none";
  Write(EncodeFrame(HelloText(hello)));
  FrameReader frames;
  char chunk[4096];
  while (true) {
    const ssize_t got = ::read(STDIN_FILENO, chunk, sizeof chunk);
    if (got <= 0) {
      return 0;
    }
    frames.Append({chunk, static_cast<size_t>(got)});
    for (auto text = frames.Next(); text.ok() && text->has_value();
         text = frames.Next()) {
      Do(**text);
    }
  }
}

}  // namespace
}  // namespace gatedyno

int main() {
  return gatedyno::Main();
}
