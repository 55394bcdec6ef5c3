#include "harness/compare/versus.h"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <map>
#include <utility>

#include <fmt/format.h>

#include "harness/compare/figure.h"

namespace gatedyno {
namespace {

bool Contains(const std::vector<std::string>& names, const std::string& name) {
  return std::find(names.begin(), names.end(), name) != names.end();
}

// Equal for equal arcs.
std::string ArcName(const Arc& arc) {
  return fmt::format("{}\n{}\n{}\n{}",
                     arc.cell,
                     DescribeArc(arc),
                     EdgeName(arc.input_edge),
                     DescribeSide(arc));
}

std::vector<std::string> JobKeys(const Comparison& row) {
  std::vector<std::string> keys;
  for (const Point& point : row.points) {
    keys.push_back(point.job_key);
  }
  std::sort(keys.begin(), keys.end());
  return keys;
}

// Points without a key come from nowhere known.
bool SameJobs(const Comparison& a, const Comparison& b) {
  const std::vector<std::string> keys = JobKeys(a);
  return !keys.empty() && !keys.front().empty() && keys == JobKeys(b);
}

std::vector<double> Fanouts(const Comparison& row) {
  std::vector<double> fanouts;
  for (const Point& point : row.points) {
    fanouts.push_back(point.fanout);
  }
  std::sort(fanouts.begin(), fanouts.end());
  return fanouts;
}

bool SameFanouts(const Comparison& a, const Comparison& b) {
  constexpr double kSpelling = 1e-9;  // Of a decimal as a double.
  const std::vector<double> of_a = Fanouts(a);
  const std::vector<double> of_b = Fanouts(b);
  return std::equal(of_a.begin(),
                    of_a.end(),
                    of_b.begin(),
                    of_b.end(),
                    [](double p, double q) {
                      return std::abs(p - q) <= kSpelling * std::abs(p);
                    });
}

Finding FindingOf(const ArcPair& pair) {
  if (!pair.measured()) {
    return Finding::kNotMeasured;
  }
  if (SameJobs(*pair.a, *pair.b)) {
    return Finding::kSameJobs;
  }
  bool known = true;
  bool changed = false;
  for (const Quantity quantity : kQuantities) {
    const std::optional<Change>& change = ChangeIn(pair, quantity);
    known &= change && change->expanded;
    changed |= change && IsBeyondUncertainty(*change);
  }
  if (!changed) {
    return known ? Finding::kAlike : Finding::kUnknown;
  }
  const bool bent = pair.a->bent || pair.b->bent;
  return bent && !SameFanouts(*pair.a, *pair.b) ? Finding::kBentApart
                                                : Finding::kChanged;
}

// p over p_inv.
Measured InPInv(const Comparison& row, const Calibration& calibration) {
  return {row.parasitic.value / calibration.p_inv.value, std::nullopt};
}

ArcPair Pair(const Comparison& a,
             const Comparison& b,
             const Calibration* calibration_a,
             const Calibration* calibration_b) {
  ArcPair pair;
  pair.a = &a;
  pair.b = &b;
  if (pair.measured()) {
    pair.effort =
        ChangeOf({a.effort, a.line->points}, {b.effort, b.line->points});
    pair.parasitic =
        ChangeOf({a.parasitic, a.line->points}, {b.parasitic, b.line->points});
    if (calibration_a != nullptr && calibration_b != nullptr) {
      pair.parasitic_in_p_inv =
          ChangeOf({InPInv(a, *calibration_a), a.line->points},
                   {InPInv(b, *calibration_b), b.line->points});
    }
  }
  pair.finding = FindingOf(pair);
  return pair;
}

// The rows of one run at one corner.
struct CornerRows {
  std::vector<const Comparison*> rows;
  const Calibration* calibration = nullptr;
};

CornerRows RowsAt(const std::string& corner, const RunResult& result) {
  CornerRows at{.rows = {}, .calibration = CalibrationAt(corner, result)};
  for (const Comparison& row : result.comparisons) {
    if (row.corner == corner) {
      at.rows.push_back(&row);
    }
  }
  return at;
}

void AddCorner(const CornerRows& a, const CornerRows& b, Versus* versus) {
  std::map<std::string, size_t> places;  // In b.rows.
  for (size_t i = 0; i < b.rows.size(); ++i) {
    places.try_emplace(ArcName(b.rows[i]->arc), i);
  }
  std::vector<bool> taken(b.rows.size(), false);
  for (const Comparison* row : a.rows) {
    const auto other = places.find(ArcName(row->arc));
    if (other == places.end() || taken[other->second]) {
      versus->only_a.push_back(row);
    } else {
      taken[other->second] = true;
      versus->arcs.push_back(
          Pair(*row, *b.rows[other->second], a.calibration, b.calibration));
    }
  }
  for (size_t i = 0; i < b.rows.size(); ++i) {
    if (!taken[i]) {
      versus->only_b.push_back(b.rows[i]);
    }
  }
}

}  // namespace

std::vector<std::string> CornersOf(const RunResult& result) {
  std::vector<std::string> corners;
  for (const Comparison& row : result.comparisons) {
    if (!Contains(corners, row.corner)) {
      corners.push_back(row.corner);
    }
  }
  return corners;
}

std::vector<CornerPair> PairCorners(const RunResult& a, const RunResult& b) {
  const std::vector<std::string> corners_a = CornersOf(a);
  const std::vector<std::string> corners_b = CornersOf(b);
  std::vector<CornerPair> pairs;
  for (const std::string& corner : corners_a) {
    if (Contains(corners_b, corner)) {
      pairs.push_back({corner, corner});
    }
  }
  if (pairs.empty() && corners_a.size() == 1 && corners_b.size() == 1) {
    pairs.push_back({corners_a.front(), corners_b.front()});
  }
  return pairs;
}

std::string_view FindingName(Finding finding) {
  switch (finding) {
    case Finding::kAlike:
      return "alike";
    case Finding::kChanged:
      return "changed";
    case Finding::kSameJobs:
      return "same jobs";
    case Finding::kBentApart:
      return "bent, other fanouts";
    case Finding::kUnknown:
      return "uncertainty unknown";
    case Finding::kNotMeasured:
      return "not measured";
  }
  return "";
}

const std::optional<Change>& ChangeIn(const ArcPair& pair, Quantity quantity) {
  return quantity == Quantity::kEffort ? pair.effort : pair.parasitic;
}

bool HandEffortDiffers(const ArcPair& pair) {
  constexpr double kShown = 5e-4;
  return std::abs(pair.b->estimate.effort - pair.a->estimate.effort) > kShown;
}

const Calibration* CalibrationAt(const std::string& corner,
                                 const RunResult& result) {
  for (const Calibration& calibration : result.calibrations) {
    if (calibration.corner.name == corner) {
      return &calibration;
    }
  }
  return nullptr;
}

Versus PutSideBySide(const RunResult& a,
                     const RunResult& b,
                     std::vector<CornerPair> corners) {
  Versus versus;
  versus.corners = std::move(corners);
  for (const CornerPair& pair : versus.corners) {
    AddCorner(RowsAt(pair.a, a), RowsAt(pair.b, b), &versus);
  }
  return versus;
}

}  // namespace gatedyno
