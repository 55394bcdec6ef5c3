// What the script of the page of two runs draws and sorts by.

#ifndef GATEDYNO_PAGE_VERSUS_DATA_H_
#define GATEDYNO_PAGE_VERSUS_DATA_H_

#include <string>

#include "harness/report/versus_view.h"

namespace gatedyno {

// JSON text; nine digits a number, null for what is not known.
//
//   {"format": "gatedyno-versus-page/1", "agreement": 0.1,
//    "cells": [name ...], "corners": [name ...], "outputs": [group ...],
//    "arcs": [{"c": place in cells, "k": place in corners, "o": in outputs,
//              "n": "a->y fall", "e": "fall", "f": finding,
//              "d": verdicts differ,
//              "g": [in A, in B, change, U of it], "p": the same} ...]}
//
// The arcs are Versus::arcs, in order; the outputs those of GroupByStack().
std::string VersusData(const VersusView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_VERSUS_DATA_H_
