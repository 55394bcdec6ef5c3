#include "harness/report/csv_text.h"

#include <string>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

TEST(CsvTextTest, Fields) {
  struct Case {
    const char* text;
    const char* field;
  };
  const Case cases[] = {{"nand2", "nand2"},
                        {"", ""},
                        {"a b", "a b"},
                        {"a,b", "\"a,b\""},
                        {"say \"g\"", "\"say \"\"g\"\"\""},
                        {"two\nlines", "\"two\nlines\""},
                        {"\r", "\"\r\""}};
  for (const Case& c : cases) {
    EXPECT_EQ(CsvField(c.text), c.field);
  }
}

TEST(CsvTextTest, LinesAndNumbers) {
  EXPECT_EQ(CsvLine({"a", "", "c"}), "a,,c\r\n");
  for (const double value : {0.1, 1.0 / 3.0, 2.5e-12, -4.0}) {
    EXPECT_EQ(std::stod(CsvNumber(value)), value);
  }
}

}  // namespace
}  // namespace gatedyno
