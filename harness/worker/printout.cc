#include "harness/worker/printout.h"

#include <algorithm>
#include <array>

#include "harness/base/text.h"

namespace gatedyno {
namespace {

// How a complaint begins, in lower case.  Each was seen from ngspice 39.3 for
// a deck of tests/worker/session_test.cc; lines that only follow another
// complaint are here too, in case a version drops the first.
constexpr std::array<std::string_view, 13> kComplaintStarts = {
    "error",
    "fatal",
    "netlist line no.",
    "doanalyses:",
    "run simulation(s) aborted",
    "run simulation not started",
    "could not find a valid modelname",
    "unknown subckt",
    "circuit not parsed",
    "warning: no job",
    "malloc:",
    "calloc:",
    "realloc:",
};

// Said after the real reason, and no help to anybody.
constexpr std::array<std::string_view, 6> kEchoes = {
    "error: there aren't any circuits loaded.",
    "error: circuit not parsed.",
    "error: ngspice.dll cannot recover and awaits to be detached",
    "please check your input netlist.",
    "run simulation(s) aborted",
    "run simulation not started",
};

constexpr std::string_view kErrorStream = "stderr ";
constexpr std::string_view kOutputStream = "stdout ";

std::string_view Trim(std::string_view text) {
  constexpr std::string_view kBlanks = " \t\r\n";
  const size_t first = text.find_first_not_of(kBlanks);
  if (first == std::string_view::npos) {
    return {};
  }
  return text.substr(first, text.find_last_not_of(kBlanks) - first + 1);
}

bool StartsComplaint(std::string_view text) {
  const std::string lower = ToLower(text);
  return std::any_of(
      kComplaintStarts.begin(),
      kComplaintStarts.end(),
      [&](std::string_view start) { return lower.starts_with(start); });
}

bool IsEcho(std::string_view text) {
  return std::find(kEchoes.begin(), kEchoes.end(), ToLower(text)) !=
         kEchoes.end();
}

}  // namespace

void Printout::Add(std::string_view line) {
  const bool is_error = line.starts_with(kErrorStream);
  if (is_error || line.starts_with(kOutputStream)) {
    line.remove_prefix(kErrorStream.size());
  }
  const std::string_view text = Trim(line);
  lines_.emplace_back(text);
  // Lines after a complaint explain it: the netlist line, the parameter.
  if (is_error && !text.empty() && (complained() || StartsComplaint(text))) {
    complaints_.emplace_back(text);
  }
}

void Printout::Clear() {
  lines_.clear();
  complaints_.clear();
}

std::string Printout::Complaint() const {
  const bool only_echoes = std::all_of(
      complaints_.begin(), complaints_.end(), [](const std::string& line) {
        return IsEcho(line);
      });
  std::string text;
  for (const std::string& line : complaints_) {
    if (IsEcho(line) && !only_echoes) {
      continue;
    }
    if (!text.empty()) {
      text += text.ends_with(':') ? " " : "; ";
    }
    text += line;
  }
  if (text.size() > kMaxComplaintBytes) {
    text.resize(kMaxComplaintBytes);
    text += "...";
  }
  return text;
}

}  // namespace gatedyno
