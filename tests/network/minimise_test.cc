#include "harness/network/minimise.h"

#include <algorithm>
#include <random>

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TruthTable FromRows(int inputs, const std::vector<InputVector>& rows) {
  TruthTable table = {inputs, {}};
  for (const InputVector row : rows) {
    table.high.set(row);
  }
  return table;
}

bool Covers(const std::vector<Product>& cover, InputVector row) {
  return std::any_of(cover.begin(), cover.end(), [&](const Product& product) {
    return product.covers(row);
  });
}

TEST(MinimiseTest, WorkedExampleOfFourInputs) {
  // The example of McCluskey's method most textbooks carry (common practice):
  // rows 4, 8, 10, 11, 12, 15 and 9, 14 as don't-cares taken as ones.  Primes:
  // -100, 1--0, 1-1-, 10--; the rest follows.
  const TruthTable table = FromRows(4, {4, 8, 9, 10, 11, 12, 14, 15});
  const std::vector<Product> primes = PrimeImplicants(table);
  EXPECT_THAT(primes,
              testing::UnorderedElementsAre(Product{0b0100, 0b1000},
                                            Product{0b1000, 0b0110},
                                            Product{0b1010, 0b0101},
                                            Product{0b1000, 0b0011}));
  const std::vector<Product> cover = MinimalCover(table);
  EXPECT_EQ(cover.size(), 3U);
  EXPECT_FALSE(std::count(cover.begin(), cover.end(), Product{0b1000, 0b0110}));
}

TEST(MinimiseTest, CyclicTableIsCovered) {
  // a'b + bc' ... six primes of which no one is essential; three suffice.
  const TruthTable table = FromRows(3, {1, 2, 3, 4, 5, 6});
  EXPECT_EQ(PrimeImplicants(table).size(), 6U);
  const std::vector<Product> cover = MinimalCover(table);
  EXPECT_LE(cover.size(), 4U);
  for (InputVector v = 0; v < table.rows(); ++v) {
    EXPECT_EQ(Covers(cover, v), table.at(v));
  }
}

TEST(MinimiseTest, Constants) {
  EXPECT_TRUE(MinimalCover(FromRows(2, {})).empty());
  EXPECT_THAT(MinimalCover(FromRows(2, {0, 1, 2, 3})),
              testing::ElementsAre(Product{0, 0b11}));
}

TEST(MinimiseTest, CoverIsTheFunctionOnRandomTables) {
  std::mt19937 random(1);  // NOLINT(cert-msc32-c,cert-msc51-cpp): repeatable.
  for (int trial = 0; trial < 200; ++trial) {
    TruthTable table = {1 + trial % 6, {}};
    for (InputVector v = 0; v < table.rows(); ++v) {
      table.high[v] = random() % 2 == 0;
    }
    const std::vector<Product> cover = MinimalCover(table);
    for (InputVector v = 0; v < table.rows(); ++v) {
      ASSERT_EQ(Covers(cover, v), table.at(v));
    }
  }
}

}  // namespace
}  // namespace gatedyno
