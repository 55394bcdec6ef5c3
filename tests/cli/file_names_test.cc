#include "harness/cli/file_names.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct Case {
  std::string stem;
  std::string name;
};

TEST(FileNamesTest, AreHarmlessAndEachGivenOnce) {
  const Case cases[] = {
      {"nand2_a_y_rise_1_h4_typical", "nand2_a_y_rise_1_h4_typical.sp"},
      {"req<0>", "req_0_.sp"},
      {"req[0]", "req_0__2.sp"},
      {"req(0)", "req_0__3.sp"},
      {"REQ_0_", "REQ_0__4.sp"},
      {"req_0__2", "req_0__2_2.sp"},
      {"../../etc/passwd", "_._.._etc_passwd.sp"},
      {"/root", "_root.sp"},
      {"-rf", "_rf.sp"},
      {".hidden", "_hidden.sp"},
      {"h2.5+", "h2.5+.sp"},
      {"a\nb\x1b\xc3\xa9", "a_b___.sp"},
      {"", ".sp"},
      {std::string(300, 'x'), std::string(200, 'x') + ".sp"},
      {std::string(301, 'x'), std::string(200, 'x') + "_2.sp"},
  };
  FileNames names;
  for (const Case& tried : cases) {
    EXPECT_EQ(names.FileName(tried.stem, ".sp"), tried.name) << tried.stem;
  }
}

}  // namespace
}  // namespace gatedyno
