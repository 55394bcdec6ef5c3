// Efforts per bundle of exclusive ors and multiplexers.
//
// Sources: HL Harris, lecture tables; SSH Sutherland, Sproull, Harris, Logical
// Effort, 1999, from memory; RCN Rabaey, Chandrakasan, Nikolic, from memory.

#include "harness/effort/bundle.h"

#include <gtest/gtest.h>

#include "tests/support/bundle_gates.h"
#include "tests/support/gates.h"

namespace gatedyno {
namespace {

constexpr double kExact = 1e-9;  // Small fractions after a Cholesky solve.

using Nets = std::vector<std::string>;

struct BundleRow {
  const char* source;
  Cell (*build)(double gamma);
  Nets nets;
  double effort;
  double parasitic;
};

Nets InputBundle(const std::string& input) {
  return {input, InverseName(input)};
}

std::vector<BundleRow> BundleRows() {
  using Build = Cell (*)(double gamma);
  const Build xor2 = [](double g) { return XorSharedCell(2, g); };
  const Build xor3 = [](double g) { return XorSharedCell(3, g); };
  const Build xor4 = [](double g) { return XorSharedCell(4, g); };
  const Build xor2s = [](double g) { return XorSymmetricCell(2, g); };
  const Build xor3s = [](double g) { return XorSymmetricCell(3, g); };
  const Build xor4s = [](double g) { return XorSymmetricCell(4, g); };
  return {
      {"HL: XOR2 4, 4; p 4", xor2s, InputBundle("a"), 4, 4},
      {"HL: XOR2 4, 4; p 4", xor2s, InputBundle("b"), 4, 4},
      {"HL: XOR2 4, 4; p 4", xor2, InputBundle("a"), 4, 4},
      {"HL: XOR3 asymmetric 6, 12, 6; p 6", xor3, InputBundle("a"), 6, 6},
      {"HL: XOR3 asymmetric 6, 12, 6; p 6", xor3, InputBundle("b"), 12, 6},
      {"HL: XOR3 asymmetric 6, 12, 6; p 6", xor3, InputBundle("c"), 6, 6},
      {"HL: XOR4 asymmetric 8, 16, 16, 8; p 8", xor4, InputBundle("a"), 8, 8},
      {"HL: XOR4 asymmetric 8, 16, 16, 8; p 8", xor4, InputBundle("b"), 16, 8},
      {"HL: XOR4 asymmetric 8, 16, 16, 8; p 8", xor4, InputBundle("c"), 16, 8},
      {"HL: XOR4 asymmetric 8, 16, 16, 8; p 8", xor4, InputBundle("d"), 8, 8},
      {"SSH, RCN: n 2^(n-1)", xor3s, InputBundle("b"), 12, 12},
      {"SSH, RCN: n 2^(n-1)", xor4s, InputBundle("d"), 32, 32},
      {"HL: mux 2 per data; p 2n", Mux2Cell, {"d1"}, 2, 4},
      {"HL: mux 2 per select bundle", Mux4Cell, {"k3", "k3n"}, 2, 8},
      {"HL: mux 2 per select bundle", Mux4Cell, {"k0", "k0n"}, 2, 8},
      {"HL: mux 2 per data; p 2n", Mux4Cell, {"d2"}, 2, 8},
  };
}

TEST(EstimateBundleTest, ExclusiveOrsAndMultiplexersAtEveryRatio) {
  for (const BundleRow& row : BundleRows()) {
    for (const double gamma : {1.0, 1.5, 2.0, 3.0}) {
      const Cell cell = row.build(gamma);
      for (const Edge edge : {Edge::kRise, Edge::kFall}) {
        SCOPED_TRACE(testing::Message() << cell.name << " " << row.nets.front()
                                        << " " << EdgeName(edge) << " at gamma "
                                        << gamma << ": " << row.source);
        const Result<BundleEstimate> found =
            EstimateBundle(cell, {"y", row.nets}, edge, gamma);
        ASSERT_TRUE(found.ok()) << found.error().message;
        EXPECT_NEAR(found->effort, row.effort, kExact);
        EXPECT_NEAR(found->parasitic_by_nodes, row.parasitic, kExact);
      }
    }
  }
}

TEST(EstimateBundleTest, OnePinOfAPlainGateIsItsEffort) {
  const Result<BundleEstimate> found =
      EstimateBundle(NandCell(2, 2, 2), {"Y", {"A"}}, Edge::kFall, 2.0);
  ASSERT_TRUE(found.ok());
  EXPECT_NEAR(found->effort, 4.0 / 3, kExact);
}

TEST(EstimateBundleTest, NamesWhatIsMissing) {
  const Cell cell = NandCell(2, 2, 2);
  const auto message = [&](const Bundle& bundle) {
    const auto found = EstimateBundle(cell, bundle, Edge::kFall, 2.0);
    return found.ok() ? "" : found.error().message;
  };
  EXPECT_EQ(message({"y", {"q"}}),
            "nand2.sp:1:1: cell 'nand2': has no net 'q'");
  EXPECT_EQ(message({"z", {"a"}}),
            "nand2.sp:1:1: cell 'nand2': has no net 'z'");
  EXPECT_EQ(message({"a", {"b"}}),
            "nand2.sp:1:1: cell 'nand2': a is no output that makes the edge "
            "'fall'");
}

}  // namespace
}  // namespace gatedyno
