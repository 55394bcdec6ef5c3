#include "harness/page/versus_page.h"

#include <map>

#include <fmt/format.h>

#include "harness/page/page_method.h"
#include "harness/page/page_parts.h"
#include "harness/page/page_policy.h"
#include "harness/page/versus_arcs.h"
#include "harness/page/versus_data.h"
#include "harness/page/versus_head.h"
#include "harness/page/versus_lists.h"
#include "harness/report/html_text.h"
#include "harness/report/versus_text.h"

namespace gatedyno {
namespace {

// By what sets them apart: nodes, corners or runs.
std::string Title(const VersusView& view) {
  const RunFacts& a = view.a.result.facts;
  const RunFacts& b = view.b.result.facts;
  if (a.node != b.node) {
    return fmt::format("{} against {}", a.node, b.node);
  }
  const auto& corners = view.versus.corners;
  if (corners.size() == 1 && corners[0].a != corners[0].b) {
    return fmt::format("{} against {}", corners[0].a, corners[0].b);
  }
  return fmt::format("{} before and after", a.node);
}

std::string Method(const VersusSide& side) {
  return KeepPercents(MethodList(side.result, side.source)) +
         TroubleLists(side.result);
}

}  // namespace

std::string VersusPage(const VersusView& view) {
  const std::map<std::string, std::string> values = {
      {"policy", PagePolicy(kVersusScript)},
      {"style", std::string(kPageStyle.text)},
      {"title", Html(Title(view))},
      {"sentence", KeepPercents(Html(VersusSentence(view)))},
      {"sides", KeepPercents(SideTable(view))},
      {"corners", CornerPairTable(view)},
      {"spread", KeepPercents(SpreadTable(view))},
      {"stacks", KeepPercents(StackSpreadTable(view))},
      {"changed", ChangedList(view)},
      {"verdicts", VerdictList(view)},
      {"arcs", PairTable(view.versus)},
      {"one-sided", OneSidedLists(view)},
      {"method-a", Method(view.a)},
      {"method-b", Method(view.b)},
      {"caution", Html(VersusCaution(view))},
      {"licences", Html(kChartLicences.text)},
      {"data", ScriptJson(VersusData(view))},
      {"charts", std::string(kChartScript.text)},
      {"script", std::string(kVersusScript.text)}};
  return FillIn(kVersusShell.text, values);
}

}  // namespace gatedyno
