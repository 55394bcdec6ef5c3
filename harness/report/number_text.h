// Numbers for people: the only place where seconds become picoseconds.

#ifndef GATEDYNO_REPORT_NUMBER_TEXT_H_
#define GATEDYNO_REPORT_NUMBER_TEXT_H_

#include <string>

#include "harness/record/line.h"

namespace gatedyno {

// "1.485 ps": three decimals below 10, two below 100, one above.
std::string Picoseconds(double seconds);

// "+2.8 %", "-17 %": sign always, two digits that count.
std::string SignedPercent(double ratio);

// "20 %".
std::string Percent(double ratio);

// "1.296 ±0.004": the uncertainty to `decimals`, as the value; "1.296" where
// it is not known.
std::string WithUncertainty(const Measured& measured, int decimals);

// "2.182 ±0.001": in picoseconds, three decimals.
std::string PicosecondsWithUncertainty(const Measured& seconds);

// "4/3" where the value is a fraction with a denominator up to 60, to 1e-9;
// "2" for a whole number; empty otherwise.
std::string FractionText(double value);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_NUMBER_TEXT_H_
