#include "harness/worker/session.h"

#include <algorithm>
#include <cassert>
#include <ctime>

#include <fmt/format.h>
#include <ngspice/sharedspice.h>

#include "harness/base/text.h"
#include "harness/worker/private_folder.h"

namespace gatedyno {
namespace {

// The last time point is computed by adding steps.
constexpr double kStopTolerance = 1e-6;

double ProcessorSeconds() {
  constexpr double kNanosecond = 1e-9;
  timespec now = {};
  ::clock_gettime(CLOCK_PROCESS_CPUTIME_ID, &now);
  return static_cast<double>(now.tv_sec) +
         static_cast<double>(now.tv_nsec) * kNanosecond;
}

// One string a line, without line ends.
std::vector<std::string> SplitLines(const std::string& deck) {
  std::vector<std::string> lines;
  size_t start = 0;
  while (start < deck.size()) {
    const size_t end = std::min(deck.find('\n', start), deck.size());
    std::string line = deck.substr(start, end - start);
    if (line.ends_with('\r')) {
      line.pop_back();
    }
    lines.push_back(std::move(line));
    start = end + 1;
  }
  return lines;
}

// What follows `label` on the first of `lines` that holds it.
std::string After(const std::vector<std::string>& lines,
                  std::string_view label) {
  for (const std::string& line : lines) {
    const size_t at = line.find(label);
    if (at != std::string::npos) {
      return line.substr(at + label.size());
    }
  }
  return {};
}

bool HasTransientPlot() {
  return std::string_view(ngSpice_CurPlot()).starts_with("tran");
}

}  // namespace

// The library's signature.
// NOLINTNEXTLINE(readability-non-const-parameter)
int Session::OnLine(char* line, int /*id*/, void* self) {
  static_cast<Session*>(self)->printout_.Add(line);
  return 0;
}

int Session::OnExit(int /*status*/,
                    bool /*immediate*/,
                    bool /*on_quit*/,
                    int /*id*/,
                    void* self) {
  // The library jumps back out of the call that is under way after this.
  static_cast<Session*>(self)->usable_ = false;
  return 0;
}

Result<std::unique_ptr<Session>> Session::Start() {
  [[maybe_unused]] static bool started = false;
  assert(!started);
  started = true;
  const Result<PrivateFolder> folder = PrivateFolder::Enter();
  if (!folder.ok()) {
    return Forward(folder);
  }
  std::unique_ptr<Session> session(new Session);
  ngSpice_Init(
      OnLine, nullptr, OnExit, nullptr, nullptr, nullptr, session.get());
  // Its two threads cost twice the processor time on small circuits.
  session->Command("set num_threads=1");
  session->printout_.Clear();
  session->Command("version -s");
  const std::vector<std::string>& said = session->printout_.lines();
  const std::string version = After(said, "ngspice-");
  if (version.empty()) {
    return Unavailable("the simulator does not say its version");
  }
  session->simulator_ = fmt::format(
      "ngspice-{}, built {}", version, After(said, "Creation Date: "));
  return session;
}

void Session::Command(std::string command) {
  ngSpice_Command(command.data());
}

Result<std::vector<Waveform>> Session::Run(const std::string& deck,
                                           const std::set<std::string>& nets,
                                           double stop_s) {
  assert(usable_);
  const double start_s = ProcessorSeconds();
  Result<std::vector<Waveform>> waveforms = RunAndRead(deck, nets, stop_s);
  last_run_s_ = ProcessorSeconds() - start_s;
  return waveforms;
}

Result<std::vector<Waveform>> Session::RunAndRead(
    const std::string& deck, const std::set<std::string>& nets, double stop_s) {
  if (const Status simulated = Simulate(deck); !simulated.ok()) {
    return Forward(simulated);
  }
  if (const Status reached = CheckReached(stop_s); !reached.ok()) {
    return Forward(reached);
  }
  const Result<std::vector<double>> time_s = Vector("time");
  if (!time_s.ok()) {
    return Forward(time_s);
  }
  std::vector<Waveform> waveforms;
  for (const std::string& net : nets) {
    Result<std::vector<double>> voltage_v = Vector(net);
    if (!voltage_v.ok() || voltage_v->size() != time_s->size()) {
      return BadInput(fmt::format("v({}): the deck has no such net", net));
    }
    waveforms.push_back({net, *time_s, std::move(*voltage_v)});
  }
  return waveforms;
}

Status Session::Simulate(const std::string& deck) {
  // A failed run leaves the plot of the one before in place: without this,
  // reading vectors would return the last job's numbers.
  Command("destroy all");
  Command("remcirc");
  printout_.Clear();
  std::vector<std::string> lines = SplitLines(deck);
  std::vector<char*> pointers;
  pointers.reserve(lines.size() + 1);
  for (std::string& line : lines) {
    pointers.push_back(line.data());
  }
  pointers.push_back(nullptr);
  ngSpice_Circ(pointers.data());
  if (usable_ && !printout_.complained()) {
    Command("run");
  }
  if (printout_.complained()) {
    return BadInput(printout_.Complaint());
  }
  if (!usable_) {
    return BadInput("the deck makes the simulator quit");
  }
  return Ok();
}

Status Session::CheckReached(double stop_s) {
  if (!HasTransientPlot()) {
    return BadInput("the deck runs no transient analysis");
  }
  const Result<std::vector<double>> time_s = Vector("time");
  const double last_s = time_s.ok() && !time_s->empty() ? time_s->back() : 0.0;
  if (last_s < stop_s * (1.0 - kStopTolerance)) {
    return BadInput(fmt::format(
        "the simulation ended at {:g} s and not at {:g} s", last_s, stop_s));
  }
  return Ok();
}

// Of the current plot, and only of it: a bare name like `c` would find the
// simulator's constant.
Result<std::vector<double>> Session::Vector(const std::string& name) {
  std::string full = fmt::format("{}.{}", ngSpice_CurPlot(), ToLower(name));
  const pvector_info found = ngGet_Vec_Info(full.data());
  if (found == nullptr || found->v_realdata == nullptr) {
    return BadInput(fmt::format("{}: no such vector", full));
  }
  // The structure is the library's only one: copied before the next call.
  return std::vector<double>(found->v_realdata,
                             found->v_realdata + found->v_length);
}

}  // namespace gatedyno
