// What a kit's files may not do, unless the node file says that it trusts them.

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/file.h"
#include "harness/node/process_node.h"
#include "tests/kit/kit_folder.h"
#include "tests/support/temporary_folder.h"

namespace gatedyno {
namespace {

// A copy of the kit in a folder of its own, inside one that is not its own.
class KitCopy {
 public:
  KitCopy() {
    std::filesystem::create_directory(kit());
    for (const char* name :
         {"kit.json", "kit.lib", "devices.lib", "cards.inc"}) {
      std::filesystem::copy(KitFile(name), kit() / name);
    }
    outer_.Write("outside.inc", "* outside\n");
  }

  std::filesystem::path kit() const { return outer_.path() / "kit"; }

  void Append(const std::string& name, const std::string& text) const {
    std::ofstream(kit() / name, std::ios::app) << text;
  }

  void Trust() const {
    const Result<std::string> text = ReadFile(kit() / "kit.json");
    ASSERT_TRUE(text.ok()) << text.error().message;
    std::string trusting = *text;
    trusting.insert(trusting.find('{') + 1, "\"trusted_models\": true,");
    ASSERT_TRUE(WriteFile(kit() / "kit.json", trusting).ok());
  }

  Result<ProcessNode> Load() const { return LoadNode(kit() / "kit.json"); }

 private:
  TemporaryFolder outer_;
};

struct RefusalRow {
  const char* file;  // Of the kit, at its end.
  const char* text;
  const char* why;
  const char* line;  // The one refused: the first of the text.
};
constexpr RefusalRow kRefusals[] = {
    {"kit.lib",
     ".control\nshell true\n.endc\n",
     "'.control' does not define a device",
     ".control"},
    {"cards.inc",
     ".control\nshell true\n.endc\n",
     "'.control' does not define a device",
     ".control"},
    {"devices.lib",
     ".include \"../outside.inc\"\n",
     "'../outside.inc' lies outside the model's folder",
     ".include \"../outside.inc\""},
    {"cards.inc",
     ".lib '../outside.inc' tt\n",
     "'../outside.inc' lies outside the model's folder",
     ".lib '../outside.inc' tt"},
};

int LinesOf(const std::filesystem::path& file) {
  const Result<std::string> text = ReadFile(file);
  EXPECT_TRUE(text.ok()) << text.error().message;
  return static_cast<int>(std::count(text->begin(), text->end(), '\n'));
}

TEST(KitRefusalTest, SaysWhereAndWhyAndHowToTrust) {
  for (const RefusalRow& row : kRefusals) {
    const KitCopy copy;
    const std::filesystem::path file = copy.kit() / row.file;
    const int place = LinesOf(file) + 1;
    copy.Append(row.file, row.text);
    const Result<ProcessNode> node = copy.Load();
    ASSERT_FALSE(node.ok()) << row.file << ": " << row.text;
    EXPECT_EQ(node.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(node.error().message,
              fmt::format("{}:{}: refused in a model file: {}; "
                          "\"trusted_models\": true in the node file lets it "
                          "through\n{}",
                          file.string(),
                          place,
                          row.why,
                          row.line));
  }
}

TEST(KitRefusalTest, TrustedModelsLetItThrough) {
  for (const RefusalRow& row : kRefusals) {
    const KitCopy copy;
    copy.Append(row.file, row.text);
    copy.Trust();
    const Result<ProcessNode> node = copy.Load();
    EXPECT_TRUE(node.ok()) << node.error().message;
  }
}

TEST(KitRefusalTest, TheKitAsItIsPasses) {
  const Result<ProcessNode> node = KitCopy().Load();
  EXPECT_TRUE(node.ok()) << node.error().message;
}

}  // namespace
}  // namespace gatedyno
