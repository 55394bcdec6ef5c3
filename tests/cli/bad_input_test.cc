// Netlists, nodes and plans that are wrong: the whole message, and exit code 2.

#include <fstream>
#include <string>

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include "tests/cli/program.h"

namespace gatedyno {
namespace {

using nlohmann::json;

struct BadCell {
  const char* netlist;
  const char* message;
};

constexpr BadCell kBadCells[] = {
    // An unknown device.
    {".subckt bad a y vdd vss\n"
     "mp y a vdd vdd pfet w=180n\n"
     "mn y a vss vss lvtnfet w=90n\n"
     ".ends\n",
     "bad.sp:3:16: unknown device 'lvtnfet': this node knows nfet, pfet\n"
     "mn y a vss vss lvtnfet w=90n\n"
     "               ^\n"},
    // y floats where the pull-up is off and the pull-down too.
    {".subckt bad a b y vdd vss\n"
     "mp1 y  a p1  vdd pfet w=360n\n"
     "mp2 p1 b vdd vdd pfet w=360n\n"
     "mn1 y  a n1  vss nfet w=180n\n"
     "mn2 n1 b vss vss nfet w=180n\n"
     ".ends\n",
     "bad.sp:1:1: cell 'bad': output y floats at a=1 b=0: neither pull-up nor "
     "pull-down conducts; networks are not complementary\n"},
    // Both conduct.
    {".subckt bad a b y vdd vss\n"
     "mp1 y a vdd vdd pfet w=180n\n"
     "mp2 y b vdd vdd pfet w=180n\n"
     "mn1 y a vss vss nfet w=90n\n"
     "mn2 y b vss vss nfet w=90n\n"
     ".ends\n",
     "bad.sp:1:1: cell 'bad': output y is shorted at a=1 b=0: both pull-up and "
     "pull-down conduct; networks are not complementary\n"},
    {".subckt bad a b y vdd vss\n"
     "mp y a vdd vdd pfet w=180n\n"
     "mn y a vss vss nfet w=90n\n"
     ".ends\n",
     "bad.sp:1:1: cell 'bad': pin b is never used\n"},
    {".subckt bad a vdd vss\n"
     "mp x a vdd vdd pfet w=180n\n"
     "mn x a vss vss nfet w=90n\n"
     ".ends\n",
     "bad.sp:1:1: cell 'bad': has no output: its devices drive no pin\n"},
    {"* nothing\n",
     "bad.sp:1:1: no .subckt: a cell file holds one cell or more\n"
     "* nothing\n"
     "^\n"},
    // A terminal must not obey a netlist.
    {".subckt bad a y vdd vss\n"
     "\x1b[31mmp y a vdd vdd pfet w=180n\n"
     ".ends\n",
     "bad.sp:2:1: unknown kind of device '?[31mmp': a cell holds M, X, R and C "
     "lines\n"
     "?[31mmp y a vdd vdd pfet w=180n\n"
     "^\n"},
};

TEST(BadInputTest, NetlistsAreRefusedAtTheirPlace) {
  const Program program;
  for (const BadCell& bad : kBadCells) {
    program.Write("bad.sp", bad.netlist);
    for (const char* command : {"estimate", "run"}) {
      const Ended ended = program.Run({command, "bad.sp"});
      EXPECT_EQ(ended.exit_code, 2);
      EXPECT_EQ(ended.out, "");
      EXPECT_EQ(ended.err, std::string("gatedyno: ") + bad.message);
    }
  }
  EXPECT_FALSE(std::filesystem::exists(program.path() / "gatedyno.db"));
}

TEST(BadInputTest, MissingCellFileNamesTheBuiltInOnes) {
  const Ended ended = Program().Run({"estimate", "none.sp"});
  EXPECT_EQ(ended.exit_code, 2);
  EXPECT_TRUE(ended.err.starts_with(
      "gatedyno: cell 'none.sp': neither a netlist file nor a built-in cell "
      "(and2, aoi21, "))
      << ended.err;
}

json NodeOnP45() {
  std::ifstream in(GATEDYNO_SOURCE_DIR "/models/p45.json");
  json node = json::parse(in);
  node["corners"] = {node["corners"][0]};
  return node;
}

struct BadFile {
  const char* pointer;
  json value;
  const char* message;
};

TEST(BadInputTest, NodesAreRefusedAtTheirPlace) {
  const std::vector<BadFile> cases = {
      {"/mu", "2", R"(node.json: /mu: expected number, more than 0; got "2")"},
      {"/corners/0/process",
       "hot",
       "node.json: /corners/0/process: no process is named 'hot'"},
  };
  const Program program;
  for (const BadFile& bad : cases) {
    json node = NodeOnP45();
    node[json::json_pointer(bad.pointer)] = bad.value;
    program.Write("node.json", node.dump());
    const Ended ended = program.Run({"estimate", "inv", "--node", "node.json"});
    EXPECT_EQ(ended.exit_code, 2);
    EXPECT_EQ(ended.err, std::string("gatedyno: ") + bad.message + "\n");
  }
}

TEST(BadInputTest, PlansAreRefusedAtTheirPlace) {
  const std::vector<BadFile> cases = {
      {"/cells",
       "inv",
       R"(plan.json: /cells: expected array, at least 1 of them; got "inv")"},
      {"/fanouts",
       json::array(),
       "plan.json: /fanouts: expected array, at least 2 of them, no two "
       "alike; got []"},
      {"/fanouts",
       {0},
       "plan.json: /fanouts/0: expected number, more than 0, at most 1000; "
       "got 0"},
      {"/node",
       "nosuch",
       "node 'nosuch': neither a built-in node (p130, p180, p45, p65) nor a "
       "file"},
  };
  const Program program;
  for (const BadFile& bad : cases) {
    json plan = {
        {"format", "gatedyno-plan/1"}, {"node", "p45"}, {"cells", {"inv"}}};
    plan[json::json_pointer(bad.pointer)] = bad.value;
    program.Write("plan.json", plan.dump());
    const Ended ended = program.Run({"run", "plan.json"});
    EXPECT_EQ(ended.exit_code, 2);
    EXPECT_EQ(ended.err, std::string("gatedyno: ") + bad.message + "\n");
  }
}

TEST(BadInputTest, UnknownCornerNamesTheNodes) {
  const Program program;
  program.Write("node.json", NodeOnP45().dump());
  std::filesystem::copy(GATEDYNO_SOURCE_DIR "/models/p45.sp",
                        program.path() / "p45.sp");
  const Ended ended =
      program.Run({"run", "inv", "--node", "node.json", "--corner", "frozen"});
  EXPECT_EQ(ended.exit_code, 2);
  EXPECT_EQ(ended.err,
            "gatedyno: unknown corner 'frozen': node p45 has typical\n");
}

TEST(BadInputTest, ModelFilesAreNotObeyed) {
  const Program program;
  program.Write("node.json", NodeOnP45().dump());
  const std::string cards =
      program.Write("p45.sp", "* cards\n.control\nshell touch proof\n.endc\n");
  const Ended ended = program.Run({"run", "inv", "--node", "node.json"});
  EXPECT_EQ(ended.exit_code, 2);
  EXPECT_EQ(ended.err,
            "gatedyno: " + cards +
                ":2: refused in a model file: '.control' does not define a "
                "device; \"trusted_models\": true in the node file lets it "
                "through\n.control\n");
  EXPECT_FALSE(std::filesystem::exists(program.path() / "proof"));
}

TEST(BadInputTest, WidthsOffTheGridAreAWarning) {
  const Program program;
  program.Write("own.sp",
                ".subckt own a y vdd vss\n"
                "mp y a vdd vdd pfet w=180n\n"
                "mn y a vss vss nfet w=93n\n"
                ".ends\n");
  const Ended ended = program.Run({"estimate", "own.sp"});
  EXPECT_EQ(ended.exit_code, 0);
  // g of the falling output: (180 + w) / 3 / w.
  EXPECT_EQ(ended.err,
            "warning: own: mn w=93n is off the 5 nm grid: rounded to 95n, "
            "g(a, fall) 0.978 -> 0.965\n");
}

}  // namespace
}  // namespace gatedyno
