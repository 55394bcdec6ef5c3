// Every way a deck can fail in ngspice 39.3 without its calls saying so.

#include "harness/worker/session.h"

#include <cmath>
#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/worker/measure.h"
#include "tests/support/shared_session.h"

namespace gatedyno {
namespace {

using testing::MatchesRegex;

constexpr double kStop = 10e-9;

// A deck around `body`; the input is a step at 1 ns.
Job StepDeck(const std::string& body) {
  Job job;
  job.deck = "a title\nvin in 0 pulse(0 1 1n 1f 1f 1 2)\n" + body +
             "\n.tran 10p 10n\n.end\n";
  job.intervals = {
      {"delay", {"in", 0.5, Edge::kRise, 1}, {"out", 0.5, Edge::kRise, 1}}};
  job.swings = {{"out", 0.1, 0.9}};
  job.stop_s = kStop;
  return job;
}

const Job& GoodJob() {
  static const Job& job = *new Job(StepDeck("r1 in out 1k\nc1 out 0 1p"));
  return job;
}

void ExpectGood() {
  const Outcome outcome = RunJob(GoodJob(), &SharedSession());
  ASSERT_TRUE(outcome.measured()) << outcome.message;
  constexpr double kLoose = 5e-12;  // The tight check is in rc_test.cc.
  EXPECT_NEAR(outcome.values_s.at("delay"), std::log(2.0) * 1e-9, kLoose);
  EXPECT_GT(outcome.simulator_s, 0.0);
}

TEST(SessionTest, SaysWhichSimulatorItIs) {
  const std::string& simulator = SharedSession().simulator();
  EXPECT_TRUE(simulator.starts_with("ngspice-")) << simulator;
  EXPECT_NE(simulator.find(", built "), std::string::npos) << simulator;
}

struct FailingRow {
  std::string name;
  std::string body;
  std::string message;  // A regular expression where `is_pattern`.
  bool is_pattern = false;
};

// A good job before each, whose numbers must not come back, and one after
// each, which must not be harmed.
TEST(SessionTest, AFailedDeckIsNeverThePreviousJob) {
  const FailingRow rows[] = {
      {"not parsed",
       "r1 in out 1k\n.bogus 1 2",
       "Error on line 4 or its substitute: .bogus 1 2; unimplemented control "
       "card - error"},
      {"missing include",
       ".include /nowhere/card.sp\nr1 in out 1k",
       "Error: Could not find include file /nowhere/card.sp"},
      {"unknown subcircuit",
       "x1 in out nosuch",
       "Error: unknown subckt: x1 in out nosuch"},
      {"refused parameter",
       "r1 in out 1k bogus=3",
       "Error on line 3 or its substitute: r1 in out 1k bogus=3; unknown "
       "parameter (bogus)"},
      {"no such model",
       "m1 out in 0 0 nope w=1u l=1u",
       "Error on line 3 or its substitute: m1 out in 0 0 nope w=1u l=1u; could "
       "not find a valid modelname"},
      {"width outside every bin",
       "m1 out in 0 0 nx w=50u l=1u\n"
       ".model nx.1 nmos level=54 version=4.8.0 wmin=1u wmax=2u lmin=.1u "
       "lmax=9u\n"
       ".model nx.2 nmos level=54 version=4.8.0 wmin=2u wmax=4u lmin=.1u "
       "lmax=9u",
       "Error on line 3 or its substitute: m1 out in 0 0 nx w=50u l=1u; could "
       "not find a valid modelname"},
      {"device refuses its size",
       "m1 out in 0 0 nx w=1u l=10n\n"
       ".model nx nmos level=54 version=4.8.0 lint=5n",
       "Fatal error: BSIM4: mosfet nx, model m1: Effective channel length <= "
       "0; doAnalyses: no such parameter on this device"},
      {"no operating point",
       "r1 in out 1k\nv2 in 0 0.5",
       "Error: Transient op failed, timestep too small; doAnalyses: TRAN:  "
       "Timestep too small; initial timepoint: cause unrecorded."},
      {"no convergence on the way",
       "r1 in out 1k\nc1 out 0 1p\nrq q 0 1k\n"
       "b1 q 0 i = v(out) > 0.5 ? 1e3*(v(q) > 0 ? 1 : -1) : 0",
       "doAnalyses: TRAN:  Timestep too small; time = 1\\.[67].*e-09, timestep "
       "= .*: trouble with node \"q\"",
       true},
      {"stops before the end",
       "r1 in out 1k\nc1 out 0 1p\n.options autostop\n"
       ".meas tran d trig v(in) val=.5 rise=1 targ v(out) val=.5 rise=1",
       "the simulation ended at 1\\.[67].*e-09 s and not at 1e-08 s",
       true},
      {"floating output",
       "r1 in x 1k\nc1 out 0 1p\nr2 out 0 1g",
       "v(out) does not swing from below 0.1 V to above 0.9 V (it stays "
       "between 0.00 and 0.00 V): look for a floating net or supply, or a "
       "contention"},
      {"no such net",
       "r1 in x 1k\nr2 x 0 1k",
       "v(out): the deck has no such net"},
  };
  for (const FailingRow& row : rows) {
    SCOPED_TRACE(row.name);
    ExpectGood();
    const Outcome outcome = RunJob(StepDeck(row.body), &SharedSession());
    EXPECT_EQ(outcome.ending, Ending::kFailed);
    EXPECT_TRUE(outcome.values_s.empty());
    if (row.is_pattern) {
      EXPECT_THAT(outcome.message, MatchesRegex(row.message));
    } else {
      EXPECT_EQ(outcome.message, row.message);
    }
    ASSERT_TRUE(SharedSession().usable());
  }
  ExpectGood();
}

TEST(SessionTest, ACrossingThatIsNeverReachedSaysWhatHappened) {
  Job job = StepDeck("r1 in out 1k\nr2 out 0 1k");
  job.swings.clear();
  job.intervals[0].to.level_v = 0.75;
  const Outcome outcome = RunJob(job, &SharedSession());
  EXPECT_EQ(outcome.ending, Ending::kFailed);
  EXPECT_EQ(outcome.message,
            "delay: v(out) never rises through 0.75 V within 1e-08 s (it stays "
            "between 0.00 and 0.50 V)");
}

struct WholeDeckRow {
  std::string deck;
  std::string message;
};

TEST(SessionTest, RefusesWhatIsNoDeck) {
  const WholeDeckRow rows[] = {
      {"", "Error: there aren't any circuits loaded."},
      {"title only\n", "Error: .end statement is missing in netlist!"},
      {"t\nr1 in 0 1k\n", "Error: .end statement is missing in netlist!"},
      {"t\nvin in 0 1\nr1 in 0 1k\n.end\n",
       "Warning: No job (tran, ac, op etc.) defined:"},
      {"t\nvin in 0 1\nr1 in 0 1k\n.op\n.end\n",
       "the deck runs no transient analysis"},
  };
  for (const WholeDeckRow& row : rows) {
    ExpectGood();
    Job job = GoodJob();
    job.deck = row.deck;
    const Outcome outcome = RunJob(job, &SharedSession());
    EXPECT_EQ(outcome.ending, Ending::kFailed);
    EXPECT_EQ(outcome.message, row.message) << row.deck;
  }
  ExpectGood();
}

struct NetRow {
  std::string net;
  bool found;
};

// `c` and `boltz` are constants of the simulator too; a bare name would give
// the constant.
TEST(SessionTest, ANetIsANetAndNotAConstant) {
  const std::string deck =
      "t\nv1 c 0 pulse(0 1 1n 1f 1f 1 2)\nx1 c 0 rc\n"
      ".subckt rc a b\nr1 a m 1k\nc1 m b 1p\n.ends\n"
      "r9 c 5 1k\nc9 5 0 1p\n.tran 10p 10n\n.end\n";
  const NetRow rows[] = {{"c", true},
                         {"5", true},
                         {"x1.m", true},
                         {"X1.M", true},
                         {"boltz", false},
                         {"e", false},
                         {"m", false}};
  for (const NetRow& row : rows) {
    const auto waveforms = SharedSession().Run(deck, {row.net}, kStop);
    ASSERT_EQ(waveforms.ok(), row.found) << row.net;
    if (!row.found) {
      EXPECT_EQ(waveforms.error().message,
                "v(" + row.net + "): the deck has no such net");
    } else {
      EXPECT_EQ(waveforms->front().time_s.size(),
                waveforms->front().voltage_v.size());
      EXPECT_NEAR(waveforms->front().voltage_v.back(), 1.0, 1e-3);
    }
  }
}

TEST(SessionTest, TheSameDeckGivesTheSameBitsWhateverRanBefore) {
  const auto first = SharedSession().Run(GoodJob().deck, {"out"}, kStop);
  RunJob(StepDeck(".options reltol=1e-6\nr1 in out 2k\nc1 out 0 3p"),
         &SharedSession());
  const auto second = SharedSession().Run(GoodJob().deck, {"out"}, kStop);
  ASSERT_TRUE(first.ok() && second.ok());
  EXPECT_EQ(first->front().time_s, second->front().time_s);
  EXPECT_EQ(first->front().voltage_v, second->front().voltage_v);
}

TEST(SessionTest, DecksWithOtherLineEndsRun) {
  Job job = GoodJob();
  std::string deck;
  for (const char c : job.deck) {
    deck += c == '\n' ? "\r\n" : std::string(1, c);
  }
  deck.resize(deck.size() - 2);  // And none at the end.
  job.deck = deck;
  EXPECT_TRUE(RunJob(job, &SharedSession()).measured());
}

}  // namespace
}  // namespace gatedyno
