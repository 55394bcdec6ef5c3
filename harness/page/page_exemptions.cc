#include "harness/page/page_exemptions.h"

#include <cstddef>
#include <vector>

#include <fmt/format.h>

#include "harness/compare/excuse.h"
#include "harness/report/html_text.h"

namespace gatedyno {
namespace {

std::string Row(const Exemption& exemption, const ExemptionUse& use) {
  return fmt::format(
      "<tr><th scope=\"row\">{}</th><td>{}</td><td>{}</td><td>{}</td>"
      "<td>{}</td><td>{}</td><td>{} of {}</td></tr>\n",
      Html(DescribePattern(exemption.where)),
      exemption.quantity ? QuantitySymbol(*exemption.quantity)
                         : "g, p, not measured",
      ExemptionStateName(use.state),
      Html(exemption.expires),
      Html(exemption.reason),
      Html(exemption.author),
      use.in_need,
      use.arcs);
}

}  // namespace

std::string ExemptionSection(const RunResult& result,
                             const std::string& today) {
  const std::vector<Exemption>& exemptions = result.facts.exemptions;
  if (exemptions.empty()) {
    return "";
  }
  const std::vector<ExemptionUse> uses = UseOfExemptions(result, today);
  std::string rows;
  for (size_t i = 0; i < exemptions.size(); ++i) {
    rows += Row(exemptions[i], uses[i]);
  }
  return fmt::format(
      "<section id=\"exemptions\">\n<h2>Exemptions</h2>\n<p>Arcs that the plan "
      "lets pass although they differ, or were not measured. They change no "
      "number and no verdict; <code>gatedyno release</code> goes by those in "
      "force.</p>\n<div class=\"wide\" role=\"region\" tabindex=\"0\" "
      "aria-label=\"exemptions\"><table class=\"exemptions\"><caption>As of {}"
      "</caption>\n<thead><tr><th scope=\"col\">arcs</th><th scope=\"col\">"
      "what</th><th scope=\"col\">state</th><th scope=\"col\">last day</th>"
      "<th scope=\"col\">reason</th><th scope=\"col\">author</th><th "
      "scope=\"col\">arcs in need</th></tr></thead>\n<tbody>\n{}</tbody>"
      "</table></div>\n</section>\n",
      Html(today),
      rows);
}

std::string ExemptionLink(const RunResult& result) {
  return result.facts.exemptions.empty()
             ? ""
             : "<a href=\"#exemptions\">Exemptions</a>\n";
}

}  // namespace gatedyno
