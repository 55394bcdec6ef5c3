#include "harness/report/html_text.h"

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(HtmlTextTest, Escapes) {
  struct Case {
    const char* text;
    const char* html;
  };
  const Case cases[] = {
      {"nand2 a->y", "nand2 a-&gt;y"},
      {"<b class=\"x\" id='y'>&amp;",
       "&lt;b class=&quot;x&quot; id=&#39;y&#39;&gt;&amp;amp;"},
      {"a\tb\nc", "a\tb\nc"},
      {"bell\x07 delete\x7f", "bell\xEF\xBF\xBD delete\xEF\xBF\xBD"},
      {"\xE5\x8F\x8D", "\xE5\x8F\x8D"},
      {"", ""},
  };
  for (const Case& test : cases) {
    EXPECT_EQ(Html(test.text), test.html);
  }
  EXPECT_EQ(HtmlName("a<b"), "<bdi>a&lt;b</bdi>");
  EXPECT_EQ(KeepPercents("g 25 %, p 3 %"), "g 25&nbsp;%, p 3&nbsp;%");
}

TEST(HtmlTextTest, JsonCannotEndItsElement) {
  EXPECT_EQ(ScriptJson("[\"</script><!--\"]"),
            "[\"\\u003c/script>\\u003c!--\"]");
}

// RFC 4648, section 10: "foobar" and its beginnings.
TEST(HtmlTextTest, PolicyHashIsBase64) {
  struct Case {
    const char* hex;
    const char* hash;
  };
  const Case cases[] = {{"666f6f626172", "'sha256-Zm9vYmFy'"},
                        {"666f6f6261", "'sha256-Zm9vYmE='"},
                        {"666f6f62", "'sha256-Zm9vYg=='"},
                        {"666f6f", "'sha256-Zm9v'"},
                        {"ff", "'sha256-/w=='"}};
  for (const Case& test : cases) {
    EXPECT_EQ(PolicyHash(test.hex), test.hash);
  }
}

TEST(HtmlTextTest, FillsInOnce) {
  EXPECT_EQ(FillIn("<p>{{a}}</p>{{b}}{{a}}.", {{"a", "{{b}}"}, {"b", "2"}}),
            "<p>{{b}}</p>2{{b}}.");
  EXPECT_EQ(FillIn("nothing", {}), "nothing");
}

}  // namespace
}  // namespace gatedyno
