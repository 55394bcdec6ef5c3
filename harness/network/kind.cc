#include "harness/network/kind.h"

#include <algorithm>
#include <array>
#include <cassert>

namespace gatedyno {
namespace {

const Switch& SwitchAt(const OutputBehaviour& behaviour, int index) {
  return behaviour.network.switches[static_cast<size_t>(index)];
}

bool IsComplementary(const OutputBehaviour& behaviour) {
  return behaviour.group.pass_inputs.empty() && behaviour.floating.none() &&
         behaviour.shorted.none();
}

bool IsPassGate(const OutputBehaviour& behaviour) {
  return !behaviour.group.pass_inputs.empty();
}

// A device whose gate is tied so that it always conducts.
bool IsLoad(const OutputBehaviour& behaviour, int index) {
  const Switch& device = SwitchAt(behaviour, index);
  const NetId on = device.polarity == Polarity::kN ? behaviour.network.power
                                                   : behaviour.network.ground;
  return device.gate == on;
}

bool IsRatioed(const OutputBehaviour& behaviour) {
  return behaviour.floating.none() && behaviour.shorted.any() &&
         std::any_of(behaviour.group.switches.begin(),
                     behaviour.group.switches.end(),
                     [&](int index) { return IsLoad(behaviour, index); });
}

// One signal gates every PMOS, and some NMOS listens to another one.
bool IsDynamic(const OutputBehaviour& behaviour) {
  NetId precharge = -1;
  bool has_logic = false;
  for (const int index : behaviour.group.switches) {
    const Switch& device = SwitchAt(behaviour, index);
    if (device.polarity == Polarity::kP) {
      if (precharge >= 0 && precharge != device.gate) {
        return false;
      }
      precharge = device.gate;
    }
  }
  for (const int index : behaviour.group.switches) {
    const Switch& device = SwitchAt(behaviour, index);
    has_logic |= device.polarity == Polarity::kN && device.gate != precharge;
  }
  return precharge >= 0 && has_logic && behaviour.floating.any();
}

// What the output does while the inputs under `mask` hold `value`.
struct Held {
  bool all_float = true;
  bool none_floats = true;
  bool goes_high = false;
  bool goes_low = false;
};

Held HoldInputs(const OutputBehaviour& behaviour,
                InputVector mask,
                InputVector value) {
  Held held;
  for (InputVector v = 0; v < (InputVector{1} << behaviour.inputs); ++v) {
    if ((v & mask) != value) {
      continue;
    }
    held.all_float &= behaviour.floating[v];
    held.none_floats &= !behaviour.floating[v];
    held.goes_high |= behaviour.high[v];
    held.goes_low |= !behaviour.high[v] && !behaviour.floating[v];
  }
  return held;
}

bool IsEnable(const OutputBehaviour& behaviour, InputVector mask) {
  bool disables = false;
  bool enables = false;
  // All values of the masked inputs: the subsets of the mask.
  InputVector value = mask;
  for (bool more = true; more; value = (value - 1) & mask) {
    const Held held = HoldInputs(behaviour, mask, value);
    disables |= held.all_float;
    enables |= held.none_floats && held.goes_high && held.goes_low;
    more = value != 0;
  }
  return disables && enables;
}

// One or two inputs decide whether the output floats whatever the others do.
bool IsTristate(const OutputBehaviour& behaviour) {
  if (behaviour.shorted.any()) {
    return false;
  }
  for (int i = 0; i < behaviour.inputs; ++i) {
    for (int j = i; j < behaviour.inputs; ++j) {
      if (IsEnable(behaviour, (InputVector{1} << i) | (InputVector{1} << j))) {
        return true;
      }
    }
  }
  return false;
}

bool IsAnything(const OutputBehaviour& /*behaviour*/) {
  return true;
}

struct KindRule {
  GateKind kind;
  std::string_view name;
  bool carried_on;
  bool (*matches)(const OutputBehaviour& behaviour);
};

// The first that matches wins.
constexpr std::array<KindRule, 6> kKinds = {{
    {GateKind::kComplementaryStatic,
     "complementary static",
     true,
     IsComplementary},
    {GateKind::kPassGate, "pass gate", false, IsPassGate},
    {GateKind::kRatioed, "ratioed", false, IsRatioed},
    {GateKind::kTristate, "tristate", false, IsTristate},
    {GateKind::kDynamic, "dynamic", false, IsDynamic},
    {GateKind::kNotComplementary, "not complementary", false, IsAnything},
}};

const KindRule& RuleOf(GateKind kind) {
  const auto* const rule = std::find_if(
      kKinds.begin(), kKinds.end(), [&](const KindRule& candidate) {
        return candidate.kind == kind;
      });
  assert(rule != kKinds.end());
  return *rule;
}

}  // namespace

GateKind ClassifyOutput(const OutputBehaviour& behaviour) {
  const auto* const rule = std::find_if(
      kKinds.begin(), kKinds.end(), [&](const KindRule& candidate) {
        return candidate.matches(behaviour);
      });
  return rule->kind;
}

std::string_view KindName(GateKind kind) {
  return RuleOf(kind).name;
}

bool IsCarriedOn(GateKind kind) {
  return RuleOf(kind).carried_on;
}

}  // namespace gatedyno
