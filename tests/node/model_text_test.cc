#include "harness/node/model_text.h"

#include <string>

#include <gtest/gtest.h>

#include "tests/node/node_folder.h"

namespace gatedyno {
namespace {

TEST(ModelTextTest, KeepsStoredLinesAndTheirNumbers) {
  NodeFolder folder;
  folder.WriteCards("* c\r\n\r\n \t.model x nmos \r\n+ level=1\n");
  const Result<ModelText> text = ReadModelText(folder.CardsFile());
  ASSERT_TRUE(text.ok()) << text.error().message;
  ASSERT_EQ(text->lines.size(), 3U);
  EXPECT_EQ(text->lines[0].text, "* c");
  EXPECT_EQ(text->lines[1].number, 3);
  EXPECT_EQ(text->lines[1].text, ".model x nmos");
  EXPECT_EQ(text->lines[2].text, "+ level=1");
  const std::vector<ModelLine> logical = LogicalLines(*text);
  ASSERT_EQ(logical.size(), 1U);
  EXPECT_EQ(logical[0].number, 3);
  EXPECT_EQ(logical[0].text, ".model x nmos  level=1");
}

struct Case {
  const char* line;
  const char* file;
  const char* section;
  const char* rest;
};

// What ngspice 39 opens for each, tried with files of these names.
constexpr Case kIncludes[] = {
    {".include a.inc", "a.inc", "", ""},
    {".INC  a.inc", "a.inc", "", ""},
    {".incl a.inc", "a.inc", "", ""},
    {".include \"a b.inc\"", "a b.inc", "", ""},
    {".include 'a b.inc' c", "a b.inc", "", "c"},
    {".include a.inc $ words", "a.inc", "", "$ words"},
    {".lib tt", "", "", ""},
    {".lib a.lib tt", "a.lib", "tt", ""},
    {".LIB 'a.lib' tt", "a.lib", "tt", ""},
    {".lib a.lib $ tt", "a.lib", "$", "tt"},
    {".libx a.lib tt", "a.lib", "tt", ""},
    {".include \"a.inc", "a.inc", "", ""},
    {".include", "", "", ""},
};

TEST(ModelTextTest, FindsIncludedFiles) {
  for (const Case& tried : kIncludes) {
    const IncludeLine include = ParseInclude(tried.line);
    EXPECT_EQ(include.file, tried.file) << tried.line;
    EXPECT_EQ(include.section, tried.section) << tried.line;
    EXPECT_EQ(include.rest, tried.rest) << tried.line;
  }
  EXPECT_EQ(ParseInclude(".model a nmos").file, "");
}

}  // namespace
}  // namespace gatedyno
