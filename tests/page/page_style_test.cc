// That the page's colours can be read, light and dark: contrast as WCAG 2.2
// defines it (W3C, success criterion 1.4.3: 4.5 for text; "relative luminance"
// and "contrast ratio" in its glossary).

#include <algorithm>
#include <cmath>
#include <map>
#include <string>

#include <gtest/gtest.h>

#include "harness/page/page_parts.h"

namespace gatedyno {
namespace {

constexpr double kReadable = 4.5;

using Theme = std::map<std::string, std::string>;

// The variables of the first ":root {" after `from`, over those of `base`.
Theme ThemeAfter(const std::string& css, const std::string& from, Theme base) {
  size_t at = css.find(":root {", css.find(from));
  const size_t end = css.find('}', at);
  while ((at = css.find("--", at)) < end) {
    const size_t colon = css.find(':', at);
    base[css.substr(at + 2, colon - at - 2)] = css.substr(colon + 2, 7);
    at = colon;
  }
  return base;
}

double Luminance(const std::string& colour) {
  const auto channel = [&](size_t at) {
    const double c = std::stoi(colour.substr(at, 2), nullptr, 16) / 255.0;
    return c <= 0.04045 ? c / 12.92 : std::pow((c + 0.055) / 1.055, 2.4);
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}

double Contrast(const std::string& a, const std::string& b) {
  const double first = Luminance(a) + 0.05;
  const double second = Luminance(b) + 0.05;
  return std::max(first, second) / std::min(first, second);
}

TEST(PageStyleTest, BlackOnWhiteIsTwentyOne) {
  constexpr double kRounding = 1e-9;
  EXPECT_NEAR(Contrast("#000000", "#ffffff"), 21.0, kRounding);
}

TEST(PageStyleTest, ColoursCanBeRead) {
  const std::string css(kPageStyle.text);
  const Theme light = ThemeAfter(css, "Colours.", {});
  const Theme dark = ThemeAfter(css, "prefers-color-scheme: dark", light);
  ASSERT_NE(light.at("paper"), dark.at("paper"));
  for (const Theme& theme : {light, dark}) {
    for (const char* text : {"ink",
                             "quiet",
                             "link",
                             "within",
                             "beyond",
                             "unmeasured",
                             "rise",
                             "fall"}) {
      for (const char* ground : {"paper", "panel"}) {
        EXPECT_GE(Contrast(theme.at(text), theme.at(ground)), kReadable)
            << text << " on " << ground << " " << theme.at("paper");
      }
    }
    for (const char* shade : {"up1", "up2", "up3", "down1", "down2", "down3"}) {
      EXPECT_GE(Contrast(theme.at("on-shade"), theme.at(shade)), kReadable)
          << shade << " " << theme.at("paper");
    }
  }
}

}  // namespace
}  // namespace gatedyno
