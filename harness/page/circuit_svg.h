// Stages of a cell as transistor schematics, in SVG within HTML.

#ifndef GATEDYNO_PAGE_CIRCUIT_SVG_H_
#define GATEDYNO_PAGE_CIRCUIT_SVG_H_

#include <string>
#include <string_view>

#include "harness/page/circuit_layout.h"
#include "harness/page/circuit_sizes.h"
#include "harness/record/circuit.h"

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

#endif  // GATEDYNO_PAGE_CIRCUIT_SVG_H_
