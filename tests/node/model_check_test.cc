#include "harness/node/model_check.h"

#include <filesystem>
#include <string>
#include <string_view>

#include <gtest/gtest.h>

#include "tests/node/node_folder.h"

namespace gatedyno {
namespace {

namespace fs = std::filesystem;
using std::string_view_literals::operator""sv;

constexpr const char* kTrust =
    "; \"trusted_models\": true in the node file lets it through\n";

std::string Refusal(const fs::path& file,
                    int line,
                    const std::string& why,
                    const std::string& text) {
  return file.string() + ":" + std::to_string(line) +
         ": refused in a model file: " + why + kTrust + text;
}

std::string LoadWithCards(NodeFolder& folder, std::string_view cards) {
  folder.WriteCards(cards);
  return MessageOf(folder.Load(SmallNode()));
}

struct Hostile {
  std::string_view cards;
  int line;
  const char* why;
  const char* shown;
};

// The rules one by one are in model_rules_test.cc; here is how they meet in a
// file.
constexpr Hostile kHostile[] = {
    {"* cards\n.control\nshell ls\n.endc\n",
     2,
     "'.control' does not define a device",
     ".control"},
    {"\n\n  \t.CoNtRoL\nshell ls\n.endc\n",
     3,
     "'.control' does not define a device",
     ".CoNtRoL"},
    {"*#shell ls\n",
     1,
     "a comment that begins '*#' is a command to the simulator",
     "*#shell ls"},
    {".model n nmos\n* between\n*\r#shell ls\n"sv,
     3,
     "control character 0x0d",
     "*?#shell ls"},
    {"* to the terminal \x1b[2J\n",
     1,
     "control character 0x1b",
     "* to the terminal ?[2J"},
    {".con\n+ trol\n", 1, "'.con' does not define a device", ".con"},
    {"+ uic\n", 1, "there is nothing that '+' continues", "+ uic"},
    {"* first\n+ uic\n", 2, "there is nothing that '+' continues", "+ uic"},
    {".model r1\n* between\n+ filesource(file=\"x\")\n",
     1,
     "models of type 'filesource' may read and write files",
     ".model r1  filesource(file=\"x\")"},
    {".subckt a b\n.control\n.endc\n.ends\n",
     2,
     "'.control' does not define a device",
     ".control"},
    {".lib tt\n.if(x)\n.exec ls\n.endif\n.endl\n",
     3,
     "'.exec' does not define a device",
     ".exec ls"},
    {".include ../secret.inc\n",
     1,
     "'../secret.inc' lies outside the model's folder",
     ".include ../secret.inc"},
    {".INCLUDE 'sub/../../secret.inc'\n",
     1,
     "'sub/../../secret.inc' lies outside the model's folder",
     ".INCLUDE 'sub/../../secret.inc'"},
    {".inc \"/etc/passwd\"\n",
     1,
     "'/etc/passwd' lies outside the model's folder",
     ".inc \"/etc/passwd\""},
    {".lib /etc/passwd tt\n",
     1,
     "'/etc/passwd' lies outside the model's folder",
     ".lib /etc/passwd tt"},
    {".include ~/secret.inc\n",
     1,
     "'~/secret.inc' has other characters than letters, digits and _.+-/",
     ".include ~/secret.inc"},
    {".include linked.inc\n",
     1,
     "'linked.inc' is a symbolic link",
     ".include linked.inc"},
    {".include away/secret.inc\n",
     1,
     "'away/secret.inc' is a symbolic link",
     ".include away/secret.inc"},
    {".include\n+ ../secret.inc\n",
     1,
     "'../secret.inc' lies outside the model's folder",
     ".include  ../secret.inc"},
};

TEST(ModelCheckTest, RefusesWhatIsNoDefinition) {
  NodeFolder folder;
  const TemporaryFolder elsewhere;
  fs::create_symlink("cards.sp", folder.path() / "linked.inc");
  fs::create_directory_symlink(elsewhere.path(), folder.path() / "away");
  for (const Hostile& hostile : kHostile) {
    EXPECT_EQ(
        LoadWithCards(folder, hostile.cards),
        Refusal(folder.CardsFile(), hostile.line, hostile.why, hostile.shown));
  }
}

TEST(ModelCheckTest, LooksIntoIncludedFilesAndSections) {
  NodeFolder folder;
  folder.Write("sub/deep.inc", "* fine\n.include deeper.inc\n");
  folder.Write("sub/deeper.inc", ".model n nmos\n.control\n");
  for (const char* cards :
       {".include sub/deep.inc\n",
        ".lib sub/deep.inc tt\n",
        ".subckt a b\n.inc './sub/../sub/deep.inc'\n.ends\n"}) {
    EXPECT_EQ(LoadWithCards(folder, cards),
              Refusal(folder.path() / "sub/deeper.inc",
                      2,
                      "'.control' does not define a device",
                      ".control"))
        << cards;
  }
}

// An include two levels down may go up again, but not out.
TEST(ModelCheckTest, FolderIsTheOneOfTheFileTheNodeNames) {
  NodeFolder folder;
  folder.Write("sub/up.inc", ".include ../top.inc\n");
  folder.Write("top.inc", ".param a=1\n");
  EXPECT_EQ(LoadWithCards(folder, ".include sub/up.inc\n"), "ok");
  folder.Write("sub/up.inc", ".include ../../out.inc\n");
  EXPECT_EQ(LoadWithCards(folder, ".include sub/up.inc\n"),
            Refusal(folder.path() / "sub/up.inc",
                    1,
                    "'../../out.inc' lies outside the model's folder",
                    ".include ../../out.inc"));
}

TEST(ModelCheckTest, FilesThatIncludeEachOtherEnd) {
  NodeFolder folder;
  folder.Write("a.inc", ".include b.inc\n");
  folder.Write("b.inc", ".include a.inc\n.include cards.sp\n");
  EXPECT_EQ(LoadWithCards(folder, ".include a.inc\n"), "ok");
}

TEST(ModelCheckTest, MissingIncludeIsNamed) {
  NodeFolder folder;
  EXPECT_EQ(LoadWithCards(folder, ".include none.inc\n"),
            (folder.path() / "none.inc").string() +
                ": cannot be read: No such file or directory");
}

TEST(ModelCheckTest, TrustedModelsAreNotLookedAt) {
  NodeFolder folder;
  nlohmann::json node = SmallNode();
  node["trusted_models"] = true;
  folder.WriteCards(".control\nset ngbehavior=hsa\n.endc\n");
  EXPECT_EQ(MessageOf(folder.Load(node)), "ok");
}

TEST(ModelCheckTest, ModelFileThroughALinkIsCheckedWhereItIs) {
  NodeFolder folder;
  folder.Write("real/cards.lib", ".include own.inc\n");
  folder.Write("real/own.inc", ".control\n");
  folder.Write("own.inc", ".param harmless=1\n");
  fs::create_symlink("real/cards.lib", folder.path() / "link.lib");
  nlohmann::json node = SmallNode();
  node["processes"][0]["models"][0]["file"] = "link.lib";
  EXPECT_EQ(MessageOf(folder.Load(node)),
            Refusal(folder.path() / "real/own.inc",
                    1,
                    "'.control' does not define a device",
                    ".control"));
}

struct OddPath {
  const char* folder;
  bool whole;    // Can be included whole,
  bool section;  // and a section of it.
};
// As ngspice 39 was seen to read them.
constexpr OddPath kOddPaths[] = {
    {"a b", true, false},
    {"a'b", true, false},
    {"a$b", true, true},
    {"a $b", false, false},
    {"a;b", false, false},
    {"a#b", true, true},
    {"\xc3\xa4", true, true},
};

TEST(ModelCheckTest, RefusesPathsTheSimulatorCannotRead) {
  NodeFolder folder;
  for (const OddPath& odd : kOddPaths) {
    folder.Write(std::string(odd.folder) + "/cards.sp", kCards);
    nlohmann::json node = SmallNode();
    nlohmann::json& model = node["processes"][0]["models"][0];
    model["file"] = std::string(odd.folder) + "/cards.sp";
    EXPECT_EQ(folder.Load(node).ok(), odd.whole) << odd.folder;
    model["section"] = "tt";
    EXPECT_EQ(folder.Load(node).ok(), odd.section) << odd.folder;
  }
  nlohmann::json node = SmallNode();
  node["processes"][0]["models"][0] = {{"file", "a b/cards.sp"},
                                       {"section", "tt"}};
  EXPECT_EQ(MessageOf(folder.Load(node)),
            (folder.path() / "a b/cards.sp").string() +
                ": the simulator cannot read a library's section with ' ' in "
                "its path: move it");
  node["processes"][0]["models"][0] = {{"file", "a;b/cards.sp"}};
  EXPECT_EQ(MessageOf(folder.Load(node)),
            (folder.path() / "a;b/cards.sp").string() +
                ": the simulator cannot read a model file with ';' in its "
                "path: move it");
}

std::string FingerprintOf(NodeFolder& folder) {
  const Result<ProcessNode> node = folder.Load(SmallNode());
  EXPECT_TRUE(node.ok()) << node.error().message;
  return node.ok() ? *ModelsFingerprint(node->processes.front()) : "";
}

TEST(ModelCheckTest, FingerprintFollowsTheContent) {
  NodeFolder folder;
  NodeFolder twin;
  const std::string plain = FingerprintOf(folder);
  EXPECT_EQ(plain, FingerprintOf(twin)) << "depends on the path";

  folder.WriteCards(".include sub/n.inc\n");
  folder.Write("sub/n.inc", ".param a=1\n");
  const std::string included = FingerprintOf(folder);
  EXPECT_NE(included, plain);
  folder.Write("sub/n.inc", ".param a=2\n");
  EXPECT_NE(FingerprintOf(folder), included);
  folder.Write("sub/n.inc", ".param a=1\n");
  EXPECT_EQ(FingerprintOf(folder), included);
}

TEST(ModelCheckTest, FingerprintFollowsTheSection) {
  NodeFolder folder;
  Result<ProcessNode> node = folder.Load(SmallNode());
  ASSERT_TRUE(node.ok()) << node.error().message;
  Process process = node->processes.front();
  const std::string whole = *ModelsFingerprint(process);
  process.models.front().section = "tt";
  const std::string typical = *ModelsFingerprint(process);
  process.models.front().section = "ff";
  EXPECT_NE(typical, whole);
  EXPECT_NE(typical, *ModelsFingerprint(process));
}

}  // namespace
}  // namespace gatedyno
