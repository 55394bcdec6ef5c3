#include "harness/page/page_policy.h"

#include <fmt/format.h>

#include "harness/report/html_text.h"

namespace gatedyno {

std::string PagePolicy(const PagePart& script) {
  return fmt::format(
      "default-src 'none'; base-uri 'none'; form-action 'none'; img-src data:; "
      "style-src 'unsafe-inline'; script-src {} {}",
      PolicyHash(kChartScript.sha256),
      PolicyHash(script.sha256));
}

}  // namespace gatedyno
