// Emphasis on a terminal.  Words carry every meaning; colour only repeats it.

#ifndef GATEDYNO_REPORT_STYLE_H_
#define GATEDYNO_REPORT_STYLE_H_

#include <string>
#include <string_view>

#include "harness/record/comparison.h"

namespace gatedyno {

// Whether the stream of this descriptor takes colour: a terminal, and neither
// NO_COLOR (no-color.org) nor TERM=dumb is set.
bool TakesColour(int descriptor);

class Style {
 public:
  explicit Style(bool colour) : colour_(colour) {}

  std::string Heading(std::string_view text) const;
  std::string Quiet(std::string_view text) const;
  std::string OfVerdict(Verdict verdict, std::string_view text) const;

 private:
  bool colour_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_STYLE_H_
