// The gates of the published tables, drawn and sized as the tables assume.
//
// Unit sizing: every pull-down is as strong as one NMOS of width 1 and every
// pull-up as one PMOS of width gamma, gamma being the P/N ratio of the
// reference inverter.  Inputs are a, b, c ... from the output down.

#ifndef GATEDYNO_TESTS_SUPPORT_GATES_H_
#define GATEDYNO_TESTS_SUPPORT_GATES_H_

#include <string>
#include <vector>

#include "tests/support/cell_builder.h"

namespace gatedyno {

inline std::string InputName(int index) {
  return std::string(1, static_cast<char>('a' + index));
}

inline CellBuilder& PinsOf(CellBuilder& builder, int inputs) {
  for (int i = 0; i < inputs; ++i) {
    builder.Pins({InputName(i)});
  }
  return builder.Pins({"y", "vdd", "vss"});
}

// Name of the net below the first `above` devices of a stack; the stack is
// named after its top and all its gates, so that no two stacks share a net.
inline std::string StackNet(const std::string& stack, size_t above) {
  return stack + ":" + std::to_string(above);
}

inline std::string StackName(const std::string& top,
                             const std::vector<std::string>& gates) {
  std::string name = top;
  for (const std::string& gate : gates) {
    name += "." + gate;
  }
  return name;
}

// `gates` in series from `top` to the ground, or up to the supply.
inline void NStack(CellBuilder& builder,
                   const std::string& top,
                   const std::vector<std::string>& gates,
                   double width) {
  const std::string stack = StackName(top + ".n", gates);
  for (size_t i = 0; i < gates.size(); ++i) {
    builder.N(stack + std::to_string(i),
              i == 0 ? top : StackNet(stack, i),
              gates[i],
              i + 1 == gates.size() ? "vss" : StackNet(stack, i + 1),
              width);
  }
}
inline void PStack(CellBuilder& builder,
                   const std::string& top,
                   const std::vector<std::string>& gates,
                   double width) {
  const std::string stack = StackName(top + ".p", gates);
  for (size_t i = 0; i < gates.size(); ++i) {
    builder.P(stack + std::to_string(i),
              i == 0 ? top : StackNet(stack, i),
              gates[i],
              i + 1 == gates.size() ? "vdd" : StackNet(stack, i + 1),
              width);
  }
}

inline Cell InverterCell(double n_width, double p_width) {
  CellBuilder builder("inv");
  return PinsOf(builder, 1).Inverter("a", "y", n_width, p_width).Build();
}

inline Cell NandCell(int inputs, double n_width, double p_width) {
  CellBuilder builder("nand" + std::to_string(inputs));
  PinsOf(builder, inputs);
  std::vector<std::string> gates;
  for (int i = 0; i < inputs; ++i) {
    gates.push_back(InputName(i));
    PStack(builder, "y", {InputName(i)}, p_width);
  }
  NStack(builder, "y", gates, n_width);
  return builder.Build();
}

inline Cell NorCell(int inputs, double n_width, double p_width) {
  CellBuilder builder("nor" + std::to_string(inputs));
  PinsOf(builder, inputs);
  std::vector<std::string> gates;
  for (int i = 0; i < inputs; ++i) {
    gates.push_back(InputName(i));
    NStack(builder, "y", {InputName(i)}, n_width);
  }
  PStack(builder, "y", gates, p_width);
  return builder.Build();
}

// !(a & b | c), the PMOS of c at the output.
inline Cell Aoi21Cell(double gamma) {
  CellBuilder builder("aoi21");
  PinsOf(builder, 3);
  NStack(builder, "y", {"a", "b"}, 2);
  NStack(builder, "y", {"c"}, 1);
  return builder.P("p1", "y", "c", "x", 2 * gamma)
      .P("p2", "x", "a", "vdd", 2 * gamma)
      .P("p3", "x", "b", "vdd", 2 * gamma)
      .Build();
}

inline Cell Aoi22Cell(double gamma) {
  CellBuilder builder("aoi22");
  PinsOf(builder, 4);
  NStack(builder, "y", {"a", "b"}, 2);
  NStack(builder, "y", {"c", "d"}, 2);
  return builder.P("p1", "y", "a", "x", 2 * gamma)
      .P("p2", "y", "b", "x", 2 * gamma)
      .P("p3", "x", "c", "vdd", 2 * gamma)
      .P("p4", "x", "d", "vdd", 2 * gamma)
      .Build();
}

// !((a | b) & c), the NMOS of c at the output.
inline Cell Oai21Cell(double gamma) {
  CellBuilder builder("oai21");
  PinsOf(builder, 3);
  PStack(builder, "y", {"a", "b"}, 2 * gamma);
  PStack(builder, "y", {"c"}, gamma);
  return builder.N("n1", "y", "c", "x", 2)
      .N("n2", "x", "a", "vss", 2)
      .N("n3", "x", "b", "vss", 2)
      .Build();
}

// The same with c at the ground.
inline Cell Oai21TurnedCell(double gamma) {
  CellBuilder builder("oai21t");
  PinsOf(builder, 3);
  PStack(builder, "y", {"a", "b"}, 2 * gamma);
  PStack(builder, "y", {"c"}, gamma);
  return builder.N("n1", "y", "a", "x", 2)
      .N("n2", "y", "b", "x", 2)
      .N("n3", "x", "c", "vss", 2)
      .Build();
}

inline Cell Oai22Cell(double gamma) {
  CellBuilder builder("oai22");
  PinsOf(builder, 4);
  PStack(builder, "y", {"a", "b"}, 2 * gamma);
  PStack(builder, "y", {"c", "d"}, 2 * gamma);
  return builder.N("n1", "y", "a", "x", 2)
      .N("n2", "y", "b", "x", 2)
      .N("n3", "x", "c", "vss", 2)
      .N("n4", "x", "d", "vss", 2)
      .Build();
}

// !(a & (b | c) | d & e): the NMOS of a and d, the PMOS of d and e at the
// output.
inline Cell CompoundCell(double gamma) {
  CellBuilder builder("compound");
  PinsOf(builder, 5);
  NStack(builder, "y", {"d", "e"}, 2);
  builder.N("n1", "y", "a", "x", 2)
      .N("n2", "x", "b", "vss", 2)
      .N("n3", "x", "c", "vss", 2)
      .P("p1", "y", "d", "w", 3 * gamma)
      .P("p2", "y", "e", "w", 3 * gamma);
  PStack(builder, "w", {"b", "c"}, 3 * gamma);
  PStack(builder, "w", {"a"}, 1.5 * gamma);
  return builder.Build();
}

// !(a & b | c & d | e), the PMOS of e at the output.
inline Cell Aoi221Cell(double gamma) {
  CellBuilder builder("aoi221");
  PinsOf(builder, 5);
  NStack(builder, "y", {"a", "b"}, 2);
  NStack(builder, "y", {"c", "d"}, 2);
  NStack(builder, "y", {"e"}, 1);
  return builder.P("p1", "y", "e", "w", 3 * gamma)
      .P("p2", "w", "a", "x", 3 * gamma)
      .P("p3", "w", "b", "x", 3 * gamma)
      .P("p4", "x", "c", "vdd", 3 * gamma)
      .P("p5", "x", "d", "vdd", 3 * gamma)
      .Build();
}

// Three pairs in each network.
inline Cell MajoritySymmetricCell(double gamma) {
  CellBuilder builder("maj3s");
  PinsOf(builder, 3);
  const std::vector<std::vector<std::string>> pairs = {
      {"a", "b"}, {"b", "c"}, {"c", "a"}};
  for (const std::vector<std::string>& pair : pairs) {
    NStack(builder, "y", pair, 2);
    PStack(builder, "y", pair, 2 * gamma);
  }
  return builder.Build();
}

inline CellBuilder MajorityPullDown(const std::string& name) {
  CellBuilder builder(name);
  PinsOf(builder, 3);
  NStack(builder, "y", {"a", "b"}, 2);
  return builder.N("n1", "y", "c", "x", 2)
      .N("n2", "x", "a", "vss", 2)
      .N("n3", "x", "b", "vss", 2);
}

// !(a & b | c & (a | b)) with the pull-down repeated as pull-up, c at the
// output.
inline Cell MajorityRepeatedCell(double gamma) {
  CellBuilder builder = MajorityPullDown("maj3");
  PStack(builder, "y", {"a", "b"}, 2 * gamma);
  return builder.P("p1", "y", "c", "w", 2 * gamma)
      .P("p2", "w", "a", "vdd", 2 * gamma)
      .P("p3", "w", "b", "vdd", 2 * gamma)
      .Build();
}

// The same function with the series/parallel dual as pull-up: a pair at the
// supply in series with c beside a stack of two.
inline Cell MajorityDualCell(double gamma) {
  CellBuilder builder = MajorityPullDown("maj3d");
  return builder.P("p1", "y", "c", "w", 1.5 * gamma)
      .P("p2", "y", "a", "v", 3 * gamma)
      .P("p3", "v", "b", "w", 3 * gamma)
      .P("p4", "w", "a", "vdd", 3 * gamma)
      .P("p5", "w", "b", "vdd", 3 * gamma)
      .Build();
}

// !(a & b & c | (a | b | c) & d), d being the inverted carry, pull-down
// repeated as pull-up, d at the output.
inline Cell MirrorSumCell(double gamma) {
  CellBuilder builder("msum");
  PinsOf(builder, 4);
  NStack(builder, "y", {"a", "b", "c"}, 3);
  PStack(builder, "y", {"a", "b", "c"}, 3 * gamma);
  builder.N("nd", "y", "d", "x", 2).P("pd", "y", "d", "w", 2 * gamma);
  for (const std::string gate : {"a", "b", "c"}) {
    builder.N("n" + gate, "x", gate, "vss", 2)
        .P("p" + gate, "w", gate, "vdd", 2 * gamma);
  }
  return builder.Build();
}

// A bridge in both networks: a and b at the output, c and d at the rail, e
// across, each as wide as `widths` says (in that order; PMOS times gamma).
inline Cell BridgeCell(const std::vector<double>& widths, double gamma) {
  CellBuilder builder("bridge");
  PinsOf(builder, 5);
  return builder.N("n1", "y", "a", "l", widths[0])
      .N("n2", "y", "b", "r", widths[1])
      .N("n3", "l", "c", "vss", widths[2])
      .N("n4", "r", "d", "vss", widths[3])
      .N("n5", "l", "e", "r", widths[4])
      .P("p1", "y", "a", "u", widths[0] * gamma)
      .P("p2", "u", "b", "vdd", widths[1] * gamma)
      .P("p3", "y", "c", "v", widths[2] * gamma)
      .P("p4", "v", "d", "vdd", widths[3] * gamma)
      .P("p5", "u", "e", "v", widths[4] * gamma)
      .Build();
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_GATES_H_
