#include "harness/compare/compare.h"

#include <algorithm>
#include <array>
#include <cassert>
#include <cmath>
#include <optional>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "harness/fit/coverage.h"
#include "harness/fit/line_fit.h"
#include "harness/fit/linearity.h"
#include "harness/fit/normalise.h"
#include "harness/fit/quotient.h"

namespace gatedyno {
namespace {

// One of the two figures of an arc that the hand method predicts.
struct Figure {
  std::string_view symbol;  // "g", "p".
  Measured measured;
  double hand = 0.0;
  Measured difference;  // (measured - hand) / hand.
  double tolerance = 0.0;
};

std::string FirstFailure(const std::vector<std::string>& failures) {
  if (failures.size() == 1) {
    return failures.front();
  }
  return fmt::format("{} (and {} more)", failures.front(), failures.size() - 1);
}

Measured HandParasitic(const Estimate& estimate, const Measured& p_inv) {
  const double nodes = estimate.parasitic_by_nodes - estimate.inner_effort;
  Measured hand{nodes * p_inv.value + estimate.inner_effort, std::nullopt};
  if (p_inv.u) {
    hand.u = nodes * *p_inv.u;
  }
  return hand;
}

Measured Difference(const Measured& measured, const Measured& hand) {
  Measured difference = Quotient(measured, hand);
  difference.value -= 1.0;
  return difference;
}

std::string DescribeBeyond(const Figure& figure) {
  return fmt::format(
      "{} {:.2f} against {:.2f} by hand: {:+.1f} % (allowed {:g} "
      "%)",
      figure.symbol,
      figure.measured.value,
      figure.hand,
      100.0 * figure.difference.value,
      100.0 * figure.tolerance);
}

std::string DescribeUncertain(const Figure& figure, double expanded) {
  return fmt::format(
      "{} is too uncertain to tell: {:+.1f} % with an "
      "uncertainty of {:.1f} % (allowed {:g} %)",
      figure.symbol,
      100.0 * figure.difference.value,
      100.0 * expanded,
      100.0 * figure.tolerance);
}

void AppendReason(Comparison& comparison, const std::string& reason) {
  if (!comparison.reason.empty()) {
    comparison.reason += "; ";
  }
  comparison.reason += reason;
}

double Expanded(const Figure& figure, double coverage) {
  assert(figure.difference.u.has_value());
  return coverage * figure.difference.u.value_or(0.0);
}

// Beyond on either figure outweighs doubt about the other.
void Judge(const Figure& figure, double coverage, Comparison& comparison) {
  const double expanded = Expanded(figure, coverage);
  const bool beyond =
      std::abs(figure.difference.value) - expanded > figure.tolerance;
  if (beyond && comparison.verdict != Verdict::kBeyond) {
    comparison.verdict = Verdict::kBeyond;
    comparison.reason.clear();
  }
  if (beyond) {
    AppendReason(comparison, DescribeBeyond(figure));
  } else if (expanded > figure.tolerance &&
             comparison.verdict != Verdict::kBeyond) {
    comparison.verdict = Verdict::kNotMeasured;
    AppendReason(comparison, DescribeUncertain(figure, expanded));
  }
}

// Fills in what the line says and returns both figures.
std::array<Figure, 2> Measure(const Calibration& calibration,
                              double delay_u_relative,
                              Comparison& comparison) {
  const Line& line = *comparison.line;
  const Normalised normalised =
      Normalise(line, comparison.arc.edge, calibration);
  comparison.effort = normalised.effort;
  comparison.effort_mean = normalised.effort_mean;
  comparison.parasitic = normalised.parasitic;
  comparison.bent =
      TestLinearity(
          line, comparison.points, calibration.tau_s.value, delay_u_relative)
          .bent;

  const Measured hand_effort{comparison.estimate.effort, 0.0};
  const Measured effort_difference = Difference(normalised.effort, hand_effort);
  const Measured hand_parasitic =
      HandParasitic(comparison.estimate, calibration.p_inv);
  const Measured parasitic_difference =
      Difference(normalised.parasitic, hand_parasitic);
  comparison.effort_difference = effort_difference.value;
  comparison.parasitic_difference = parasitic_difference.value;
  return {Figure{"g",
                 normalised.effort,
                 hand_effort.value,
                 effort_difference,
                 comparison.tolerance.effort},
          Figure{"p",
                 normalised.parasitic,
                 hand_parasitic.value,
                 parasitic_difference,
                 comparison.tolerance.parasitic}};
}

// Everything but what a line says.
Comparison WithoutLine(const MeasuredArc& measured,
                       const Calibration& calibration,
                       const Tolerance& tolerance) {
  assert(measured.estimate.effort > 0.0);
  assert(measured.estimate.parasitic_by_nodes > 0.0);
  assert(measured.estimate.parasitic_by_nodes >=
         measured.estimate.inner_effort);
  Comparison comparison;
  comparison.arc = measured.arc;
  comparison.corner = calibration.corner.name;
  comparison.estimate = measured.estimate;
  comparison.tolerance = tolerance;
  comparison.points = measured.points;
  comparison.hand_parasitic =
      HandParasitic(measured.estimate, calibration.p_inv).value;
  return comparison;
}

// What there is to judge, or why there is nothing.
struct Judgement {
  Comparison comparison;
  std::optional<std::array<Figure, 2>> figures;
};

Judgement Prepare(const MeasuredArc& measured,
                  const Calibration& calibration,
                  const Tolerance& tolerance,
                  double delay_u_relative) {
  Judgement judgement{WithoutLine(measured, calibration, tolerance), {}};
  Comparison& comparison = judgement.comparison;
  if (!measured.failures.empty()) {
    comparison.reason = FirstFailure(measured.failures);
    return judgement;
  }
  const Result<Line> line = FitLine(measured.points, delay_u_relative);
  if (!line.ok()) {
    comparison.reason = line.error().message;
    return judgement;
  }
  if (calibration.p_inv.value <= 0.0) {
    comparison.reason = fmt::format(
        "p_inv of the reference inverter is {:.2f}: p by hand needs one above "
        "zero",
        calibration.p_inv.value);
    return judgement;
  }
  comparison.line = *line;
  const auto figures = Measure(calibration, delay_u_relative, comparison);
  if (!figures[0].difference.u || !figures[1].difference.u) {
    comparison.reason =
        "uncertainty unknown: needs three points or more, of the arc and of "
        "the reference inverter";
    return judgement;
  }
  judgement.figures = figures;
  return judgement;
}

}  // namespace

Comparison Compare(const MeasuredArc& measured,
                   const Calibration& calibration,
                   const Tolerance& tolerance,
                   double delay_u_relative) {
  Judgement judgement =
      Prepare(measured, calibration, tolerance, delay_u_relative);
  Comparison& comparison = judgement.comparison;
  if (judgement.figures) {
    comparison.verdict = Verdict::kWithin;
    const double coverage = CoverageFactor(comparison.line->points - 2);
    for (const Figure& figure : *judgement.figures) {
      Judge(figure, coverage, comparison);
    }
  }
  return std::move(comparison);
}

bool IsCloseCall(const MeasuredArc& measured,
                 const Calibration& calibration,
                 const Tolerance& tolerance,
                 double delay_u_relative) {
  const Judgement judgement =
      Prepare(measured, calibration, tolerance, delay_u_relative);
  if (!judgement.figures) {
    return false;
  }
  const double coverage = CoverageFactor(judgement.comparison.line->points - 2);
  return std::any_of(judgement.figures->begin(),
                     judgement.figures->end(),
                     [&](const Figure& figure) {
                       const double margin =
                           figure.tolerance - std::abs(figure.difference.value);
                       return std::abs(margin) < Expanded(figure, coverage);
                     });
}

}  // namespace gatedyno
