#include "harness/page/page.h"

#include <map>

#include <fmt/format.h>

#include "harness/page/circuit_svg.h"
#include "harness/page/page_arcs.h"
#include "harness/page/page_cells.h"
#include "harness/page/page_data.h"
#include "harness/page/page_exemptions.h"
#include "harness/page/page_head.h"
#include "harness/page/page_heat.h"
#include "harness/page/page_method.h"
#include "harness/page/page_parts.h"
#include "harness/page/page_policy.h"
#include "harness/page/page_waves.h"
#include "harness/report/html_text.h"
#include "harness/report/run_table.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

std::string Title(const RunFacts& facts) {
  return facts.title.empty() ? "cells on " + facts.node : facts.title;
}

}  // namespace

std::string Page(const RunResult& result,
                 const RunSource& source,
                 std::span<const ArcWaves> waves) {
  const RunFacts& facts = result.facts;
  const std::map<std::string, std::string> values = {
      {"policy", PagePolicy(kPageScript)},
      {"style", std::string(kPageStyle.text)},
      {"title", Html(Title(facts))},
      {"node", fmt::format("{}: {}", Html(facts.node), Html(facts.node_title))},
      {"begun", Html(facts.started)},
      {"verdict", KeepPercents(Html(VerdictSentence(result)))},
      {"counts", CountTable(result)},
      {"worst", KeepPercents(WorstList(result))},
      {"corners", CornerTable(result)},
      {"heat", HeatMaps(result)},
      {"waves", WavesSection(waves, result)},
      {"waves link", WavesLink(waves)},
      {"exemptions", ExemptionSection(result, source.today)},
      {"exemption_link", ExemptionLink(result)},
      {"arcs", ArcTable(result, source.today)},
      {"symbols", CircuitSymbols()},
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
