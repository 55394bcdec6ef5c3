// What the simulator said during one circuit, and whether it complained.
//
// ngspice's calls return 0 whatever happens (tried: circuit not parsed, missing
// include, unknown subcircuit, refused parameter), so its words are the first
// of three judges; the plot and its last time point are the others.

#ifndef GATEDYNO_WORKER_PRINTOUT_H_
#define GATEDYNO_WORKER_PRINTOUT_H_

#include <string>
#include <string_view>
#include <vector>

namespace gatedyno {

class Printout {
 public:
  // `line` as the simulator sends it: "stderr Error: ...", "stdout ...".
  // Only what goes to its standard error can be a complaint.
  void Add(std::string_view line);
  void Clear();

  bool complained() const { return !complaints_.empty(); }

  // From the first complaint on, as one line of at most kMaxComplaintBytes.
  // Empty when there is none.
  std::string Complaint() const;

  // Everything said, for the version line.
  const std::vector<std::string>& lines() const { return lines_; }

 private:
  std::vector<std::string> lines_;
  std::vector<std::string> complaints_;
};

inline constexpr size_t kMaxComplaintBytes = 600;

}  // namespace gatedyno

#endif  // GATEDYNO_WORKER_PRINTOUT_H_
