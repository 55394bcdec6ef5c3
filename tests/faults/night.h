// One plan, run again and again while something dies; and what must be in its
// store at the end.

#ifndef GATEDYNO_TESTS_FAULTS_NIGHT_H_
#define GATEDYNO_TESTS_FAULTS_NIGHT_H_

#include <filesystem>
#include <map>
#include <string>
#include <vector>

#include <boost/process.hpp>
#include <sys/types.h>

#include "harness/record/outcome.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {

// How a job ended, but for how long it took.
struct Ended {
  Ending ending = Ending::kFailed;
  std::map<std::string, double> values_s;
  int rung = 0;

  bool operator==(const Ended&) const = default;
};
using Points = std::map<std::string, Ended>;  // By key.

// All that is in a store; doubles as they are, bit for bit.
Points PointsIn(const std::filesystem::path& store);

// Of the plan, run once without any disturbance.
const Points& Undisturbed();

// A started `gatedyno run` of the plan.
class Night {
 public:
  explicit Night(const std::filesystem::path& store,
                 const std::vector<std::string>& more_options = {});
  ~Night();
  Night(const Night&) = delete;
  Night& operator=(const Night&) = delete;

  bool running() { return process_.running(); }
  pid_t pid() const { return process_.id(); }
  std::vector<pid_t> Workers() const;
  // Exit code; 128 + the signal's number where one ended it.
  int Wait();
  std::string Words();  // Its standard error.  REQUIRES: Wait().

 private:
  TemporaryFolder streams_;
  boost::process::child process_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_FAULTS_NIGHT_H_
