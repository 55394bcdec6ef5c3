#include "harness/netlist/geometry.h"

#include <cmath>
#include <string>
#include <string_view>

#include <fmt/format.h>

#include "harness/netlist/geometry_role.h"

namespace gatedyno {
namespace {

double PowerOf(double unit_m, int power) {
  return power == 0 ? 1.0 : power == 1 ? unit_m : unit_m * unit_m;
}

class Geometry {
 public:
  Geometry(const DeviceLine& line, double unit_m, ParameterSource& parameters)
      : line_(line), unit_m_(unit_m), parameters_(parameters) {}

  // Nothing when the line does not say.
  Parsed<std::optional<double>> Positive(GeometryRole role) {
    const Value* value = Find(role);
    if (value == nullptr) {
      return std::optional<double>();
    }
    const Parsed<double> number =
        EvaluatePositive(*value, DescribeRole(role, unit_m_), parameters_);
    if (!number.ok()) {
      return Forward(number);
    }
    const double scaled = *number * PowerOf(unit_m_, LengthPower(role));
    if (!std::isnormal(scaled)) {
      return WrongValue(*value,
                        fmt::format("{} in range", DescribeRole(role, unit_m_)),
                        *number);
    }
    return std::optional(scaled);
  }

  // A diffusion shared with a neighbour may have none: zero is allowed.
  Parsed<std::optional<double>> NotNegative(GeometryRole role) {
    const Value* value = Find(role);
    if (value == nullptr) {
      return std::optional<double>();
    }
    const Parsed<double> number = Evaluate(value->expression, parameters_);
    if (!number.ok()) {
      return Forward(number);
    }
    if (*number < 0.0) {
      return WrongValue(
          *value,
          fmt::format("{}, not negative", DescribeRole(role, unit_m_)),
          *number);
    }
    return std::optional(*number * PowerOf(unit_m_, LengthPower(role)));
  }

  Parsed<std::optional<double>> WholePositive(GeometryRole role) {
    Parsed<std::optional<double>> number = Positive(role);
    if (number.ok() && *number && std::floor(**number) != **number) {
      return WrongValue(
          *Find(role),
          fmt::format("{}, a whole one", DescribeRole(role, unit_m_)),
          **number);
    }
    return number;
  }

  const Value* Find(GeometryRole role) const {
    const auto found = line_.geometry.find(role);
    return found == line_.geometry.end() ? nullptr : &found->second;
  }

  const DeviceLine& line() const { return line_; }

 private:
  const DeviceLine& line_;
  double unit_m_;
  ParameterSource& parameters_;
};

Parsed<double> Fingers(Geometry& geometry) {
  const auto fingers = geometry.WholePositive(GeometryRole::kFingers);
  if (!fingers.ok()) {
    return Forward(fingers);
  }
  return fingers->value_or(1.0);
}

Parsed<double> Multiplicity(Geometry& geometry) {
  const auto own = geometry.Positive(GeometryRole::kMultiplicity);
  const auto on_instance =
      geometry.Positive(GeometryRole::kInstanceMultiplicity);
  if (!own.ok()) {
    return Forward(own);
  }
  if (!on_instance.ok()) {
    return Forward(on_instance);
  }
  return own->value_or(1.0) * on_instance->value_or(1.0);
}

Parsed<double> Length(Geometry& geometry, const ReaderOptions& options) {
  const auto length = geometry.Positive(GeometryRole::kLength);
  if (!length.ok()) {
    return Forward(length);
  }
  if (!*length && !options.default_length_m) {
    return Complain(geometry.line().head.position,
                    fmt::format("no length: expected {}= on {}",
                                geometry.line().device->parameters.length,
                                Quote(geometry.line().head.name)));
  }
  return *length ? **length : *options.default_length_m;
}

Parsed<double> WidthOfFins(Geometry& geometry,
                           const ReaderOptions& options,
                           double fingers) {
  const Value& fins_value = *geometry.Find(GeometryRole::kFins);
  if (geometry.Find(GeometryRole::kWidth) != nullptr) {
    return Complain(fins_value.position, "both a width and fins are given");
  }
  if (!options.fin_width_m) {
    return Complain(fins_value.position, "this node has no fin width");
  }
  const auto fins = geometry.WholePositive(GeometryRole::kFins);
  if (!fins.ok()) {
    return Forward(fins);
  }
  return **fins * fingers * *options.fin_width_m;
}

Parsed<double> Width(Geometry& geometry,
                     const ReaderOptions& options,
                     double fingers) {
  if (geometry.Find(GeometryRole::kFins) != nullptr) {
    return WidthOfFins(geometry, options, fingers);
  }
  const auto width = geometry.Positive(GeometryRole::kWidth);
  if (!width.ok()) {
    return Forward(width);
  }
  if (!*width) {
    const DeviceLine& line = geometry.line();
    return Complain(line.head.position,
                    fmt::format("no width: expected {}= on {}",
                                line.device->parameters.width,
                                Quote(line.head.name)));
  }
  return **width;
}

Parsed<DiffusionGeometry> Diffusion(Geometry& geometry) {
  DiffusionGeometry diffusion;
  struct Target {
    GeometryRole role;
    std::optional<double>& field;
  };
  const Target targets[] = {
      {GeometryRole::kDrainArea, diffusion.drain_area_m2},
      {GeometryRole::kSourceArea, diffusion.source_area_m2},
      {GeometryRole::kDrainPerimeter, diffusion.drain_perimeter_m},
      {GeometryRole::kSourcePerimeter, diffusion.source_perimeter_m}};
  for (const Target& target : targets) {
    const auto value = geometry.NotNegative(target.role);
    if (!value.ok()) {
      return Forward(value);
    }
    target.field = *value;
  }
  return diffusion;
}

}  // namespace

tl::unexpected<ParseError> WrongValue(const Value& value,
                                      std::string_view expected,
                                      double got) {
  // A lone number says itself what it is.
  const bool is_literal =
      value.expression.steps.size() == 1 &&
      value.expression.steps[0].operation == Operation::kNumber;
  return Complain(value.position,
                  fmt::format("expected {}, got {}{}",
                              expected,
                              Quote(value.spelling),
                              is_literal ? "" : fmt::format(" = {:g}", got)));
}

Parsed<double> EvaluatePositive(const Value& value,
                                std::string_view role,
                                ParameterSource& parameters) {
  Parsed<double> number = Evaluate(value.expression, parameters);
  if (number.ok() && *number <= 0.0) {
    return WrongValue(value, fmt::format("{}, above zero", role), *number);
  }
  return number;
}

Parsed<Mosfet> EvaluateGeometry(const DeviceLine& line,
                                const ReaderOptions& options,
                                std::optional<double> file_scale_m,
                                ParameterSource& parameters) {
  Geometry geometry(
      line, file_scale_m.value_or(line.device->unit_m), parameters);
  const Parsed<double> fingers = Fingers(geometry);
  if (!fingers.ok()) {
    return Forward(fingers);
  }
  const Parsed<double> width = Width(geometry, options, *fingers);
  if (!width.ok()) {
    return Forward(width);
  }
  const Parsed<double> length = Length(geometry, options);
  if (!length.ok()) {
    return Forward(length);
  }
  const Parsed<double> multiplicity = Multiplicity(geometry);
  if (!multiplicity.ok()) {
    return Forward(multiplicity);
  }
  const Parsed<DiffusionGeometry> diffusion = Diffusion(geometry);
  if (!diffusion.ok()) {
    return Forward(diffusion);
  }
  Mosfet mosfet;
  mosfet.width_m = *width;
  mosfet.length_m = *length;
  mosfet.fingers = *fingers;
  mosfet.multiplicity = *multiplicity;
  mosfet.diffusion = *diffusion;
  return mosfet;
}

}  // namespace gatedyno
