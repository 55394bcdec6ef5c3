#include "harness/page/label_text.h"

#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

struct LabelCase {
  const char* name;
  int places;
  const char* in_six;
};

const std::vector<LabelCase> kCases = {
    {"", 0, ""},
    {"a", 1, "a"},
    {"req_07", 6, "req_07"},
    {"grant_n", 7, "gran…"},
    {"\xE5\x8F\x8D\xE5\x8F\x8A", 4, "\xE5\x8F\x8D\xE5\x8F\x8A"},
    // Cut between characters, never within one.
    {"\xE5\x8F\x8D\xE5\x8F\x8A\xE9\x96\x98\xE9\x96\x98",
     8,
     "\xE5\x8F\x8D\xE5\x8F\x8A…"},
    {"a\xE5\x8F\x8D\xE5\x8F\x8A\xE9\x96\x98", 7, "a\xE5\x8F\x8D…"},
};

TEST(LabelTextTest, NamesAreCutToTheRoomThereIs) {
  constexpr int kRoom = 6;
  for (const LabelCase& tried : kCases) {
    EXPECT_EQ(LabelPlaces(tried.name), tried.places) << tried.name;
    const std::string label = ShortLabel(tried.name, kRoom);
    EXPECT_EQ(label, tried.in_six);
    EXPECT_LE(LabelPlaces(label), kRoom);
  }
}

}  // namespace
}  // namespace gatedyno
