#include "harness/flow/agreement.h"

#include <cstddef>

#include <fmt/format.h>

#include "harness/base/calendar_day.h"
#include "harness/record/agreement_json.h"

namespace gatedyno {
namespace {

using nlohmann::json;

bool IsBlank(const std::string& text) {
  return text.find_first_not_of(" \t\r\n") == std::string::npos;
}

Status CheckRules(const std::vector<ToleranceRule>& rules,
                  const std::string& file) {
  for (size_t i = 0; i < rules.size(); ++i) {
    if (!rules[i].effort && !rules[i].parasitic) {
      return BadInput(
          fmt::format("{}: /tolerances/rules/{}: key 'effort' or 'parasitic' "
                      "is missing: a rule says what it allows",
                      file,
                      i));
    }
  }
  return Ok();
}

Status CheckExemption(const Exemption& exemption, const std::string& place) {
  if (IsBlank(exemption.reason) || IsBlank(exemption.author)) {
    return BadInput(
        fmt::format("{}/{}: must not be blank",
                    place,
                    IsBlank(exemption.reason) ? "reason" : "author"));
  }
  if (!IsCalendarDay(exemption.expires)) {
    return BadInput(fmt::format(
        "{}/expires: expected a day of the calendar, as \"2026-12-31\"; got {}",
        place,
        json(exemption.expires).dump()));
  }
  return Ok();
}

}  // namespace

Status ReadAgreement(const json& content, const std::string& file, Plan* plan) {
  if (content.contains("tolerances") &&
      content["tolerances"].contains("rules")) {
    plan->tolerance_rules = ReadToleranceRules(content["tolerances"]["rules"]);
  }
  if (content.contains("exemptions")) {
    plan->exemptions = ReadExemptions(content["exemptions"]);
  }
  Status checked = CheckRules(plan->tolerance_rules, file);
  for (size_t i = 0; checked.ok() && i < plan->exemptions.size(); ++i) {
    checked = CheckExemption(plan->exemptions[i],
                             fmt::format("{}: /exemptions/{}", file, i));
  }
  return checked;
}

}  // namespace gatedyno
