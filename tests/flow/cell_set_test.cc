#include "harness/flow/cell_set.h"

#include <algorithm>
#include <string>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

namespace fs = std::filesystem;
using ::testing::ElementsAre;

constexpr const char* kOwn =
    ".subckt own a y vdd vss\n"
    "mp y a vdd vdd pfet w=180n\n"
    "mn y a vss vss nfet w=90n\n"
    ".ends\n";

std::vector<std::string> Stems(const std::vector<std::string>& names,
                               const fs::path& folder = ".") {
  const Result<std::vector<fs::path>> files = CellFiles(names, folder);
  if (!files.ok()) {
    return {files.error().message};
  }
  std::vector<std::string> stems;
  for (const fs::path& file : *files) {
    stems.push_back(file.stem().string());
  }
  return stems;
}

TEST(CellSetTest, FindsBuiltInCellsByPattern) {
  EXPECT_THAT(Stems({"nor2", "nand?"}),
              ElementsAre("nor2", "nand2", "nand3", "nand4"));
  EXPECT_THAT(Stems({"inv", "nand2", "inv", "i?v"}),
              ElementsAre("inv", "nand2"));
  EXPECT_EQ(Stems({"*"}), BuiltInCells());
  const std::vector<std::string> all = BuiltInCells();
  EXPECT_TRUE(std::is_sorted(all.begin(), all.end()));
}

TEST(CellSetTest, FindsFilesFromTheFolder) {
  const TemporaryFolder folder;
  fs::create_directory(folder.path() / "my cells");
  std::ofstream(folder.path() / "my cells/own.sp") << kOwn;
  EXPECT_THAT(Stems({"inv", "my cells/own.sp"}, folder.path()),
              ElementsAre("inv", "own"));
  EXPECT_THAT(Stems({(folder.path() / "my cells/own.sp").string()}),
              ElementsAre("own"));
}

TEST(CellSetTest, UnknownCellNamesTheBuiltInOnes) {
  const std::string known = fmt::format("{}", fmt::join(BuiltInCells(), ", "));
  for (const char* name : {"nandx", "q*", "no/such.sp", "/"}) {
    EXPECT_THAT(Stems({name}),
                ElementsAre(fmt::format(
                    "cell '{}': neither a netlist file nor a built-in cell "
                    "({})",
                    name,
                    known)));
  }
}

TEST(CellSetTest, RefusesTwoCellsOfOneName) {
  TemporaryFolder folder;
  const std::string first = folder.Write("a.sp", kOwn).string();
  const std::string second =
      folder.Write("b.sp", std::string("* other\n") + kOwn).string();
  const Result<ProcessNode> node = LoadNode("p45");
  ASSERT_TRUE(node.ok()) << node.error().message;
  const Result<std::vector<Cell>> cells =
      ReadCellSet({"a.sp", "b.sp"}, folder.path(), *node);
  ASSERT_FALSE(cells.ok());
  EXPECT_EQ(cells.error().message,
            second + ":2: cell 'own' is also defined at " + first + ":1");
}

TEST(CellSetTest, EveryBuiltInCellIsReadOnEveryBuiltInNode) {
  for (const std::string& name : BuiltInNodes()) {
    const Result<ProcessNode> node = LoadNode(name);
    ASSERT_TRUE(node.ok()) << node.error().message;
    const Result<std::vector<Cell>> cells = ReadCellSet({"*"}, ".", *node);
    ASSERT_TRUE(cells.ok()) << cells.error().message;
    EXPECT_EQ(cells->size(), BuiltInCells().size());
  }
}

}  // namespace
}  // namespace gatedyno
