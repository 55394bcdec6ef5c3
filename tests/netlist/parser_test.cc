#include "harness/netlist/parser.h"

#include <span>
#include <string>

#include <gtest/gtest.h>

#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

// A line inside a .subckt, the caret's column and the message.
struct BadLine {
  const char* line;
  int column;
  const char* message;
};

void ExpectComplaints(std::span<const BadLine> table) {
  for (const BadLine& bad : table) {
    EXPECT_EQ(ComplaintAbout(Around(bad.line)),
              Worded(2, bad.column, bad.message, bad.line));
  }
}

constexpr BadLine kBadMosfets[] = {
    {"m1 y a vss vss nch w=1u l=1u",
     16,
     "unknown device 'nch': this node knows nfet, pfet"},
    {"m1 y a vss nfet w=1u l=1u",
     1,
     "expected drain, gate, source, body and device after 'm1', got 4 words"},
    {"m1 y a vss vss nfet 1u w=1u l=1u",
     21,
     "expected name=value after the device, got '1u'"},
    {"m1 y a vss vss nfet w=1u l=1u off",
     31,
     "expected name=value, got 'off': an expression with blanks goes in "
     "braces"},
    {"m1 y a vss vss nfet w=1u l=1u vth0=0.4",
     31,
     "unknown parameter 'vth0' of device 'nfet': known are w, l, nf, m, ad, "
     "as, pd, ps, nfin"},
    {"m1 y a vss vss nfet w=1u l=1u W=2u", 31, "'W' is given twice"},
    {"m1 y a vss vss nfet w=1u l=", 26, "no value after 'l='"},
    {"m1 y a vss vss nfet w= =1u", 21, "no value after 'w='"},
    {"m1 y a vss vss nfet w=1u =2", 26, "expected a parameter name before '='"},
    {"m1 y a vss vss nfet w=1u l=1u {w} =2",
     31,
     "expected a parameter name before '=', got '{w}'"},
    {"m1 (y a vss vss) nfet w=1u l=1u",
     1,
     "expected drain, gate, source, body and device after 'm1', got 2 words"},
    {"m1 y {a} vss vss nfet w=1u l=1u", 6, "expected a net, got '{a}'"},
    {"m1 y a vss vss nfet params: w=1u l=1u",
     21,
     "'params:' belongs on .subckt and X lines"},
    {"m1 y,a vss vss nfet w=1u l=1u", 5, "unexpected ','"},
    {"m1 y a vss vss nfet w=\"1u\"", 23, "unexpected '\"'"},
    {"m1 y a\\b vss vss nfet w=1u", 7, "unexpected '\\'"},
    {"m1 y a} vss vss nfet w=1u", 7, "unexpected '}'"},
    {"m1 y a vss vss nfet w={1u", 23, "no closing '}' for this '{'"},
    {"m1 y a vss vss nfet w='1u", 23, "no closing quote for this quote"},
    {"m1 y a vss vss nfet w={1u}l=1u",
     27,
     "expected a blank after the expression '{1u}'"},
    {"m1 y a vss vss nfet w=(1u l=1u", 23, "no ')' for this '('"},
    {"m1 y a vss vss nfet w=1u) l=1u", 25, "no '(' for this ')'"},
};
TEST(Parser, RefusesMosfets) {
  ExpectComplaints(kBadMosfets);
}

// Numbers whose wording has the role; the row of the style guide first.
constexpr BadLine kBadNumbers[] = {
    {"M3 y a n1 0 nfet L=60n W=2x",
     24,
     "expected a width in metres, got 'W=2x'"},
    {"m1 y a vss vss nfet w=1a l=1u",
     21,
     "expected a width in metres, got 'w=1a': the letter 'a' means atto in "
     "some dialects and nothing in others: write an exponent"},
    {"m1 y a vss vss nfet w=1u l=4n7",
     26,
     "expected a length in metres, got 'l=4n7': some dialects drop the digits "
     "after a letter: put the letter last"},
    {"m1 y a vss vss nfet w = {1milli} l=1u",
     21,
     "expected a width in metres, got 'w={1milli}'"},
    {"m1 y a vss vss nfet w=1u l=1u nf='2..5'",
     31,
     "expected a number of fingers, got 'nf='2..5''"},
    {"m1 y a vss vss nfet w=1u l=1u m=1e",
     31,
     "expected a multiplicity, got 'm=1e'"},
    {"m1 y a vss vss nfet w=1u l=1u ad=1e999",
     31,
     "expected a drain area in square metres, got 'ad=1e999': too large or too "
     "small"},
    {"m1 y a vss vss nfet w=1u l=1u ps=1q",
     31,
     "expected a source perimeter in metres, got 'ps=1q'"},
    {"m1 y a vss vss nfet w=1u l=1u nfin=2q",
     31,
     "expected a number of fins, got 'nfin=2q'"},
    {"m1 y a vss vss nfet w=1u l=1u sa=2q",
     31,
     "expected a value, got 'sa=2q'"},
    {"r1 a y 4k7",
     8,
     "expected a resistance in ohms, got '4k7': some dialects drop the digits "
     "after a letter: put the letter last"},
    {"c1 a y c=1x", 8, "expected a capacitance in farads, got 'c=1x'"},
    {"r1 a y 1k m=1x", 11, "expected a multiplicity, got 'm=1x'"},
};
TEST(Parser, RefusesNumbers) {
  ExpectComplaints(kBadNumbers);
}

constexpr BadLine kBadPassives[] = {
    {"r1 a y", 1, "expected a resistance in ohms after 'r1'"},
    {"c1 a", 1, "expected two nets and a value after 'c1'"},
    {"r1 a y 1k rmod", 11, "expected name=value after the value, got 'rmod'"},
    {"r1 a y 1k r=2k", 11, "a second value: the first is '1k'"},
    {"r1 a y 1k tc1=0", 11, "unknown parameter 'tc1' of 'r1': known are r, m"},
    {"c1 a y 1f ic=0", 11, "unknown parameter 'ic' of 'c1': known are c, m"},
    {"c1 a y params: c=1f", 8, "'params:' belongs on .subckt and X lines"},
    {"r1 'a' y 1k", 4, "expected a net, got ''a''"},
};
TEST(Parser, RefusesPassives) {
  ExpectComplaints(kBadPassives);
}

constexpr BadLine kBadInstances[] = {
    {"x1", 1, "expected nets and a subcircuit name after 'x1'"},
    {"x1 a y vdd vss / inv",
     16,
     "a '/' before the subcircuit's name is not SPICE: leave it out"},
    {"x1 a y vdd vss {inv}", 16, "expected a subcircuit name, got '{inv}'"},
    {"x1 a 'y' vdd vss inv", 6, "expected a net, got ''y''"},
    {"x1 a y vdd vss inv params: wn",
     28,
     "expected name=value, got 'wn': an expression with blanks goes in "
     "braces"},
    {"x1 a y vdd vss inv",
     16,
     "unknown subcircuit 'inv': neither this file nor the node has it"},
    {"x1 a y vdd vss nfet",
     16,
     "device 'nfet' is no subcircuit of this node: write it on an M line"},
};
TEST(Parser, RefusesInstances) {
  ExpectComplaints(kBadInstances);
}

constexpr BadLine kBadOtherLines[] = {
    {"d1 a vss diode",
     1,
     "unknown kind of device 'd1': a cell holds M, X, R and C lines"},
    {"= 3", 1, "unknown kind of device '=': a cell holds M, X, R and C lines"},
    {".foo 1",
     1,
     "unknown line '.foo': a cell file holds .subckt, .ends, .param, .option "
     "scale and .end"},
    {".CONTROL",
     1,
     ".control is refused: cell files hold no simulator commands"},
    {".include 'cells.sp'",
     1,
     ".include is refused: a cell file is read on its own: put the .subckt in "
     "it"},
    {".lib models.lib tt",
     1,
     ".lib is refused: device models belong to the node, not to a cell"},
    {".model nch nmos",
     1,
     ".model is refused: device models belong to the node, not to a cell"},
    {".global vdd",
     1,
     ".global is refused: a cell reaches its supplies through pins: add them "
     "to .subckt"},
    {".if (wn > 1)",
     1,
     ".if is refused: cell files hold no conditional lines: write the cell "
     "out"},
    {".param", 1, "expected name=value after .param"},
    {".param wn", 8, "expected name=value, got 'wn'"},
    {".param wn = 2 * wp",
     15,
     "expected name=value, got '*': an expression with blanks goes in braces"},
    {".param 2wn=1", 8, "expected a parameter name before '=', got '2wn'"},
    {".option scale=1u",
     1,
     ".option inside .subckt 'c' of line 1: is its .ends missing?"},
    {".subckt d a y",
     1,
     ".subckt inside .subckt 'c' of line 1: is its .ends missing?"},
    {".end", 1, ".end inside .subckt 'c' of line 1: is its .ends missing?"},
    {".ends d", 7, "expected .ends c, got 'd'"},
    {".ends c d", 1, "only a name may follow .ends"},
    {".ends=c", 1, "expected a parameter name before '=', got '.ends'"},
    {".ends c d=1", 1, "only a name may follow .ends"},
};
TEST(Parser, RefusesOtherLines) {
  ExpectComplaints(kBadOtherLines);
}

// A whole text and what is wrong with it.
struct BadText {
  const char* text;
  int line;
  int column;
  const char* message;
  const char* shown;
};

constexpr const char* kTitleAdvice =
    "expected .subckt: make a title line a comment with '*'; devices belong "
    "inside a .subckt";

constexpr BadText kBadTexts[] = {
    {"", 1, 1, "no .subckt: a cell file holds one cell or more", ""},
    {"* only\n\n",
     1,
     1,
     "no .subckt: a cell file holds one cell or more",
     "* only"},
    {"My cells\n.subckt c a\n.ends\n", 1, 1, kTitleAdvice, "My cells"},
    {"Gates of the arbiter\n", 1, 1, kTitleAdvice, "Gates of the arbiter"},
    {"m1 y a vss vss nfet w=1u\n",
     1,
     1,
     kTitleAdvice,
     "m1 y a vss vss nfet w=1u"},
    {"+ w=1u\n",
     1,
     1,
     "a continuation line with nothing above it to continue",
     "+ w=1u"},
    {".subckt\n", 1, 1, "expected a name after .subckt", ".subckt"},
    {".subckt 'c' a\n",
     1,
     9,
     "expected a subcircuit name, got ''c''",
     ".subckt 'c' a"},
    {".subckt c a A\n", 1, 13, "pin 'A' is given twice", ".subckt c a A"},
    {".subckt c a {b}\n",
     1,
     13,
     "expected a pin, got '{b}'",
     ".subckt c a {b}"},
    {".subckt c a wn=2x\n",
     1,
     13,
     "expected a value, got 'wn=2x'",
     ".subckt c a wn=2x"},
    {".subckt c a\n", 1, 1, "no .ends for .subckt 'c'", ".subckt c a"},
    {".ends\n", 1, 1, ".ends without .subckt", ".ends"},
    {".subckt c a\n.ends\n.subckt C a\n.ends\n",
     3,
     9,
     "'C' is already defined in line 1",
     ".subckt C a"},
    {".subckt c a y\nr1 a y 1\nR1 a y 2\n.ends\n",
     3,
     1,
     "'R1' is already defined in line 2",
     "R1 a y 2"},
    {".param wn=1\n.PARAM WN=2\n",
     2,
     8,
     "'wn' is already defined in line 1",
     ".PARAM WN=2"},
    {".subckt c a wn=1\n.param wn=2\n.ends\n",
     2,
     8,
     "'wn' is already defined in line 1",
     ".param wn=2"},
    {".option reltol=1\n",
     1,
     9,
     "unknown option 'reltol': a cell file sets scale and no other",
     ".option reltol=1"},
    {".option scale=1u gmin=1\n",
     1,
     18,
     "unknown option 'gmin': a cell file sets scale and no other",
     ".option scale=1u gmin=1"},
    {".option scale=1u\n.options scale=1u\n",
     2,
     10,
     "a second scale: line 1 sets one",
     ".options scale=1u"},
    {".end now\n", 1, 1, "nothing may follow .end", ".end now"},
    {".subckt c a\n.ends\n.end\n* fine\nm1 old cell\n",
     5,
     1,
     "text after .end: remove it or make it a comment",
     "m1 old cell"},
};
TEST(Parser, RefusesTexts) {
  for (const BadText& bad : kBadTexts) {
    EXPECT_EQ(ComplaintAbout(bad.text),
              Worded(bad.line, bad.column, bad.message, bad.shown));
  }
}

TEST(Parser, RefusesToDefineADeviceOfTheNode) {
  ReaderOptions options = TestOptions();
  options.devices.push_back(KitDevice());
  EXPECT_EQ(ComplaintAbout(".subckt KIT_N d g s b\n.ends\n", options),
            Worded(1,
                   9,
                   "'KIT_N' is a device of this node: a cell file does not "
                   "define it",
                   ".subckt KIT_N d g s b"));
}

TEST(Parser, SendsADeviceToTheLineItBelongsOn) {
  ReaderOptions options = TestOptions();
  options.devices.push_back(KitDevice());
  const std::string line = "m1 y a vss vss kit_n wr=1 lr=1";
  EXPECT_EQ(ComplaintAbout(Around(line), options),
            Worded(2,
                   16,
                   "device 'kit_n' is a subcircuit of this node: write it on "
                   "an X line",
                   line));
}

TEST(Parser, CountsTheNetsOfASubcircuitDevice) {
  ReaderOptions options = TestOptions();
  options.devices.push_back(KitDevice());
  const std::string line = "x1 y a vss kit_n wr=1 lr=1";
  EXPECT_EQ(ComplaintAbout(Around(line), options),
            Worded(2,
                   12,
                   "device 'kit_n' has 4 nets (drain gate source body), got 3",
                   line));
}

TEST(Parser, NamesNoUnitWhereTheDeviceHasItsOwn) {
  ReaderOptions options = TestOptions();
  options.devices.push_back(KitDevice());
  const std::string line = "x1 y a vss vss kit_n wr=2x lr=1";
  EXPECT_EQ(ComplaintAbout(Around(line), options),
            Worded(2, 22, "expected a width, got 'wr=2x'", line));
}

TEST(Parser, AcceptsCommentsAfterEnd) {
  EXPECT_EQ(ComplaintAbout(InverterAround("* inside") +
                           ".end\n* after\n\n  ; and this\n"),
            "");
}

}  // namespace
}  // namespace gatedyno
