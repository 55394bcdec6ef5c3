#include "harness/page/page_method.h"

#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>
#include <nlohmann/json.hpp>

#include "harness/report/html_text.h"
#include "harness/report/number_text.h"
#include "harness/report/verdict_text.h"

namespace gatedyno {
namespace {

std::string Item(std::string_view term, const std::string& text) {
  return fmt::format("<dt>{}</dt><dd>{}</dd>\n", term, Html(text));
}

std::string SmallPercent(double ratio) {
  return fmt::format("{:.2g} %", 100.0 * ratio);
}

std::string Checked(const AccuracyCheck& check) {
  if (check.delays == 0) {
    return "not checked";
  }
  return fmt::format(
      "{}: {} delays simulated again with finer settings changed by {} root "
      "mean square and {} at most ({})",
      check.met() ? "kept" : "not kept",
      check.delays,
      SmallPercent(check.rms),
      SmallPercent(check.largest),
      check.worst);
}

std::string Fanouts(const RunFacts& facts) {
  return facts.fanouts.empty()
             ? "as each arc needs"
             : fmt::format("{:g}", fmt::join(facts.fanouts, ", "));
}

// "g 30 %, p 40 %": what the rule changes.
std::string Allowed(const ToleranceRule& rule) {
  std::vector<std::string> parts;
  if (rule.effort) {
    parts.push_back("g " + Percent(*rule.effort));
  }
  if (rule.parasitic) {
    parts.push_back("p " + Percent(*rule.parasitic));
  }
  return fmt::format("{}", fmt::join(parts, ", "));
}

std::string RuleItems(const RunFacts& facts) {
  std::string items;
  for (const ToleranceRule& rule : facts.tolerance_rules) {
    items += Item(
        "allowed by rule",
        fmt::format("{} for {}", Allowed(rule), DescribePattern(rule.where)));
  }
  return items;
}

std::string Jobs(const JobCounts& jobs) {
  return fmt::format("{}: {} simulated, {} taken from stores, {} failed",
                     jobs.wanted,
                     jobs.simulated,
                     jobs.reused,
                     jobs.failed);
}

std::string List(std::string_view heading, const std::string& items) {
  return items.empty()
             ? ""
             : fmt::format("<h3>{}</h3>\n<ul class=\"trouble\">\n{}</ul>\n",
                           heading,
                           items);
}

}  // namespace

std::string MethodList(const RunResult& result, const RunSource& source) {
  const RunFacts& facts = result.facts;
  return "<dl>\n" +
         Item("node", fmt::format("{}: {}", facts.node, facts.node_title)) +
         Item("drive", std::string(DriveName(facts.drive))) +
         Item("fanouts", Fanouts(facts)) + Item("allowed", AllowedText(facts)) +
         RuleItems(facts) +
         Item("accuracy promised",
              fmt::format("{} of each delay", SmallPercent(facts.accuracy))) +
         Item("accuracy checked", Checked(result.accuracy)) +
         Item("jobs", Jobs(result.jobs)) + Item("simulator", facts.simulator) +
         Item("program", facts.program) + Item("begun", facts.started) +
         Item("store", fmt::format("{}, run {}", source.store, source.run)) +
         "</dl>\n";
}

std::string PlanText(const RunSource& source) {
  using nlohmann::json;
  const json plan = json::parse(source.plan, nullptr, /*exceptions=*/false);
  return Html(plan.is_discarded()
                  ? source.plan
                  : plan.dump(1, ' ', false, json::error_handler_t::replace));
}

std::string TroubleLists(const RunResult& result) {
  std::string warnings;
  for (const std::string& warning : result.warnings) {
    warnings += fmt::format("<li>{}</li>\n", Html(warning));
  }
  std::string failures;
  for (const FailedJob& job : result.failed_jobs) {
    failures += fmt::format("<li>{}: {} <small>job {}</small></li>\n",
                            Html(job.label),
                            Html(job.message),
                            Html(job.key));
  }
  return List("Warnings", warnings) + List("Jobs that failed", failures);
}

}  // namespace gatedyno
