// Transistors of the cells that the page is tested with.

#ifndef GATEDYNO_TESTS_PAGE_CIRCUITS_H_
#define GATEDYNO_TESTS_PAGE_CIRCUITS_H_

#include <string>
#include <vector>

#include "harness/record/run_result.h"
#include "tests/support/test_circuit.h"

namespace gatedyno {

// Two pairs of request and priority, or a lock alone; ten devices.
inline Circuit FiveInputCircuit() {
  return CircuitBuilder()
      .P("mp_4", "y", "in4", "p1")
      .P("mp_2", "p1", "in2", "p2")
      .P("mp_3", "p1", "in3", "p2")
      .P("mp_0", "p2", "in0", "vdd")
      .P("mp_1", "p2", "in1", "vdd")
      .N("mn_0", "y", "in0", "n1")
      .N("mn_1", "n1", "in1", "vss")
      .N("mn_2", "y", "in2", "n2")
      .N("mn_3", "n2", "in3", "vss")
      .N("mn_4", "y", "in4", "vss")
      .Stage({"y"});
}

// Every device and net named `name`, with a number where they must differ; and
// a device that is not drawn.
inline Circuit NamedCircuit(const std::string& name) {
  Circuit circuit = CircuitBuilder()
                        .P(name + "1", name + " y", name, name + " up")
                        .P(name + "2", name + " y", name, name + " up")
                        .N(name + "3", name + " y", name, name + " in")
                        .N(name + "4", name + " in", name, name + " down")
                        .Stage({name + " y"})
                        .N(name + "5", name, name, name);
  circuit.power = name + " up";
  circuit.ground = name + " down";
  return circuit;
}

// Of the sample's three cells: an inverter, a gate, and none for the third, as
// in a run of an older gatedyno.
inline RunResult WithCircuits(RunResult sample) {
  sample.cells[0].circuit = CircuitBuilder()
                                .P("mp", "y", "a", "vdd")
                                .N("mn", "y", "a", "vss")
                                .Stage({"y"});
  sample.cells[1].circuit = Nand2Circuit();
  return sample;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_PAGE_CIRCUITS_H_
