#include "harness/compare/compare.h"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <iterator>
#include <optional>

#include <fmt/format.h>

#include "harness/compare/figure.h"
#include "harness/fit/coverage.h"
#include "harness/fit/line_fit.h"
#include "harness/fit/linearity.h"
#include "harness/fit/normalise.h"
#include "harness/fit/quotient.h"

namespace gatedyno {
namespace {

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

void AppendReason(Comparison& comparison, const std::string& reason) {
  if (!comparison.reason.empty()) {
    comparison.reason += "; ";
  }
  comparison.reason += reason;
}

// Beyond on either figure outweighs doubt about the other.
void Judge(const Figure& figure, Comparison& comparison) {
  const bool beyond = IsBeyond(figure);
  if (beyond && comparison.verdict != Verdict::kBeyond) {
    comparison.verdict = Verdict::kBeyond;
    comparison.reason.clear();
  }
  if (beyond) {
    AppendReason(comparison, DescribeBeyond(figure));
  } else if (IsTooUncertain(figure) && comparison.verdict != Verdict::kBeyond) {
    comparison.verdict = Verdict::kNotMeasured;
    AppendReason(comparison, DescribeTooUncertain(figure));
  }
}

std::optional<double> Expanded(const Measured& difference, int points) {
  return difference.u
             ? std::optional(CoverageFactor(points - 2) * *difference.u)
             : std::nullopt;
}

// Fills in what the line says.
void Measure(const Calibration& calibration,
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
  const Measured effort = Difference(normalised.effort, hand_effort);
  const Measured parasitic =
      Difference(normalised.parasitic,
                 HandParasitic(comparison.estimate, calibration.p_inv));
  comparison.effort_difference = effort.value;
  comparison.parasitic_difference = parasitic.value;
  comparison.effort_difference_expanded = Expanded(effort, line.points);
  comparison.parasitic_difference_expanded = Expanded(parasitic, line.points);
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

// What there is to judge, or, as the reason, why there is nothing.
Comparison Prepare(const MeasuredArc& measured,
                   const Calibration& calibration,
                   const Tolerance& tolerance,
                   double delay_u_relative) {
  Comparison comparison = WithoutLine(measured, calibration, tolerance);
  if (!measured.failures.empty()) {
    comparison.reason = FirstFailure(measured.failures);
    return comparison;
  }
  const Result<Line> line = FitLine(measured.points, delay_u_relative);
  if (!line.ok()) {
    comparison.reason = line.error().message;
    return comparison;
  }
  if (calibration.p_inv.value <= 0.0) {
    comparison.reason = fmt::format(
        "p_inv of the reference inverter is {:.2f}: p by hand needs one above "
        "zero",
        calibration.p_inv.value);
    return comparison;
  }
  comparison.line = *line;
  Measure(calibration, delay_u_relative, comparison);
  if (!comparison.effort_difference_expanded ||
      !comparison.parasitic_difference_expanded) {
    comparison.reason =
        "uncertainty unknown: needs three points or more, of the arc and of "
        "the reference inverter";
  }
  return comparison;
}

}  // namespace

Comparison Compare(const MeasuredArc& measured,
                   const Calibration& calibration,
                   const Tolerance& tolerance,
                   double delay_u_relative) {
  Comparison comparison =
      Prepare(measured, calibration, tolerance, delay_u_relative);
  if (comparison.reason.empty()) {
    comparison.verdict = Verdict::kWithin;
    for (const Quantity quantity : kQuantities) {
      Judge(FigureOf(comparison, quantity), comparison);
    }
  }
  return comparison;
}

bool IsCloseCall(const MeasuredArc& measured,
                 const Calibration& calibration,
                 const Tolerance& tolerance,
                 double delay_u_relative) {
  const Comparison comparison =
      Prepare(measured, calibration, tolerance, delay_u_relative);
  return comparison.reason.empty() &&
         std::any_of(std::begin(kQuantities),
                     std::end(kQuantities),
                     [&comparison](Quantity quantity) {
                       const Figure figure = FigureOf(comparison, quantity);
                       const double margin =
                           figure.tolerance - std::abs(figure.difference);
                       return std::abs(margin) < figure.expanded.value_or(0.0);
                     });
}

}  // namespace gatedyno
