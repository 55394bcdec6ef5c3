// A cell's transistors as JSON; field names are the structs' own.

#ifndef GATEDYNO_RECORD_CIRCUIT_JSON_H_
#define GATEDYNO_RECORD_CIRCUIT_JSON_H_

#include <nlohmann/json.hpp>

#include "harness/record/circuit.h"

namespace gatedyno {

nlohmann::json CircuitToJson(const Circuit& circuit);

// Throws what nlohmann_json throws, or std::out_of_range for a stage with a
// device that there is not.
Circuit ReadCircuit(const nlohmann::json& from);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_CIRCUIT_JSON_H_
