#include "harness/base/install.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

namespace fs = std::filesystem;

// A build tree has the shape of an installation; test programs lie beside its
// bin/.
TEST(InstallTest, EverythingLiesBesideTheProgram) {
  EXPECT_EQ(ProgramFolder(), fs::read_symlink("/proc/self/exe").parent_path());
  const fs::path prefix = ProgramFolder().parent_path();
  EXPECT_EQ(ModelsFolder(), prefix / "share/gatedyno/models");
  EXPECT_EQ(DecksFolder(), prefix / "share/gatedyno/decks");
  EXPECT_EQ(WorkerProgram(), ProgramFolder() / "gatedyno-worker");
}

TEST(InstallTest, BuildTreeHasTheData) {
  EXPECT_TRUE(fs::is_regular_file(ModelsFolder() / "node.schema.json"));
  EXPECT_TRUE(fs::is_regular_file(ModelsFolder() / "p45.sp"));
  EXPECT_TRUE(fs::is_regular_file(DecksFolder() / "plan.schema.json"));
  EXPECT_TRUE(fs::is_regular_file(DecksFolder() / "cells/inv.sp"));
  EXPECT_TRUE(fs::is_regular_file(DecksFolder() / "plans/arbiter.json"));
}

}  // namespace
}  // namespace gatedyno
