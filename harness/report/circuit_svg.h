// Stages of a cell as transistor schematics, in SVG within HTML.

#ifndef GATEDYNO_REPORT_CIRCUIT_SVG_H_
#define GATEDYNO_REPORT_CIRCUIT_SVG_H_

#include <string>
#include <string_view>

#include "harness/record/circuit.h"
#include "harness/report/circuit_layout.h"
#include "harness/report/circuit_sizes.h"

namespace gatedyno {

// The symbols that the drawings of a page share; once in a page.
std::string CircuitSymbols();

// `label` says in a sentence what is drawn.  One unit is a pixel, so that text
// has the size it is meant to be read at; colours are the style's.
std::string StageSvg(const Circuit& circuit,
                     const StageLayout& layout,
                     const CircuitSizes& sizes,
                     std::string_view label);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_CIRCUIT_SVG_H_
