#include "harness/flow/arc_measurement.h"

#include <algorithm>
#include <memory>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/deck/stage_measures.h"
#include "harness/fit/line_fit.h"

namespace gatedyno {
namespace {

// Kept alive by the jobs it waits for.
class Measurement : public std::enable_shared_from_this<Measurement> {
 public:
  Measurement(const ArcContext& context,
              const StageTest& test,
              std::function<void(MeasuredArc)> on_done)
      : context_(context), test_(test), on_done_(std::move(on_done)) {
    measured_.arc = test.arc;
    measured_.estimate = test.estimate;
  }

  void Ask(const std::vector<double>& fanouts) {
    // Counted first: a job may end while the next is not yet asked for.
    pending_ = fanouts.size();
    for (const double fanout : fanouts) {
      const Job job = JobAt(*context_.bench, fanout);
      context_.desk->Ask(
          job,
          [self = shared_from_this(), fanout, key = job.key](
              const Outcome& outcome) { self->Add(fanout, key, outcome); });
    }
  }

 private:
  Job JobAt(const Bench& bench, double fanout) {
    test_.fanout = fanout;
    return StageJob(bench, test_);
  }

  void Add(double fanout, const std::string& key, const Outcome& outcome) {
    if (outcome.measured()) {
      measured_.points.push_back(PointOf(outcome, test_.arc, fanout));
      measured_.points.back().job_key = key;
      if (context_.sample->Wants(key) || IsAlwaysChecked(fanout)) {
        AskTighter(fanout, key, outcome);
      }
    } else {
      failures_.push_back({fanout, outcome});
    }
    if (--pending_ == 0) {
      Decide();
    }
  }

  // By what a job is, not by when it ends: the sample must be the same in every
  // run.
  bool IsAlwaysChecked(double fanout) const {
    return context_.always_checked &&
           fanout == FirstFanouts(*context_.fanouts).front();
  }

  void AskTighter(double fanout,
                  const std::string& key,
                  const Outcome& outcome) {
    Bench tighter = *context_.bench;
    ++tighter.rung;
    Job twin = JobAt(tighter, fanout);
    const std::string label = twin.label;
    twin.label += " (tighter)";
    context_.desk->Ask(
        twin,
        [sample = context_.sample, key, label, outcome](const Outcome& again) {
          if (again.measured()) {
            sample->Add(key, label, outcome, again);
          }
        });
  }

  void Decide() {
    std::sort(
        measured_.points.begin(),
        measured_.points.end(),
        [](const Point& a, const Point& b) { return a.fanout < b.fanout; });
    if (failures_.empty()) {
      const std::vector<double> more = MoreFanouts(
          *context_.fanouts, measured_.points, Tau(), HangsOnUncertainty());
      if (!more.empty()) {
        Ask(more);
        return;
      }
    }
    std::sort(
        failures_.begin(),
        failures_.end(),
        [](const Failure& a, const Failure& b) { return a.fanout < b.fanout; });
    for (const Failure& failure : failures_) {
      measured_.failures.push_back(
          fmt::format("h={}: {}: {}",
                      failure.fanout,
                      EndingName(failure.outcome.ending),
                      failure.outcome.message));
    }
    on_done_(std::move(measured_));
  }

  bool HangsOnUncertainty() const {
    return context_.calibration != nullptr &&
           IsCloseCall(measured_,
                       *context_.calibration,
                       context_.tolerance,
                       context_.fanouts->delay_u_relative);
  }

  // Of the reference inverter: its own slope, whatever its sign.
  double Tau() const {
    if (context_.calibration != nullptr) {
      return context_.calibration->tau_s.value;
    }
    const Result<Line> line = FitLine(measured_.points);
    return line.ok() && line->slope_s > 0.0 ? line->slope_s : test_.time_unit_s;
  }

  struct Failure {
    double fanout;
    Outcome outcome;
  };

  ArcContext context_;
  StageTest test_;
  std::function<void(MeasuredArc)> on_done_;
  MeasuredArc measured_;
  std::vector<Failure> failures_;
  size_t pending_ = 0;
};

}  // namespace

void MeasureArc(const ArcContext& context,
                const StageTest& test,
                std::function<void(MeasuredArc)> on_done) {
  std::make_shared<Measurement>(context, test, std::move(on_done))
      ->Ask(FirstFanouts(*context.fanouts));
}

}  // namespace gatedyno
