// A chain of inverters of level-1 devices: the multiplicity of a load, and an
// independent simulator.

#include <fstream>
#include <sstream>
#include <string>
#include <vector>

#include <boost/process.hpp>
#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/spice_number.h"
#include "harness/worker/measure.h"
#include "tests/support/ngspice_batch.h"
#include "tests/support/shared_session.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

constexpr double kSupply = 1.8;
constexpr double kStop = 2.1e-9;

// Gate and overlap capacitance only: what both simulators compute for level 1.
// A made-up 180 nm-like card.
constexpr std::string_view kCards =
    ".model nch nmos (level=1 vto=0.4 kp=200u gamma=0.4 phi=0.7 lambda=0.05 "
    "tox=4n cgso=0.3n cgdo=0.3n)\n"
    ".model pch pmos (level=1 vto=-0.4 kp=80u gamma=0.4 phi=0.7 lambda=0.05 "
    "tox=4n cgso=0.3n cgdo=0.3n)\n"
    "vdd vdd 0 1.8\n"
    "vin n1 0 pulse(0 1.8 0.1n 20p 20p 1n 2.2n)\n";

constexpr std::string_view kSettings =
    ".options reltol=1e-5 chgtol=1e-18 trtol=1 num_threads=1\n"
    ".tran 1p 2.1n 0 0.5p\n";

// How one inverter, `width` times the smallest and `m` times over, is written.
using Inverter = std::string (*)(
    int index, std::string_view in, std::string_view out, double width, int m);

std::string MLines(
    int index, std::string_view in, std::string_view out, double width, int m) {
  return fmt::format(
      "m{0}n {2} {1} 0 0 nch w={3}u l=0.18u m={5}\n"
      "m{0}p {2} {1} vdd vdd pch w={4}u l=0.18u m={5}\n",
      index,
      in,
      out,
      width,
      2.0 * width,
      m);
}

std::string XLines(
    int index, std::string_view in, std::string_view out, double width, int m) {
  return fmt::format(
      "x{0}n {2} {1} 0 0 ndev w={3}u l=0.18u m={5}\n"
      "x{0}p {2} {1} vdd vdd pdev w={4}u l=0.18u m={5}\n",
      index,
      in,
      out,
      width,
      2.0 * width,
      m);
}

std::string Copies(
    int index, std::string_view in, std::string_view out, double width, int m) {
  std::string lines;
  for (int copy = 0; copy < m; ++copy) {
    lines += MLines(index * 100 + copy, in, out, width, 1);
  }
  return lines;
}

// Two shaping stages, the stage measured, its load, and the load's load.
std::string ChainDeck(std::string_view wrappers, Inverter load) {
  std::string deck = "a chain of inverters\n";
  deck += kCards;
  deck += wrappers;
  deck += MLines(1, "n1", "n2", 1.0, 1);
  deck += MLines(2, "n2", "n3", 1.0, 1);
  deck += load(3, "n3", "n4", 1.0, 4);
  deck += load(4, "n4", "n5", 4.0, 4);
  deck += kSettings;
  return deck + ".end\n";
}

Job ChainJob(std::string deck) {
  Job job;
  job.deck = std::move(deck);
  job.stop_s = kStop;
  constexpr double kHalf = kSupply / 2.0;
  job.intervals = {
      {"fall", {"n2", kHalf, Edge::kRise, 1}, {"n3", kHalf, Edge::kFall, 1}},
      {"rise", {"n2", kHalf, Edge::kFall, 1}, {"n3", kHalf, Edge::kRise, 1}}};
  job.swings = {{"n3", 0.1 * kSupply, 0.9 * kSupply}};
  return job;
}

std::map<std::string, double> Delays(const std::string& deck) {
  const Outcome outcome = RunJob(ChainJob(deck), &SharedSession());
  EXPECT_TRUE(outcome.measured()) << outcome.message << "\n" << deck;
  return outcome.values_s;
}

struct WrapperRow {
  std::string name;
  std::string wrappers;
  Inverter load;
};

// Tried, ngspice 39.3: `m` on an X line that calls a subcircuit directly
// reaches its device lines, whether the subcircuit stands above or below,
// unless it declares `m` without using it (the test after this one).
TEST(ChainTest, MultiplicityEqualsCopies) {
  constexpr double kTolerance = 1e-4;  // Of the delay.
  const std::string plain =
      ".subckt ndev d g s b w=1u l=1u\nm1 d g s b nch w={w} l={l}\n.ends\n"
      ".subckt pdev d g s b w=1u l=1u\nm1 d g s b pch w={w} l={l}\n.ends\n";
  const std::string declared =
      ".subckt ndev d g s b w=1u l=1u m=1\nm1 d g s b nch w={w} l={l} m={m}\n"
      ".ends\n"
      ".subckt pdev d g s b w=1u l=1u m=1\nm1 d g s b pch w={w} l={l} m={m}\n"
      ".ends\n";
  const WrapperRow rows[] = {
      {"device lines", "", MLines},
      {"wrapper without m", plain, XLines},
      {"wrapper that declares and uses m", declared, XLines},
  };
  const auto copies = Delays(ChainDeck("", Copies));
  for (const WrapperRow& row : rows) {
    for (const auto& [name, delay_s] :
         Delays(ChainDeck(row.wrappers, row.load))) {
      EXPECT_NEAR(delay_s, copies.at(name), kTolerance * copies.at(name))
          << row.name << " " << name;
    }
  }
}

// The same check finds the two ways in which the simulator loses it: the
// delay is then far from that of four copies.
TEST(ChainTest, LostMultiplicityIsFarFromCopies) {
  const std::string unused =
      ".subckt ndev d g s b w=1u l=1u m=1\nm1 d g s b nch w={w} l={l}\n.ends\n"
      ".subckt pdev d g s b w=1u l=1u m=1\nm1 d g s b pch w={w} l={l}\n.ends\n";
  const std::string two_deep =
      ".subckt inner_n d g s b w=1u l=1u\nm1 d g s b nch w={w} l={l}\n.ends\n"
      ".subckt inner_p d g s b w=1u l=1u\nm1 d g s b pch w={w} l={l}\n.ends\n"
      ".subckt ndev d g s b w=1u l=1u\nx1 d g s b inner_n w={w} l={l}\n.ends\n"
      ".subckt pdev d g s b w=1u l=1u\nx1 d g s b inner_p w={w} l={l}\n.ends\n";
  const WrapperRow rows[] = {
      {"wrapper that declares m and ignores it", unused, XLines},
      {"wrapper in a wrapper, above the call", two_deep, XLines},
  };
  const auto copies = Delays(ChainDeck("", Copies));
  for (const WrapperRow& row : rows) {
    for (const auto& [name, delay_s] :
         Delays(ChainDeck(row.wrappers, row.load))) {
      EXPECT_LT(delay_s, 0.6 * copies.at(name)) << row.name << " " << name;
    }
  }
}

TEST(ChainTest, AgreesWithTheSameDeckInBatch) {
  // What the batch log draws as straight lines are curves here; to all digits:
  // tests/measured/exported_deck_test.cc.
  constexpr double kTolerance = 1e-4;
  std::string deck = ChainDeck("", MLines);
  const auto delays = Delays(deck);
  deck.insert(deck.find(".end\n"),
              ".meas tran fall trig v(n2) val=.9 rise=1 targ v(n3) val=.9 "
              "fall=1\n"
              ".meas tran rise trig v(n2) val=.9 fall=1 targ v(n3) val=.9 "
              "rise=1\n");
  const Result<BatchMeasures> batch = RunBatch(deck);
  ASSERT_TRUE(batch.ok()) << batch.error().message;
  for (const auto& [name, delay_s] : delays) {
    EXPECT_NEAR(delay_s, batch->at(name), kTolerance * delay_s) << name;
  }
}

// What gnucap prints: time, v(n2), v(n3) a line.
std::vector<Waveform> ReadPrinted(std::istream& printed) {
  std::vector<Waveform> waveforms = {{"n2", {}, {}}, {"n3", {}, {}}};
  for (std::string line; std::getline(printed, line);) {
    std::istringstream words(line);
    std::vector<double> numbers;
    for (std::string word; words >> word;) {
      const Result<double> number = ParseSpiceNumber(word);
      if (number.ok()) {
        numbers.push_back(*number);
      }
    }
    if (numbers.size() == 1 + waveforms.size()) {
      for (size_t i = 0; i < waveforms.size(); ++i) {
        waveforms[i].time_s.push_back(numbers[0]);
        waveforms[i].voltage_v.push_back(numbers[i + 1]);
      }
    }
  }
  return waveforms;
}

// gnucap takes neither num_threads nor a largest step; it steps as it prints.
std::string GnucapDeck() {
  return fmt::format(
      "a chain of inverters\n{}{}{}"
      ".options dtmin=1e-17 numdgt=8\n.width out=132\n"
      ".print tran v(n2) v(n3)\n.tran 1p 2.1n\n.end\n",
      kCards,
      MLines(1, "n1", "n2", 1.0, 1) + MLines(2, "n2", "n3", 1.0, 1),
      "c3 n3 0 20f\n");
}

std::string SameDeckForUs() {
  std::string deck = GnucapDeck();
  const size_t options = deck.find(".options");
  deck.replace(options, std::string::npos, kSettings);
  return deck + ".end\n";
}

// An independent simulator, with its own level-1 model and integration.
TEST(ChainTest, AgreesWithAnIndependentSimulator) {
  constexpr double kTolerance = 0.01;  // Two programs, two step controls.
  namespace bp = boost::process;
  const auto program = bp::search_path("gnucap");
  if (program.empty()) {
    GTEST_SKIP() << "gnucap is not installed: no second opinion on the chain";
  }
  TemporaryFolder folder;
  const auto deck = folder.Write("chain.ckt", GnucapDeck());
  const auto printed = folder.path() / "printed";
  ASSERT_EQ(bp::system(program,
                       "-b",
                       deck.string(),
                       bp::std_out > printed.string(),
                       bp::std_err > bp::null,
                       bp::std_in < bp::null),
            0);
  std::ifstream stream(printed);
  const std::vector<Waveform> waveforms = ReadPrinted(stream);
  if (waveforms.front().time_s.size() < 2) {
    GTEST_SKIP() << "gnucap runs without its plugins (package "
                    "gnucap-default-plugins0): no second opinion";
  }
  const std::string ours = SameDeckForUs();
  const Outcome theirs = Measure(ChainJob(ours), waveforms);
  ASSERT_TRUE(theirs.measured()) << theirs.message;
  for (const auto& [name, delay_s] : Delays(ours)) {
    EXPECT_NEAR(theirs.values_s.at(name), delay_s, kTolerance * delay_s)
        << name;
  }
}

}  // namespace
}  // namespace gatedyno
