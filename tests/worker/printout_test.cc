#include "harness/worker/printout.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct PrintoutRow {
  std::vector<std::string> lines;  // As ngspice 39.3 sent them.
  std::string complaint;
};

TEST(PrintoutTest, HearsComplaintsAndNothingElse) {
  const PrintoutRow rows[] = {
      {{}, ""},
      // A good run, and remarks that are none of our business.
      {{"stdout Circuit: error in the title is none",
        "stdout Error: said on the wrong stream",
        "stderr Warning: singular matrix:  check node out",
        "stderr Note: One successful gmin step",
        "stderr Warning: there is no circuit loaded.",
        "stderr out of interval",
        "stderr .meas tran tf trig v(out) val=0.5 rise=1 failed!"},
       ""},
      {{"stderr Error on line 3 or its substitute:",
        "stderr r1 in 0 1k bogus=3",
        "stderr unknown parameter (bogus) ",
        "stderr Error: circuit not parsed.",
        ""},
       "Error on line 3 or its substitute: r1 in 0 1k bogus=3; unknown "
       "parameter (bogus)"},
      {{"stderr Fatal error: BSIM4: mosfet nx, model m1: Effective channel "
        "length <= 0",
        "stderr doAnalyses: no such parameter on this device\n",
        "stderr run simulation(s) aborted\n"},
       "Fatal error: BSIM4: mosfet nx, model m1: Effective channel length <= "
       "0; doAnalyses: no such parameter on this device"},
      // Nothing better to say.
      {{"stderr Error: there aren't any circuits loaded."},
       "Error: there aren't any circuits loaded."},
  };
  for (const PrintoutRow& row : rows) {
    Printout printout;
    for (const std::string& line : row.lines) {
      printout.Add(line);
    }
    EXPECT_EQ(printout.complained(), !row.complaint.empty());
    EXPECT_EQ(printout.Complaint(), row.complaint);
  }
}

TEST(PrintoutTest, CutsALongComplaint) {
  Printout printout;
  for (int i = 0; i < 1000; ++i) {
    printout.Add("stderr Error: no such thing");
  }
  const std::string complaint = printout.Complaint();
  EXPECT_EQ(complaint.size(), kMaxComplaintBytes + 3);
  EXPECT_TRUE(complaint.ends_with("..."));
}

TEST(PrintoutTest, ForgetsTheCircuitBefore) {
  Printout printout;
  printout.Add("stderr Error: unknown subckt: x1 a b");
  printout.Clear();
  EXPECT_FALSE(printout.complained());
  EXPECT_TRUE(printout.lines().empty());
}

}  // namespace
}  // namespace gatedyno
