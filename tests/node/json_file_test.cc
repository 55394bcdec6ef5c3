#include "harness/node/json_file.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/node/node_folder.h"

namespace gatedyno {
namespace {

struct NoJson {
  const char* text;
  const char* message;  // After the file's name.
};

constexpr NoJson kNoJson[] = {
    {"",
     ":1:1: not JSON: syntax error while parsing value - unexpected end of "
     "input; expected '[', '{', or a literal"},
    {"{\"name\": \"x\",\n \"mu\": 2,,\n}\n",
     ":2:10: not JSON: syntax error while parsing object key - unexpected ','; "
     "expected string literal"},
    {"{\"name\": 'x'}\n",
     ":1:10: not JSON: syntax error while parsing value - invalid literal; "
     "last read: '\"name\": ''"},
    {"{\n  \"mu\": 2\n  \"supply_v\": 1}\n",
     ":3:12: not JSON: syntax error while parsing object - unexpected string "
     "literal; expected '}'"},
    {"{\"mu\": 2",
     ":1:9: not JSON: syntax error while parsing object - unexpected end of "
     "input; expected '}'"},
};

TEST(JsonFileTest, PointsAtLineAndColumn) {
  NodeFolder folder;
  for (const NoJson& no_json : kNoJson) {
    const Result<ProcessNode> loaded = folder.LoadText(no_json.text);
    ASSERT_FALSE(loaded.ok()) << no_json.text;
    EXPECT_EQ(loaded.error().kind, ErrorKind::kBadInput);
    EXPECT_EQ(loaded.error().message, folder.NodeFile() + no_json.message);
  }
}

TEST(JsonFileTest, NamesAFileThatCannotBeRead) {
  const NodeFolder folder;
  const std::string missing = (folder.path() / "none.json").string();
  EXPECT_EQ(MessageOf(ReadJsonFile(missing, "any")),
            missing + ": cannot be read: No such file or directory");
  EXPECT_EQ(MessageOf(ReadJsonFile(folder.path(), "any")),
            folder.path().string() + ": is a folder, not a file");
}

// nlohmann reads by recursion; so many brackets must end in words.
TEST(JsonFileTest, OutlivesDeepNesting) {
  NodeFolder folder;
  constexpr size_t kDepth = 200'000;
  const std::string message =
      MessageOf(folder.LoadText(std::string(kDepth, '[')));
  EXPECT_EQ(message.find(folder.NodeFile() + ":1:200001: not JSON"), 0U)
      << message.substr(0, 200);
}

}  // namespace
}  // namespace gatedyno
