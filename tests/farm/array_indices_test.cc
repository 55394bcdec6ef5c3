#include "harness/farm/array_indices.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct Row {
  std::vector<int> indices;
  std::string text;
};

TEST(ArrayIndicesTest, WritesRangesAndSingleOnes) {
  const Row rows[] = {
      {{}, ""},
      {{0}, "0"},
      {{0, 1, 2, 3}, "0-3"},
      {{1, 2, 4, 7, 8, 9}, "1-2,4,7-9"},
      {{3, 5, 1000}, "3,5,1000"},
  };
  for (const Row& row : rows) {
    EXPECT_EQ(ArrayIndices(row.indices), row.text);
  }
}

}  // namespace
}  // namespace gatedyno
