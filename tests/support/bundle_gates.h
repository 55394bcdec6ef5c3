// Exclusive ors and multiplexers: gates whose tables count a signal and its
// complement as one input.  Complements are made inside and called like the
// signal with an "n" behind.  Sizing as in gates.h.

#ifndef GATEDYNO_TESTS_SUPPORT_BUNDLE_GATES_H_
#define GATEDYNO_TESTS_SUPPORT_BUNDLE_GATES_H_

#include <string>
#include <vector>

#include "tests/support/gates.h"

namespace gatedyno {

inline std::string InverseName(const std::string& net) {
  return net + "n";
}

inline CellBuilder XorStart(const std::string& name, int inputs, double gamma) {
  CellBuilder builder(name);
  PinsOf(builder, inputs);
  for (int i = 0; i < inputs; ++i) {
    builder.Inverter(InputName(i), InverseName(InputName(i)), 1, gamma);
  }
  return builder;
}

// Exclusive or of the inputs: a branch for every row of the truth table.
inline Cell XorSymmetricCell(int inputs, double gamma) {
  CellBuilder builder =
      XorStart("xor" + std::to_string(inputs) + "s", inputs, gamma);
  for (unsigned row = 0; row < (1U << inputs); ++row) {
    // Gates that are all high, or all low, in this row.
    std::vector<std::string> high;
    std::vector<std::string> low;
    bool odd = false;
    for (int i = 0; i < inputs; ++i) {
      const bool one = ((row >> i) & 1U) != 0;
      const std::string input = InputName(i);
      high.push_back(one ? input : InverseName(input));
      low.push_back(one ? InverseName(input) : input);
      odd = odd != one;
    }
    if (odd) {
      PStack(builder, "y", low, inputs * gamma);
    } else {
      NStack(builder, "y", high, inputs);
    }
  }
  return builder.Build();
}

// Exclusive or of the inputs as a tree that shares its devices: two at either
// end, four at every level between.
inline Cell XorSharedCell(int inputs, double gamma) {
  CellBuilder builder = XorStart("xor" + std::to_string(inputs), inputs, gamma);
  // Net `side` after `level` inputs; parity 0 at the output.
  const auto net = [&](const std::string& side, int level, int parity) {
    return level == 0 ? std::string("y")
                      : side + std::to_string(level) + std::to_string(parity);
  };
  for (int level = 0; level < inputs; ++level) {
    const std::string input = InputName(level);
    const bool last = level + 1 == inputs;
    for (int parity = 0; parity < (level == 0 ? 1 : 2); ++parity) {
      for (int one = 0; one < 2; ++one) {
        const int next = parity ^ one;
        const std::string name = input + std::to_string(2 * parity + one);
        // The pull-down conducts for an even number of ones, the pull-up for
        // an odd one.
        if (!last || next == 0) {
          builder.N("n" + name,
                    net("n", level, parity),
                    one == 1 ? input : InverseName(input),
                    last ? "vss" : net("n", level + 1, next),
                    inputs);
        }
        if (!last || next == 1) {
          builder.P("p" + name,
                    net("p", level, parity),
                    one == 1 ? InverseName(input) : input,
                    last ? "vdd" : net("p", level + 1, next),
                    inputs * gamma);
        }
      }
    }
  }
  return builder.Build();
}

inline void MuxBranch(CellBuilder& builder,
                      const std::string& data,
                      const std::string& select,
                      double gamma) {
  NStack(builder, "y", {data, select}, 2);
  PStack(builder, "y", {data, InverseName(select)}, 2 * gamma);
}

// Inverting two-way multiplexer: d1 when s, else d0.
inline Cell Mux2Cell(double gamma) {
  CellBuilder builder("mux2");
  builder.Pins({"d0", "d1", "s", "y", "vdd", "vss"})
      .Inverter("s", "sn", 1, gamma);
  NStack(builder, "y", {"d1", "s"}, 2);
  PStack(builder, "y", {"d1", "sn"}, 2 * gamma);
  NStack(builder, "y", {"d0", "sn"}, 2);
  PStack(builder, "y", {"d0", "s"}, 2 * gamma);
  return builder.Build();
}

// Inverting four-way multiplexer with its decoder: selects k0..k3, inverses
// k0n..k3n.
inline Cell Mux4Cell(double gamma) {
  CellBuilder builder("mux4");
  builder.Pins({"d0", "d1", "d2", "d3", "s0", "s1", "y", "vdd", "vss"})
      .Inverter("s0", "s0n", 1, gamma)
      .Inverter("s1", "s1n", 1, gamma);
  for (int way = 0; way < 4; ++way) {
    const std::string select = "k" + std::to_string(way);
    const std::string inverse = InverseName(select);
    const std::string low = (way & 1) != 0 ? "s0" : "s0n";
    const std::string high = (way & 2) != 0 ? "s1" : "s1n";
    NStack(builder, inverse, {low, high}, 2);
    PStack(builder, inverse, {low}, gamma);
    PStack(builder, inverse, {high}, gamma);
    builder.Inverter(inverse, select, 1, gamma);
    MuxBranch(builder, "d" + std::to_string(way), select, gamma);
  }
  return builder.Build();
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_SUPPORT_BUNDLE_GATES_H_
