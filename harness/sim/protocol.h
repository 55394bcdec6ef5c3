// What the pool and a worker say to each other, one JSON text a frame:
//
//   worker  hello                      once, when it is ready for jobs
//   pool    job                        (record/job_json.h)
//   worker  reply                      one a job, in the order of the jobs
//
// The worker leaves when its input ends, or after a reply marked `leaving`.

#ifndef GATEDYNO_SIM_PROTOCOL_H_
#define GATEDYNO_SIM_PROTOCOL_H_

#include <string>
#include <string_view>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"

namespace gatedyno {

// Raised whenever either side would misread the other.
inline constexpr int kProtocolVersion = 2;

struct Hello {
  int protocol = kProtocolVersion;
  std::string worker;     // Version of the worker program: "0.1.0".
  std::string simulator;  // Name and version, in the simulator's own words.

  bool operator==(const Hello&) const = default;
};

struct Reply {
  Outcome outcome;
  // The simulator cannot go on: the worker ends by itself after this reply,
  // and jobs already sent to it must go to another.
  bool leaving = false;
};

std::string HelloText(const Hello& hello);
// Fails for another protocol version: two builds are mixed.
Result<Hello> ParseHello(std::string_view text);

// Fails when the job is too long for a frame.
Result<std::string> JobText(const Job& job);
Result<Job> ParseJob(std::string_view text);

// A reply whose waves are too long for a frame says so in their place: its
// outcome is failed.
std::string ReplyText(const Reply& reply);
Result<Reply> ParseReply(std::string_view text);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_PROTOCOL_H_
