// What the page's script draws and sorts by.

#ifndef GATEDYNO_PAGE_PAGE_DATA_H_
#define GATEDYNO_PAGE_PAGE_DATA_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// JSON text; times in picoseconds, nine digits a number, null for what is not
// known.  Names are short because there is one set an arc:
//
//   {"format": "gatedyno-page/1",
//    "cells": [name ...], "corners": [name ...],
//    "u": relative standard uncertainty of a delay, null where not checked,
//    "arcs": [{"c": place in cells, "k": place in corners,
//              "n": "a->y fall", "e": "fall", "s": "b=1", "v": "within",
//              "b": bent,
//              "g": [hand, measured, u, difference, U of it, tolerance],
//              "p": the same,
//              "x": [[fanout, delay] ...],
//              "l": [slope, intercept], "h": the same by hand} ...]}
//
// The arcs are the run's comparisons, in order.
std::string PageData(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_DATA_H_
