#include "harness/record/comparison_json.h"

#include <cmath>
#include <exception>
#include <limits>
#include <stdexcept>

#include <fmt/format.h>

namespace gatedyno {
namespace {

using nlohmann::json;

// Every Read... below throws what nlohmann_json throws, or UnknownName; the
// public functions turn it into an Error.
struct UnknownName : std::runtime_error {
  using std::runtime_error::runtime_error;
};

json Write(double number) {
  return std::isfinite(number) ? json(number) : json(nullptr);
}

json Write(const std::optional<double>& number) {
  return number ? Write(*number) : json(nullptr);
}

std::optional<double> ReadOptional(const json& from, const char* field) {
  const json& value = from.at(field);
  return value.is_null() ? std::nullopt
                         : std::optional<double>(value.get<double>());
}

// Of a field that an older gatedyno did not write.
std::optional<double> ReadIfThere(const json& from, const char* field) {
  return from.contains(field) ? ReadOptional(from, field) : std::nullopt;
}

double ReadNumber(const json& from, const char* field) {
  return ReadOptional(from, field)
      .value_or(std::numeric_limits<double>::quiet_NaN());
}

std::string ReadText(const json& from, const char* field) {
  return from.at(field).get<std::string>();
}

Edge ReadEdge(const json& from, const char* field) {
  const std::string name = ReadText(from, field);
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    if (name == EdgeName(edge)) {
      return edge;
    }
  }
  throw UnknownName(fmt::format("unknown edge '{}'", name));
}

Verdict ReadVerdict(const json& from, const char* field) {
  const std::string name = ReadText(from, field);
  for (const Verdict verdict :
       {Verdict::kWithin, Verdict::kBeyond, Verdict::kNotMeasured}) {
    if (name == VerdictName(verdict)) {
      return verdict;
    }
  }
  throw UnknownName(fmt::format("unknown verdict '{}'", name));
}

json Write(const Measured& measured) {
  return {{"value", Write(measured.value)}, {"u", Write(measured.u)}};
}

Measured ReadMeasured(const json& from, const char* field) {
  const json& value = from.at(field);
  return {ReadNumber(value, "value"), ReadOptional(value, "u")};
}

json Write(const Arc& arc) {
  json side = json::array();
  for (const SideInput& input : arc.side) {
    side.push_back({{"pin", input.pin}, {"high", input.high}});
  }
  return {{"cell", arc.cell},
          {"pin", arc.pin},
          {"output", arc.output},
          {"input_edge", EdgeName(arc.input_edge)},
          {"edge", EdgeName(arc.edge)},
          {"side", std::move(side)}};
}

Arc ReadArc(const json& from) {
  Arc arc;
  arc.cell = ReadText(from, "cell");
  arc.pin = ReadText(from, "pin");
  arc.output = ReadText(from, "output");
  arc.input_edge = ReadEdge(from, "input_edge");
  arc.edge = ReadEdge(from, "edge");
  for (const json& input : from.at("side")) {
    arc.side.push_back({ReadText(input, "pin"), input.at("high").get<bool>()});
  }
  return arc;
}

json Write(const Estimate& estimate) {
  return {{"effort", Write(estimate.effort)},
          {"parasitic_by_nodes", Write(estimate.parasitic_by_nodes)},
          {"parasitic_by_elmore", Write(estimate.parasitic_by_elmore)},
          {"fixed_first_effort", Write(estimate.fixed_first_effort)},
          {"inner_effort", Write(estimate.inner_effort)}};
}

Estimate ReadEstimate(const json& from) {
  Estimate estimate;
  estimate.effort = ReadNumber(from, "effort");
  estimate.parasitic_by_nodes = ReadNumber(from, "parasitic_by_nodes");
  estimate.parasitic_by_elmore = ReadNumber(from, "parasitic_by_elmore");
  estimate.fixed_first_effort = ReadOptional(from, "fixed_first_effort");
  estimate.inner_effort = ReadNumber(from, "inner_effort");
  return estimate;
}

json Write(const Point& point) {
  return {{"fanout", Write(point.fanout)},
          {"delay_s", Write(point.delay_s)},
          {"input_transition_s", Write(point.input_transition_s)},
          {"output_transition_s", Write(point.output_transition_s)},
          {"job_key", point.job_key}};
}

Point ReadPoint(const json& from) {
  return {.fanout = ReadNumber(from, "fanout"),
          .delay_s = ReadNumber(from, "delay_s"),
          .input_transition_s = ReadNumber(from, "input_transition_s"),
          .output_transition_s = ReadNumber(from, "output_transition_s"),
          .job_key = ReadText(from, "job_key")};
}

json Write(const Line& line) {
  return {{"slope_s", Write(line.slope_s)},
          {"intercept_s", Write(line.intercept_s)},
          {"slope_u_s", Write(line.slope_u_s)},
          {"intercept_u_s", Write(line.intercept_u_s)},
          {"covariance_s2", Write(line.covariance_s2)},
          {"largest_residual_s", Write(line.largest_residual_s)},
          {"points", line.points}};
}

Line ReadLine(const json& from) {
  return {.slope_s = ReadNumber(from, "slope_s"),
          .intercept_s = ReadNumber(from, "intercept_s"),
          .slope_u_s = ReadOptional(from, "slope_u_s"),
          .intercept_u_s = ReadOptional(from, "intercept_u_s"),
          .covariance_s2 = ReadOptional(from, "covariance_s2"),
          .largest_residual_s = ReadNumber(from, "largest_residual_s"),
          .points = from.at("points").get<int>()};
}

json Write(const Corner& corner) {
  return {{"name", corner.name},
          {"process", corner.process},
          {"supply_v", Write(corner.supply_v)},
          {"temperature_c", Write(corner.temperature_c)}};
}

Corner ReadCorner(const json& from) {
  return {.name = ReadText(from, "name"),
          .process = ReadText(from, "process"),
          .supply_v = ReadNumber(from, "supply_v"),
          .temperature_c = ReadNumber(from, "temperature_c")};
}

Comparison ReadComparison(const json& from) {
  Comparison comparison;
  comparison.arc = ReadArc(from.at("arc"));
  comparison.corner = ReadText(from, "corner");
  comparison.estimate = ReadEstimate(from.at("estimate"));
  comparison.tolerance.effort = ReadNumber(from.at("tolerance"), "effort");
  comparison.tolerance.parasitic =
      ReadNumber(from.at("tolerance"), "parasitic");
  for (const json& point : from.at("points")) {
    comparison.points.push_back(ReadPoint(point));
  }
  comparison.hand_parasitic = ReadNumber(from, "hand_parasitic");
  if (const json& line = from.at("line"); !line.is_null()) {
    comparison.line = ReadLine(line);
    comparison.effort = ReadMeasured(from, "effort");
    comparison.effort_mean = ReadMeasured(from, "effort_mean");
    comparison.parasitic = ReadMeasured(from, "parasitic");
    comparison.effort_difference = ReadNumber(from, "effort_difference");
    comparison.parasitic_difference = ReadNumber(from, "parasitic_difference");
    comparison.effort_difference_expanded =
        ReadIfThere(from, "effort_difference_expanded");
    comparison.parasitic_difference_expanded =
        ReadIfThere(from, "parasitic_difference_expanded");
  }
  comparison.bent = from.at("bent").get<bool>();
  comparison.verdict = ReadVerdict(from, "verdict");
  comparison.reason = ReadText(from, "reason");
  return comparison;
}

Calibration ReadCalibration(const json& from) {
  return {.corner = ReadCorner(from.at("corner")),
          .tau_rise_s = ReadMeasured(from, "tau_rise_s"),
          .tau_fall_s = ReadMeasured(from, "tau_fall_s"),
          .tau_s = ReadMeasured(from, "tau_s"),
          .p_inv = ReadMeasured(from, "p_inv"),
          .fo4_s = ReadNumber(from, "fo4_s")};
}

template <class T>
Result<T> Caught(const json& from, T (*read)(const json&), const char* what) {
  try {
    return read(from);
  } catch (const std::exception& thrown) {
    return Internal(fmt::format("not a {}: {}", what, thrown.what()));
  }
}

}  // namespace

json ComparisonToJson(const Comparison& comparison) {
  json points = json::array();
  for (const Point& point : comparison.points) {
    points.push_back(Write(point));
  }
  const Tolerance& tolerance = comparison.tolerance;
  const bool measured = comparison.line.has_value();
  const auto if_measured = [measured](const auto& value) {
    return measured ? Write(value) : json(nullptr);
  };
  return {
      {"arc", Write(comparison.arc)},
      {"corner", comparison.corner},
      {"estimate", Write(comparison.estimate)},
      {"tolerance",
       {{"effort", Write(tolerance.effort)},
        {"parasitic", Write(tolerance.parasitic)}}},
      {"points", std::move(points)},
      {"line", measured ? Write(*comparison.line) : json(nullptr)},
      {"effort", if_measured(comparison.effort)},
      {"effort_mean", if_measured(comparison.effort_mean)},
      {"parasitic", if_measured(comparison.parasitic)},
      {"hand_parasitic", Write(comparison.hand_parasitic)},
      {"effort_difference", if_measured(comparison.effort_difference)},
      {"parasitic_difference", if_measured(comparison.parasitic_difference)},
      {"effort_difference_expanded",
       if_measured(comparison.effort_difference_expanded)},
      {"parasitic_difference_expanded",
       if_measured(comparison.parasitic_difference_expanded)},
      {"bent", comparison.bent},
      {"verdict", VerdictName(comparison.verdict)},
      {"reason", comparison.reason},
  };
}

Result<Comparison> ComparisonFromJson(const json& json) {
  return Caught(json, ReadComparison, "comparison");
}

json CalibrationToJson(const Calibration& calibration) {
  return {{"corner", Write(calibration.corner)},
          {"tau_rise_s", Write(calibration.tau_rise_s)},
          {"tau_fall_s", Write(calibration.tau_fall_s)},
          {"tau_s", Write(calibration.tau_s)},
          {"p_inv", Write(calibration.p_inv)},
          {"fo4_s", Write(calibration.fo4_s)}};
}

Result<Calibration> CalibrationFromJson(const json& json) {
  return Caught(json, ReadCalibration, "calibration");
}

}  // namespace gatedyno
