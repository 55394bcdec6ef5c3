#include "harness/page/page_circuit.h"

#include <string>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "harness/page/circuit_svg.h"
#include "tests/page/count.h"
#include "tests/support/test_circuit.h"

namespace gatedyno {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

CellSummary Nand2() {
  return {"nand2", {"y = !(a & b)"}, 1, 2, 1, Nand2Circuit()};
}

TEST(PageCircuitTest, HasEveryDevice) {
  const std::string figure = CircuitFigure(Nand2());
  EXPECT_EQ(Count(figure, "<use href=\"#pmos\""), 2U);
  EXPECT_EQ(Count(figure, "<use href=\"#nmos\""), 2U);
  EXPECT_EQ(Count(figure, "<use href=\"#ground\""), 1U);
  EXPECT_EQ(Count(figure, ">360 nm</text>"), 2U);
  EXPECT_EQ(Count(figure, ">180 nm</text>"), 2U);
  for (const char* part :
       {"aria-label=\"stage 1 of nand2, y = !(a &amp; b): 2 PMOS and 2 NMOS "
        "devices\"",
        ">vdd</text>",
        ">vss</text>",
        ">n1</text>",
        " class=\"output\">y</text>",
        "<figcaption>Beside each device: width; all lengths 45 nm."
        "</figcaption>",
        "<summary>4 devices</summary>",
        "<tr><th scope=\"row\">mn_a<td>NMOS<td>a<td>y<td>n1<td>180<td>45\n"}) {
    EXPECT_THAT(figure, HasSubstr(part));
  }
  EXPECT_THAT(figure, Not(HasSubstr("Not drawn")));
}

// Hundreds of cells are on a page.
TEST(PageCircuitTest, ASimpleGateIsSmall) {
  constexpr size_t kMostBytes = 2000;
  EXPECT_LT(CircuitFigure(Nand2()).size(), kMostBytes);
}

TEST(PageCircuitTest, NamesWhatItDoesNotDraw) {
  CellSummary cell = Nand2();
  cell.circuit.devices.push_back(
      {"m<5>", false, "vss", "y", "y", 180e-9, 45e-9});
  cell.circuit.devices.push_back(
      {"m6", false, "vss", "vdd", "vss", 180e-9, 45e-9});
  EXPECT_THAT(
      CircuitFigure(cell),
      HasSubstr("all lengths 45 nm. Not drawn: <bdi>m&lt;5&gt;</bdi> (drain "
                "and source on <bdi>y</bdi>), <bdi>m6</bdi> (always off, from "
                "<bdi>vdd</bdi> to <bdi>vss</bdi>)."));
}

TEST(PageCircuitTest, SaysThatAnOldRunHasNone) {
  EXPECT_EQ(CircuitFigure({"inv", {"y = !a"}, 1, 1, 1}),
            "<p>No drawing: this run kept no transistors.</p>\n");
}

TEST(PageCircuitTest, NamesStayText) {
  const std::string name = "</svg><img src=x onerror=\"a\">";
  CellSummary cell = Nand2();
  cell.name = name;
  for (CircuitDevice& device : cell.circuit.devices) {
    device.name = device.gate = name;
    device.drain = device.drain == "n1" ? name : device.drain;
    device.source = device.source == "n1" ? name : device.source;
  }
  const std::string figure = CircuitFigure(cell);
  EXPECT_EQ(Count(figure, "<img"), 0U);
  EXPECT_EQ(Count(figure, "</svg"), 1U);
  EXPECT_THAT(figure, HasSubstr("&lt;/svg&gt;&lt;img s…<title>&lt;/svg&gt;"));
}

TEST(PageCircuitTest, SymbolsAreThoseThatAreUsed) {
  for (const char* id : {"id=\"nmos\"", "id=\"pmos\"", "id=\"ground\""}) {
    EXPECT_EQ(Count(CircuitSymbols(), id), 1U) << id;
  }
}

}  // namespace
}  // namespace gatedyno
