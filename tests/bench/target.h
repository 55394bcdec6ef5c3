// A measured figure against what was promised of it.

#ifndef GATEDYNO_TESTS_BENCH_TARGET_H_
#define GATEDYNO_TESTS_BENCH_TARGET_H_

#include <string_view>

namespace gatedyno {

// Each prints one line, and is false where the target is missed.
bool AtMost(std::string_view what, double value, double limit);
bool AtLeast(std::string_view what, double value, double limit);

// A figure without a target.
void Figure(std::string_view what, double value, std::string_view remark = "");

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_TARGET_H_
