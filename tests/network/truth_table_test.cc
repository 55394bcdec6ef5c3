#include "harness/network/truth_table.h"

#include <bit>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TruthTable Table(int inputs, bool (*function)(InputVector)) {
  TruthTable table = {inputs, {}};
  for (InputVector v = 0; v < table.rows(); ++v) {
    table.high[v] = function(v);
  }
  return table;
}

struct SelfDualRow {
  const char* name;
  int inputs;
  bool (*function)(InputVector);
  bool self_dual;
};

TEST(TruthTableTest, SelfDuality) {
  const std::vector<SelfDualRow> table = {
      {"wire", 1, [](InputVector v) { return v == 1; }, true},
      {"inverter", 1, [](InputVector v) { return v == 0; }, true},
      {"and", 2, [](InputVector v) { return v == 3; }, false},
      {"parity of 2",
       2,
       [](InputVector v) { return std::popcount(v) % 2 == 1; },
       false},
      {"parity of 3",
       3,
       [](InputVector v) { return std::popcount(v) % 2 == 1; },
       true},
      {"majority of 3",
       3,
       [](InputVector v) { return std::popcount(v) >= 2; },
       true},
      {"majority of 5",
       5,
       [](InputVector v) { return std::popcount(v) >= 3; },
       true},
      {"at least 2 of 4",
       4,
       [](InputVector v) { return std::popcount(v) >= 2; },
       false},
      {"constant", 3, [](InputVector) { return true; }, false},
  };
  for (const SelfDualRow& row : table) {
    EXPECT_EQ(IsSelfDual(Table(row.inputs, row.function)), row.self_dual)
        << row.name;
  }
}

TEST(TruthTableTest, Dependence) {
  // Input 1 does not matter.
  const TruthTable table =
      Table(3, [](InputVector v) { return IsHigh(v, 0) && IsHigh(v, 2); });
  EXPECT_TRUE(DependsOn(table, 0));
  EXPECT_FALSE(DependsOn(table, 1));
  EXPECT_TRUE(DependsOn(table, 2));
  EXPECT_TRUE(table.toggles(0b100, 0));
  EXPECT_FALSE(table.toggles(0b000, 0));
}

TEST(TruthTableTest, ComplementTwiceIsTheSame) {
  const TruthTable table = Table(4, [](InputVector v) { return v % 3 == 0; });
  EXPECT_NE(Complement(table), table);
  EXPECT_EQ(Complement(Complement(table)), table);
  EXPECT_EQ(Complement(table).high.count() + table.high.count(), 16U);
}

}  // namespace
}  // namespace gatedyno
