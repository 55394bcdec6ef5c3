// Copies that a deck counts are as good as copies that it writes out.

#include <gtest/gtest.h>

#include "tests/measured/lab.h"
#include "tests/measured/written_copies.h"

namespace gatedyno {
namespace {

// Devices that are models, on M lines; subcircuits: tests/kit/copies_test.cc.
TEST(CopiesTest, MultiplicityOfDeviceLinesEqualsCopies) {
  for (const char* cell : {"inv", "nand2"}) {
    const PreparedRun run = Prepare("p45", {cell});
    for (const ArcEstimate& arc : run.estimates.front().arcs) {
      ExpectSameWithWrittenCopies(run, arc.arc);
    }
  }
}

}  // namespace
}  // namespace gatedyno
