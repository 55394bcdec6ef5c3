// The files of reports/ that every page is made of, embedded by the build
// (cmake/EmbedPage.cmake), so that the program needs none of them to run.

#ifndef GATEDYNO_PAGE_PAGE_PARTS_H_
#define GATEDYNO_PAGE_PAGE_PARTS_H_

#include <string_view>

namespace gatedyno {

struct PagePart {
  std::string_view text;
  std::string_view sha256;  // Of the text, hexadecimal.
};

// page.html, with a {{name}} where something is to be filled in.
extern const PagePart kPageShell;
extern const PagePart kPageStyle;      // page.css
extern const PagePart kPageScript;     // script/*.js, as one
extern const PagePart kVersusShell;    // versus.html
extern const PagePart kVersusScript;   // script/*.js of its own, as one
extern const PagePart kChartScript;    // vendor/charts.min.js
extern const PagePart kChartLicences;  // vendor/LICENSES.txt

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_PARTS_H_
