// Measures the device cards of models/ with the simulator as a child process.
//
// Deliberately apart from the harness: it reads the node file with a JSON
// library and writes its decks itself, so that a card is judged by something
// other than the program that will use it.

#ifndef GATEDYNO_TESTS_MODELS_CARD_BENCH_H_
#define GATEDYNO_TESTS_MODELS_CARD_BENCH_H_

#include <map>
#include <string>
#include <string_view>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"

namespace gatedyno {

// The nodes of models/.
inline constexpr std::string_view kNodes[] = {"p180", "p130", "p65", "p45"};

using ProcessParameters = std::map<std::string, double>;

// What the bench needs of models/NAME.json.
struct CardNode {
  std::string name;
  double supply_v = 0.0;
  double length_m = 0.0;
  double unit_width_m = 0.0;
  double contacted_m = 0.0;  // Diffusion beside a gate, with a contact.
  std::map<std::string, ProcessParameters> processes;
  nlohmann::json corners;
};
CardNode LoadCardNode(std::string_view name);

// Under which conditions a card is measured.
struct Conditions {
  ProcessParameters process;
  double supply_v = 0.0;
  double temperature_c = 25.0;
};
// One of the node's processes at its nominal supply.
Conditions NominalConditions(const CardNode& node,
                             const std::string& process,
                             double temperature_c);

// Figures of one device 1 um wide, as magnitudes.
struct DeviceFigures {
  double on_a_per_m = 0.0;   // Vgs = Vds = supply; A/m is uA/um.
  double off_a_per_m = 0.0;  // Vgs = 0, Vds = supply; mA/m is nA/um.
  // Thresholds by constant current, 100 nA * W / L with L as drawn, at a drain
  // voltage of 50 mV and of the supply.
  double threshold_linear_v = 0.0;
  double threshold_saturated_v = 0.0;
  double barrier_lowering = 0.0;  // DIBL in V/V between those two.
  double swing_v = 0.0;           // V a decade, Vgs 0 to 0.1 V, Vds 50 mV.
};
// `polarity` is 'n' or 'p'; `length_scale` multiplies the drawn length.
Result<DeviceFigures> MeasureDevice(const CardNode& node,
                                    char polarity,
                                    const Conditions& conditions,
                                    double length_scale = 1.0);

// Both devices' on-currents, A/m, and nothing else: for the many corners.
struct OnCurrents {
  double n_a_per_m = 0.0;
  double p_a_per_m = 0.0;
};
Result<OnCurrents> MeasureOnCurrents(const CardNode& node,
                                     const Conditions& conditions);

// The reference inverter, P/N width ratio 2, in a chain of five at one fanout.
struct InverterFigures {
  double fo4_rise_s = 0.0;  // Output rising, 50 % to 50 %.
  double fo4_fall_s = 0.0;
  double fo4_s = 0.0;      // Mean of both edges.
  double tau_s = 0.0;      // Slope of the mean delay from fanout 1 to 6.
  double parasitic = 0.0;  // Intercept of that line, in tau.
};
Result<InverterFigures> MeasureInverter(const CardNode& node,
                                        const Conditions& conditions);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_MODELS_CARD_BENCH_H_
