// Kinds of gates, as an explicit table: how each is recognised, and whether it
// is carried on to estimates.
//
// A new kind is a line in the table in kind.cc, a hand rule in effort/ and a
// stimulus in deck/.  Recognition of the kinds that are refused is a help to
// the reader of the message, no proof: a static gate that lacks a device can
// have the shape of a dynamic one.

#ifndef GATEDYNO_NETWORK_KIND_H_
#define GATEDYNO_NETWORK_KIND_H_

#include <string_view>

#include "harness/network/group.h"
#include "harness/network/truth_table.h"

namespace gatedyno {

enum class GateKind {
  kComplementaryStatic,  // Each vector: pull-up or pull-down, never both.
  kPassGate,             // A pin enters by a source or drain.
  kRatioed,              // A load that always conducts is overpowered.
  kDynamic,              // One precharge signal owns the pull-up.
  kTristate,             // An enable takes both networks off.
  kNotComplementary,     // None of these.
};

// How one output net of a group behaves over all input vectors.
struct OutputBehaviour {
  const SwitchNetwork& network;
  const Group& group;
  NetId output = 0;
  int inputs = 0;
  VectorSet high;
  VectorSet floating;
  VectorSet shorted;
};

GateKind ClassifyOutput(const OutputBehaviour& behaviour);

// "complementary static".
std::string_view KindName(GateKind kind);

// Whether hand rules exist for the kind.
bool IsCarriedOn(GateKind kind);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_KIND_H_
