// The netlist reader on arbitrary bytes.

#include <cstddef>
#include <cstdint>
#include <string_view>

#include "harness/netlist/reader.h"
#include "tests/netlist/read_text.h"

extern "C" int LLVMFuzzerTestOneInput(const uint8_t* data, size_t size) {
  // A kit's device, too, and fins.
  static const gatedyno::ReaderOptions options = [] {
    gatedyno::ReaderOptions made = gatedyno::TestOptions();
    made.devices.push_back(gatedyno::KitDevice());
    made.fin_width_m = 50e-9;
    return made;
  }();
  const auto* text = reinterpret_cast<const char*>(data);
  (void)gatedyno::ReadCells({text, size}, gatedyno::kFile, options);
  return 0;
}
