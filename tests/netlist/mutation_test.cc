// The built-in cells with damaged text: the reader must end, and either read a
// cell or point at a place in the text.  The damage is the same in every run.

#include <algorithm>
#include <array>
#include <cstddef>
#include <cstdio>
#include <filesystem>
#include <random>
#include <string>
#include <string_view>
#include <vector>

#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/netlist/reader.h"
#include "tests/netlist/read_text.h"

namespace gatedyno {
namespace {

// Enough to damage every line of every cell several times.
constexpr int kMutantsPerCell = 400;
constexpr unsigned kSeed = 20260101;

constexpr std::array<std::string_view, 24> kFragments = {
    "{",   "}",  "'",    "(",       ")",      "=",     "*", "**",
    "\n+", "\n", ".end", ".ends",   ".param", "x1 ",   "/", ";",
    "$",   "//", "1a",   "params:", "m=0",    "1e999", "-", "\t"};

class Mutator {
 public:
  std::string Damage(std::string text) {
    const size_t count = 1 + Below(3);
    for (size_t i = 0; i < count && !text.empty(); ++i) {
      DamageOnce(text);
    }
    return text;
  }

 private:
  size_t Below(size_t limit) { return random_() % limit; }

  void DamageOnce(std::string& text) {
    const size_t at = Below(text.size());
    const size_t length = 1 + Below(12);
    switch (Below(5)) {
      case 0:
        text.erase(at, length);
        break;
      case 1:
        text.insert(at, kFragments[Below(kFragments.size())]);
        break;
      case 2:
        text[at] = static_cast<char>(Below(256));
        break;
      case 3:
        text.insert(at, text.substr(Below(text.size()), length));
        break;
      default:
        text.resize(at);
    }
  }

  std::mt19937 random_{kSeed};
};

// "t.sp:LINE:COLUMN: ...", the line and a caret below its column.
void ExpectAPlace(const std::string& message, int lines) {
  int line = 0;
  int column = 0;
  ASSERT_EQ(std::sscanf(message.c_str(), "t.sp:%d:%d: ", &line, &column), 2)
      << message;
  EXPECT_TRUE(line >= 1 && line <= lines + 1) << message;
  EXPECT_GE(column, 1) << message;
  EXPECT_TRUE(message.ends_with(" ^") || message.ends_with("\n^")) << message;
}

// Sorted: the folder's own order differs from machine to machine.
std::vector<std::filesystem::path> CellFiles() {
  const std::filesystem::path folder = GATEDYNO_SOURCE_DIR;
  std::vector<std::filesystem::path> paths;
  for (const auto& entry :
       std::filesystem::directory_iterator(folder / "decks/cells")) {
    paths.push_back(entry.path());
  }
  std::sort(paths.begin(), paths.end());
  return paths;
}

TEST(Mutation, EveryDamagedCellEndsWithACellOrAPlace) {
  Mutator mutator;
  int read = 0;
  int refused = 0;
  for (const std::filesystem::path& path : CellFiles()) {
    const Result<std::string> text = ReadFile(path);
    ASSERT_TRUE(text.ok());
    for (int i = 0; i < kMutantsPerCell; ++i) {
      const std::string damaged = mutator.Damage(*text);
      const Result<std::vector<Cell>> cells =
          ReadCells(damaged, kFile, TestOptions());
      if (cells.ok()) {
        ++read;
      } else {
        ++refused;
        const auto lines = std::count(damaged.begin(), damaged.end(), '\n');
        ExpectAPlace(cells.error().message, static_cast<int>(lines));
      }
    }
  }
  // Damage in a comment is harmless, damage elsewhere mostly is not.
  EXPECT_GT(read, kMutantsPerCell);
  EXPECT_GT(refused, kMutantsPerCell);
}

}  // namespace
}  // namespace gatedyno
