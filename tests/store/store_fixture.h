// A folder of its own for each test, and jobs to keep in a store there.

#ifndef GATEDYNO_TESTS_STORE_STORE_FIXTURE_H_
#define GATEDYNO_TESTS_STORE_STORE_FIXTURE_H_

#include <cstdlib>
#include <filesystem>
#include <string>

#include <gtest/gtest.h>

#include "harness/base/fingerprint.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/store/store.h"

namespace gatedyno {

class StoreFixture : public testing::Test {
 protected:
  void SetUp() override {
    std::string pattern =
        (std::filesystem::temp_directory_path() / "gatedyno-XXXXXX").string();
    ASSERT_NE(mkdtemp(pattern.data()), nullptr);
    folder_ = pattern;
  }
  void TearDown() override { std::filesystem::remove_all(folder_); }

  std::filesystem::path Path() const { return folder_ / "runs.db"; }

  std::filesystem::path folder_;
};

inline Job ExampleJob(int number) {
  Job job;
  job.label = "nand2 a->y h=" + std::to_string(number) + " typical";
  job.deck = "* " + job.label + "\nM1 y a 0 0 nch\n.end\n";
  job.key = Fingerprint(job.deck);
  job.settings = {".options reltol=1e-4\n", ".options reltol=1e-5\n"};
  job.intervals = {
      {"delay", {"a", 0.5, Edge::kRise, 2}, {"y", 0.5, Edge::kFall, 1}}};
  job.swings = {{"y", 0.05, 0.95}};
  job.stop_s = 1e-9;
  job.time_limit_s = 30.0;
  return job;
}

inline Outcome MeasuredAs(double delay_s) {
  return {.ending = Ending::kMeasured,
          .values_s = {{"delay", delay_s}},
          .message = "",
          .simulator_s = 0.004,
          .rung = 1};
}

inline Outcome EndedAs(Ending ending, const std::string& message) {
  return {.ending = ending,
          .values_s = {},
          .message = message,
          .simulator_s = 0.0,
          .rung = 0};
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_STORE_STORE_FIXTURE_H_
