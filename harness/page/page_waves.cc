#include "harness/page/page_waves.h"

#include <cmath>
#include <string_view>

#include <fmt/format.h>

#include "harness/page/page_arcs.h"
#include "harness/page/wave_view.h"
#include "harness/page/waves_data.h"
#include "harness/report/html_text.h"
#include "harness/report/number_text.h"

namespace gatedyno {
namespace {

constexpr double kPercent = 100.0;

std::string_view Verb(Edge edge) {
  return edge == Edge::kRise ? "rises" : "falls";
}

// "0.5 V, 50 %" of the supply.
std::string LevelText(double level_v, const WaveView& view) {
  const std::string volts = fmt::format("{:.3g} V", level_v);
  return view.supply_v
             ? fmt::format(
                   "{}, {:.3g} %", volts, level_v / *view.supply_v * kPercent)
             : volts;
}

// For the columns of a table: all to the femtosecond.
std::string PicosecondNumber(double seconds) {
  constexpr double kPicosecondsPerSecond = 1e12;
  return fmt::format("{:.3f}", seconds * kPicosecondsPerSecond);
}

struct End {
  const Crossing& crossing;
  double time_s;
};

std::string EndCells(const End& end,
                     const ArcWaves& waves,
                     const WaveView& view,
                     const Arc& arc) {
  return fmt::format("<td>{} {}</td><td>{}</td><td>{}</td>",
                     HtmlName(NetName(end.crossing.net, waves, arc)),
                     Verb(end.crossing.edge),
                     LevelText(end.crossing.level_v, view),
                     PicosecondNumber(end.time_s - view.zero_s));
}

std::string IntervalRow(const SeenInterval& seen,
                        const ArcWaves& waves,
                        const WaveView& view,
                        const Arc& arc) {
  return fmt::format(
      "<tr><th scope=\"row\">{}</th><td>{}</td>{}{}</tr>\n",
      HtmlName(IntervalTitle(seen, waves, arc)),
      PicosecondNumber(seen.to_s - seen.from_s),
      EndCells({seen.interval.from, seen.from_s}, waves, view, arc),
      EndCells({seen.interval.to, seen.to_s}, waves, view, arc));
}

std::string Table(const ArcWaves& waves,
                  const WaveView& view,
                  const std::string& name,
                  const Arc& arc) {
  std::string rows;
  for (const SeenInterval& seen : waves.intervals) {
    rows += IntervalRow(seen, waves, view, arc);
  }
  return fmt::format(
      "<details><summary>The numbers</summary>\n<div class=\"wide\" "
      "role=\"region\" tabindex=\"0\" aria-label=\"crossings of {}\"><table>"
      "<caption>Time 0 is {} into the deck of job <code>{}</code></caption>\n"
      "<thead><tr><th scope=\"col\">interval</th><th scope=\"col\">value, "
      "ps</th><th scope=\"col\">from</th><th scope=\"col\">at</th><th "
      "scope=\"col\">time, ps</th><th scope=\"col\">to</th><th "
      "scope=\"col\">at</th><th scope=\"col\">time, "
      "ps</th></tr></thead>\n<tbody>\n{}"
      "</tbody></table></div></details>\n",
      Html(name),
      Picoseconds(view.zero_s),
      Html(waves.job_key),
      rows);
}

// "Delay 12.34 ps, by hand 15.01 ps; transition of a 9.10 ps, ...".
std::string Values(const ArcWaves& waves,
                   const WaveView& view,
                   const Arc& arc) {
  std::string text = fmt::format("Delay {}", Picoseconds(view.delay_s));
  if (view.hand_delay_s) {
    text += fmt::format(", by hand {}", Picoseconds(*view.hand_delay_s));
  }
  for (size_t i = 1; i < waves.intervals.size(); ++i) {
    const SeenInterval& seen = waves.intervals[i];
    text += fmt::format("; {} {}",
                        HtmlName(IntervalTitle(seen, waves, arc)),
                        Picoseconds(seen.to_s - seen.from_s));
  }
  return text + '.';
}

std::string Caption(const ArcWaves& waves,
                    const Comparison& row,
                    const std::string& name) {
  const std::string side = DescribeSide(row.arc);
  return fmt::format(
      "<strong><a href=\"#{}\">{}</a></strong>at {}{}{}, g {}: <bdi>{}</bdi> "
      "{}, <bdi>{}</bdi> {}.",
      ArcId(waves.place),
      HtmlName(name),
      HtmlName(row.corner),
      side.empty() ? "" : fmt::format(", with {}", HtmlName(side)),
      waves.fanout > 0 ? fmt::format(", fanout {:g}", waves.fanout) : "",
      SignedPercent(row.effort_difference),
      Html(row.arc.pin),
      Verb(row.arc.input_edge),
      Html(row.arc.output),
      Verb(row.arc.edge));
}

// Empty for the same simulation.
std::string Doubt(const ArcWaves& waves, const WaveView& view) {
  const double change_s = view.delay_s - waves.stored_delay_s;
  if (std::abs(change_s) <= kSameDelay * std::abs(waves.stored_delay_s)) {
    return "";
  }
  return fmt::format(
      "<p class=\"doubt\"><strong>Not the simulation of the run.</strong> The "
      "delay that it measured is {}; this one differs by {:+.2g} %: "
      "another simulator version, or model files that have changed.</p>",
      Picoseconds(waves.stored_delay_s),
      change_s / waves.stored_delay_s * kPercent);
}

std::string Figure(const ArcWaves& waves, const RunResult& result) {
  const Comparison& row = result.comparisons[waves.place];
  const std::string name = row.arc.cell + ' ' + DescribeArc(row.arc);
  const std::string caption = Caption(waves, row, name);
  if (!waves.trouble.empty()) {
    return fmt::format(
        "<figure><figcaption>{}</figcaption>\n<p class=\"doubt\"><strong>No "
        "waveforms.</strong> {}.</p></figure>\n",
        caption,
        Html(waves.trouble));
  }
  const WaveView view = ViewOf(waves, result);
  return fmt::format(
      "<figure id=\"waves-{}\"><figcaption>{} {}{}</figcaption>\n{}</figure>\n",
      waves.place + 1,
      caption,
      Values(waves, view, row.arc),
      Doubt(waves, view),
      Table(waves, view, name, row.arc));
}

std::string Heading(size_t count) {
  return count == 1
             ? "Waveforms of the arc that differs most"
             : fmt::format("Waveforms of the {} arcs that differ most", count);
}

}  // namespace

std::string WavesSection(std::span<const ArcWaves> waves,
                         const RunResult& result) {
  if (waves.empty()) {
    return "";
  }
  std::string figures;
  for (const ArcWaves& one : waves) {
    figures += Figure(one, result);
  }
  return fmt::format(
      "<section id=\"waves\">\n<h2>{}</h2>\n<p>Each arc's own simulation, made "
      "again for this page, at the fanout nearest to 4. Dashed: the input; "
      "solid: the output. Time runs from where the delay begins, at half the "
      "supply on the input; it ends at half the supply on the output. Open "
      "diamond: where the hand numbers have it end. Transitions are from 20 to "
      "80 % of the supply, as they are.</p>\n<noscript><p>The pictures need "
      "scripts; the tables have their numbers.</p></noscript>\n"
      "<div id=\"wave-list\">\n{}</div>\n<script type=\"application/json\" "
      "id=\"waves-data\">{}</script>\n</section>\n",
      Heading(waves.size()),
      KeepPercents(figures),
      ScriptJson(WavesData(waves, result)));
}

std::string WavesLink(std::span<const ArcWaves> waves) {
  return waves.empty() ? "" : "<a href=\"#waves\">Waveforms</a>\n";
}

}  // namespace gatedyno
