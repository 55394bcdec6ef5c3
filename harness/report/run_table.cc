#include "harness/report/run_table.h"

#include <algorithm>
#include <iterator>
#include <span>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/compare/excuse.h"
#include "harness/compare/summary.h"
#include "harness/report/comparison_rows.h"
#include "harness/report/exemption_text.h"
#include "harness/report/number_text.h"
#include "harness/report/verdict_text.h"
#include "harness/report/wrap.h"

namespace gatedyno {
namespace {

// `text` wrapped, its beginning emphasized where that is on one line.
std::string WithHeading(const std::string& heading,
                        const std::string& text,
                        const Style& style) {
  const std::string wrapped = Wrap(heading + text);
  return (wrapped.starts_with(heading)
              ? style.Heading(heading) + wrapped.substr(heading.size())
              : wrapped) +
         '\n';
}

std::string CellLine(const CellSummary& cell, const Style& style) {
  return WithHeading(cell.name,
                     fmt::format("  {}  [{} stage{}, stacks {} down {} up]",
                                 fmt::join(cell.functions, "; "),
                                 cell.stages,
                                 cell.stages == 1 ? "" : "s",
                                 cell.tallest_pull_down,
                                 cell.tallest_pull_up),
                     style);
}

std::string CornerLines(const Calibration& calibration, const Style& style) {
  const Corner& corner = calibration.corner;
  return WithHeading(fmt::format("corner {}", corner.name),
                     fmt::format(": {} process, {:g} V, {:g} C",
                                 corner.process,
                                 corner.supply_v,
                                 corner.temperature_c),
                     style) +
         Wrap(fmt::format("  tau {} (rise {}, fall {}), p_inv {:.2f}, FO4 {}",
                          Picoseconds(calibration.tau_s.value),
                          Picoseconds(calibration.tau_rise_s.value),
                          Picoseconds(calibration.tau_fall_s.value),
                          calibration.p_inv.value,
                          Picoseconds(calibration.fo4_s))) +
         '\n';
}

std::string FanoutText(const RunFacts& facts) {
  return facts.fanouts.empty()
             ? "fanouts as each arc needs"
             : fmt::format("fanouts {:g}", fmt::join(facts.fanouts, " "));
}

// What the settings were promised to cost, and what they did.
std::string AccuracyLine(const RunResult& result) {
  const AccuracyCheck& check = result.accuracy;
  const auto percent = [](double share) {
    return fmt::format("{:.2g} %", 100.0 * share);
  };
  return fmt::format(
      "delays to {} by the simulator's settings; {}",
      percent(result.facts.accuracy),
      check.delays == 0
          ? "not checked"
          : fmt::format("checked on {}: {} root mean square, {} at most",
                        check.delays,
                        percent(check.rms),
                        percent(check.largest)));
}

std::string FactLines(const RunResult& result, const Style& style) {
  const RunFacts& facts = result.facts;
  return style.Heading(Wrap(facts.title)) + '\n' +
         Wrap(fmt::format("node {}: {}", facts.node, facts.node_title)) + '\n' +
         Wrap(fmt::format("{} drive, {}; allowed: {}",
                          DriveName(facts.drive),
                          FanoutText(facts),
                          AllowedText(facts))) +
         '\n' + Wrap(AccuracyLine(result)) + '\n';
}

std::string CountLine(const RunResult& result, const Summary& summary) {
  return fmt::format(
      "{} arcs: {} within, {} beyond, {} not measured{}\n",
      result.comparisons.size(),
      summary.within,
      summary.beyond,
      summary.not_measured,
      summary.bent > 0 ? fmt::format(", {} bent", summary.bent) : "");
}

std::string SummaryLines(const RunResult& result) {
  constexpr std::string_view kTitle = "largest differences: ";
  const Summary summary = Summarise(result.comparisons);
  std::string text = CountLine(result, summary);
  std::string title(kTitle);
  for (const size_t place : summary.worst_by_effort) {
    const Comparison& row = result.comparisons[place];
    text += Wrap(title + fmt::format(
                             "{} {} at {}: g {:.3f} against {:.3f} by hand, {}",
                             row.arc.cell,
                             DescribeArc(row.arc),
                             row.corner,
                             row.effort.value,
                             row.estimate.effort,
                             SignedPercent(row.effort_difference)),
                 kTitle.size()) +
            '\n';
    title.assign(kTitle.size(), ' ');
  }
  return text;
}

std::string ExemptionLines(const RunResult& result, const std::string& today) {
  constexpr size_t kIndent = 4;
  const std::vector<Exemption>& exemptions = result.facts.exemptions;
  const std::vector<ExemptionUse> uses = UseOfExemptions(result, today);
  std::string text =
      exemptions.empty() ? "" : fmt::format("exemptions on {}:\n", today);
  for (size_t i = 0; i < exemptions.size(); ++i) {
    const Exemption& exemption = exemptions[i];
    text += Wrap(fmt::format("  {}: {}",
                             ExemptionScope(exemption),
                             ExemptionStanding(exemption, uses[i])),
                 kIndent) +
            '\n' +
            Wrap(fmt::format("    {} ({})", exemption.reason, exemption.author),
                 kIndent) +
            '\n';
  }
  return text;
}

class TableWriter {
 public:
  TableWriter(const RunResult& result,
              const Style& style,
              const std::string& today)
      : result_(result), style_(style), today_(today) {}

  std::string Text() {
    text_ = FactLines(result_, style_);
    const auto& rows = result_.comparisons;
    auto from = rows.begin();
    while (from != rows.end()) {
      const auto to =
          std::find_if(from, rows.end(), [&](const Comparison& row) {
            return row.corner != from->corner;
          });
      AddCorner({from, to});
      from = to;
    }
    AddFoot();
    return std::move(text_);
  }

 private:
  std::string CornerText(const std::string& name) const {
    for (const Calibration& calibration : result_.calibrations) {
      if (calibration.corner.name == name) {
        return CornerLines(calibration, style_);
      }
    }
    return WithHeading("corner " + name, ": without tau", style_);
  }

  void AddCorner(std::span<const Comparison> rows) {
    text_ += '\n' + CornerText(rows.front().corner);
    text_ += ComparisonHead();
    std::string cell;
    for (const Comparison& row : rows) {
      if (row.arc.cell != cell) {
        cell = row.arc.cell;
        AddCell(cell);
      }
      text_ += ComparisonRow(
          row, style_, ExemptionNote(row, result_.facts.exemptions, today_));
    }
  }

  void AddCell(const std::string& name) {
    for (const CellSummary& cell : result_.cells) {
      if (cell.name == name) {
        text_ += CellLine(cell, style_);
      }
    }
  }

  void AddFoot() {
    text_ += '\n';
    for (const std::string& warning : result_.warnings) {
      text_ += Wrap("warning: " + warning) + '\n';
    }
    text_ += ExemptionLines(result_, today_) + SummaryLines(result_);
    text_ += style_.Quiet(fmt::format(
        "g: slope of delay against fanout, over the reference inverter's of "
        "the same edge. p: intercept\nover tau; by hand, node count times the "
        "measured p_inv, or times 1. ±: one standard uncertainty.\n{}\n",
        kCaution));
  }

  const RunResult& result_;
  const Style& style_;
  const std::string& today_;
  std::string text_;
};

}  // namespace

std::string RunTable(const RunResult& result,
                     const Style& style,
                     const std::string& today) {
  return TableWriter(result, style, today).Text();
}

}  // namespace gatedyno
