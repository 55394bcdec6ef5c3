#include "harness/report/page.h"

#include <map>

#include <fmt/format.h>

#include "harness/report/html_text.h"
#include "harness/report/page_arcs.h"
#include "harness/report/page_cells.h"
#include "harness/report/page_data.h"
#include "harness/report/page_head.h"
#include "harness/report/page_heat.h"
#include "harness/report/page_method.h"
#include "harness/report/page_parts.h"
#include "harness/report/run_table.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

// Styles are let in whole, for the attributes that the charts set.
std::string Policy() {
  return fmt::format(
      "default-src 'none'; base-uri 'none'; form-action 'none'; img-src data:; "
      "style-src 'unsafe-inline'; script-src {} {}",
      PolicyHash(kChartScript.sha256),
      PolicyHash(kPageScript.sha256));
}

std::string Title(const RunFacts& facts) {
  return facts.title.empty() ? "cells on " + facts.node : facts.title;
}

}  // namespace

std::string Page(const RunResult& result, const RunSource& source) {
  const RunFacts& facts = result.facts;
  const std::map<std::string, std::string> values = {
      {"policy", Policy()},
      {"style", std::string(kPageStyle.text)},
      {"title", Html(Title(facts))},
      {"node", fmt::format("{}: {}", Html(facts.node), Html(facts.node_title))},
      {"begun", Html(facts.started)},
      {"verdict", KeepPercents(Html(VerdictSentence(result)))},
      {"counts", CountTable(result)},
      {"worst", KeepPercents(WorstList(result))},
      {"corners", CornerTable(result)},
      {"heat", HeatMaps(result)},
      {"arcs", ArcTable(result)},
      {"cells", CellSections(result)},
      {"method", KeepPercents(MethodList(result, source))},
      {"plan", PlanText(source)},
      {"trouble", TroubleLists(result)},
      {"caution", Html(kCaution)},
      {"licences", Html(kChartLicences.text)},
      {"data", ScriptJson(PageData(result))},
      {"charts", std::string(kChartScript.text)},
      {"script", std::string(kPageScript.text)}};
  return FillIn(kPageShell.text, values);
}

}  // namespace gatedyno
