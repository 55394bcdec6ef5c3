// gatedyno release, on what the simulator gave.

#include <string>
#include <vector>

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using nlohmann::json;
using ::testing::ContainsRegex;
using ::testing::HasSubstr;
using ::testing::Not;
using ::testing::StartsWith;

// A two-input NAND of the arbiter, pull-down of so many width units.
std::string Gate(int pull_down) {
  const std::string n = std::to_string(pull_down);
  return ".subckt gate a b y vdd vss\n"
         "mp_a y  a vdd vdd pfet w={2*wunit} l={lgate}\n"
         "mp_b y  b vdd vdd pfet w={2*wunit} l={lgate}\n"
         "mn_a y  a n1  vss nfet w={" +
         n +
         "*wunit} l={lgate}\n"
         "mn_b n1 b vss vss nfet w={" +
         n +
         "*wunit} l={lgate}\n"
         ".ends gate\n";
}

// Its falling arcs are about 15 % faster than by hand, as velocity saturation
// has it in stacks: beyond what the rule allows, and exempt.
json PlanWith(const std::vector<json>& exemptions) {
  json plan = {{"format", "gatedyno-plan/1"},
               {"title", "a gate of the arbiter"},
               {"node", "p45"},
               {"cells", {"gate.sp"}},
               {"tolerances",
                {{"effort", 0.5},
                 {"parasitic", 0.6},
                 {"rules", {{{"edge", "fall"}, {"effort", 0.05}}}}}}};
  if (!exemptions.empty()) {
    plan["exemptions"] = exemptions;
  }
  return plan;
}

const json kExemption = {{"cells", "gate"},
                         {"edge", "fall"},
                         {"quantity", "effort"},
                         {"reason", "stacks saturate early"},
                         {"author", "M. Ober"},
                         {"expires", "2030-06-30"}};

class ReleaseProgramTest : public testing::Test {
 protected:
  ReleaseProgramTest() {
    program_.Write("gate.sp", Gate(2));
    program_.Write("plan.json", PlanWith({kExemption}).dump());
    program_.Write("strict.json", PlanWith({}).dump());
  }

  Ended Run() const {
    return program_.Run({"run", "plan.json", "--store", "s.db"});
  }

  Ended Release(const std::string& plan,
                const std::vector<std::string>& more = {}) const {
    std::vector<std::string> arguments = {"release", "s.db", "--plan", plan};
    if (more.empty() || more.front() != "--date") {
      arguments.insert(arguments.end(), {"--date", "2026-12-02"});
    }
    arguments.insert(arguments.end(), more.begin(), more.end());
    return program_.Run(arguments);
  }

  const Program program_;
};

TEST_F(ReleaseProgramTest, GoesByExemptionsThatHoldOnTheDay) {
  // A run goes by verdicts alone.
  const Ended run = Run();
  EXPECT_EQ(run.exit_code, 1) << run.out << run.err;
  EXPECT_THAT(run.out, HasSubstr("needed by 2 of 2 arcs"));

  const Ended yes = Release("plan.json");
  EXPECT_EQ(yes.exit_code, 0) << yes.out << yes.err;
  EXPECT_EQ(yes.err, "");
  EXPECT_THAT(yes.out, StartsWith("release: yes\na gate of the arbiter\n"));
  EXPECT_THAT(yes.out, HasSubstr("4 arcs: 2 within, 2 beyond, 0 not measured"));
  EXPECT_THAT(yes.out, HasSubstr("\nexcused\n  gate a->y fall with b=1 at "));
  EXPECT_THAT(yes.out,
              HasSubstr("exempt until 2030-06-30: stacks saturate early "
                        "(M. Ober)\n"));
  EXPECT_THAT(yes.out, HasSubstr("Predictive device models are not a foundry"));

  const Ended expired = Release("plan.json", {"--date", "2030-07-01"});
  EXPECT_EQ(expired.exit_code, 1) << expired.out << expired.err;
  EXPECT_THAT(expired.out, StartsWith("release: no\n"));
  EXPECT_THAT(expired.out, HasSubstr("g was exempt until 2030-06-30"));

  const Ended strict = Release("strict.json");
  EXPECT_EQ(strict.exit_code, 1) << strict.out << strict.err;
  EXPECT_THAT(strict.out,
              HasSubstr("\nbeyond what is allowed\n  gate a->y fall"));
  EXPECT_THAT(strict.out, Not(HasSubstr("not in the store")));
}

// A netlist that is another has jobs of its own.
TEST_F(ReleaseProgramTest, TakesNoOldNumberForANewOne) {
  ASSERT_EQ(Run().err, "");
  program_.Write("gate.sp", Gate(3));
  const Ended changed = Release("plan.json");
  EXPECT_EQ(changed.exit_code, 1) << changed.out << changed.err;
  EXPECT_THAT(changed.out, HasSubstr("4 arcs: 0 within, 0 beyond, 4 not me"));
  EXPECT_THAT(changed.out,
              ContainsRegex("[0-9]+ jobs of the plan are not in the store\n"
                            "  gatedyno run plan.json --store s.db simulates "
                            "what is missing\n"));

  ASSERT_EQ(Run().err, "");
  const Ended revised =
      Release("plan.json", {"--baseline", "s.db", "--json", "r.json"});
  EXPECT_THAT(revised.out,
              ContainsRegex("\nmoved since the baseline\n  run 1 of s.db: 4 "
                            "arcs compared, [2-4] moved; only now: 0 arcs, "
                            "only then: 0 arcs\n  gate a->y rise with b=1 at "
                            "typical: g 1\\.[0-9]+ -> 1\\.[0-9]+, \\+[0-9.]+ "
                            "% \\(uncertainty"));
  const json read = json::parse(program_.Read("r.json"));
  EXPECT_EQ(read["decision"] == "yes", revised.exit_code == 0);
  EXPECT_EQ(read["missing_jobs"], 0);
  EXPECT_EQ(read["baseline"]["run"], 1);
  EXPECT_EQ(read["baseline"]["arcs"], 4);
}

}  // namespace
}  // namespace gatedyno
