// The reader against what ngspice 39.3 reads, row by row (each tried in it),
// and where this reader is stricter on purpose.

#include "harness/netlist/reader.h"

#include <string>
#include <vector>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

// The first device of an inverter with this one among its devices.
Mosfet First(const std::string& line,
             const ReaderOptions& options = TestOptions()) {
  const Cell cell = ReadOne(InverterAround(line), options);
  return cell.mosfets.empty() ? Mosfet{} : cell.mosfets.front();
}

// The same parameters under `head`, lines above .subckt.
Mosfet FirstUnder(const std::string& head, const std::string& line) {
  const Cell cell = ReadOne(head + InverterAround(line));
  return cell.mosfets.empty() ? Mosfet{} : cell.mosfets.front();
}

TEST(Reader, PointsAtTheInput) {
  const std::string text =
      "* NAND2\n"
      "\n"
      ".subckt nand2 a b y vdd vss\n"
      "M1 y a vdd vdd pfet L=60n W=2u\n"
      "M2 y b vdd vdd pfet L=60n W=2u\n"
      "M4 n1 b 0 0 nch L=60n W=2u\n"
      "M3 y a n1 0 nch L=60n W=2x\n"
      ".ends\n";
  ReaderOptions options = TestOptions();
  options.devices[0].name = "nch";
  const Result<std::vector<Cell>> cells =
      ReadCells(text, "decks/cells/nand2.sp", options);
  ASSERT_FALSE(cells.ok());
  EXPECT_EQ(cells.error().message,
            "decks/cells/nand2.sp:7:23: expected a width in metres, got "
            "'W=2x'\n"
            "M3 y a n1 0 nch L=60n W=2x\n"
            "                      ^");
}

TEST(Reader, ScaleLetters) {
  const struct {
    std::string spelling;
    double width_m;
  } table[] = {{"1M", 1e-3},
               {"1m", 1e-3},
               {"1MEG", 1e6},
               {"1mil", 25.4e-6},
               {"1u", 1e-6},
               {"1U", 1e-6},
               {"1um", 1e-6},
               {"0.1e-6", 0.1e-6}};
  for (const auto& row : table) {
    const Mosfet mosfet =
        First(fmt::format("m1 y a vss vss nfet w={} l=1u", row.spelling));
    EXPECT_DOUBLE_EQ(mosfet.width_m, row.width_m) << row.spelling;
  }
}

TEST(Reader, UnitLettersOfCapacitors) {
  const struct {
    std::string spelling;
    double capacitance_f;
  } table[] = {{"1F", 1e-15}, {"1fF", 1e-15}, {"1uF", 1e-6}, {"2p", 2e-12}};
  for (const auto& row : table) {
    const Cell cell =
        ReadOne(InverterAround(fmt::format("c1 a y {}", row.spelling)));
    ASSERT_EQ(cell.capacitors.size(), 1U);
    EXPECT_DOUBLE_EQ(cell.capacitors[0].capacitance_f, row.capacitance_f)
        << row.spelling;
  }
}

// ngspice reads 1.0, 4000 and 1e6; other dialects read other numbers.
TEST(Reader, RefusesNumbersThatDialectsDisagreeOn) {
  for (const std::string spelling : {"1a", "4k7", "1meg5"}) {
    const std::string line = "r1 a y " + spelling;
    const std::string complaint = ComplaintAbout(InverterAround(line));
    EXPECT_EQ(complaint.rfind(
                  fmt::format("t.sp:2:8: expected a resistance in ohms, got "
                              "'{}': ",
                              spelling),
                  0),
              0U)
        << complaint;
  }
}

// A deck's first line is its title whatever it says; a cell file has none.
TEST(Reader, TheFirstLineIsReadAsAnyOther) {
  EXPECT_EQ(ReadOne(InverterAround("* a comment")).name, "c");
  EXPECT_EQ(ComplaintAbout("a title\n" + InverterAround("")),
            Worded(1,
                   1,
                   "expected .subckt: make a title line a comment with '*'; "
                   "devices belong inside a .subckt",
                   "a title"));
}

TEST(Reader, CommentsAndContinuations) {
  const Mosfet mosfet = First(
      "*.PININFO a:I y:O\n"
      "m1 y a ; the output\n"
      "* between\n"
      "\n"
      "   + vss vss nfet $[nch]\n"
      "+ w=1u // the width\n"
      "+ l=2u $X=10 $Y=20");
  EXPECT_EQ(mosfet.name, "m1");
  EXPECT_DOUBLE_EQ(mosfet.width_m, 1e-6);
  EXPECT_DOUBLE_EQ(mosfet.length_m, 2e-6);
}

TEST(Reader, SubcktParameters) {
  for (const std::string header :
       {"wn=2u", "params: wn=2u", "PARAMS:wn = {2*1u}", "wn='1u+1u'"}) {
    const Cell cell = ReadOne(fmt::format(
        ".SUBCKT c a y vdd vss {}\nM1 Y A VSS VSS NFET W=WN L=1U\n.ENDS\n",
        header));
    ASSERT_EQ(cell.mosfets.size(), 1U) << header;
    EXPECT_DOUBLE_EQ(cell.mosfets[0].width_m, 2e-6) << header;
  }
}

TEST(Reader, NameAfterEndsIsOptional) {
  const std::string body =
      ".subckt c a y vdd vss\nm1 y a vss vss nfet w=1u l=1u\n";
  for (const std::string ends : {".ends", ".ends c", ".ENDS C"}) {
    EXPECT_EQ(ReadOne(body + ends).name, "c") << ends;
  }
}

TEST(Reader, Expressions) {
  const std::string head = ".param wn=1u\n";
  for (const std::string value : {"wn", "{wn}", "'wn'", "WN", "{ wn }"}) {
    const Mosfet mosfet =
        FirstUnder(head, fmt::format("m1 y a vss vss nfet l=1u w={}", value));
    EXPECT_DOUBLE_EQ(mosfet.width_m, 1e-6) << value;
  }
  for (const std::string value :
       {"2*wn", "{2*wn}", "'2 * wn'", "max(wn, 2*wn)", "{wn\n+ *2}"}) {
    const Mosfet mosfet =
        FirstUnder(head, fmt::format("m1 y a vss vss nfet l=1u w={}", value));
    EXPECT_DOUBLE_EQ(mosfet.width_m, 2e-6) << value;
  }
}

// ngspice fails on it; here a name is a function only before "(".
TEST(Reader, AParameterMayBeNamedLikeAFunction) {
  EXPECT_DOUBLE_EQ(FirstUnder(".param ln=60n min=2u\n",
                              "m1 y a vss vss nfet l={ln} w={min(min,3u)}")
                       .length_m,
                   60e-9);
}

TEST(Reader, WidthIsTheTotalOverTheFingers) {
  const Mosfet fingers = First("m1 y a vss vss nfet w=2u l=1u nf=2");
  const Mosfet copies = First("m1 y a vss vss nfet w=1u l=1u m=2");
  EXPECT_DOUBLE_EQ(fingers.width_m, 2e-6);
  EXPECT_DOUBLE_EQ(fingers.fingers, 2.0);
  EXPECT_DOUBLE_EQ(copies.width_m, 1e-6);
  EXPECT_DOUBLE_EQ(fingers.total_width_m(), copies.total_width_m());
}

TEST(Reader, OptionScale) {
  const std::string line =
      "m1 y a vss vss nfet w=2 l=0.5 ad=3 as=4 pd=5 ps=6 nf=2 m=3";
  const Mosfet mosfet = FirstUnder(".option scale=1e-6\n", line);
  EXPECT_DOUBLE_EQ(mosfet.width_m, 2e-6);
  EXPECT_DOUBLE_EQ(mosfet.length_m, 0.5e-6);
  EXPECT_DOUBLE_EQ(*mosfet.diffusion.drain_area_m2, 3e-12);
  EXPECT_DOUBLE_EQ(*mosfet.diffusion.source_area_m2, 4e-12);
  EXPECT_DOUBLE_EQ(*mosfet.diffusion.drain_perimeter_m, 5e-6);
  EXPECT_DOUBLE_EQ(*mosfet.diffusion.source_perimeter_m, 6e-6);
  EXPECT_DOUBLE_EQ(mosfet.fingers, 2.0);
  EXPECT_DOUBLE_EQ(mosfet.multiplicity, 3.0);
}

// The simulator rejects the form too.
TEST(Reader, RefusesASlashBeforeTheSubcircuit) {
  const std::string line = "x1 a y vdd vss / inv";
  EXPECT_EQ(ComplaintAbout(InverterAround(line)),
            Worded(2,
                   16,
                   "a '/' before the subcircuit's name is not SPICE: leave it "
                   "out",
                   line));
}

TEST(Reader, TerminalsAreDrainGateSourceBody) {
  const Cell cell = ReadOne(InverterAround("m1 Y A vss VNB NFET w=1u l=1u"));
  const Mosfet& mosfet = cell.mosfets[0];
  EXPECT_EQ(cell.net_name(mosfet.drain), "y");
  EXPECT_EQ(cell.net_name(mosfet.gate), "a");
  EXPECT_EQ(cell.net_name(mosfet.source), "vss");
  EXPECT_EQ(cell.net_name(mosfet.body), "VNB");
  EXPECT_EQ(mosfet.model, "nfet");
  EXPECT_EQ(mosfet.polarity, Polarity::kN);
  EXPECT_EQ(mosfet.place.file, "t.sp");
  EXPECT_EQ(mosfet.place.line, 2);
  EXPECT_EQ(mosfet.place.column, 1);
  EXPECT_EQ(cell.mosfets[1].polarity, Polarity::kP);
}

TEST(Reader, ParametersInAnyOrderAndCase) {
  const Mosfet a = First("m1 y a vss vss nfet w=1u l=2u ad=1p m=2 nf=1");
  const Mosfet b = First("M1 y a vss vss NFET NF=1 M=2 AD=1P L=2U W=1U");
  EXPECT_EQ(a.width_m, b.width_m);
  EXPECT_EQ(a.length_m, b.length_m);
  EXPECT_EQ(a.multiplicity, b.multiplicity);
  EXPECT_EQ(a.diffusion.drain_area_m2, b.diffusion.drain_area_m2);
  EXPECT_FALSE(a.diffusion.source_area_m2.has_value());
}

TEST(Reader, TheFilesParametersWinOverTheNodes) {
  const std::string line = "m1 y a vss vss nfet w={wunit} l={lgate}";
  EXPECT_DOUBLE_EQ(First(line).width_m, 90e-9);
  EXPECT_DOUBLE_EQ(FirstUnder(".param wunit=1u\n", line).width_m, 1e-6);
}

TEST(Reader, WarnsOfLayoutRemarksOnce) {
  const Cell cell = ReadOne(
      InverterAround("m1 y a vss vss nfet w=1u l=1u SA=1u sb={2*1u}\n"
                     "m2 y a vss vss nfet w=1u l=1u sa=1u nrd=0.1 nrs=0.1"));
  EXPECT_EQ(cell.warnings,
            std::vector<std::string>{"parameters nrd, nrs, sa, sb are remarks "
                                     "on the layout and not used"});
}

TEST(Reader, WarnsOfSizesThatAreNoTransistors) {
  const Cell cell =
      ReadOne(InverterAround("m1 y a vss vss nfet w=1M l=45n\n"
                             "m2 y a vss vss nfet w=2 l=45n"));
  EXPECT_EQ(cell.warnings,
            std::vector<std::string>{
                "m1 is 0.001 m wide and 4.5e-08 m long, no transistor's size: "
                "is a unit missing, or is M (milli) meant as MEG?"});
}

TEST(Reader, ReadsSeveralCellsInFileOrder) {
  const std::string device = "m1 y a vss vss nfet w=1u l=1u\n.ends\n";
  const Result<std::vector<Cell>> cells = ReadCells(
      ".subckt B a y vdd vss\n" + device + ".subckt a a y vdd vss\n" + device,
      kFile,
      TestOptions());
  ASSERT_TRUE(cells.ok());
  ASSERT_EQ(cells->size(), 2U);
  EXPECT_EQ((*cells)[0].name, "B");
  EXPECT_EQ((*cells)[1].name, "a");
  EXPECT_EQ((*cells)[1].place.line, 4);
}

TEST(Reader, ReadsWindowsTextAndTextWithoutALastLineEnd) {
  const std::string text =
      "\xEF\xBB\xBF.subckt c a y vdd vss\r\nm1 y a vss vss nfet\r\n"
      "+ w=1u l=1u\r\n.ends";
  EXPECT_EQ(ReadOne(text).mosfets.size(), 1U);
}

TEST(Reader, RefusesWhatIsNoText) {
  const std::string zero("* a\0b\n", 6);
  EXPECT_EQ(ComplaintAbout(zero),
            "t.sp:1:4: a zero byte: this is no text file\n* a?b\n   ^");
  EXPECT_EQ(ComplaintAbout(std::string((size_t{64} << 20) + 1, ' ')),
            "t.sp: larger than 64 MiB, no cell file");
}

TEST(Reader, NamesAFileThatIsNotThere) {
  const Result<std::vector<Cell>> cells =
      ReadCellFile("no/such.sp", TestOptions());
  ASSERT_FALSE(cells.ok());
  EXPECT_EQ(cells.error().message,
            "no/such.sp: cannot be read: No such file or directory");
}

TEST(Reader, NamesTheFileInComplaints) {
  const std::string path = testing::TempDir() + "/reader_test.sp";
  ASSERT_TRUE(WriteFile(path, ".ends\n").ok());
  const Result<std::vector<Cell>> cells = ReadCellFile(path, TestOptions());
  ASSERT_FALSE(cells.ok());
  EXPECT_EQ(cells.error().message,
            path + ":1:1: .ends without .subckt\n.ends\n^");
}

}  // namespace
}  // namespace gatedyno
